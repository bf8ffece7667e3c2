import type { Request, RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy } from 'passport-local';

import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../context.ts';
import { DatabaseSessionStore } from './session-store.ts';
import type { SignedIn } from './signed-in.ts';

declare module 'express-session' {
  interface SessionData {
    /** What passport keeps: the signed-in person's id. */
    passport?: { user?: number };
  }
}

/** What signing in needs to know of people and passwords. */
export interface Identity {
  /** Checks an address and a password; throws AppError signInFailed or tooManyRequests. */
  verify: (email: string, password: string, address: string) => Promise<{ id: number }>;
  /** The person of a running session; null when they are gone or no longer active. */
  find: (personId: number, sessionId: string) => Promise<SignedIn | null>;
}

export interface Authentication {
  /** Read the session of each request, and its person into `request.user`. */
  middleware: RequestHandler[];
  /** Checks the body's address and password and begins a new session under a new id; throws as Identity.verify. */
  signIn: (request: Request) => Promise<void>;
  /** Ends the session. */
  signOut: (request: Request) => Promise<void>;
}

const SESSION_COOKIE = 'graticule.session';

/** The person whom the middleware has read from the session. */
export function signedInOf(request: Request): SignedIn | null {
  return (request.user as SignedIn | undefined) ?? null;
}

function createAuthenticator(identity: Identity): passport.Authenticator {
  const authenticator = new passport.Passport();
  authenticator.use(
    new Strategy({ usernameField: 'email', passReqToCallback: true }, (request, email, password, done) => {
      identity.verify(email, password, request.ip ?? '').then(
        (person) => done(null, person),
        (error: unknown) => done(error),
      );
    }),
  );
  authenticator.serializeUser((person, done) => done(null, (person as { id: number }).id));
  authenticator.deserializeUser<unknown, Request>((request, id, done) => {
    identity.find(Number(id), request.sessionID).then(
      (person) => done(null, person ?? false),
      (error: unknown) => done(error),
    );
  });
  return authenticator;
}

/** Sessions in the database, sign-in by address and password; the session's id changes at every sign-in. */
export function createAuthentication(context: AppContext, identity: Identity): Authentication {
  const { settings } = context;
  const authenticator = createAuthenticator(identity);
  const sessions = session({
    name: SESSION_COOKIE,
    secret: settings.sessionSecret,
    store: new DatabaseSessionStore(context.database, context.clock),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: {
      httpOnly: true,
      sameSite: 'lax',
      secure: settings.secureCookies,
      maxAge: Math.round(settings.sessionHours * 3_600_000),
    },
  });
  return {
    middleware: [sessions, authenticator.session() as RequestHandler],
    signIn: (request) =>
      new Promise((resolve, reject) => {
        const settle = (error: unknown) => (error ? reject(error) : resolve());
        const check = authenticator.authenticate(
          'local',
          (error: unknown, person?: Express.User | false | null) => {
            if (error) settle(error);
            else if (!person) settle(new AppError('signInFailed', SIGN_IN_FAILED));
            // This also gives the session a new id, so that an id planted before is worth nothing.
            else request.logIn(person, settle);
          },
        ) as RequestHandler;
        if (request.res === undefined) throw new Error('The request has no response.');
        void check(request, request.res, settle);
      }),
    signOut: (request) =>
      new Promise((resolve, reject) => {
        request.logout((error: unknown) => (error ? reject(error) : resolve()));
      }),
  };
}

/** One sentence for an unknown address, a wrong password and a closed account alike. */
export const SIGN_IN_FAILED = 'The e-mail address and the password do not belong together.';
