import { asc } from 'drizzle-orm';

import { listTopics } from '#shared/contracts/topics.ts';

import type { AppContext } from '../../context.ts';
import { topics } from '../../db/schema/index.ts';
import { type Route, route } from '../../http/route.ts';

/** The topics that items are sorted under. */
export function topicRoutes(context: AppContext): Route[] {
  return [
    route(listTopics, { can: 'topic.list' }, async () => ({
      topics: await context.database
        .select({ id: topics.id, code: topics.code, name: topics.name })
        .from(topics)
        .orderBy(asc(topics.position), asc(topics.code)),
    })),
  ];
}
