import { z } from 'zod';

import { ACTIONS } from '../domain/permissions.ts';
import { ROLES } from '../domain/roles.ts';
import { emptyReply, endpoint } from './endpoint.ts';

export const signedInPersonSchema = z.object({
  id: z.number().int(),
  name: z.string(),
  email: z.string(),
  roles: z.array(z.enum(ROLES)),
  /** Actions open to this person on things that are theirs to touch; menus read this. */
  abilities: z.array(z.enum(ACTIONS as [(typeof ACTIONS)[number], ...typeof ACTIONS])),
});
export type SignedInPerson = z.infer<typeof signedInPersonSchema>;

export const sessionSchema = z.object({
  person: signedInPersonSchema.nullable(),
  /** Sent back in the `x-csrf-token` header of every changing request. */
  csrfToken: z.string(),
});
export type SessionReply = z.infer<typeof sessionSchema>;

export const getSession = endpoint('GET', '/api/session', { response: sessionSchema });

export const signIn = endpoint('POST', '/api/session', {
  body: z.object({
    email: z.email('Enter your e-mail address, as name@place.example.').max(254),
    password: z.string().min(1, 'Enter your password.').max(200),
  }),
  response: sessionSchema,
});

export const signOut = endpoint('DELETE', '/api/session', { response: emptyReply });
