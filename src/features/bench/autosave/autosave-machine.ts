import type { ItemContent } from '#shared/engine/index.ts';

/** What is saved: the content and the topic that goes with it. */
export interface Draft {
  content: ItemContent;
  topicId: number;
}

/** Why a save came to nothing. */
export type SaveFailure =
  { kind: 'offline' } | { kind: 'signedOut' } | { kind: 'conflict' } | { kind: 'refused'; message: string };

/**
 * Where the draft stands against the server's copy.
 * `edit` counts edits; a save carries the number it was begun with, so that what is typed meanwhile is not
 * taken for saved.
 */
export interface AutosaveState {
  phase: 'saved' | 'waiting' | 'saving' | 'offline' | 'signedOut' | 'conflict' | 'refused';
  /** Version of the server's copy that this draft is based on. */
  version: number;
  edit: number;
  savedEdit: number;
  /** ISO time of the last save, or null before the first in this sitting. */
  savedAt: string | null;
  message: string;
}

export type AutosaveEvent =
  | { kind: 'edited' }
  | { kind: 'saveBegan' }
  | { kind: 'saved'; edit: number; version: number; savedAt: string }
  | { kind: 'failed'; failure: SaveFailure }
  /** The connection is back, or the person has signed in again. */
  | { kind: 'retry' }
  | { kind: 'resolved'; version: number }
  | { kind: 'opened'; version: number; unsaved: boolean };

export function openAutosave(version: number, unsaved = false): AutosaveState {
  return {
    phase: unsaved ? 'waiting' : 'saved',
    version,
    edit: unsaved ? 1 : 0,
    savedEdit: 0,
    savedAt: null,
    message: '',
  };
}

/** Whether something is not on the server yet. */
export function isUnsaved(state: AutosaveState): boolean {
  return state.edit !== state.savedEdit;
}

/** The next state. An edit during a save or a failure waits its turn; only `waiting` begins a save. */
export function reduceAutosave(state: AutosaveState, event: AutosaveEvent): AutosaveState {
  switch (event.kind) {
    case 'edited': {
      const edit = state.edit + 1;
      const begins = state.phase === 'saved' || state.phase === 'refused';
      return {
        ...state,
        edit,
        phase: begins ? 'waiting' : state.phase,
        message: begins ? '' : state.message,
      };
    }
    case 'saveBegan':
      return state.phase === 'waiting' ? { ...state, phase: 'saving' } : state;
    case 'saved': {
      const more = event.edit !== state.edit;
      return {
        ...state,
        phase: more ? 'waiting' : 'saved',
        version: event.version,
        savedEdit: event.edit,
        savedAt: event.savedAt,
        message: '',
      };
    }
    case 'failed':
      return {
        ...state,
        phase: event.failure.kind,
        message: event.failure.kind === 'refused' ? event.failure.message : '',
      };
    case 'retry':
      return state.phase === 'offline' || state.phase === 'signedOut' || state.phase === 'refused'
        ? { ...state, phase: isUnsaved(state) ? 'waiting' : 'saved', message: '' }
        : state;
    case 'resolved':
      return { ...state, phase: 'waiting', version: event.version, edit: state.edit + 1, message: '' };
    case 'opened':
      return openAutosave(event.version, event.unsaved);
  }
}

const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** The state in a few words, as it stands beside the title. */
export function autosaveText(state: AutosaveState): string {
  switch (state.phase) {
    case 'saved':
      return state.savedAt === null ? 'All changes saved' : `Saved ${clock.format(new Date(state.savedAt))}`;
    case 'waiting':
      return 'Not saved yet';
    case 'saving':
      return 'Saving';
    case 'offline':
      return 'Not saved: offline, kept on this computer';
    case 'signedOut':
      return 'Not saved: signed out, kept on this computer';
    case 'conflict':
      return 'Not saved: somebody else changed this draft';
    case 'refused':
      return 'Not saved: see below';
  }
}
