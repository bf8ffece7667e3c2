import { CONSTANTS } from './constants.ts';

/** Values of one set on one draw by role id, coherent SI; NaN where a role is not bound. */
export type RoleValues = (role: string) => number;

/** A finer form of the same relation, which an item may use instead. */
export interface Refinement {
  words: string;
  formula: (value: RoleValues) => number;
}

/** One published law: what the subject must be, given the others. */
export interface LawRow {
  id: string;
  /** As it reads in a sentence: `eV = ½mv²`. */
  statement: string;
  subject: string;
  /** Roles that must all be bound; mass and charge may come from the particle of the set. */
  others: readonly string[];
  /** What the others say the subject is, coherent SI. The law's residual is subject over formula, less one. */
  formula: (value: RoleValues) => number;
  /** Where it holds. */
  validity: string;
  source: string;
  /** Finer forms; a script that follows one of them keeps the law. */
  refinements: readonly Refinement[];
}

/** One row of a table of laws. */
export function law(
  id: string,
  statement: string,
  subject: string,
  others: readonly string[],
  formula: LawRow['formula'],
  validity: string,
  source: string,
  refinements: readonly Refinement[] = [],
): LawRow {
  return { id, statement, subject, others, formula, validity, source, refinements };
}

/** Laws about particles take the set's own mass and charge: roles, else the particle that the script speaks of. */
export const MASS = 'particleMass';
export const CHARGE = 'particleCharge';

const constant = (name: string): number => CONSTANTS.get(name)?.value ?? NaN;
export const e = constant('e');
export const h = constant('h');
export const c = constant('c');
export const g = constant('g');
export const rydberg = constant('R_inf');

export const UNIVERSITY_1 = 'OpenStax, University Physics vol. 1';
export const UNIVERSITY_2 = 'OpenStax, University Physics vol. 2';
export const UNIVERSITY_3 = 'OpenStax, University Physics vol. 3';
export const COLLEGE = 'OpenStax, College Physics 2e';
export const DERIVED = 'derived in school texts from the laws above it; common practice';

export const ALWAYS = 'always';
export const SLOW = 'speeds well below that of light';
export const FROM_REST = 'a particle that starts from rest, at speeds well below that of light';
export const UNIFORM = 'a uniform field, its edges left out';
export const ACROSS_FIELD = 'motion at right angles to a uniform magnetic field';
export const STEADY_FALL = 'a small sphere falling steadily at a Reynolds number well below one';
