import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { interceptOf, quantumOf, slopeOf } from './series-math.ts';

/** NIST Statistical Reference Datasets, linear regression, dataset Norris (observations and certified values). */
const NORRIS = {
  x: [
    0.2, 337.4, 118.2, 884.6, 10.1, 226.5, 666.3, 996.3, 448.6, 777.0, 558.2, 0.4, 0.6, 775.5, 666.9, 338.0,
    447.5, 11.6, 556.0, 228.1, 995.8, 887.6, 120.2, 0.3, 0.3, 556.8, 339.1, 887.2, 999.0, 779.0, 11.1, 118.3,
    229.2, 669.1, 448.9, 0.5,
  ],
  y: [
    0.1, 338.8, 118.1, 888.0, 9.2, 228.1, 668.5, 998.5, 449.1, 778.9, 559.2, 0.3, 0.1, 778.1, 668.8, 339.3,
    448.9, 10.8, 557.7, 228.3, 998.0, 888.8, 119.6, 0.3, 0.6, 557.6, 339.3, 888.0, 998.5, 778.9, 10.2, 117.6,
    228.9, 668.4, 449.2, 0.2,
  ],
  slope: 1.00211681802045,
  intercept: -0.262323073774029,
};

describe('least squares', () => {
  it('agrees with the certified values of NIST StRD Norris to twelve figures', () => {
    expect(slopeOf(NORRIS.x, NORRIS.y) / NORRIS.slope).toBeCloseTo(1, 12);
    expect(interceptOf(NORRIS.x, NORRIS.y) / NORRIS.intercept).toBeCloseTo(1, 12);
  });

  it('recovers an exact line far from the origin', () => {
    const xs = [1e7, 1e7 + 1, 1e7 + 2, 1e7 + 3];
    expect(
      slopeOf(
        xs,
        xs.map((x) => 3 * x + 5),
      ),
    ).toBe(3);
  });
});

describe('quantum', () => {
  it('finds the charge of which all are whole multiples', () => {
    // SI Brochure, 9th edition (2019): e = 1.602176634e-19 C; the readings scatter by about 2 %.
    const scatter = [1.01, 0.985, 1.02, 0.99, 1.005, 1.0];
    const charges = [2, 3, 5, 4, 7, 6].map(
      (n, index) => n * 1.602176634e-19 + ((scatter[index] ?? 1) - 1) * 1.6e-19,
    );
    expect(quantumOf(charges) / 1.602176634e-19).toBeCloseTo(1, 2);
  });

  it('finds the largest, not a fraction of it', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 3, maxLength: 12 }),
        fc.double({ min: 1e-20, max: 1e3, noNaN: true }),
        (multiples, quantum) => {
          let divisor = 0;
          for (const multiple of multiples) {
            let [a, b] = [divisor, multiple];
            while (b !== 0) [a, b] = [b, a % b];
            divisor = a;
          }
          expect(quantumOf(multiples.map((n) => n * quantum)) / (quantum * divisor)).toBeCloseTo(1, 9);
        },
      ),
    );
  });

  it('says that there is none when a value is zero or not finite', () => {
    expect(quantumOf([0, 1])).toBeNaN();
    expect(quantumOf([Infinity, 1])).toBeNaN();
  });
});
