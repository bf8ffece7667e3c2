import { z } from 'zod';

import { ROLES } from '../domain/roles.ts';
import { endpoint, idParam, instant } from './endpoint.ts';

/** A person as named beside the things they did. */
export const personNameSchema = z.object({ id: z.number().int(), name: z.string() });
export type PersonName = z.infer<typeof personNameSchema>;

export const personSchema = personNameSchema.extend({
  email: z.string(),
  roles: z.array(z.enum(ROLES)),
  active: z.boolean(),
  createdAt: instant,
  lastSeenAt: instant.nullable(),
  version: z.number().int(),
});
export type Person = z.infer<typeof personSchema>;

/** Colleagues by role, to address a review or filter by owner. */
export const choosePeople = endpoint('GET', '/api/people/names', {
  query: z.object({ role: z.enum(ROLES).optional() }),
  response: z.object({ people: z.array(personNameSchema.extend({ roles: z.array(z.enum(ROLES)) })) }),
});

export const listPeople = endpoint('GET', '/api/people', {
  response: z.object({ people: z.array(personSchema) }),
});

export const setRoles = endpoint('PUT', '/api/people/:personId/roles', {
  params: z.object({ personId: idParam }),
  body: z.object({ version: z.number().int(), roles: z.array(z.enum(ROLES)) }),
  response: personSchema,
});
