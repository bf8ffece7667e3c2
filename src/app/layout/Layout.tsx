import { useQuery } from '@tanstack/react-query';
import { Suspense, useEffect, useRef, useState } from 'react';
import { Outlet, useLocation } from 'react-router';

import type { SignedInPerson } from '#shared/contracts/session.ts';
import { Notices } from '#src/components/ui/Notices.tsx';
import { Failure, Loading } from '#src/components/ui/states.tsx';
import { endSession, sessionQuery } from '#src/features/session/api.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { SignInPage } from '../pages/SignInPage.tsx';
import { Arrival } from './Arrival.tsx';
import { ConnectionLine } from './ConnectionLine.tsx';
import { LeaveGuard } from './LeaveGuard.tsx';
import { SessionEnd } from './SessionEnd.tsx';
import { Shortcuts } from './Shortcuts.tsx';
import { TopLine } from './TopLine.tsx';

/** Each screen begins at its top, with the keyboard. */
function usePageArrival() {
  const { pathname } = useLocation();
  const main = useRef<HTMLElement>(null);
  const first = useRef(true);
  useEffect(() => {
    if (first.current) first.current = false;
    else {
      main.current?.focus({ preventScroll: true });
      window.scrollTo(0, 0);
    }
  }, [pathname]);
  return main;
}

/** Ends the session and begins from nothing, so that nothing confidential stays in memory. */
async function leave(): Promise<void> {
  await endSession().catch(() => undefined);
  window.location.assign('/');
}

/** What stands round every screen of a person who is signed in. */
function House({ person, ended }: { person: SignedInPerson; ended: boolean }) {
  const main = usePageArrival();
  const [keysShown, setKeysShown] = useState(false);
  return (
    <>
      <a href="#main" className="skip-link">
        Skip to the content
      </a>
      <TopLine person={person} onKeys={() => setKeysShown(true)} onLeave={() => void leave()} />
      <ConnectionLine />
      <main
        id="main"
        ref={main}
        tabIndex={-1}
        className="mx-auto w-full max-w-[100rem] px-4 py-7 outline-none sm:px-8"
      >
        <Suspense fallback={<Loading what="this screen" />}>
          <Outlet context={person} />
        </Suspense>
      </main>
      <Arrival />
      <Notices />
      <LeaveGuard />
      <Shortcuts abilities={person.abilities} shown={keysShown} onShow={setKeysShown} />
      <SessionEnd person={person} ended={ended} />
    </>
  );
}

/** The house, or its door: whoever has come in stays in with what they typed, even when the session ends. */
export function Layout() {
  const session = useQuery(sessionQuery);
  const now = session.data?.person ?? null;
  const [person, setPerson] = useState<SignedInPerson | null>(now);
  if (now !== null && now !== person) {
    // Another window of this browser signed in as somebody else.
    if (person !== null && now.id !== person.id) window.location.reload();
    setPerson(now);
  }
  if (person !== null) return <House person={person} ended={session.isSuccess && now === null} />;
  return (
    <div className="px-4 sm:px-8">
      {session.isPending && <Loading what="Graticule" />}
      {session.isError && (
        <Failure message={sentenceOf(session.error)} onRetry={() => void session.refetch()} />
      )}
      {session.isSuccess && <SignInPage />}
    </div>
  );
}
