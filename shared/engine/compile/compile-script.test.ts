import { describe, expect, it } from 'vitest';
import { compileScript } from './compile-script.ts';

function quantity(source: string, name: string) {
  const { quantities, diagnostics } = compileScript(source);
  expect(diagnostics.filter((diagnostic) => diagnostic.severity === 'error')).toEqual([]);
  return quantities.find((candidate) => candidate.name === name);
}

describe('what is known of a name', () => {
  it.each([
    ['x = draw(150 V, 300 V, 10 V)', 'drawn', 'V', null, 0],
    ['x = draw(0.70 mT, 1.30 mT, 0.05 mT)', 'drawn', 'mT', null, 2],
    ['x = draw(0.725 mT, 1.225 mT, 0.05 mT)', 'drawn', 'mT', null, 3],
    ['x = draw(2.0e5 m/s, 4.0e5 m/s, 0.1e5 m/s)', 'drawn', 'm s^-1', null, -4],
    ['x = draw(1.0 kV, 2.0 kV, 50 V)', 'drawn', 'kV', null, 3],
    ['x = whole(1, 6)', 'drawn', '', null, 0],
    ['x = oneOf(1.5 eV, 2.25 eV)', 'drawn', 'eV', null, 2],
    ['x = oneOf(m_e, m_p)', 'drawn', 'kg', null, null],
    ['a = 5 kV\nx = given(a / 2, 3)', 'given', 'kV', 3, null],
    ['x = given(2 * e * 1 V, 2, eV)', 'given', 'eV', 2, null],
    ['a = 2 cm\nx = a + 1 mm', 'computed', 'cm', null, null],
    ['x = e * 3 kV', 'computed', 'J', null, null],
    ['x = (2 m)^2', 'computed', 'm^2', null, null],
    ['x = 1 V / (2 mm)', 'computed', 'V m^-1', null, null],
  ])('%s', (source, kind, scriptUnit, figures, decimals) => {
    expect(quantity(source, 'x')).toMatchObject({ kind, scriptUnit, figures, decimals });
  });

  it('lists the names and constants on its right-hand side', () => {
    expect(quantity('a = 1 V\nb = 2\nx = sqrt(2 * e * a / m_e) * b', 'x')).toMatchObject({
      uses: ['a', 'b'],
      constants: ['e', 'm_e'],
      span: { line: 3, column: 1 },
    });
  });

  it('is told for the sound lines of a script that has a mistake elsewhere', () => {
    const { script, quantities } = compileScript('a = 1 V\nb = a + 1 m\nd = b * 2\nf = a * 2');
    expect(script).toBeNull();
    expect(quantities.map(({ name }) => name)).toEqual(['a', 'f']);
  });
});

describe('ways of writing', () => {
  it.each([
    ['superscripts and typographic signs', 'a = 2 m × 3 − 1 m\nx = a²', 'x'],
    ['a statement over several lines', 'x = sqrt(\n  4 +\n  5\n)', 'x'],
    ['both code points of micro and ohm', 'a = 1 \u00B5m + 1 \u03BCm\nx = 1 \u03A9 + 1 \u2126', 'x'],
    ['Greek names', 'λ = 500 nm\nx = h * c / λ', 'x'],
    ['subscript digits', 'B₀ = 2 mT\nx = B0 * 2', 'x'],
    ['comments and empty lines', '\n// all\n\nx = 1 // one\n', 'x'],
    ['Windows line ends', 'a = 1\r\nx = a\r\n', 'x'],
    ['no final line end or spaces', 'x=1+2*3', 'x'],
    ['a unit in brackets after a slash', 'x = 4200 J/(kg K)', 'x'],
    ['a condition as a value', 'x = 1 < 2 and not (2 < 1)', 'x'],
  ])('take %s', (_, source, name) => {
    expect(quantity(source, name)).toBeDefined();
  });

  it('warn where steps do not meet the end', () => {
    const { script, diagnostics } = compileScript('x = draw(1 V, 2.05 V, 0.1 V)');
    expect(script?.grid.size).toBe(11);
    expect(diagnostics).toMatchObject([
      {
        severity: 'warning',
        code: 'draw-end-not-reached',
        message: expect.stringContaining('the last value is 2.0 V'),
      },
    ]);
  });

  it('tell at most fifty mistakes at once, in the order of the lines', () => {
    const { diagnostics } = compileScript(
      Array.from({ length: 80 }, (_, index) => `x${index} = y`).join('\n'),
    );
    expect(diagnostics).toHaveLength(50);
    expect(diagnostics.map(({ span }) => span.line)).toEqual(
      Array.from({ length: 50 }, (_, index) => index + 1),
    );
  });

  it('offer a fix for a product without its sign', () => {
    const source = 'Va = 3 V\nx = 2 Va';
    const [first] = compileScript(source).diagnostics;
    const fix = first?.fix;
    if (fix === undefined) throw new Error('no fix is offered');
    const fixed = source.slice(0, fix.span.start) + fix.replacement + source.slice(fix.span.end);
    expect(fixed).toBe('Va = 3 V\nx = 2 * Va');
    expect(compileScript(fixed).diagnostics).toEqual([]);
  });
});
