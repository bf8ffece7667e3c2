import { describe, expect, it } from 'vitest';
import { compileScript, evaluateBlock, evaluateDraw, type CompiledScript } from '#shared/engine/index.ts';
import { FAULTY_SCRIPTS } from './faulty-scripts.ts';
import { SOUND_SCRIPTS } from './sound-scripts.ts';

function mustCompile(source: string): CompiledScript {
  const { script, diagnostics } = compileScript(source);
  if (script === null) throw new Error(diagnostics.map((diagnostic) => diagnostic.message).join('\n'));
  return script;
}

/** Draws at which the two evaluators are compared. */
function draws(script: CompiledScript): Float64Array {
  const last = script.grid.open ? 3000 : script.grid.size;
  const step = Math.max(1, Math.floor(last / 1500));
  return Float64Array.from({ length: Math.floor((last - 1) / step) + 1 }, (_, index) => 1 + index * step);
}

describe.each(SOUND_SCRIPTS)('sound script: $name', ({ script: source, gridSize, open = false, values }) => {
  it('compiles without a mistake and counts its grid', () => {
    const { diagnostics, grid } = compileScript(source);
    expect(diagnostics).toEqual([]);
    expect(grid).toEqual({ size: gridSize, open });
  });

  it('gives the same bits in the block evaluator as in the plain one', () => {
    const script = mustCompile(source);
    const selection = draws(script);
    const listed = evaluateBlock(script, selection);
    const run = evaluateBlock(script, { from: 1, count: Math.min(2100, open ? 2100 : gridSize) });
    for (const block of [listed, run]) {
      for (const [index, draw] of block.draws.entries()) {
        const plain = evaluateDraw(script, draw);
        const values = new Map(Object.entries(plain.values));
        expect(block.kept[index] === 1).toBe(plain.kept);
        for (const [name, column] of block.columns) {
          if (!Object.is(column[index], values.get(name)))
            expect([draw, name, column[index]]).toEqual([draw, name, values.get(name)]);
        }
        for (const [name, columns] of block.series) {
          const row = columns.map((column) => column[index]);
          if (JSON.stringify(row) !== JSON.stringify(values.get(name)))
            expect([draw, name, row]).toEqual([draw, name, values.get(name)]);
        }
      }
    }
  });

  it.each(values)('gives $name as printed ($source)', ({ name, printed, figures }) => {
    const value = evaluateDraw(mustCompile(source), 1).values[name];
    expect(typeof value).toBe('number');
    // Agreement to the printed figures: half a unit in the last of them.
    const lastFigure = 10 ** (Math.floor(Math.log10(Math.abs(printed))) + 1 - figures);
    expect(Math.abs(Number(value) - printed)).toBeLessThanOrEqual(0.5 * lastFigure * 1.001);
  });
});

describe('faulty scripts', () => {
  it.each(FAULTY_SCRIPTS)('%j says %s', (source, code, underlined, words) => {
    const { script, diagnostics } = compileScript(source);
    expect(script).toBeNull();
    const [first] = diagnostics;
    expect(first?.code).toBe(code);
    expect(source.slice(first?.span.start, first?.span.end)).toBe(underlined);
    expect(first?.message).toContain(words);
    expect(diagnostics).toHaveLength(1);
  });

  it('gives line and column from 1', () => {
    const { diagnostics } = compileScript('a = 1\n\n  b = a + 2 m');
    expect(diagnostics[0]?.span).toMatchObject({ line: 3, column: 7 });
  });
});
