import { z } from 'zod';

import { endpoint } from './endpoint.ts';

/** Answers 200 when the server and its database are ready, else 503. */
export const getHealth = endpoint('GET', '/api/health', {
  response: z.object({ status: z.literal('ready'), version: z.string() }),
});
