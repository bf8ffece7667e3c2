import { expect, it } from 'vitest';
import { fuzz } from './fuzzing.ts';

it('100,000 mutated scripts each compile or are told a positioned mistake', { timeout: 900_000 }, () => {
  const outcome = fuzz(100_000, 7);
  expect(outcome.sound + outcome.faulty).toBe(100_000);
  expect(outcome.slowest).toBeLessThan(2_000);
});
