import { describe, expect, it } from 'vitest';
import { compileScript } from '../compile/compile-script.ts';
import type { CompiledScript } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { coverageStatement } from './coverage.ts';
import { firstKeptDraw, planDraws, randomDraw } from './sampling.ts';

function mustCompile(source: string): CompiledScript {
  const { script, diagnostics } = compileScript(source);
  if (script === null) throw new Error(diagnostics.map((diagnostic) => diagnostic.message).join('\n'));
  return script;
}

const LARGE = mustCompile('a = draw(0, 1, 0.001)\nb = draw(0, 2, 0.002)\nd = draw(0 V, 3 V, 0.001 V)');

describe('planDraws', () => {
  it('takes all draws of a grid up to the limit', () => {
    const plan = planDraws(mustCompile('a = whole(1, 4320)'));
    expect(plan).toMatchObject({ draws: { from: 1, count: 4320 }, exhaustive: true });
    expect(coverageStatement(plan)).toBe('all 4,320 draws');
  });

  it('takes every corner and then an even sample of a larger grid', () => {
    const plan = planDraws(LARGE);
    expect(plan).toMatchObject({ count: 20_000, exhaustive: false, gridSize: 1001 * 1001 * 3001 });
    if (!(plan.draws instanceof Float64Array)) throw new Error('expected a list');
    expect(new Set(plan.draws).size).toBe(20_000);
    const { columns } = evaluateBlock(LARGE, plan.draws);
    const corners = Array.from(plan.draws, (_, i) =>
      ['a', 'b', 'd'].map((name) => columns.get(name)?.[i]).join(),
    );
    for (const a of [0, 1])
      for (const b of [0, 2]) for (const d of [0, 3]) expect(corners).toContain(`${a},${b},${d}`);
    for (const [name, middle] of [
      ['a', 0.5],
      ['b', 1],
      ['d', 1.5],
    ] as const) {
      const column = columns.get(name) ?? new Float64Array();
      const mean = column.reduce((sum, value) => sum + value, 0) / column.length;
      expect(mean / middle).toBeCloseTo(1, 2);
    }
  });

  it('gives the same plan each time', () => {
    expect(planDraws(LARGE).draws).toEqual(planDraws(LARGE).draws);
  });

  it('says how sure a sample makes us, by the rule of three', () => {
    expect(coverageStatement(planDraws(LARGE))).toBe(
      '20,000 of 3.0 × 10^9; fewer than 1 in 6,600 fails, 95 % confidence',
    );
    expect(coverageStatement(planDraws(LARGE), 12)).toBe('20,000 of 3.0 × 10^9; 12 of these fail');
  });

  it('never exhausts a script with scatter', () => {
    const plan = planDraws(mustCompile('a = whole(1, 10)\ns = scatter(1 V)'));
    expect(plan).toMatchObject({ draws: { from: 1, count: 20_000 }, exhaustive: false, open: true });
  });
});

describe('single draws', () => {
  it('spread over the whole grid by chance', () => {
    const script = mustCompile('a = whole(1, 10)');
    expect(randomDraw(script, () => 0)).toBe(1);
    expect(randomDraw(script, () => 0.999999)).toBe(10);
  });

  it('are found where a condition keeps them, going round the grid', () => {
    const script = mustCompile('a = whole(1, 10)\nrequire(a == 3)');
    expect(firstKeptDraw(script)).toBe(3);
    expect(firstKeptDraw(script, 5)).toBe(3);
    expect(firstKeptDraw(mustCompile('a = whole(1, 10)\nrequire(a > 10)'))).toBeNull();
  });
});

describe('scatter', () => {
  it('is Gaussian with the standard deviation asked for, and the same for the same draw', () => {
    const script = mustCompile('s = scatter(2 V)');
    const draws = { from: 1, count: 20_000 };
    const column = evaluateBlock(script, draws).columns.get('s') ?? new Float64Array();
    const mean = column.reduce((sum, x) => sum + x, 0) / column.length;
    const deviation = Math.sqrt(column.reduce((sum, x) => sum + (x - mean) ** 2, 0) / column.length);
    expect(Math.abs(mean)).toBeLessThan(0.05);
    expect(deviation / 2).toBeCloseTo(1, 1);
    // 68.27 % of a Gaussian lies within one standard deviation (any table of the normal distribution).
    expect(column.filter((x) => Math.abs(x) < 2).length / column.length).toBeCloseTo(0.6827, 2);
    expect(evaluateBlock(script, draws).columns.get('s')).toEqual(column);
  });
});
