import { z } from 'zod';

import { endpoint, instant, pageOf, pageQuery } from './endpoint.ts';
import { personNameSchema } from './people.ts';

/** One event of the audit trail. */
export const recordSchema = z.object({
  id: z.number().int(),
  at: instant,
  person: personNameSchema.nullable(),
  event: z.string(),
  subjectType: z.string(),
  subjectId: z.number().int().nullable(),
  /** The event as a sentence. */
  summary: z.string(),
});
export type RecordRow = z.infer<typeof recordSchema>;

export const listRecords = endpoint('GET', '/api/records', {
  query: z.object({
    ...pageQuery,
    person: z.coerce.number().int().optional(),
    event: z.string().max(60).optional(),
  }),
  response: pageOf(recordSchema),
});
