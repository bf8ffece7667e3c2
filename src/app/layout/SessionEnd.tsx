import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';

import { Dialog } from '#src/components/ui/Dialog.tsx';
import { sessionQuery } from '#src/features/session/api.ts';
import { SignInForm } from '#src/features/session/SignInForm.tsx';
import { onSessionEnd } from '#src/lib/api.ts';

/** When the session has ended: sign in again without leaving the screen, so that nothing typed is lost. */
export function SessionEnd({ email }: { email: string }) {
  const [ended, setEnded] = useState(false);
  const queries = useQueryClient();
  useEffect(() => onSessionEnd(() => setEnded(true)), []);
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
