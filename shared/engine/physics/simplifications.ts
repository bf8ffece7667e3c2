import { CHARGE, g, MASS, type RoleValues } from './law-row.ts';
import {
  AIR_DENSITY,
  exactKineticEnergy,
  exactMomentum,
  exactSpeed,
  gammaOfEnergy,
  gammaOfSpeed,
  oseenExcess,
  reynoldsNumber,
  slipCorrection,
} from './models.ts';

/** One simplification that items make, the error that it leaves, and the answers that it bears upon. */
export interface Simplification {
  id: 'relativistic' | 'slip' | 'upthrust' | 'stokes';
  assumption: 'nonRelativistic' | 'noSlipCorrection' | 'noUpthrust' | 'stokesLaw';
  /** Roles that must be bound. */
  needs: readonly string[];
  /** Relative error of the simple formula. */
  error: (value: RoleValues) => number;
  /** By role of the answer, the power to which the error enters there. */
  powers: Readonly<Record<string, number>>;
  /**
   * What the simple and the finer formula say of one role. Where the script's own value is nearer to the finer
   * one, it does not make the simplification.
   */
  told?: { role: string; simple: (value: RoleValues) => number; finer: (value: RoleValues) => number };
  words: string;
  cure: string;
  source: string;
}

const gained = (v: RoleValues) => v(CHARGE) * v('acceleratingPd');
const fluid = (v: RoleValues) => {
  const density = v('airDensity');
  return Number.isNaN(density) ? AIR_DENSITY : density;
};
/** Terminal speed by Stokes' law for a weight that stands for `density` (kg/m³). */
const fall = (v: RoleValues, density: number) =>
  (2 * v('dropRadius') ** 2 * density * g) / (9 * v('viscosity'));

const RELATIVISTIC = {
  id: 'relativistic',
  assumption: 'nonRelativistic',
  words: 'The non-relativistic formula',
  cure: 'Lower the energy, or state in the stem that relativistic effects are left out.',
  source: 'special relativity; A. Einstein, Ann. Phys. 322, 891 (1905)',
} as const;

const simpleSpeed = (energy: number, mass: number) => Math.sqrt((2 * energy) / mass);
const simpleMomentum = (energy: number, mass: number) => Math.sqrt(2 * mass * energy);

