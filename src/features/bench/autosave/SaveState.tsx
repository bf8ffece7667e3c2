import { autosaveText, type AutosaveState } from './autosave-machine.ts';

const UNEASY = new Set<AutosaveState['phase']>(['offline', 'signedOut', 'conflict', 'refused']);

/** Whether the draft is saved, in words; changes are announced without taking the keyboard away. */
export function SaveState({ state, onRetry }: { state: AutosaveState; onRetry: () => void }) {
  const uneasy = UNEASY.has(state.phase);
  return (
    <span className={uneasy ? 'text-brass' : 'text-muted'}>
      <span role="status">{autosaveText(state)}</span>
      {(state.phase === 'offline' || state.phase === 'signedOut' || state.phase === 'refused') && (
        <>
          {' '}
          <button type="button" className="link" onClick={onRetry}>
            Try again
          </button>
        </>
      )}
    </span>
  );
}
