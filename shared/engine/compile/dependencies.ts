import type { CompiledScript } from './compiled-script.ts';

/** All that a name rests on, each list in script order. */
export interface Dependencies {
  /** Every name, transitively, without itself. */
  names: string[];
  /** Printed values (drawn or given) that are reached without passing through another printed value. */
  givens: string[];
  /** Computed names between those givens and the name: the intermediate results of the working. */
  intermediates: string[];
  /** Constants used by the name itself and by its intermediates (not those inside a given). */
  constants: string[];
}

/** What `name` rests on; empty lists for an unknown name. */
export function dependenciesOf(script: CompiledScript, name: string): Dependencies {
  throw new Error(`no dependencies yet: ${script.source.length} ${name}`);
}
