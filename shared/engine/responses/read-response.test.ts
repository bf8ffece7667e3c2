import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatQuantity } from '../units/format.ts';
import { readUnit } from '../units/read-unit.ts';
import type { Unit } from '../units/unit.ts';
import { readResponse } from './read-response.ts';

function mustReadUnit(text: string): Unit {
  const reading = readUnit(text);
  if (!reading.ok) throw new Error(reading.message);
  return reading.unit;
}

const READ: readonly [text: string, value: number, unit: string | null, least: number, most: number][] = [
  ['1.76 × 10^11 C kg⁻¹', 1.76e11, 'C kg^-1', 3, 3],
  ['1.76e11 C/kg', 1.76e11, 'C kg^-1', 3, 3],
  ['1,76·10^11', 1.76e11, null, 3, 3],
  ['176 GC/kg', 176, 'GC kg^-1', 3, 3],
  ['-3,2 E-19C', -3.2e-19, 'C', 2, 2],
  ['6.6x10-34 Js', 6.6e-34, 'J s', 2, 2],
  ['v = 3.0 × 10⁷ m s⁻¹', 3e7, 'm s^-1', 2, 2],
  ['≈ 5.2 mT', 5.2, 'mT', 2, 2],
  ['≈5.2\u202FmT', 5.2, 'mT', 2, 2],
  ['−5.2 mT', -5.2, 'mT', 2, 2],
  ['5.2 mT approx', 5.2, 'mT', 2, 2],
  ['e/m = 1.76e11 C/kg (3 s.f.)', 1.76e11, 'C kg^-1', 3, 3],
  ['1500 V = 1.5 kV', 1500, 'V', 2, 4],
  ['3.0 × 10⁸ m/s (= 300 Mm/s)', 3e8, 'm s^-1', 2, 2],
  ['0,125 m', 0.125, 'm', 3, 3],
  ['1,602e-19 C', 1.602e-19, 'C', 4, 4],
  ['1.602 176 634e-19 C', 1.602176634e-19, 'C', 10, 10],
  ['12 500 V', 12500, 'V', 3, 5],
  ['1,250,000 V', 1.25e6, 'V', 3, 7],
  ['speed is 4.5 metres per second', 4.5, 'm s^-1', 2, 2],
  ['about 3.4cm', 3.4, 'cm', 2, 2],
  ['10^-19 C', 1e-19, 'C', 1, 1],
  ['3.0 m as expected', 3, 'm', 2, 2],
  ['7.3 m/s to the right', 7.3, 'm s^-1', 2, 2],
  ['7.3 m/s.', 7.3, 'm s^-1', 2, 2],
  ['2.0 × 10^(-3) T', 0.002, 'T', 2, 2],
  ['400', 400, null, 1, 3],
  ['4.00e2', 400, null, 3, 3],
  ['0.00450', 0.0045, null, 3, 3],
  ['.5 m', 0.5, 'm', 1, 1],
  ['30°', 30, '°', 1, 2],
  ['5 kev', 5, 'keV', 1, 1],
  ['1.2 × 10^5 J/kg K', 1.2e5, 'J kg^-1 K^-1', 2, 2],
  ['v_1 = 2.5 m/s', 2.5, 'm s^-1', 2, 2],
  ['Answer: 3.4 cm', 3.4, 'cm', 2, 2],
  ['2.50 kilovolts', 2.5, 'kV', 3, 3],
];

const FOR_A_PERSON: readonly [text: string, words: string][] = [
  ['', 'Nothing is written'],
  ['   ', 'Nothing is written'],
  ['no idea', 'No number'],
  ['< 3 m', 'limit or a range'],
  ['between 3 and 4 m', 'limit or a range'],
  ['3 m and 4 m', 'More than one number'],
  ['1500 V or 2 kV', 'Two answers'],
  ['1500 V = 2.5 kV', 'Two different values'],
  ['12,500 V', 'whole number or as a decimal'],
  ['1,234', 'whole number or as a decimal'],
  ['1.76x1011', 'power of ten is not clear'],
  ['1.5 x10 V', 'power of ten is not clear'],
  ['3/4', 'not worked out'],
  ['3 × 4', 'not worked out'],
  ['v=3.0/2.0=1.5 m/s', 'not worked out'],
  ['3.2 ± 0.1 m', 'uncertainty'],
  ['5 apples', 'not a unit'],
  ['1e999 V', 'too large'],
  ['1.2.3 V', 'not clear'],
  ['3.0 ms-1', 'per millisecond or as metre per second'],
  ['√2 m', 'working'],
  ['9'.repeat(500), 'too long'],
];

describe('readResponse', () => {
  it.each(READ)('reads “%s”', (text, value, unit, least, most) => {
    const reading = readResponse(text);
    if (!reading.ok) throw new Error(reading.reason);
    expect(reading.value).toBe(value);
    expect(reading.unit?.text ?? null).toBe(unit);
    expect(reading.figures).toEqual({ least, most });
  });

  it.each(FOR_A_PERSON)('leaves “%s” to a person', (text, words) => {
    const reading = readResponse(text);
    expect(reading.ok).toBe(false);
    if (!reading.ok) expect(reading.reason).toContain(words);
  });

  it('settles metre per second by the unit asked for, and by nothing else', () => {
    const speed = readResponse('3.0 ms-1', mustReadUnit('m s^-1'));
    expect(speed.ok && speed.unit?.text).toBe('m s^-1');
    const rate = readResponse('3.0 ms-1', mustReadUnit('Hz'));
    expect(rate.ok && rate.unit?.text).toBe('ms^-1');
    expect(readResponse('3.0 ms-1', mustReadUnit('V')).ok).toBe(false);
  });

  it('reads back whatever the engine prints', () => {
    const units = ['V', 'mT', 'C kg^-1', 'm s^-2', 'keV', 'Ω', 'µm', 'kg m^-3', 'J s', ''].map(mustReadUnit);
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }).filter((x) => Math.abs(x) > 1e-9),
        fc.integer({ min: -30, max: 20 }),
        fc.integer({ min: 1, max: 6 }),
        fc.constantFrom(...units),
        (mantissa, exponent, figures, unit) => {
          const printed = formatQuantity(mantissa * 10 ** exponent, unit, { figures });
          const reading = readResponse(printed.text, unit);
          if (!reading.ok) throw new Error(`${printed.text}: ${reading.reason}`);
          expect(reading.value).toBe(printed.value);
          expect(reading.unit?.text ?? '').toBe(unit.text);
          expect(figures).toBeGreaterThanOrEqual(reading.figures.least);
          expect(figures).toBeLessThanOrEqual(reading.figures.most);
        },
      ),
      { numRuns: 1000 },
    );
  });

  it('never throws, whatever is written', () => {
    const piece = fc.constantFrom(
      '1',
      '0',
      '.',
      ',',
      ' ',
      'x',
      '10',
      '^',
      '-',
      'e',
      'E',
      'm',
      's',
      '/',
      '(',
      ')',
      '=',
      '⁻¹',
      'V',
      '±',
      'kg',
      '≈',
      'ü',
      '°',
    );
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string({ maxLength: 40 }),
          fc.array(piece, { maxLength: 20 }).map((all) => all.join('')),
        ),
        (text) => {
          const reading = readResponse(text);
          if (reading.ok) expect(Number.isFinite(reading.value)).toBe(true);
          else expect(reading.reason).not.toBe('');
        },
      ),
      { numRuns: 3000 },
    );
  });
});
