import { z } from 'zod';

import { endpoint } from './endpoint.ts';

export const topicSchema = z.object({
  id: z.number().int(),
  /** Two or three capitals that begin the codes of its items. */
  code: z.string(),
  name: z.string(),
});
export type Topic = z.infer<typeof topicSchema>;

export const listTopics = endpoint('GET', '/api/topics', {
  response: z.object({ topics: z.array(topicSchema) }),
});
