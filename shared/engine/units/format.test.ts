import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { dimension } from './dimension.ts';
import { formatNumber, formatQuantity } from './format.ts';
import { coherentUnit, describeDimension } from './quantity-kinds.ts';
import { readUnit } from './read-unit.ts';
import { UNITS } from './unit-table.ts';

const T = '\u202F';

describe('formatNumber', () => {
  it.each([
    [5.2, 2, '5.2'],
    [150, 3, '150'],
    [150, 2, `1.5${T}×${T}10²`],
    [200, 3, '200'],
    [0.0712, 3, '0.0712'],
    [0.000712, 3, `7.12${T}×${T}10⁻⁴`],
    [1.7588e11, 3, `1.76${T}×${T}10¹¹`],
    [-1.6e-19, 2, `−1.6${T}×${T}10⁻¹⁹`],
    [999.96, 4, '1000'],
    [12345, 5, `12${T}345`],
    [0, 3, '0.00'],
  ])('prints %d to %d figures as %s', (value, figures, text) => {
    expect(formatNumber(value, { figures }).text).toBe(text);
  });

  it.each([
    [0.7, 2, '0.70'],
    [300, 0, '300'],
    [230000, -4, `2.3${T}×${T}10⁵`],
    [1.5e-15, 16, `1.5${T}×${T}10⁻¹⁵`],
    [-0.004, 1, '0.0'],
    [2500, -2, `2.5${T}×${T}10³`],
  ])('prints %d to %d decimals as %s', (value, decimals, text) => {
    expect(formatNumber(value, { decimals }).text).toBe(text);
  });

  it('prints what can be read back to the same figures', () => {
    fc.assert(
      fc.property(
        fc.double({ noNaN: true, noDefaultInfinity: true }).filter((x) => x !== 0),
        fc.integer({ min: 1, max: 12 }),
        (x, figures) => {
          const number = formatNumber(x, { figures });
          expect(number.value).toBe(Number(x.toPrecision(figures)));
          expect(number.digits.replace(/^0\.0*|\./g, '')).toHaveLength(figures);
        },
      ),
    );
  });

  it('prints what is not finite as a dash', () => {
    expect(formatNumber(NaN, { figures: 3 }).text).toBe('—');
  });
});

describe('formatQuantity', () => {
  it('prints text and maths with thin spaces', () => {
    const reading = readUnit('C/kg');
    if (!reading.ok) throw new Error(reading.message);
    const printed = formatQuantity(1.7588e11, reading.unit, { figures: 3 });
    expect(printed.text).toBe(`1.76${T}×${T}10¹¹${T}C${T}kg⁻¹`);
    expect(printed.latex).toBe('1.76 \\times 10^{11}\\,\\mathrm{C\\,kg^{-1}}');
  });

  it('sets no space before a degree sign', () => {
    const reading = readUnit('°');
    if (!reading.ok) throw new Error(reading.message);
    expect(formatQuantity(Math.PI / 6, reading.unit, { figures: 2 }).text).toBe('30°');
  });

  it.each([...UNITS.keys()])('writes maths for %s that KaTeX sets without complaint', (symbol) => {
    for (const prefixed of UNITS.get(symbol)?.prefixed ? [symbol, `µ${symbol}`] : [symbol]) {
      const reading = readUnit(prefixed);
      if (!reading.ok) throw new Error(reading.message);
      const { latex } = formatQuantity(1.5e-7, reading.unit, { figures: 2 });
      expect(() => katex.renderToString(latex, { throwOnError: true, strict: 'error' })).not.toThrow();
    }
  });
});

describe('naming dimensions', () => {
  it('says what a dimension measures', () => {
    expect(describeDimension(dimension(2, 1, -3, -1))).toBe('a potential difference (V)');
    expect(describeDimension(dimension(2, 1, -2))).toBe('an energy (J)');
    expect(describeDimension(dimension())).toBe('a plain number');
    expect(coherentUnit(dimension(0, -1, 1, 1)).text).toBe('C kg^-1');
    expect(coherentUnit(dimension(1, 0, -2)).text).toBe('m s^-2');
    expect(coherentUnit(dimension(-1, 1, -1)).text).toBe('Pa s');
    expect(coherentUnit(dimension(5, 2, -1)).text).toBe('kg^2 m^5 s^-1');
  });
});
