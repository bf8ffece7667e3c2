import { CONSTANTS } from '../physics/constants.ts';
import { divideDimensions, sameDimension, type Dimension } from '../units/dimension.ts';

/** A value that a candidate can look up instead of working it out. */
export interface SoughtConstant {
  /** As it is spoken of: `h`, or `e/m_e`. */
  name: string;
  words: string;
  value: number;
  dimension: Dimension;
  /** Names of the constants that it is made of. */
  from: readonly string[];
}

function quotient(above: string, below: string, words: string): SoughtConstant[] {
  const numerator = CONSTANTS.get(above);
  const denominator = CONSTANTS.get(below);
  if (numerator === undefined || denominator === undefined) return [];
  return [
    {
      name: `${above}/${below}`,
      words,
      value: numerator.value / denominator.value,
      dimension: divideDimensions(numerator.dimension, denominator.dimension),
      from: [above, below],
    },
  ];
}

const SOUGHT: readonly SoughtConstant[] = [
  ...[...CONSTANTS.values()]
    .filter(({ unit }) => unit !== '')
    .map(({ name, description, value, dimension }) => ({
      name,
      words: description,
      value,
      dimension,
      from: [name],
    })),
  ...quotient('e', 'm_e', 'specific charge of the electron'),
  ...quotient('e', 'm_p', 'specific charge of the proton'),
  ...quotient('h', 'e', 'gradient of stopping p.d. against frequency'),
];

/** The constants that an answer of this dimension could come back to. */
export function soughtConstants(dimension: Dimension): SoughtConstant[] {
  return SOUGHT.filter((constant) => sameDimension(constant.dimension, dimension));
}
