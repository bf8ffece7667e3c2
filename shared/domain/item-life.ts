/** The states of a revision; an item is in the state of its latest revision. */
export const ITEM_STATES = ['drafting', 'inReview', 'returned', 'approved', 'withdrawn'] as const;
export type ItemState = (typeof ITEM_STATES)[number];

export const ITEM_STATE_NAMES: Readonly<Record<ItemState, string>> = {
  drafting: 'Drafting',
  inReview: 'In review',
  returned: 'Returned',
  approved: 'Approved',
  withdrawn: 'Withdrawn',
};

/** What can happen to the latest revision of an item. */
export type ItemAction =
  | { kind: 'edit' }
  | { kind: 'send'; assayFresh: boolean; blockers: number }
  | { kind: 'recall' }
  | { kind: 'return' }
  | {
      kind: 'approve';
      assayFresh: boolean;
      blockers: number;
      openCautions: number;
      unworkedParts: number;
      disagreements: number;
    }
  | { kind: 'withdraw' };

export type ItemTransition =
  | {
      possible: true;
      state: ItemState;
      /** Whether the change begins a new revision with a copy of the content. */
      newRevision: boolean;
      /** Name of the audit event. */
      event: string;
    }
  | { possible: false; reason: string };

const refuse = (reason: string): ItemTransition => ({ possible: false, reason });
const count = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`;

function edit(state: ItemState): ItemTransition {
  if (state === 'drafting') return { possible: true, state, newRevision: false, event: 'item.edited' };
  if (state === 'inReview') {
    return refuse('This item is in review. Take it back from review before you edit it.');
  }
  if (state === 'withdrawn') return refuse('This item is withdrawn and can no longer be edited.');
  return { possible: true, state: 'drafting', newRevision: true, event: 'item.revisionStarted' };
}

function send(state: ItemState, action: Extract<ItemAction, { kind: 'send' }>): ItemTransition {
  if (state !== 'drafting') return refuse('Only a draft can be sent to review.');
  if (!action.assayFresh) return refuse('Run the assay on this draft before you send it to review.');
  if (action.blockers > 0) {
    return refuse(
      `The assay found ${count(action.blockers, 'blocker')}. Cure them before you send the item.`,
    );
  }
  return { possible: true, state: 'inReview', newRevision: false, event: 'item.sent' };
}

function approve(state: ItemState, action: Extract<ItemAction, { kind: 'approve' }>): ItemTransition {
  if (state !== 'inReview') return refuse('Only a revision in review can be approved.');
  if (!action.assayFresh) return refuse('The assay is stale. Run it again before you approve.');
  if (action.blockers > 0) return refuse(`The assay found ${count(action.blockers, 'blocker')}.`);
  if (action.unworkedParts > 0) {
    return refuse(
      `${count(action.unworkedParts, 'numeric part has', 'numeric parts have')} no independent working.`,
    );
  }
  if (action.disagreements > 0) {
    return refuse(
      `Your working disagrees with the checker in ${count(action.disagreements, 'part')}. Settle that first.`,
    );
  }
  if (action.openCautions > 0) {
    return refuse(
      `${count(action.openCautions, 'caution is', 'cautions are')} neither cured nor accepted with a reason.`,
    );
  }
  return { possible: true, state: 'approved', newRevision: false, event: 'item.approved' };
}

/** The life of an item as a pure function: state and action give the next state, or why not. */
export function itemTransition(state: ItemState, action: ItemAction): ItemTransition {
  switch (action.kind) {
    case 'edit':
      return edit(state);
    case 'send':
      return send(state, action);
    case 'recall':
      return state === 'inReview'
        ? { possible: true, state: 'returned', newRevision: false, event: 'item.recalled' }
        : refuse('Only an item in review can be taken back.');
    case 'return':
      return state === 'inReview'
        ? { possible: true, state: 'returned', newRevision: false, event: 'item.returned' }
        : refuse('Only an item in review can be returned.');
    case 'approve':
      return approve(state, action);
    case 'withdraw':
      if (state === 'withdrawn') return refuse('This item is already withdrawn.');
      if (state === 'inReview') {
        return refuse('This item is in review. Take it back from review before you withdraw it.');
      }
      return { possible: true, state: 'withdrawn', newRevision: false, event: 'item.withdrawn' };
  }
}