/** Every simplification, those that know most about the item first. */
export const SIMPLIFICATIONS: readonly Simplification[] = [
  {
    ...RELATIVISTIC,
    needs: ['acceleratingPd', MASS, CHARGE],
    error: (v) => simpleSpeed(gained(v), v(MASS)) / exactSpeed(gained(v), v(MASS)) - 1,
    powers: { speed: 1, transitTime: 1 },
    told: {
      role: 'speed',
      simple: (v) => simpleSpeed(gained(v), v(MASS)),
      finer: (v) => exactSpeed(gained(v), v(MASS)),
    },
  },
  {
    ...RELATIVISTIC,
    needs: ['acceleratingPd', MASS, CHARGE],
    error: (v) => exactMomentum(gained(v), v(MASS)) / simpleMomentum(gained(v), v(MASS)) - 1,
    powers: { momentum: 1, orbitRadius: 1, deBroglieWavelength: 1, ringDiameter: 1, ringRadius: 1 },
    told: {
      role: 'momentum',
      simple: (v) => simpleMomentum(gained(v), v(MASS)),
      finer: (v) => exactMomentum(gained(v), v(MASS)),
    },
  },
  {
    ...RELATIVISTIC,
    needs: ['acceleratingPd', 'orbitRadius', 'fluxDensity', MASS, CHARGE],
    // p² = (Bqr)² = 2mqV(1 + qV/2mc²), so that 2V/(B²r²) falls short by qV/2mc².
    error: (v) => (gammaOfEnergy(gained(v), v(MASS)) - 1) / 2,
    powers: { specificCharge: 1 },
  },
  {
    ...RELATIVISTIC,
    needs: ['acceleratingPd', 'speed', MASS, CHARGE],
    error: (v) => (simpleSpeed(gained(v), v(MASS)) / exactSpeed(gained(v), v(MASS))) ** 2 - 1,
    powers: { specificCharge: 1 },
  },
  {
    ...RELATIVISTIC,
    needs: ['speed', MASS],
    error: (v) => gammaOfSpeed(v('speed')) - 1,
    powers: { momentum: 1, orbitRadius: 1, deBroglieWavelength: 1, specificCharge: 1 },
    told: {
      role: 'momentum',
      simple: (v) => v(MASS) * v('speed'),
      finer: (v) => gammaOfSpeed(v('speed')) * v(MASS) * v('speed'),
    },
  },
  {
    ...RELATIVISTIC,
    needs: ['speed', MASS],
    error: (v) => exactKineticEnergy(v('speed'), v(MASS)) / (0.5 * v(MASS) * v('speed') ** 2) - 1,
    powers: { kineticEnergy: 1, greatestKineticEnergy: 1, acceleratingPd: 1 },
    told: {
      role: 'kineticEnergy',
      simple: (v) => 0.5 * v(MASS) * v('speed') ** 2,
      finer: (v) => exactKineticEnergy(v('speed'), v(MASS)),
    },
  },
  {
    ...RELATIVISTIC,
    needs: ['kineticEnergy', MASS],
    error: (v) => simpleSpeed(v('kineticEnergy'), v(MASS)) / exactSpeed(v('kineticEnergy'), v(MASS)) - 1,
    powers: { speed: 1 },
    told: {
      role: 'speed',
      simple: (v) => simpleSpeed(v('kineticEnergy'), v(MASS)),
      finer: (v) => exactSpeed(v('kineticEnergy'), v(MASS)),
    },
  },
  {
    ...RELATIVISTIC,
    needs: ['kineticEnergy', MASS],
    error: (v) =>
      exactMomentum(v('kineticEnergy'), v(MASS)) / simpleMomentum(v('kineticEnergy'), v(MASS)) - 1,
    powers: { momentum: 1, deBroglieWavelength: 1 },
    told: {
      role: 'momentum',
      simple: (v) => simpleMomentum(v('kineticEnergy'), v(MASS)),
      finer: (v) => exactMomentum(v('kineticEnergy'), v(MASS)),
    },
  },
  {
    id: 'slip',
    assumption: 'noSlipCorrection',
    needs: ['terminalSpeed', 'dropRadius'],
    error: (v) => slipCorrection(v('dropRadius')) - 1,
    powers: {
      terminalSpeed: 1,
      viscosity: 1,
      dropRadius: 0.5,
      dropMass: 1.5,
      weight: 1.5,
      charge: 1.5,
      drag: 1.5,
    },
    told: {
      role: 'terminalSpeed',
      simple: (v) => fall(v, v('dropDensity')),
      finer: (v) => fall(v, v('dropDensity')) * slipCorrection(v('dropRadius')),
    },
    words: 'Stokes’ law without the slip correction',
    cure: 'State in the stem that Stokes’ law holds as it stands, or take larger drops.',
    source:
      'E. Cunningham, Proc. R. Soc. A 83, 357 (1910); constants of C. N. Davies, Proc. Phys. Soc. 57, 259 (1945)',
  },
  {
    id: 'upthrust',
    assumption: 'noUpthrust',
    needs: ['dropDensity', 'terminalSpeed'],
    error: (v) => v('dropDensity') / (v('dropDensity') - fluid(v)) - 1,
    powers: { terminalSpeed: 1, viscosity: 1, dropRadius: 0.5, dropMass: 1.5, weight: 1.5, charge: 1.5 },
    told: {
      role: 'terminalSpeed',
      simple: (v) => fall(v, v('dropDensity')),
      finer: (v) => fall(v, v('dropDensity') - fluid(v)),
    },
    words: 'Leaving out the upthrust of the fluid',
    cure: 'Take the upthrust into account, or state in the stem that it may be left out.',
    source: 'Archimedes’ principle',
  },
  {
    id: 'upthrust',
    assumption: 'noUpthrust',
    needs: ['dropDensity', 'balancePd'],
    error: (v) => v('dropDensity') / (v('dropDensity') - fluid(v)) - 1,
    powers: { charge: 1 },
    words: 'Leaving out the upthrust of the fluid',
    cure: 'Take the upthrust into account, or state in the stem that it may be left out.',
    source: 'Archimedes’ principle',
  },
  {
    id: 'stokes',
    assumption: 'stokesLaw',
    needs: ['terminalSpeed', 'dropRadius', 'viscosity'],
    error: (v) => oseenExcess(reynoldsNumber(v('dropRadius'), v('terminalSpeed'), fluid(v), v('viscosity'))),
    powers: { terminalSpeed: 1, viscosity: 1, dropRadius: 0.5, drag: 1 },
    words: 'Stokes’ law at this Reynolds number',
    cure: 'Slow the fall with smaller spheres or a thicker fluid, or state in the stem that Stokes’ law holds.',
    source: 'C. W. Oseen, Ark. Mat. Astron. Fys. 6, no. 29 (1910)',
  },
];
