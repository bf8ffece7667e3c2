/** Columns of the bank that a person may hide; code and title always stay. */
export const OPTIONAL_COLUMNS = [
  { id: 'topic', name: 'Topic' },
  { id: 'state', name: 'State' },
  { id: 'owner', name: 'Owner' },
  { id: 'marks', name: 'Marks' },
  { id: 'worstFinding', name: 'Worst finding' },
  { id: 'revision', name: 'Revision' },
  { id: 'usedOn', name: 'On papers' },
  { id: 'updated', name: 'Changed' },
] as const;
export type OptionalColumn = (typeof OPTIONAL_COLUMNS)[number]['id'];

const KEY = 'graticule.bank.hidden';

/** The columns that this browser hides; names that are no columns are passed over. */
export function readHidden(storage: Pick<Storage, 'getItem'>): OptionalColumn[] {
  const names = (storage.getItem(KEY) ?? '').split(' ');
  return OPTIONAL_COLUMNS.map(({ id }) => id).filter((id) => names.includes(id));
}

/** Remembers the hidden columns for this browser. */
export function keepHidden(storage: Pick<Storage, 'setItem'>, hidden: readonly OptionalColumn[]): void {
  storage.setItem(KEY, hidden.join(' '));
}
