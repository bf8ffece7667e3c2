import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';

import type { SignedInPerson } from '#shared/contracts/session.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { sessionQuery } from '#src/features/session/api.ts';
import { SignInForm } from '#src/features/session/SignInForm.tsx';
import { whenSessionEnds } from '#src/lib/api.ts';

interface Waiting {
  promise: Promise<boolean>;
  settle: (signedIn: boolean) => void;
}

function startWaiting(): Waiting {
  let settle: Waiting['settle'] = () => undefined;
  const promise = new Promise<boolean>((resolve) => (settle = resolve));
  return { promise, settle };
}

interface SessionEndProps {
  person: SignedInPerson;
  /** The server said by itself that nobody is signed in. */
  ended: boolean;
}

/**
 * When the session has ended: signing in again without leaving the screen, so that nothing typed is lost.
 * Requests that found it ended wait here and go out once more.
 */
export function SessionEnd({ person, ended }: SessionEndProps) {
  const [open, setOpen] = useState(false);
  const waiting = useRef<Waiting | null>(null);
  const queries = useQueryClient();
  useEffect(() => {
    if (ended) setOpen(true);
  }, [ended]);
  useEffect(
    () =>
      whenSessionEnds(() => {
        setOpen(true);
        waiting.current ??= startWaiting();
        return waiting.current.promise;
      }),
    [],
  );
  const settle = (signedIn: boolean) => {
    waiting.current?.settle(signedIn);
    waiting.current = null;
    setOpen(false);
  };
  return (
    <Dialog
      title="Sign in again"
      description="Your session has ended. What you typed is still on this screen, and goes on from where it was."
      open={open}
      onClose={() => settle(false)}
    >
      <SignInForm
        email={person.email}
        onSignedIn={(session) => {
          // Somebody else must not find this person's work on the screen.
          if (session.person?.id !== person.id) {
            window.location.assign('/');
            return;
          }
          queries.setQueryData(sessionQuery.queryKey, session);
          settle(true);
          void queries.invalidateQueries();
          window.dispatchEvent(new Event('online'));
        }}
      />
    </Dialog>
  );
}
