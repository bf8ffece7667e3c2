import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compileScript } from './compile-script.ts';
import type { CompiledScript } from './compiled-script.ts';
import { evaluateBlock, evaluateDraw } from './evaluate.ts';
import { digitsOfDraw, drawOfDigits, gridPlaces } from './grid.ts';

function mustCompile(source: string): CompiledScript {
  const { script, diagnostics } = compileScript(source);
  if (script === null) throw new Error(diagnostics.map((diagnostic) => diagnostic.message).join('\n'));
  return script;
}

const anyGrid = fc
  .array(fc.integer({ min: 1, max: 60 }), { minLength: 1, maxLength: 8 })
  .map((counts) => mustCompile(counts.map((count, index) => `x${index} = whole(1, ${count})`).join('\n')));

describe('draw numbers', () => {
  it('are a bijection between 1 to size and the digits of the grid', () => {
    fc.assert(
      fc.property(anyGrid, fc.nat(), (script, seed) => {
        const draw = 1 + (seed % script.grid.size);
        const digits = digitsOfDraw(script, draw);
        expect(drawOfDigits(script, digits)).toBe(draw);
        for (const [index, place] of gridPlaces(script).entries()) {
          expect(digits[index]).toBeGreaterThanOrEqual(0);
          expect(digits[index]).toBeLessThan(place.count);
        }
      }),
    );
  });

  it('reach every point of a small grid once', () => {
    const script = mustCompile('a = whole(1, 4)\nb = draw(0 V, 1 V, 0.5 V)\nc1 = oneOf(1, 2)');
    const { columns } = evaluateBlock(script, { from: 1, count: 24 });
    const seen = new Set(
      Array.from({ length: 24 }, (_, i) => ['a', 'b', 'c1'].map((name) => columns.get(name)?.[i]).join()),
    );
    expect(seen.size).toBe(24);
  });

  it('stay exact on a grid of 10^15 points', () => {
    const script = mustCompile('a = draw(0, 999999, 1)\nb = draw(0, 999999, 1)\nc1 = draw(0, 999, 1)');
    expect(script.grid.size).toBe(1e15);
    expect(evaluateDraw(script, 1e15).values).toMatchObject({ a: 999999, b: 999999, c1: 999 });
    expect(evaluateDraw(script, 123456789012346).values).toMatchObject({ a: 123456, b: 789012, c1: 345 });
  });

  it('refuse numbers outside the grid', () => {
    const script = mustCompile('a = whole(1, 4)');
    for (const draw of [0, 5, 1.5, NaN]) expect(() => evaluateDraw(script, draw)).toThrow(RangeError);
    expect(() => evaluateBlock(script, { from: 3, count: 3 })).toThrow(RangeError);
    expect(() => evaluateBlock(script, Float64Array.of(1, 7))).toThrow(RangeError);
  });

  it('give the written decimals exactly, in any decimal unit', () => {
    const script = mustCompile(
      'B = draw(0.70 mT, 1.30 mT, 0.05 mT)\nq = draw(1.6e-19 C, 9.6e-19 C, 1.6e-19 C)',
    );
    const { columns } = evaluateBlock(script, { from: 1, count: script.grid.size });
    const { B, q } = { B: columns.get('B'), q: columns.get('q') };
    for (const [index, value] of (B ?? []).entries()) {
      expect(value).toBe(Number(`${70 + 5 * Math.floor(index / 6)}e-5`));
      expect(q?.[index]).toBe(Number(`${16 * (1 + (index % 6))}e-20`));
    }
  });
});
