import { queryOptions } from '@tanstack/react-query';

import { getSession, signIn, signOut } from '#shared/contracts/session.ts';
import { call, rememberSession } from '#src/lib/api.ts';

/** Who is signed in here, if anyone. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: async ({ signal }) => {
    const session = await call(getSession, { signal });
    rememberSession(session);
    return session;
  },
  staleTime: 60_000,
});

/** Signs in and remembers the new session's token. Throws AppError with the server's sentence. */
export async function beginSession(credentials: { email: string; password: string }) {
  const session = await call(signIn, { body: credentials });
  rememberSession(session);
  return session;
}

export const endSession = () => call(signOut);
