import { useQueryClient } from '@tanstack/react-query';

import { sessionQuery } from '#src/features/session/api.ts';
import { SignInForm } from '#src/features/session/SignInForm.tsx';
import { usePageTitle } from '../layout/use-page-title.ts';

/** Where everyone begins; after it the screen that was asked for is shown. */
export function SignInPage() {
  const queries = useQueryClient();
  usePageTitle('Sign in');
  return (
    <main className="mx-auto grid min-h-screen max-w-sm content-center gap-8 py-12">
      <div>
        <h1 className="wordmark text-5xl">Graticule</h1>
        <div className="tick-rule my-4" aria-hidden="true" />
        <p className="text-muted">Items whose every answer has been checked, draw by draw.</p>
      </div>
      <SignInForm onSignedIn={(session) => queries.setQueryData(sessionQuery.queryKey, session)} />
      <p className="text-sm text-muted">
        Accounts are given by your team’s administrator. Ask them if you cannot sign in.
      </p>
    </main>
  );
}
