import { usesOf } from '../script/statement-uses.ts';
import type { Statement } from '../script/statement.ts';
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
  const statements = new Map<string, Statement>();
  for (const statement of script.statements)
    if (statement.kind !== 'require') statements.set(statement.name, statement);
  const printed = new Set(
    script.quantities.filter((quantity) => quantity.kind !== 'computed').map((quantity) => quantity.name),
  );
  const root = statements.get(name);
  if (root === undefined) return { names: [], givens: [], intermediates: [], constants: [] };

  const reach = (passes: (name: string) => boolean): { names: Set<string>; constants: Set<string> } => {
    const names = new Set<string>();
    const constants = new Set<string>(usesOf(root).constants);
    const open = usesOf(root).names;
    for (let next = open.pop(); next !== undefined; next = open.pop()) {
      if (names.has(next)) continue;
      names.add(next);
      const statement = statements.get(next);
      if (statement === undefined || !passes(next)) continue;
      const uses = usesOf(statement);
      for (const constant of uses.constants) constants.add(constant);
      open.push(...uses.names);
    }
    return { names, constants };
  };
  const all = reach(() => true);
  const near = reach((next) => !printed.has(next));
  const inOrder = [...statements.keys()];
  return {
    names: inOrder.filter((next) => all.names.has(next)),
    givens: inOrder.filter((next) => near.names.has(next) && printed.has(next)),
    intermediates: inOrder.filter((next) => near.names.has(next) && !printed.has(next)),
    constants: [...near.constants],
  };
}
