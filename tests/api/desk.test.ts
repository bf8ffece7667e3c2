import { afterAll, beforeEach, describe, expect, it } from 'vitest';

import { type DeskReply, getDesk } from '#shared/contracts/desk.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeItem, makePaper, makePerson, makeReview, makeTopic } from '#tests/support/factories.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

async function deskOf(client: Client): Promise<Record<string, DeskReply['groups'][number]>> {
  const { groups } = await client.call(getDesk);
  return Object.fromEntries(groups.map((group) => [group.group, group]));
}

const codes = (group: DeskReply['groups'][number] | undefined) => group?.entries.map((entry) => entry.code);

describe('the desk', () => {
  it.each([
    [['writer'], ['returnedToMe', 'myDrafts']],
    [['reviewer'], ['reviewsForMe', 'reviewQueue']],
    [['setter'], ['papersAssembling', 'papersToConfirm']],
    [['moderator'], ['papersToConfirm']],
    [['administrator'], []],
    [
      ['writer', 'reviewer'],
      ['returnedToMe', 'myDrafts', 'reviewsForMe', 'reviewQueue'],
    ],
  ] as const)('of %j has the groups %j', async (roles, groups) => {
    const { client } = await app.signIn(roles);
    expect((await client.call(getDesk)).groups).toEqual(
      groups.map((group) => ({ group, total: 0, entries: [] })),
    );
  });

  it('shows a writer their own drafts and returned items, the longest untouched first', async () => {
    const { client, person } = await app.signIn(['writer']);
    const rae = await makePerson(database, { name: 'Rae', roles: ['reviewer'] });
    const topicId = (await makeTopic(database)).id;
    const own = { ownerId: person.id, topicId };
    const newer = await makeItem(database, { ...own, updatedAt: new Date('2026-03-02T10:00:00Z') });
    const older = await makeItem(database, { ...own, updatedAt: new Date('2026-03-01T10:00:00Z') });
    await makeItem(database, { ownerId: rae.id, topicId });
    await makeItem(database, { ...own, state: 'approved' });
    const returned = await makeItem(database, { ...own, state: 'returned' });
    await makeReview(database, returned, person.id, {
      stage: 'decided',
      decision: 'returned',
      reviewerId: rae.id,
      decidedAt: new Date('2026-03-03T09:30:00Z'),
    });
    const recalled = await makeItem(database, { ...own, state: 'returned' });
    await makeReview(database, recalled, person.id, {
      stage: 'decided',
      decision: 'recalled',
      decidedAt: new Date('2026-03-04T09:30:00Z'),
    });

    const desk = await deskOf(client);
    expect(codes(desk['myDrafts'])).toEqual([older.code, newer.code]);
    expect(desk['myDrafts']).toMatchObject({
      total: 2,
      entries: [{ path: `/items/${older.id}`, reason: 'draft', since: '2026-03-01T10:00:00.000Z' }, {}],
    });
    const reasons = desk['returnedToMe']?.entries.map(({ code, reason, since }) => [code, reason, since]);
    expect(reasons).toEqual(
      expect.arrayContaining([
        [returned.code, 'returned by Rae', '2026-03-03T09:30:00.000Z'],
        [recalled.code, 'taken back from review', '2026-03-04T09:30:00.000Z'],
      ]),
    );
    expect(reasons).toHaveLength(2);
  });

  it('shows a reviewer what is theirs, due dates first, and the queue without what they wrote', async () => {
    const { client, person } = await app.signIn(['reviewer', 'writer']);
    const wil = await makePerson(database, { name: 'Wil', roles: ['writer'] });
    const other = await makePerson(database, { roles: ['reviewer'] });
    const topicId = (await makeTopic(database)).id;
    const item = (authorIds: number[] = [], ownerId = wil.id) =>
      makeItem(database, { ownerId, topicId, state: 'inReview', authorIds });
    const [mine, dueSoon, queued, foreign, written, owned] = [
      await item(),
      await item(),
      await item(),
      await item(),
      await item([person.id]),
      await item([], person.id),
    ];
    await makeReview(database, mine, wil.id, {
      reviewerId: person.id,
      stage: 'working',
      claimedAt: new Date(),
    });
    await makeReview(database, dueSoon, wil.id, { reviewerId: person.id, dueOn: '2026-12-24' });
    const free = await makeReview(database, queued, wil.id);
    await makeReview(database, foreign, wil.id, { reviewerId: other.id, stage: 'revealed' });
    await makeReview(database, written, wil.id);
    await makeReview(database, owned, person.id);

    const desk = await deskOf(client);
    expect(desk['reviewsForMe']?.entries.map(({ code, reason, dueOn }) => [code, reason, dueOn])).toEqual([
      [dueSoon.code, 'sent to you by Wil', '2026-12-24'],
      [mine.code, 'your working is not finished', null],
    ]);
    expect(desk['reviewQueue']).toMatchObject({
      total: 1,
      entries: [{ path: `/reviews/${free.id}`, code: queued.code, reason: 'sent by Wil' }],
    });
  });

  it('shows a setter the papers in the making, and only another’s proposal to confirm', async () => {
    const { client, person } = await app.signIn(['setter']);
    const sam = await makePerson(database, { name: 'Sam', roles: ['setter'] });
    const topicId = (await makeTopic(database)).id;
    const one = await makeItem(database, { ownerId: sam.id, topicId, state: 'approved' });
    const two = await makeItem(database, { ownerId: sam.id, topicId, state: 'approved' });
    const filling = await makePaper(database, { createdById: sam.id, places: [one, two] });
    const empty = await makePaper(database, { createdById: person.id });
    const proposed = { state: 'proposed', proposedAt: new Date('2026-05-01T08:00:00Z') } as const;
    const theirs = await makePaper(database, { createdById: sam.id, proposedById: sam.id, ...proposed });
    await makePaper(database, { createdById: person.id, proposedById: person.id, ...proposed });

    const desk = await deskOf(client);
    expect(desk['papersAssembling']?.total).toBe(2);
    expect(desk['papersAssembling']?.entries.map(({ code, reason }) => [code, reason])).toEqual([
      [filling.code, '2 items so far'],
      [empty.code, '0 items so far'],
    ]);
    expect(desk['papersToConfirm']).toEqual({
      group: 'papersToConfirm',
      total: 1,
      entries: [
        {
          path: `/papers/${theirs.id}`,
          code: theirs.code,
          title: 'Paper',
          reason: 'proposed by Sam',
          since: '2026-05-01T08:00:00.000Z',
          dueOn: null,
        },
      ],
    });
  });

  it('counts all but shows at most twenty of a group', async () => {
    const { client, person } = await app.signIn(['writer']);
    const topicId = (await makeTopic(database)).id;
    for (let made = 0; made < 23; made += 1) await makeItem(database, { ownerId: person.id, topicId });
    const { myDrafts } = await deskOf(client);
    expect(myDrafts?.total).toBe(23);
    expect(myDrafts?.entries).toHaveLength(20);
  });
});
