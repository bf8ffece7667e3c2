import type { ItemContent } from '#shared/engine/index.ts';

/** The draft as it is edited: what it is now, and the steps by which it can be undone and redone. */
export interface DraftState {
  content: ItemContent;
  topicId: number;
  past: Step[];
  future: Step[];
  /** What the last edit touched; typing on in the same place makes no new step. */
  lastTouched: string | null;
}

/** A state that can be gone back to, and what was done after it. */
interface Step {
  content: ItemContent;
  topicId: number;
  /** Finishes “Undo: …”. */
  label: string;
}

export type DraftAction =
  | {
      kind: 'edit';
      change: (content: ItemContent) => ItemContent;
      label: string;
      /** Field that is being typed in; edits of one field in a row are one step. Null: always a step. */
      field: string | null;
    }
  | { kind: 'topic'; topicId: number }
  /** The other version of a conflict and the merged one, each as a step, so that neither is lost. */
  | { kind: 'merged'; theirs: ItemContent; merged: ItemContent; topicId: number }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'opened'; content: ItemContent; topicId: number };

/** Steps that are kept; older ones are forgotten. */
export const MOST_STEPS = 200;

export function openDraft(content: ItemContent, topicId: number): DraftState {
  return { content, topicId, past: [], future: [], lastTouched: null };
}

function step(
  state: DraftState,
  label: string,
  next: Partial<DraftState>,
  touched: string | null,
): DraftState {
  const past = [...state.past, { content: state.content, topicId: state.topicId, label }];
  return { ...state, ...next, past: past.slice(-MOST_STEPS), future: [], lastTouched: touched };
}

function travel(state: DraftState, from: 'past' | 'future'): DraftState {
  const target = state[from].at(-1);
  if (target === undefined) return state;
  const left: Step = { content: state.content, topicId: state.topicId, label: target.label };
  const past = from === 'past' ? state.past.slice(0, -1) : [...state.past, left];
  const future = from === 'past' ? [...state.future, left] : state.future.slice(0, -1);
  return { content: target.content, topicId: target.topicId, past, future, lastTouched: null };
}

/** The draft after an action. Pure; a change that gives the same content leaves the state as it is. */
export function reduceDraft(state: DraftState, action: DraftAction): DraftState {
  switch (action.kind) {
    case 'edit': {
      const content = action.change(state.content);
      if (content === state.content) return state;
      if (action.field !== null && action.field === state.lastTouched && state.past.length > 0) {
        return { ...state, content, future: [] };
      }
      return step(state, action.label, { content }, action.field);
    }
    case 'topic':
      if (action.topicId === state.topicId) return state;
      return step(state, 'change of topic', { topicId: action.topicId }, null);
    case 'merged': {
      const theirs = step(state, 'taking over the other version', { content: action.theirs }, null);
      return step(
        theirs,
        'putting the versions together',
        { content: action.merged, topicId: action.topicId },
        null,
      );
    }
    case 'undo':
      return travel(state, 'past');
    case 'redo':
      return travel(state, 'future');
    case 'opened':
      return openDraft(action.content, action.topicId);
  }
}
