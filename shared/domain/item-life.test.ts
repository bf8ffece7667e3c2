import { describe, expect, it } from 'vitest';

import { ITEM_STATES, type ItemAction, type ItemState, itemTransition } from './item-life.ts';

const SOUND = { assayFresh: true, blockers: 0 };
const SETTLED = { openCautions: 0, unworkedParts: 0, disagreements: 0 };

/** Each action with everything in order, so that the state alone decides. */
const ACTIONS: Record<ItemAction['kind'], ItemAction> = {
  edit: { kind: 'edit' },
  send: { kind: 'send', ...SOUND },
  recall: { kind: 'recall' },
  return: { kind: 'return' },
  approve: { kind: 'approve', ...SOUND, ...SETTLED },
  withdraw: { kind: 'withdraw' },
};

/** Next state of each state under each action; '-' is refused, '+' begins a new revision. */
const LIFE: Record<ItemAction['kind'], Record<ItemState, string>> = {
  edit: {
    drafting: 'drafting',
    inReview: '-',
    returned: 'drafting +',
    approved: 'drafting +',
    withdrawn: '-',
  },
  send: { drafting: 'inReview', inReview: '-', returned: '-', approved: '-', withdrawn: '-' },
  recall: { drafting: '-', inReview: 'returned', returned: '-', approved: '-', withdrawn: '-' },
  return: { drafting: '-', inReview: 'returned', returned: '-', approved: '-', withdrawn: '-' },
  approve: { drafting: '-', inReview: 'approved', returned: '-', approved: '-', withdrawn: '-' },
  withdraw: {
    drafting: 'withdrawn',
    inReview: '-',
    returned: 'withdrawn',
    approved: 'withdrawn',
    withdrawn: '-',
  },
};

const cells = Object.values(ACTIONS).flatMap((action) =>
  ITEM_STATES.map((state) => ({ state, kind: action.kind, action, next: LIFE[action.kind][state] })),
);

describe('the life of an item', () => {
  it.each(cells)('$state, $kind: $next', ({ state, action, next }) => {
    const transition = itemTransition(state, action);
    const told = transition.possible ? `${transition.state}${transition.newRevision ? ' +' : ''}` : '-';
    expect(told).toBe(next);
  });

  it.each(cells.filter((cell) => cell.next === '-'))('says why not: $state, $kind', ({ state, action }) => {
    const transition = itemTransition(state, action);
    expect(transition.possible ? '' : transition.reason).toMatch(/^[A-Z].+\.$/);
  });

  it.each([
    ['edit', 'drafting', 'item.edited'],
    ['edit', 'approved', 'item.revisionStarted'],
    ['edit', 'returned', 'item.revisionStarted'],
    ['send', 'drafting', 'item.sent'],
    ['recall', 'inReview', 'item.recalled'],
    ['return', 'inReview', 'item.returned'],
    ['approve', 'inReview', 'item.approved'],
    ['withdraw', 'approved', 'item.withdrawn'],
  ] as const)('records %s of an item that is %s as %s', (kind, state, event) => {
    expect(itemTransition(state, ACTIONS[kind])).toMatchObject({ possible: true, event });
  });
});

describe('sending to review', () => {
  it.each([
    [{ assayFresh: false, blockers: 0 }, 'Run the assay on this draft before you send it to review.'],
    [{ assayFresh: true, blockers: 1 }, 'The assay found 1 blocker. Cure them before you send the item.'],
    [{ assayFresh: true, blockers: 3 }, 'The assay found 3 blockers. Cure them before you send the item.'],
  ])('is refused for %o', (facts, reason) => {
    expect(itemTransition('drafting', { kind: 'send', ...facts })).toEqual({ possible: false, reason });
  });
});

describe('approving', () => {
  it.each([
    [{ assayFresh: false }, 'The assay is stale. Run it again before you approve.'],
    [{ blockers: 2 }, 'The assay found 2 blockers.'],
    [{ unworkedParts: 1 }, '1 numeric part has no independent working.'],
    [{ unworkedParts: 2 }, '2 numeric parts have no independent working.'],
    [{ disagreements: 1 }, 'Your working disagrees with the checker in 1 part. Settle that first.'],
    [{ openCautions: 1 }, '1 caution is neither cured nor accepted with a reason.'],
    [{ openCautions: 4 }, '4 cautions are neither cured nor accepted with a reason.'],
  ])('is refused for %o', (fact, reason) => {
    const action: ItemAction = { kind: 'approve', ...SOUND, ...SETTLED, ...fact };
    expect(itemTransition('inReview', action)).toEqual({ possible: false, reason });
  });
});
