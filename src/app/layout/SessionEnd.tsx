import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';

import { Dialog } from '#src/components/ui/Dialog.tsx';
import { sessionQuery } from '#src/features/session/api.ts';
import { SignInForm } from '#src/features/session/SignInForm.tsx';
import { onSessionEnd } from '#src/lib/api.ts';

/** When the session has ended (a request was refused, or `isOver` by the server's word): sign in again without leaving the screen, so that nothing typed is lost. */
export function SessionEnd({ email, isOver }: { email: string; isOver: boolean }) {
  const [ended, setEnded] = useState(isOver);
  const [wasOver, setWasOver] = useState(isOver);
  const queries = useQueryClient();
  useEffect(() => onSessionEnd(() => setEnded(true)), []);
  if (isOver !== wasOver) {
    setWasOver(isOver);
    setEnded(isOver);
  }
  return (
    <Dialog
      title="Sign in again"
      description="Your session has ended. What you typed is still on this screen."
      open={ended}
      onClose={() => setEnded(false)}
    >
      <SignInForm
        email={email}
        onSignedIn={(session) => {
          queries.setQueryData(sessionQuery.queryKey, session);
          setEnded(false);
          void queries.invalidateQueries();
          window.dispatchEvent(new Event('online'));
        }}
      />
    </Dialog>
  );
}
