import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Suspense, useEffect, useRef } from 'react';
import { NavLink, Outlet, useLocation, useNavigate } from 'react-router';

import type { SignedInPerson } from '#shared/contracts/session.ts';
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

function TopLine({ person }: { person: SignedInPerson }) {
  const [lamp, setLamp] = useLamp();
  const queries = useQueryClient();
  const navigate = useNavigate();
  const leave = async () => {
    await endSession();
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

/** The house: top line, the screen, and what stands ready on every screen. */
export function Layout() {
  const session = useQuery(sessionQuery);
  const main = usePageArrival();
  if (session.isPending)
    return (
      <div className="p-8">
        <Loading what="Graticule" />
      </div>
    );
  if (session.isError) {
    return (
      <div className="p-8">
        <Failure message={sentenceOf(session.error)} onRetry={() => void session.refetch()} />
      </div>
    );
  }
  const { person } = session.data;
  if (person === null) return <SignInPage />;
  return (
    <>
      <a href="#main" className="skip-link">
        Skip to the content
      </a>
      <TopLine person={person} />
      <main
        id="main"
        ref={main}
        tabIndex={-1}
        className="mx-auto w-full max-w-[100rem] px-4 py-6 outline-none sm:px-8"
      >
        <Suspense fallback={<Loading what="this screen" />}>
          <Outlet context={person} />
        </Suspense>
      </main>
      <Shortcuts abilities={person.abilities} />
      <SessionEnd email={person.email} />
    </>
  );
}
