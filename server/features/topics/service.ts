import { eq } from 'drizzle-orm';

import type { Topic } from '#shared/contracts/topics.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { Connection } from '../../db/client.ts';
import { topics } from '../../db/schema/index.ts';

/** One topic; throws AppError invalid at the field that names it. */
export async function topicById(connection: Connection, topicId: number): Promise<Topic> {
  const [topic] = await connection
    .select({ id: topics.id, code: topics.code, name: topics.name })
    .from(topics)
    .where(eq(topics.id, topicId));
  if (topic === undefined) {
    throw new AppError('invalid', 'This topic does not exist.', {
      fields: [{ path: 'topicId', message: 'Choose a topic from the list.' }],
    });
  }
  return topic;
}
