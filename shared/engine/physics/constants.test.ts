import { describe, expect, it } from 'vitest';
import { CONSTANTS } from './constants.ts';

function value(name: string): number {
  const constant = CONSTANTS.get(name);
  if (constant === undefined) throw new Error(`no constant ${name}`);
  return constant.value;
}

describe('constants', () => {
  /** Relations that define or connect the SI constants; SI Brochure, 9th edition (2019), and CODATA 2022 (NIST). */
  it.each([
    ['reduced Planck constant', () => value('h') / (2 * Math.PI), () => value('hbar'), 1e-9],
    [
      'Stefan–Boltzmann constant',
      () => (2 * Math.PI ** 5 * value('k_B') ** 4) / (15 * value('h') ** 3 * value('c') ** 2),
      () => value('sigma_SB'),
      1e-9,
    ],
    ['speed of light', () => 1 / Math.sqrt(value('eps0') * value('mu0')), () => value('c'), 1e-10],
    [
      'fine-structure constant',
      () => value('e') ** 2 / (2 * value('eps0') * value('h') * value('c')),
      () => value('alpha_fs'),
      1e-10,
    ],
    [
      'Rydberg constant',
      () => (value('alpha_fs') ** 2 * value('m_e') * value('c')) / (2 * value('h')),
      () => value('R_inf'),
      1e-9,
    ],
    ['Bohr radius', () => value('alpha_fs') / (4 * Math.PI * value('R_inf')), () => value('a0'), 1e-10],
    // CODATA 2022 prints the quotients themselves: -1.75882000838e11 and 9.5788331430e7 C kg^-1.
    ['electron charge to mass quotient', () => value('e') / value('m_e'), () => 1.75882000838e11, 1e-10],
    ['proton charge to mass quotient', () => value('e') / value('m_p'), () => 9.578833143e7, 1e-10],
  ])('agree with the %s', (_, computed, published, tolerance) => {
    expect(Math.abs(computed() / published() - 1)).toBeLessThan(tolerance);
  });

  it('are rounded for the data sheet', () => {
    expect(CONSTANTS.get('m_e')?.dataSheet).toEqual({ figures: 3, value: 9.11e-31 });
    expect(CONSTANTS.get('e')?.dataSheet.value).toBe(1.6e-19);
    expect(CONSTANTS.get('c')?.dataSheet.value).toBe(3e8);
  });

  it('each carry a source and an uncertainty far below their data-sheet rounding', () => {
    for (const constant of CONSTANTS.values()) {
      expect(constant.source).not.toBe('');
      expect(constant.uncertainty).toBeGreaterThanOrEqual(0);
      expect(constant.uncertainty).toBeLessThan(Math.abs(constant.value) * 1e-8);
    }
  });
});
