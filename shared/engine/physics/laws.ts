import { e, type LawRow } from './law-row.ts';
import { LAWS_OF_DROPS } from './laws-of-drops.ts';
import { LAWS_OF_MOTION } from './laws-of-motion.ts';
import { LAWS_OF_LEVELS, LAWS_OF_MATTER_WAVES, LAWS_OF_PHOTONS } from './laws-of-quanta.ts';

export { CHARGE, MASS, type LawRow } from './law-row.ts';

/** Every law that is held against an item, each with the book it can be read in. */
export const LAWS: readonly LawRow[] = [
  ...LAWS_OF_MOTION,
  ...LAWS_OF_DROPS,
  ...LAWS_OF_PHOTONS,
  ...LAWS_OF_LEVELS,
  ...LAWS_OF_MATTER_WAVES,
];

/** Ratios that tell what was most likely done, by script value over law value. */
const KNOWN_FACTORS: readonly [factor: number, suggestion: string][] = [
  [2, 'A factor of two too many, or a half left out.'],
  [0.5, 'A half too many, or a factor of two left out.'],
  [4, 'A square of two, as when a diameter is taken for a radius.'],
  [0.25, 'A square of a half, as when a diameter is taken for a radius.'],
  [8, 'A cube of two, as when a diameter is taken for a radius.'],
  [0.125, 'A cube of a half, as when a diameter is taken for a radius.'],
  [Math.SQRT2, 'A root of two: a half left out under the root.'],
  [Math.SQRT1_2, 'A root of a half: a two left out under the root.'],
  [Math.PI, 'A factor of π.'],
  [2 * Math.PI, 'A factor of 2π, as between frequency and angular frequency.'],
  [1 / (2 * Math.PI), 'A factor of 2π, as between frequency and angular frequency.'],
  [1e3, 'A power of ten: a prefix.'],
  [1e-3, 'A power of ten: a prefix.'],
  [1e6, 'A power of ten: a prefix.'],
  [1e-6, 'A power of ten: a prefix.'],
  [1e9, 'A power of ten: a prefix.'],
  [1e-9, 'A power of ten: a prefix.'],
  [e, 'The elementary charge: joules and electronvolts mixed.'],
  [1 / e, 'The elementary charge: joules and electronvolts mixed.'],
];

/** What a factor by which a law is missed suggests; empty when it is none that is known. */
export function suggestForFactor(ratio: number): string {
  const known = KNOWN_FACTORS.find(([factor]) => Math.abs(ratio / factor - 1) < 0.01);
  return known?.[1] ?? '';
}
