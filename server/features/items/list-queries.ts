import { and, asc, count, desc, eq, isNotNull, isNull, like, not, or, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';

import type { ItemQuery } from '#shared/contracts/items.ts';

import type { Connection } from '../../db/client.ts';
import { assays, items, paperPlaces, people, reviews, revisions, topics } from '../../db/schema/index.ts';

const latest = alias(revisions, 'latest');
const approved = alias(revisions, 'approved');
const assay = alias(assays, 'assay');

/** Who looks at the list, as far as it decides what they may find out. */
export interface Viewer {
  id: number;
  /** Whether their roles let them open items at all. */
  opensItems: boolean;
}

/** Words that the full-text index leaves out (InnoDB's default list) or that are too short for it. */
const UNINDEXED = new Set(
  'about are com for from how that the this was what when where who will with und www'.split(' '),
);
const SHORTEST_WORD = 3;

/** The code or title holds the search, or every indexed word of it begins some word of the item's printed text. */
function searchCondition(search: string): SQL | undefined {
  const pattern = search.replace(/[%_\\]/g, '\\$&');
  const byName = or(like(items.code, `${pattern}%`), like(items.title, `%${pattern}%`));
  const looksLikeCode = /^[A-Za-z]{2,3}-\d*$/.test(search);
  const words = search
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word.length >= SHORTEST_WORD && !UNINDEXED.has(word));
  if (looksLikeCode || words.length === 0) return byName;
  const wanted = words.map((word) => `+${word}*`).join(' ');
  // The index covers these three columns together, so all three are named.
  const byText = sql`match(${items.code}, ${items.title}, ${items.searchText}) against (${wanted} in boolean mode)`;
  return or(byName, byText);
}

/** True for items whose findings would tell this person something before their own working of the item. */
function findingsHidden({ id, opensItems }: Viewer): SQL<number> {
  const awaited = opensItems
    ? sql`${reviews.reviewerId} = ${id}`
    : sql`(${reviews.reviewerId} = ${id} or ${reviews.reviewerId} is null)`;
  return sql<number>`exists (select 1 from ${reviews} where ${reviews.itemId} = ${items.id} and ${reviews.stage} in ('waiting', 'working') and ${awaited})`;
}

function conditions(query: ItemQuery, viewer: Viewer): SQL | undefined {
  const byFinding =
    query.finding === undefined
      ? undefined
      : query.finding === 'none'
        ? and(isNull(items.worstFinding), isNotNull(items.latestAssayId))
        : eq(items.worstFinding, query.finding);
  return and(
    query.search === undefined || query.search === '' ? undefined : searchCondition(query.search),
    query.topic === undefined ? undefined : eq(items.topicId, query.topic),
    query.state === undefined ? undefined : eq(items.state, query.state),
    query.owner === undefined ? undefined : eq(items.ownerId, query.owner),
    byFinding,
    byFinding === undefined ? undefined : not(findingsHidden(viewer)),
  );
}

const SORT_COLUMNS = {
  code: items.code,
  title: items.title,
  topic: topics.name,
  state: items.state,
  owner: people.name,
  marks: items.marks,
  updated: items.updatedAt,
} as const;

/** One page of the bank as `viewer` may see it. `usedOn` counts the papers that hold the item. */
export async function selectItemPage(connection: Connection, query: ItemQuery, viewer: Viewer) {
  const where = conditions(query, viewer);
  const direction = query.direction === 'ascending' ? asc : desc;
  const rows = await connection
    .select({
      id: items.id,
      code: items.code,
      title: items.title,
      state: items.state,
      marks: items.marks,
      parts: items.partsCount,
      worstFinding: items.worstFinding,
      findingsHidden: findingsHidden(viewer).mapWith(Boolean),
      updatedAt: items.updatedAt,
      topicId: topics.id,
      topicCode: topics.code,
      topicName: topics.name,
      ownerId: people.id,
      ownerName: people.name,
      revision: latest.number,
      contentHash: latest.contentHash,
      approvedRevision: approved.number,
      assayHash: assay.contentHash,
      assayEngine: assay.engineVersion,
      usedOn:
        sql<number>`(select count(*) from ${paperPlaces} where ${paperPlaces.itemId} = ${items.id})`.mapWith(
          Number,
        ),
    })
    .from(items)
    .innerJoin(topics, eq(topics.id, items.topicId))
    .innerJoin(people, eq(people.id, items.ownerId))
    .innerJoin(latest, eq(latest.id, items.latestRevisionId))
    .leftJoin(approved, eq(approved.id, items.approvedRevisionId))
    .leftJoin(assay, eq(assay.id, items.latestAssayId))
    .where(where)
    .orderBy(direction(SORT_COLUMNS[query.sort]), asc(items.id))
    .limit(query.pageSize)
    .offset((query.page - 1) * query.pageSize);
  const [all] = await connection.select({ total: count() }).from(items).where(where);
  return { rows, total: all?.total ?? 0 };
}
