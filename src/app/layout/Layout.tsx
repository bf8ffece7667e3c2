import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Suspense, useEffect, useRef, useState } from 'react';
import { NavLink, Outlet, useLocation, useNavigate } from 'react-router';

import type { SignedInPerson } from '#shared/contracts/session.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { Failure, Loading } from '#src/components/ui/states.tsx';
import { endSession, sessionQuery } from '#src/features/session/api.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { SignInPage } from '../pages/SignInPage.tsx';
import { SECTIONS } from './sections.ts';
import { SessionEnd } from './SessionEnd.tsx';
import { Shortcuts } from './Shortcuts.tsx';
import { useLamp, type Lamp } from './use-lamp.ts';

const LAMPS: readonly { lamp: Lamp; name: string }[] = [
  { lamp: 'system', name: 'as the system' },
  { lamp: 'on', name: 'on' },
  { lamp: 'off', name: 'off' },
];

function TopLine({ person, onLeft }: { person: SignedInPerson; onLeft: () => void }) {
  const [lamp, setLamp] = useLamp();
  const queries = useQueryClient();
  const navigate = useNavigate();
  const [problem, setProblem] = useState<string | null>(null);
  const leave = async () => {
    try {
      await endSession();
    } catch (error) {
      if (!(error instanceof AppError && error.code === 'notSignedIn')) {
        setProblem(sentenceOf(error));
        return;
      }
    }
    onLeft();
    // Nothing that this person saw stays for the next one at this browser.
    queries.clear();
    void navigate('/');
  };
  return (
    <header className="mx-auto w-full max-w-[100rem] px-4 pt-3 sm:px-8">
      <div className="flex flex-wrap items-baseline gap-x-8 gap-y-2">
        <NavLink to="/desk" className="text-xl font-semibold tracking-tight">
          Graticule
        </NavLink>
        <nav aria-label="Sections" className="flex flex-wrap gap-x-6">
          {SECTIONS.filter(({ ability }) => person.abilities.includes(ability)).map(({ path, name }) => (
            <NavLink
              key={path}
              to={path}
              className={({ isActive }) => `section-link ${isActive ? 'section-here' : ''}`}
            >
              {name}
            </NavLink>
          ))}
        </nav>
        <div className="ml-auto flex flex-wrap items-baseline gap-x-4 text-sm text-muted">
          <label>
            Lamp{' '}
            <select
              className="bg-transparent text-ink"
              value={lamp}
              onChange={(event) => setLamp(event.target.value as Lamp)}
            >
              {LAMPS.map(({ lamp: value, name }) => (
                <option key={value} value={value} className="bg-sheet">
                  {name}
                </option>
              ))}
            </select>
          </label>
          <span>
            {person.name}, {person.roles.join(', ') || 'no role yet'}
          </span>
          <button type="button" className="link" onClick={() => void leave()}>
            Sign out
          </button>
        </div>
      </div>
      <div className="tick-rule mt-2" aria-hidden="true" />
      {problem !== null && (
        <p role="alert" className="pt-2 text-lead">
          {problem}
        </p>
      )}
    </header>
  );
}

/** Each screen is announced, and begins at its top. */
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

/**
 * The person whose screens are open. A session that ends by itself leaves them there, so that nothing typed is
 * lost; signing out, or another person signing in, does not.
 */
function usePersonHere(person: SignedInPerson | null | undefined) {
  const [here, setHere] = useState<SignedInPerson | null>(null);
  if (person !== undefined && person !== null && person !== here) setHere(person);
  return { here: person ?? here, leave: () => setHere(null) };
}

/** The house: top line, the screen, and what stands ready on every screen. */
export function Layout() {
  const session = useQuery(sessionQuery);
  const { here: person, leave } = usePersonHere(session.data?.person);
  const main = usePageArrival();
  if (person === null) {
    if (session.isSuccess) return <SignInPage />;
    return (
      <div className="p-8">
        {session.isPending ? (
          <Loading what="Graticule" />
        ) : (
          <Failure message={sentenceOf(session.error)} onRetry={() => void session.refetch()} />
        )}
      </div>
    );
  }
  return (
    <>
      <a href="#main" className="skip-link">
        Skip to the content
      </a>
      <TopLine person={person} onLeft={leave} />
      <main
        id="main"
        ref={main}
        tabIndex={-1}
        className="mx-auto w-full max-w-[100rem] px-4 py-6 outline-none sm:px-8"
      >
        <Suspense fallback={<Loading what="this screen" />}>
          <Outlet key={person.id} context={person} />
        </Suspense>
      </main>
      <Shortcuts abilities={person.abilities} />
      <SessionEnd email={person.email} isOver={session.data?.person === null} />
    </>
  );
}
