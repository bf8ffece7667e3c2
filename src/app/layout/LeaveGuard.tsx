import { useEffect } from 'react';
import { useBlocker } from 'react-router';

import { Dialog } from '#src/components/ui/Dialog.tsx';
import { holdsUnsaved } from '#src/components/ui/unsaved.ts';

/** Asks before a screen is left on which a form holds typed text that is not saved. */
export function LeaveGuard() {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      currentLocation.pathname !== nextLocation.pathname && holdsUnsaved(document),
  );
  useEffect(() => {
    const onUnload = (event: BeforeUnloadEvent) => {
      if (holdsUnsaved(document)) event.preventDefault();
    };
    window.addEventListener('beforeunload', onUnload);
    return () => window.removeEventListener('beforeunload', onUnload);
  }, []);
  return (
    <Dialog
      title="Leave without saving?"
      description="This screen holds text that is not saved. It is lost when you leave."
      open={blocker.state === 'blocked'}
      onClose={() => blocker.reset?.()}
    >
      <div className="flex flex-wrap gap-3">
        <button type="button" className="button button-primary" onClick={() => blocker.reset?.()}>
          Stay here
        </button>
        <button type="button" className="button" onClick={() => blocker.proceed?.()}>
          Leave
        </button>
      </div>
    </Dialog>
  );
}
