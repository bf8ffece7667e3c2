import type { Dimension } from '../units/dimension.ts';
import type { Unit } from '../units/unit.ts';

/** A scalar, a true-or-false condition, or a series of a fixed number of values. */
export type Shape = { kind: 'scalar' } | { kind: 'condition' } | { kind: 'series'; length: number };

/** What is known of a value before any draw is made. */
export interface ValueType {
  dimension: Dimension;
  shape: Shape;
}

/** A name of the script as later statements see it; null where its own statement has a mistake. */
export interface ScopeEntry {
  type: ValueType | null;
  /** Unit in which it is spoken of. */
  unit: Unit | null;
}

/** The names that may be used, and all names that the script defines anywhere. */
export interface Scope {
  defined: ReadonlyMap<string, ScopeEntry>;
  all: ReadonlySet<string>;
}

/** Names that begin a property of every object in the host language are refused, so that data keyed by name stays plain. */
const RESERVED: ReadonlySet<string> = new Set([
  'constructor',
  'prototype',
  'hasOwnProperty',
  'isPrototypeOf',
  'propertyIsEnumerable',
  'toLocaleString',
  'toString',
  'valueOf',
  'this',
  'arguments',
  'eval',
  'if',
  'else',
  'for',
  'while',
  'function',
  'return',
  'true',
  'false',
  'null',
  'undefined',
  'NaN',
  'Infinity',
]);

const NAME = /^[A-Za-z\u0370-\u03FF][A-Za-z0-9_\u0370-\u03FF]*$/;
const MAXIMUM_NAME_LENGTH = 60;

/** Says why a word cannot be a name of the script, or null when it can; constants and functions are looked at elsewhere. */
export function nameProblem(name: string): string | null {
  if (name.length > MAXIMUM_NAME_LENGTH) return `A name may have at most ${MAXIMUM_NAME_LENGTH} letters.`;
  if (RESERVED.has(name)) return `“${name}” cannot be a name here: choose another.`;
  if (NAME.test(name)) return null;
  if (name.startsWith('_')) return 'A name begins with a letter, not with an underscore.';
  const foreign = Array.from(name).find((letter) => !/[A-Za-z0-9_\u0370-\u03FF]/.test(letter)) ?? name;
  const code = (foreign.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0');
  return `“${foreign}” (U+${code}) is not a Latin or Greek letter, though it may look like one: type the name again with Latin or Greek letters.`;
}
