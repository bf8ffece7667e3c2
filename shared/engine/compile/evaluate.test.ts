import { describe, expect, it } from 'vitest';
import { compileScript } from './compile-script.ts';
import type { CompiledScript } from './compiled-script.ts';
import { dependenciesOf } from './dependencies.ts';
import { evaluateBlock, evaluateDraw } from './evaluate.ts';
import { buildExpression, compileExpression, evaluateExpression } from './expressions.ts';
import { expressionText } from '../script/expression-text.ts';
import { workingOf } from './working.ts';

function mustCompile(source: string): CompiledScript {
  const { script, diagnostics } = compileScript(source);
  if (script === null) throw new Error(diagnostics.map((diagnostic) => diagnostic.message).join('\n'));
  return script;
}

const TUBE = mustCompile(`Va = draw(150 V, 300 V, 10 V)
B = draw(0.70 mT, 1.30 mT, 0.05 mT)
v = sqrt(2 * e * Va / m_e)
r = given(m_e * v / (e * B), 3)
require(r < 8.0 cm)
p = m_e * v
lam = h / p
sc = 2 * Va / (B^2 * r^2)`);

const ALL = { from: 1, count: TUBE.grid.size };

describe('evaluation options', () => {
  it('works out only what is wanted', () => {
    const { columns } = evaluateBlock(TUBE, ALL, { wanted: ['lam'], conditions: false });
    expect([...columns.keys()]).toEqual(['lam']);
    expect(columns.get('lam')).toEqual(evaluateBlock(TUBE, ALL).columns.get('lam'));
  });

  it('rounds a named intermediate before it is used further', () => {
    const { columns } = evaluateBlock(TUBE, ALL, {
      wanted: ['v', 'lam'],
      roundIntermediates: new Map([['v', 3]]),
    });
    const v = columns.get('v')?.[0] ?? NaN;
    expect(v).toBe(7.26e6);
    const m = 9.1093837139e-31;
    expect(columns.get('lam')?.[0]).toBe(6.62607015e-34 / (m * v));
    expect(evaluateDraw(TUBE, 1, { roundIntermediates: new Map([['v', 3]]) }).values['v']).toBe(v);
  });

  it('takes constants as data sheets print them, or as told', () => {
    const sheet = evaluateBlock(TUBE, ALL, { wanted: ['v'], constants: 'dataSheet' }).columns.get('v')?.[0];
    expect(sheet).toBe(Math.sqrt((2 * 1.6e-19 * 150) / 9.11e-31));
    const told = evaluateBlock(TUBE, ALL, { wanted: ['v'], constants: new Map([['e', 1.6e-19]]) });
    expect(told.columns.get('v')?.[0]).toBe(Math.sqrt((2 * 1.6e-19 * 150) / 9.1093837139e-31));
  });

  it('imposes pinned columns in place of their statements', () => {
    const pinned = new Float64Array(TUBE.grid.size).fill(0.05);
    const { columns, kept } = evaluateBlock(TUBE, ALL, { pinned: new Map([['r', pinned]]) });
    expect(columns.get('sc')?.[0]).toBe((2 * 150) / (0.0007 * 0.0007 * (0.05 * 0.05)));
    expect(kept.every((keep) => keep === 1)).toBe(true);
    expect(() => evaluateBlock(TUBE, ALL, { pinned: new Map([['r', new Float64Array(2)]]) })).toThrow(
      RangeError,
    );
  });

  it('refuses a wanted name that the script does not have', () => {
    expect(() => evaluateBlock(TUBE, ALL, { wanted: ['constructor'] })).toThrow(RangeError);
  });

  it('marks the draws that a condition leaves out, and says by which', () => {
    const { kept, columns } = evaluateBlock(TUBE, ALL);
    for (const [index, keep] of kept.entries()) {
      expect(keep === 1).toBe((columns.get('r')?.[index] ?? NaN) < 0.08);
    }
    const discarded = kept.indexOf(0);
    expect(discarded).toBeGreaterThanOrEqual(0);
    expect(evaluateDraw(TUBE, discarded + 1)).toMatchObject({
      kept: false,
      discardedBy: { line: 5, column: 1 },
    });
  });

  it('points at the first value that is not defined', () => {
    const script = mustCompile('a = whole(-1, 1)\nb = sqrt(a)\nd = 1 / a');
    expect(evaluateDraw(script, 1)).toMatchObject({ kept: true, discardedBy: { line: 2 } });
    expect(evaluateDraw(script, 2)).toMatchObject({ kept: true, discardedBy: { line: 3 } });
    expect(evaluateDraw(script, 3).discardedBy).toBeNull();
  });
});

