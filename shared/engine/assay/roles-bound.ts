import { CONSTANTS } from '../physics/constants.ts';
import { CHARGE, MASS } from '../physics/laws.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import type { AssayContext } from './context.ts';

/** Quantities of one set by the role they have there. */
export interface BoundSet {
  set: string;
  /** Name of the quantity that has a role. */
  names: ReadonlyMap<string, string>;
  /** Mass and charge of the particle, SI, where the script tells which it is. */
  particle: { mass: number; charge: number } | null;
}

const value = (name: string) => CONSTANTS.get(name)?.value ?? NaN;

/** Particles by the mass constant that a script uses; the charge is the size of the charge. */
const PARTICLES: readonly { constant: string; words: RegExp; charges: number }[] = [
  { constant: 'm_e', words: /electron/i, charges: 1 },
  { constant: 'm_p', words: /proton/i, charges: 1 },
  { constant: 'm_n', words: /neutron/i, charges: 0 },
  { constant: 'm_alpha', words: /alpha/i, charges: 2 },
];

/** Of several particles whose masses a script uses, the one that the texts speak of; where they are silent, its first. */
function spokenOf(
  context: AssayContext,
  particles: typeof PARTICLES,
): (typeof PARTICLES)[number] | undefined {
  const text = [context.content.stem, ...context.content.parts.map((part) => part.text)].join('\n');
  const spoken = particles.filter(({ words }) => words.test(text));
  if (spoken.length > 0) return spoken.length === 1 ? spoken[0] : undefined;
  const first = context.script.quantities.flatMap(({ constants }) => constants);
  const constant = first.find((name) => particles.some((particle) => particle.constant === name));
  return particles.find((particle) => particle.constant === constant);
}

function particleOf(context: AssayContext, set: string, names: Iterable<string>): BoundSet['particle'] {
  const byWord = PARTICLES.find(({ words }) => set !== '' && words.test(set));
  const used = new Set<string>();
  for (const name of names) {
    const info = context.script.quantities.find((quantity) => quantity.name === name);
    for (const constant of info?.constants ?? []) used.add(constant);
    for (const inner of dependenciesOf(context.script, name).names) {
      const from = context.script.quantities.find((quantity) => quantity.name === inner);
      for (const constant of from?.constants ?? []) used.add(constant);
    }
  }
  const masses = PARTICLES.filter(({ constant }) => used.has(constant));
  const particle = byWord ?? (masses.length > 1 ? spokenOf(context, masses) : masses[0]);
  if (particle === undefined) {
    return masses.length === 0 && used.has('e') ? { mass: NaN, charge: value('e') } : null;
  }
  return { mass: value(particle.constant), charge: particle.charges * value('e') };
}

/** The sets of an item with what is bound in each. A role that two quantities of a set claim stays unbound. */
export function bindRoles(context: AssayContext): BoundSet[] {
  const sets = new Map<string, Map<string, string | null>>();
  const known = new Set(
    context.script.quantities
      .filter((quantity) => quantity.shape.kind === 'scalar')
      .map((quantity) => quantity.name),
  );
  for (const { name, role, set } of context.content.quantities) {
    if (role === null || !known.has(name)) continue;
    let names = sets.get(set);
    if (names === undefined) sets.set(set, (names = new Map<string, string | null>()));
    names.set(role, names.has(role) ? null : name);
  }
  return [...sets].map(([set, names]) => {
    const bound = new Map(
      [...names].flatMap(([role, name]) => (name === null ? [] : [[role, name] as const])),
    );
    return { set, names: bound, particle: particleOf(context, set, bound.values()) };
  });
}

/** A law's view of one draw: values of roles, and of the particle where no role gives them. */
export function roleValue(
  set: BoundSet,
  columns: ReadonlyMap<string, Float64Array>,
  index: number,
): (role: string) => number {
  return (role) => {
    const name = set.names.get(role);
    if (name !== undefined) return columns.get(name)?.[index] ?? NaN;
    if (role === MASS) return set.particle?.mass ?? NaN;
    if (role === CHARGE) return set.particle?.charge ?? NaN;
    return NaN;
  };
}

/** Whether a role has a value in the set, from a quantity or from the particle. */
export function isBound(set: BoundSet, role: string): boolean {
  if (set.names.has(role)) return true;
  if (role === MASS) return Number.isFinite(set.particle?.mass ?? NaN);
  if (role === CHARGE) return Number.isFinite(set.particle?.charge ?? NaN);
  return false;
}
