import { describe, expect, it } from 'vitest';

import type { Finding } from '#shared/engine/index.ts';
import type { PlacedDiagnostic, QuantityRow } from '#shared/contracts/checking.ts';
import { expectsUnit, explain, proposals } from './completions.ts';
import { underlines } from './script-lint.ts';

const row: QuantityRow = {
  name: 'Va',
  kind: 'drawn',
  dimension: 'potential difference (V)',
  unit: 'V',
  line: 1,
  value: '150 V',
  valueLatex: '150\\,\\mathrm{V}',
};

describe('completion in the script', () => {
  it('proposes units alone after a number', () => {
    expect(['Va = draw(150 ', 'x = 9.81 m ', 'E = 2.0e5 V/', 'd = 1'].map(expectsUnit)).toEqual([
      true,
      true,
      true,
      true,
    ]);
    expect(['v = sqrt(', 'v = 2 * ', 'x1', 'q = n * '].map(expectsUnit)).toEqual([
      false,
      false,
      false,
      false,
    ]);
    const offered = proposals('Va = draw(150 ', [row]);
    expect(offered.map((proposal) => proposal.label)).toContain('kV');
    expect(offered.every((proposal) => proposal.kind === 'unit')).toBe(true);
  });

  it('proposes the script’s own names first, then constants, functions and ways to draw', () => {
    const offered = proposals('v = ', [row]);
    expect(offered[0]).toMatchObject({ label: 'Va', detail: 'potential difference (V)' });
    const labels = offered.map((proposal) => proposal.label);
    for (const name of ['m_e', 'sqrt', 'draw']) expect(labels).toContain(name);
    expect(offered.find((proposal) => proposal.label === 'sqrt')?.apply).toBe('sqrt(');
  });

  it('explains a name under the pointer', () => {
    expect(explain('Va', [row])?.lines).toEqual(['drawn, potential difference (V)', '150 V at this draw']);
    expect(explain('m_e', [row])?.lines[1]).toContain('9.109');
    expect(explain('nothing', [row])).toBeNull();
  });
});

const span = { start: 5, end: 7, line: 1, column: 6 };
const diagnostic: PlacedDiagnostic = {
  code: 'unknown-name',
  severity: 'error',
  span,
  message: 'No Vb.',
  field: '',
};
const finding: Finding = {
  key: 'k',
  check: 'limits',
  code: 'c',
  severity: 'caution',
  statement: 'Fast.',
  cure: 'Slow down.',
  place: { span },
  worstDraw: 1,
  otherDraws: [],
  drawCount: 1,
};

describe('underlines in the script', () => {
  it('stand for mistakes of the script and findings that point into it, and for nothing else', () => {
    const lines = underlines(
      [diagnostic, { ...diagnostic, field: 'parts.0.text' }],
      [finding, { ...finding, place: { partId: 'p' } }],
      40,
    );
    expect(lines.map((line) => [line.severity, line.message])).toEqual([
      ['error', 'No Vb.'],
      ['warning', 'Fast. Slow down.'],
    ]);
  });

  it('stay within a script that has become shorter', () => {
    expect(underlines([diagnostic], [], 3)[0]).toMatchObject({ from: 3, to: 3 });
    expect(underlines([{ ...diagnostic, span: { ...span, end: 5 } }], [], 40)[0]).toMatchObject({
      from: 5,
      to: 6,
    });
  });

  it('tell the same thing at the same place once', () => {
    expect(underlines([diagnostic, diagnostic], [], 40)).toHaveLength(1);
  });

  it('carry the cure where there is one', () => {
    const fix = { label: 'Write Va', span, replacement: 'Va' };
    expect(underlines([{ ...diagnostic, fix }], [], 40)[0]?.fix).toEqual({
      label: 'Write Va',
      from: 5,
      to: 7,
      replacement: 'Va',
    });
  });
});
