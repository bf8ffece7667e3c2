import { z } from 'zod';

import { endpoint, instant } from './endpoint.ts';

/** One thing that waits for me. */
export const deskEntrySchema = z.object({
  /** Where a click leads, as `/items/12`. */
  path: z.string(),
  code: z.string(),
  title: z.string(),
  /** Why it waits, as "returned by Ines Okafor". */
  reason: z.string(),
  since: instant,
  dueOn: z.iso.date().nullable(),
});
export type DeskEntry = z.infer<typeof deskEntrySchema>;

export const DESK_GROUPS = [
  'returnedToMe',
  'myDrafts',
  'reviewsForMe',
  'reviewQueue',
  'papersAssembling',
  'papersToConfirm',
] as const;

export const getDesk = endpoint('GET', '/api/desk', {
  response: z.object({
    groups: z.array(
      z.object({
        group: z.enum(DESK_GROUPS),
        total: z.number().int(),
        entries: z.array(deskEntrySchema),
      }),
    ),
  }),
});
export type DeskReply = z.infer<typeof getDesk.response>;