describe('expressions over a script', () => {
  it('evaluate as the same statement would', () => {
    const { expression, diagnostics } = compileExpression(TUBE, '2 * Va / (B^2 * r^2)');
    expect(diagnostics).toEqual([]);
    if (expression === null) throw new Error('not compiled');
    const values = evaluateBlock(TUBE, ALL);
    expect(evaluateExpression(expression, values)).toEqual(values.columns.get('sc'));
    expect(expression.uses).toEqual(['Va', 'B', 'r']);
  });

  it('are refused with another dimension than expected', () => {
    const sc = TUBE.quantities.find((quantity) => quantity.name === 'sc');
    const { expression, diagnostics } = compileExpression(TUBE, 'Va / r', sc?.dimension);
    expect(expression).toBeNull();
    expect(diagnostics[0]?.message).toBe(
      'This is a field strength (V m^-1); a specific charge (C kg^-1) is asked for.',
    );
  });

  it.each(['', 'Va +', 'x = 3', 'Va\nB', 'draw(1, 2, 1)', 'Va + r', 'nothing'])('refuse “%s”', (text) => {
    const { expression, diagnostics } = compileExpression(TUBE, text);
    expect(expression).toBeNull();
    expect(diagnostics.length).toBeGreaterThan(0);
  });

  it('are built from a changed tree and written out again', () => {
    const tree = workingOf(TUBE, 'sc');
    if (tree?.kind !== 'binary') throw new Error('unexpected tree');
    const upsideDown = buildExpression(TUBE, { ...tree, left: tree.right, right: tree.left });
    expect(upsideDown.expression && expressionText(upsideDown.expression.tree)).toBe('B^2 * r^2 / (2 * Va)');
    const clash = buildExpression(TUBE, { ...tree, operator: '+' });
    expect(clash.expression).toBeNull();
  });

  it.each([
    'a - (b - d)',
    '(a + b) * d',
    'a / (b * d)',
    'a / b / d',
    '-a^2',
    '(-a)^2',
    'a^(b^d)',
    '(a^b)^d',
    '2 V^2',
    'a < b and not (b < d)',
    'a < b ? a : b < d ? b : d',
    '[a, b, 2][2]',
    'sqrt(a) * min(a, b)',
    'a - -b',
    '(a < b ? a : b) + d',
    '(3 m)^2 * a',
  ])('write %s so that it reads back as the same tree', (text) => {
    const script = mustCompile('a = 1\nb = 2\nd = 3');
    const first = compileExpression(script, text).expression;
    if (first === null) throw new Error(`not compiled: ${text}`);
    const again = compileExpression(script, expressionText(first.tree)).expression;
    const values = evaluateBlock(script, { from: 1, count: 1 });
    expect(again && expressionText(again.tree)).toBe(expressionText(first.tree));
    if (first.shape.kind !== 'series' && again !== null) {
      expect(evaluateExpression(again, values)).toEqual(evaluateExpression(first, values));
    }
  });
});

describe('what an answer rests on', () => {
  it('lists givens, intermediates and constants of the working', () => {
    expect(dependenciesOf(TUBE, 'sc')).toEqual({
      names: ['Va', 'B', 'v', 'r'],
      givens: ['Va', 'B', 'r'],
      intermediates: [],
      constants: [],
    });
    expect(dependenciesOf(TUBE, 'lam')).toEqual({
      names: ['Va', 'v', 'p'],
      givens: ['Va'],
      intermediates: ['v', 'p'],
      constants: ['h', 'm_e', 'e'],
    });
    expect(dependenciesOf(TUBE, 'toString')).toEqual({
      names: [],
      givens: [],
      intermediates: [],
      constants: [],
    });
  });

  it('inlines computed names down to printed values', () => {
    const text = (inline: boolean | ReadonlySet<string>): string => {
      const tree = workingOf(TUBE, 'lam', inline);
      return tree === null ? '' : expressionText(tree);
    };
    expect(text(false)).toBe('h / p');
    expect(text(new Set(['p']))).toBe('h / (m_e * v)');
    expect(text(true)).toBe('h / (m_e * sqrt(2 * e * Va / m_e))');
    expect(workingOf(TUBE, 'Va')).toBeNull();
  });
});
