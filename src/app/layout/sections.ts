import type { Action } from '#shared/domain/permissions.ts';

/** The parts of the house, as words in the top line; each is shown to those who may open it. */
export const SECTIONS: readonly { path: string; name: string; ability: Action; shortcut: string }[] = [
  { path: '/desk', name: 'Desk', ability: 'desk.read', shortcut: 'd' },
  { path: '/bank', name: 'Bank', ability: 'item.list', shortcut: 'b' },
  { path: '/papers', name: 'Papers', ability: 'paper.list', shortcut: 'p' },
  { path: '/people', name: 'People', ability: 'person.list', shortcut: 'e' },
  { path: '/records', name: 'Records', ability: 'record.list', shortcut: 'r' },
];
