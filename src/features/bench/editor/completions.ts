import { describeNames, type NameDescription } from '#shared/engine/index.ts';
import type { QuantityRow } from '#shared/contracts/checking.ts';

/** One proposal of the editor. */
export interface Proposal {
  label: string;
  /** Stands beside the label: the dimension, signature or value. */
  detail: string;
  info: string;
  kind: 'variable' | 'constant' | 'function' | 'keyword' | 'unit';
  /** Text put in; for functions the name with an open bracket. */
  apply: string;
}

const KINDS: Readonly<Record<NameDescription['kind'], Proposal['kind']>> = {
  constant: 'constant',
  function: 'function',
  unit: 'unit',
  drawing: 'keyword',
};

/** What the script may say beside its own names; worked out once. */
let known: readonly Proposal[] | null = null;

function knownNames(): readonly Proposal[] {
  known ??= describeNames().map((entry) => {
    const kind = KINDS[entry.kind];
    const opens = kind === 'function' || kind === 'keyword';
    return {
      label: entry.name,
      detail: entry.detail,
      info: entry.description,
      kind,
      apply: opens ? `${entry.name}(` : entry.name,
    };
  });
  return known;
}

/** Whether the text before the cursor ends in a number and a space or nothing, so that a unit comes next. */
export function expectsUnit(before: string): boolean {
  return /(?:^|[^\w.])\d[\d.]*(?:e[+-]?\d+)?\s*(?:[A-Za-zµΩÅ°^\-\d/ ]*[ /])?$/.test(before);
}

/**
 * Proposals for the word being typed: `before` is the line up to that word. After a number units come alone;
 * elsewhere the script's own names come first, then constants and functions.
 */
export function proposals(before: string, rows: readonly QuantityRow[]): Proposal[] {
  if (expectsUnit(before)) return knownNames().filter((proposal) => proposal.kind === 'unit');
  const own = rows.map((row): Proposal => ({
    label: row.name,
    detail: row.dimension,
    info: row.value === '' ? row.kind : `${row.kind}, ${row.value} at this draw`,
    kind: 'variable',
    apply: row.name,
  }));
  return [...own, ...knownNames().filter((proposal) => proposal.kind !== 'unit')];
}

/** What to say of a name under the pointer; null for a name that means nothing. */
export function explain(
  name: string,
  rows: readonly QuantityRow[],
): { title: string; lines: string[] } | null {
  const row = rows.find((quantity) => quantity.name === name);
  if (row !== undefined) {
    const value = row.value === '' ? 'undefined at this draw' : `${row.value} at this draw`;
    return { title: row.name, lines: [`${row.kind}, ${row.dimension}`, value] };
  }
  const entry = knownNames().find((proposal) => proposal.label === name && proposal.kind !== 'unit');
  return entry === undefined ? null : { title: entry.label, lines: [entry.detail, entry.info] };
}
