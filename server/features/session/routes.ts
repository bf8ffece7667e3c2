import { getSession, type SessionReply, signIn, signOut } from '#shared/contracts/session.ts';
import { abilitiesFor, ACTIONS } from '#shared/domain/permissions.ts';

import type { AppContext } from '../../context.ts';
import type { Authentication } from '../../http/authentication.ts';
import { csrfTokenOf } from '../../http/csrf.ts';
import { type Route, route } from '../../http/route.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { createIdentity, recordSession } from './service.ts';

function present(person: SignedIn | null, csrfToken: string): SessionReply {
  if (person === null) return { person: null, csrfToken };
  const { id, name, email, roles } = person;
  return {
    person: { id, name, email, roles: [...roles], abilities: abilitiesFor(person, ACTIONS) },
    csrfToken,
  };
}

/** Signing in and out, and who is signed in. */
export function sessionRoutes(context: AppContext, authentication: Authentication): Route[] {
  const identity = createIdentity(context);
  return [
    route(getSession, { can: 'anyone' }, async ({ actor, request }) => present(actor, csrfTokenOf(request))),

    route(signIn, { can: 'anyone' }, async ({ request }) => {
      await authentication.signIn(request);
      const id = request.session.passport?.user ?? 0;
      const person = await identity.find(id, request.sessionID);
      if (person !== null) await recordSession(context, person, 'session.signedIn');
      return present(person, csrfTokenOf(request));
    }),

    route(signOut, { can: 'signedIn' }, async ({ actor, request }) => {
      await authentication.signOut(request);
      await recordSession(context, actor, 'session.signedOut');
      return {};
    }),
  ];
}
