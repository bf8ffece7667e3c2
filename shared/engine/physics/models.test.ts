import { describe, expect, it } from 'vitest';
import {
  exactKineticEnergy,
  exactMomentum,
  exactSpeed,
  gammaOfSpeed,
  oseenExcess,
  reynoldsNumber,
  slipCorrection,
} from './models.ts';

// CODATA 2022 (NIST).
const ELECTRON = 9.1093837139e-31;
const EV = 1.602176634e-19;
const LIGHT = 299792458;

describe('special relativity', () => {
  it('makes the simple speed 3.6 % too high at 25 kV', () => {
    // By hand with mc² = 511 keV: γ = 1.0489, so 0.3018 c, where √(2 · 25/511) is 0.3128.
    const simple = Math.sqrt((2 * 25e3 * EV) / ELECTRON);
    expect(simple / exactSpeed(25e3 * EV, ELECTRON) - 1).toBeCloseTo(0.0363, 4);
  });

  it('makes the radius at 6.00e7 m/s 2 % larger', () => {
    // OpenStax College Physics 2e, example fs-id2585919: 0.2 c.
    expect(gammaOfSpeed(6e7) - 1).toBeCloseTo(0.0206, 3);
  });

  it('agrees with itself between speed, energy and momentum', () => {
    for (const energy of [1e2, 1e4, 1e6].map((value) => value * EV)) {
      const speed = exactSpeed(energy, ELECTRON);
      expect(exactKineticEnergy(speed, ELECTRON) / energy).toBeCloseTo(1, 6);
      expect(exactMomentum(energy, ELECTRON) / (gammaOfSpeed(speed) * ELECTRON * speed)).toBeCloseTo(1, 9);
    }
  });

  it('doubles γ at a kinetic energy of mc²', () => {
    // Speed 0.866 c for γ = 2 (any text on relativity).
    expect(exactSpeed(ELECTRON * LIGHT ** 2, ELECTRON) / LIGHT).toBeCloseTo(Math.sqrt(3) / 2, 9);
    expect(gammaOfSpeed(LIGHT)).toBeNaN();
  });
});

describe('drops in air', () => {
  it('slip as published', () => {
    // W. C. Hinds, Aerosol Technology: 2.87 at a diameter of 0.1 µm, 1.16 at 1 µm, 1.02 at 10 µm (from memory).
    expect(slipCorrection(0.05e-6)).toBeCloseTo(2.87, 1);
    expect(slipCorrection(0.5e-6)).toBeCloseTo(1.16, 1);
    expect(slipCorrection(5e-6)).toBeCloseTo(1.02, 2);
  });

  it('feel Oseen’s drag at their Reynolds number', () => {
    // A drop of radius 0.1 mm at 1 m/s in air: Re = 2 · 1e-4 · 1.204 / 1.82e-5 = 13.2.
    expect(reynoldsNumber(1e-4, 1, 1.204, 1.82e-5)).toBeCloseTo(13.2, 1);
    expect(oseenExcess(0.16)).toBeCloseTo(0.03, 12);
  });
});
