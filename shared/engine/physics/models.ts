import { CONSTANTS } from './constants.ts';

const LIGHT = CONSTANTS.get('c')?.value ?? NaN;

/** Density of dry air at 20 °C and 101.325 kPa, kg/m³ (handbooks; value from memory). */
export const AIR_DENSITY = 1.204;
/** Mean free path in air at 20 °C and 101.325 kPa, m (handbooks; value from memory). */
const MEAN_FREE_PATH = 66e-9;
/** Breakdown field of air at atmospheric pressure, V/m: about 3 MV/m (CRC Handbook; value from memory). */
export const AIR_BREAKDOWN_FIELD = 3e6;

/** γ of a particle of mass `mass` (kg) that has gained `energy` (J) from rest (special relativity). */
export function gammaOfEnergy(energy: number, mass: number): number {
  return 1 + energy / (mass * LIGHT ** 2);
}

/** γ at `speed` (m/s); NaN at and beyond the speed of light. */
export function gammaOfSpeed(speed: number): number {
  return Math.abs(speed) < LIGHT ? 1 / Math.sqrt(1 - (speed / LIGHT) ** 2) : NaN;
}

/** Exact speed (m/s) of a particle that has gained `energy` (J) from rest. */
export function exactSpeed(energy: number, mass: number): number {
  return LIGHT * Math.sqrt(1 - gammaOfEnergy(energy, mass) ** -2);
}

/** Exact momentum (kg m/s) of a particle that has gained `energy` (J) from rest: p²c² = E² + 2Emc². */
export function exactMomentum(energy: number, mass: number): number {
  return Math.sqrt(2 * mass * energy * (1 + energy / (2 * mass * LIGHT ** 2)));
}

/** Exact kinetic energy (J) at `speed` (m/s): (γ − 1)mc². */
export function exactKineticEnergy(speed: number, mass: number): number {
  return (gammaOfSpeed(speed) - 1) * mass * LIGHT ** 2;
}

/** Cunningham's correction 1 + Kn(1.257 + 0.400 exp(−1.10/Kn)), Kn = mean free path over radius (Davies 1945). */
export function slipCorrection(radius: number): number {
  const knudsen = MEAN_FREE_PATH / radius;
  return 1 + knudsen * (1.257 + 0.4 * Math.exp(-1.1 / knudsen));
}

/** Reynolds number on the diameter of a sphere of `radius` (m) at `speed` (m/s). */
export function reynoldsNumber(radius: number, speed: number, density: number, viscosity: number): number {
  return (2 * radius * speed * density) / viscosity;
}

/** Share by which Oseen's drag exceeds Stokes' at a small Reynolds number (on the diameter): 3Re/16 (Oseen 1910). */
export function oseenExcess(reynolds: number): number {
  return (3 / 16) * reynolds;
}
