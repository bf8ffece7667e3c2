import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { auditEvents, outgoingMail, reviews as reviewTable, revisions } from '#server/db/schema/index.ts';
import * as contracts from '#shared/contracts/items.ts';
import { claimReview } from '#shared/contracts/reviews.ts';
import { itemContentSchema } from '#shared/engine/index.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import {
  approvedItem,
  cautionedContent,
  gunContent,
  sendItem,
  startEngine,
  workReview,
  writeItem,
} from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(() => startEngine(app), 120_000);
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

const open = (client: Client, itemId: number) => client.call(contracts.getItem, { params: { itemId } });

async function bench(content = gunContent()) {
  const { client: writer, person } = await app.signIn(['writer']);
  const topic = await makeTopic(database);
  const made = await writeItem(writer, topic.id, content);
  return { writer, person, topic, made };
}

describe('a new item', () => {
  it('is coded by its topic and the next number, and is the writer’s own draft', async () => {
    const { client, person } = await app.signIn(['writer']);
    const topic = await makeTopic(database);
    const body = { title: 'A beam', topicId: topic.id };
    const first = await client.call(contracts.createItem, { body });
    const second = await client.call(contracts.createItem, { body });
    expect([first.code, second.code]).toEqual([`${topic.code}-001`, `${topic.code}-002`]);
    const item = await open(client, second.id);
    expect(item).toMatchObject({
      state: 'drafting',
      owner: { id: person.id },
      revision: { number: 1, version: 1, content: { title: 'A beam' } },
      approvedRevision: null,
      assay: null,
    });
    expect(item.abilities).toEqual([
      'item.read',
      'item.edit',
      'item.send',
      'item.recall',
      'item.assay',
      'item.withdraw',
    ]);
  });

  it('gets a code of its own however many are begun at once', async () => {
    const { client } = await app.signIn(['writer']);
    const topic = await makeTopic(database);
    const made = await Promise.all(
      Array.from({ length: 8 }, (_, index) =>
        client.call(contracts.createItem, { body: { title: `Beam ${index}`, topicId: topic.id } }),
      ),
    );
    expect(made.map(({ code }) => code).sort()).toEqual(
      Array.from({ length: 8 }, (_, index) => `${topic.code}-00${index + 1}`),
    );
  });

  it('is refused without a title or for a topic that does not exist, and nothing is made', async () => {
    const { client } = await app.signIn(['writer']);
    const topic = await makeTopic(database);
    const untitled = await client.attempt(contracts.createItem, { body: { title: ' ', topicId: topic.id } });
    expect(untitled).toMatchObject({ status: 422, body: { detail: 'Give the item a title.' } });
    const astray = await client.attempt(contracts.createItem, { body: { title: 'Beam', topicId: 999_999 } });
    expect(astray).toMatchObject({ status: 422, body: { fields: [{ path: 'topicId' }] } });
    expect((await client.call(contracts.listItems)).total).toBe(0);
  });
});

describe('a draft', () => {
  it('is saved with a rising version, and the bank’s list follows', async () => {
    const { writer, topic, made } = await bench();
    const other = await makeTopic(database);
    const saved = await writer.call(contracts.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content: gunContent({ title: 'A faster gun' }), topicId: other.id },
    });
    expect(saved.version).toBe(3);
    const { rows } = await writer.call(contracts.listItems);
    expect(rows).toMatchObject([
      { code: made.code, title: 'A faster gun', marks: 6, parts: 3, topic: { id: other.id } },
    ]);
    expect(made.code.startsWith(topic.code)).toBe(true);
  });

  it('is never overwritten by a stale one: the reply carries what is stored, and that stays', async () => {
    const { writer, made } = await bench();
    const params = { itemId: made.id };
    const mine = gunContent({ title: 'Mine' });
    await writer.call(contracts.saveDraft, { params, body: { version: 2, content: mine } });
    const late = await writer.attempt(contracts.saveDraft, {
      params,
      body: { version: 2, content: gunContent({ title: 'Late' }) },
    });
    expect(late).toMatchObject({ status: 409, body: { code: 'conflict' } });
    const current = contracts.itemSchema.parse(late.body.current);
    expect(current.revision).toMatchObject({ version: 3, content: mine });
    expect((await open(writer, made.id)).revision.content.title).toBe('Mine');
  });

  it('is saved once when two saves of one version come at the same moment', async () => {
    const { writer, made } = await bench();
    const save = (title: string) =>
      writer.attempt(contracts.saveDraft, {
        params: { itemId: made.id },
        body: { version: 2, content: gunContent({ title }) },
      });
    for (let round = 0; round < 3; round += 1) {
      const replies = await Promise.all([save('One'), save('Two')]);
      const wins = replies.filter((reply) => reply.status === 200).length;
      // Only the first round holds the current version.
      expect(wins).toBe(round === 0 ? 1 : 0);
      expect(replies.filter((reply) => reply.status === 409)).toHaveLength(2 - wins);
    }
    expect((await open(writer, made.id)).revision.version).toBe(3);
  });

  it('belongs to its owner', async () => {
    const { made } = await bench();
    const { client: other } = await app.signIn(['writer', 'administrator']);
    const reply = await other.attempt(contracts.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content: gunContent({ title: 'Theirs' }) },
    });
    expect(reply).toMatchObject({
      status: 403,
      body: { detail: 'Only the owner of this item can do that.' },
    });
    expect((await open(other, made.id)).revision.content.title).toBe(gunContent().title);
  });

  it.each([
    ['an unknown schema', { ...gunContent(), schema: 9 }],
    ['a title that is no text', { ...gunContent(), title: 7 }],
    ['a part of no kind', { ...gunContent(), parts: [{ id: 'a', kind: 'essay' }] }],
    ['a script without end', { ...gunContent(), script: 'x'.repeat(20_001) }],
    ['nothing at all', null],
    ['parts that share an id', { ...gunContent(), parts: [gunContent().parts[2], gunContent().parts[2]] }],
    ['a figure of no item', { ...gunContent(), figures: [{ figureId: 77 }] }],
  ])('is not saved with %s, and the field is named', async (_name, content) => {
    const { writer, made } = await bench();
    const reply = await writer.attempt(contracts.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content },
    });
    expect(reply.status).toBe(422);
    expect(reply.body.fields?.[0]?.path).toMatch(/^content/);
    expect(reply.body.detail).toMatch(/^[A-Z].*\.$/s);
    expect((await open(writer, made.id)).revision).toMatchObject({ version: 2, content: gunContent() });
  });

  it('shows the usual cautions for what it describes, with deference to local rules', async () => {
    const { writer, made } = await bench();
    const { cautions } = await open(writer, made.id);
    // By its values the gun takes more than 400 V; by its words the tube is evacuated.
    expect(cautions).toHaveLength(3);
    expect(cautions.at(-1)).toMatch(/Local safety rules and a competent person’s risk assessment/);
  });
});

describe('the bank’s list', () => {
  const codes = async (client: Client, query: Record<string, string | number>) =>
    (await client.call(contracts.listItems, { query })).rows.map((row) => row.code);

  it('is searched by the words of code, title and print, in any order and by their beginnings', async () => {
    const { writer, topic, made } = await bench();
    const drop = await writeItem(
      writer,
      topic.id,
      itemContentSchema.parse({
        title: 'A hovering drop',
        stem: 'An oil drop of charge {{q}} hovers. It is 100% at rest_ there.',
        script: 'q = 2 * e // hiddenremark',
        parts: [
          { id: 'a', kind: 'written', text: 'Name the forces.', scheme: [{ text: 'weight', marks: 1 }] },
        ],
      }),
    );
    expect(await codes(writer, { search: 'oil drop' })).toEqual([drop.code]);
    expect(await codes(writer, { search: 'forces hover' })).toEqual([drop.code]);
    expect(await codes(writer, { search: 'the drop' })).toEqual([drop.code]);
    expect(await codes(writer, { search: 'cathode' })).toEqual([made.code]);
    expect((await codes(writer, { search: topic.code.toLowerCase() })).length).toBe(2);
    expect(await codes(writer, { search: drop.code })).toEqual([drop.code]);
    expect(await codes(writer, { search: 'cathode drop' })).toEqual([]);
    for (const inside of ['hiddenremark', 'weight', '%', '_', 'collisions'])
      expect(await codes(writer, { search: inside })).toEqual([]);
    for (const odd of ['"', '+-*()~<>@', "' or 1=1 --", 'drop"', '+drop -oil'])
      expect(await codes(writer, { search: odd })).toBeInstanceOf(Array);
  });

  it('is filtered, sorted and paged by the server', async () => {
    const { writer, person, topic, made } = await bench();
    const { client: second, person: other } = await app.signIn(['writer']);
    const light = await writeItem(second, (await makeTopic(database)).id, gunContent({ parts: [] }));
    expect(await codes(writer, { topic: topic.id })).toEqual([made.code]);
    expect(await codes(writer, { owner: other.id })).toEqual([light.code]);
    expect(await codes(writer, { owner: person.id, state: 'approved' })).toEqual([]);
    expect(await codes(writer, { sort: 'marks', direction: 'ascending' })).toEqual([light.code, made.code]);
    expect(await codes(writer, { sort: 'marks', direction: 'descending' })).toEqual([made.code, light.code]);
    const page = await writer.call(contracts.listItems, {
      query: { sort: 'code', direction: 'ascending', pageSize: 1, page: 2 },
    });
    expect(page).toMatchObject({ total: 2, page: 2, pageSize: 1 });
    expect(page.rows.map((row) => row.code)).toEqual([[made.code, light.code].sort()[1]]);
    expect(await writer.attempt(contracts.listItems, { query: { sort: 'colour' } })).toMatchObject({
      status: 422,
    });
  });

  it('tells how the last assay came out and whether it still holds', async () => {
    const { writer, made } = await bench(cautionedContent());
    const row = async () => (await writer.call(contracts.listItems)).rows[0];
    expect(await row()).toMatchObject({ assayed: 'never', worstFinding: null });
    await writer.call(contracts.assayItem, { params: { itemId: made.id } });
    expect(await row()).toMatchObject({ assayed: 'fresh', worstFinding: 'caution' });
    expect(await codes(writer, { finding: 'caution' })).toEqual([made.code]);
    expect(await codes(writer, { finding: 'blocker' })).toEqual([]);
    await writer.call(contracts.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content: gunContent({ stem: 'Other words, {{Va}}.' }) },
    });
    expect(await row()).toMatchObject({ assayed: 'stale' });
  });

  it('tells only people of papers how many papers hold an item', async () => {
    const { writer } = await bench();
    const { client: setter } = await app.signIn(['setter']);
    expect((await writer.call(contracts.listItems)).rows[0]?.usedOn).toBeNull();
    expect((await setter.call(contracts.listItems)).rows[0]?.usedOn).toBe(0);
  });
});

describe('an assay', () => {
  it('is run on the server and stored with the revision', async () => {
    const { writer, made } = await bench();
    const stored = await writer.call(contracts.assayItem, { params: { itemId: made.id } });
    // 410 V to 890 V in steps of 20 V.
    expect(stored).toMatchObject({ stale: false, report: { gridSize: 25, exhaustive: true } });
    expect((await open(writer, made.id)).assay).toEqual(stored);
    const reason = { Va: 'a reason' };
    await writer.call(contracts.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content: gunContent({ acceptedCautions: reason }) },
    });
    // A reason for a caution changes nothing that the assay reads.
    expect((await open(writer, made.id)).assay?.stale).toBe(false);
  });
});

describe('sending to review', () => {
  it('assays what is stale, makes the review, writes to the reviewer without content, and records it', async () => {
    const { writer, made } = await bench();
    const { person: reviewer } = await app.signIn(['reviewer']);
    const reviewId = await sendItem(writer, made.id, reviewer.id);
    const item = await open(writer, made.id);
    expect(item).toMatchObject({ state: 'inReview', reviewId, assay: { stale: false } });
    const letters = await database.select().from(outgoingMail);
    expect(letters).toMatchObject([{ kind: 'reviewRequested', address: reviewer.email, state: 'waiting' }]);
    expect(letters[0]?.payload).toMatchObject({ itemCode: made.code, reviewId });
    expect(JSON.stringify(letters)).not.toContain(gunContent().title);
    const events = await database.select().from(auditEvents);
    expect(events.map((event) => event.event)).toContain('item.sent');
  });

  it('is refused for a blocker, with the count, and nothing is half done', async () => {
    const { writer, topic } = await bench();
    const faulty = await writeItem(writer, topic.id, gunContent({ stem: 'No hole of {{this name}}.' }));
    const reply = await writer.attempt(contracts.sendToReview, {
      params: { itemId: faulty.id },
      body: { version: 2 },
    });
    expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
    expect(reply.body.detail).toMatch(/The assay found \d+ blockers?\./);
    expect(await open(writer, faulty.id)).toMatchObject({ state: 'drafting', reviewId: null });
    expect(await database.select().from(reviewTable)).toEqual([]);
  });

  it('is refused for a stale version, for no reviewer, and for somebody who wrote it', async () => {
    const { writer, person, made } = await bench();
    const { person: setter } = await app.signIn(['setter']);
    const send = (body: object) =>
      writer.attempt(contracts.sendToReview, { params: { itemId: made.id }, body });
    const stale = await send({ version: 1 });
    expect(stale).toMatchObject({ status: 409, body: { code: 'conflict' } });
    expect(contracts.itemSchema.parse(stale.body.current).revision.version).toBe(2);
    for (const reviewerId of [setter.id, person.id])
      expect(await send({ version: 2, reviewerId })).toMatchObject({
        status: 422,
        body: { fields: [{ path: 'reviewerId' }] },
      });
    expect((await send({ version: 2, reviewerId: 999_999 })).status).toBe(404);
    expect(await open(writer, made.id)).toMatchObject({ state: 'drafting', reviewId: null });
  });

  it('happens once when it is asked for twice at one moment', async () => {
    const { writer, made } = await bench();
    const replies = await Promise.all(
      [1, 2].map(() =>
        writer.attempt(contracts.sendToReview, { params: { itemId: made.id }, body: { version: 2 } }),
      ),
    );
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409]);
    expect(await database.select().from(reviewTable)).toHaveLength(1);
  });

  it('closes the draft until it is taken back, and then a new revision begins', async () => {
    const { writer, made } = await bench();
    await sendItem(writer, made.id);
    const params = { itemId: made.id };
    const { revision } = await open(writer, made.id);
    const save = await writer.attempt(contracts.saveDraft, {
      params,
      body: { version: revision.version, content: gunContent({ title: 'Changed' }) },
    });
    expect(save).toMatchObject({ status: 409, body: { code: 'notPossible' } });
    expect(save.body.detail).toMatch(/in review/);
    expect((await writer.attempt(contracts.startRevision, { params })).status).toBe(409);
    const unreasoned = await writer.attempt(contracts.recallItem, { params, body: { reason: ' ' } });
    expect(unreasoned.status).toBe(422);
    const back = await writer.call(contracts.recallItem, { params, body: { reason: 'a slip of mine' } });
    expect(back).toMatchObject({ state: 'returned', returnedBecause: null });
    const next = await writer.call(contracts.startRevision, { params });
    expect(next).toMatchObject({
      state: 'drafting',
      revision: { number: 2, content: gunContent() },
      reviewId: null,
      assay: null,
    });
    const { revisions: all } = await writer.call(contracts.listRevisions, { params });
    expect(all.map(({ number, state }) => [number, state])).toEqual([
      [2, 'drafting'],
      [1, 'returned'],
    ]);
  });
});

describe('an approved item', () => {
  it('keeps its approved revision while the next is written, byte for byte', async () => {
    const { client: writer } = await app.signIn(['writer']);
    const { client: reviewer } = await app.signIn(['reviewer']);
    const made = await approvedItem(writer, reviewer, (await makeTopic(database)).id);
    const params = { itemId: made.id };
    const [before] = await database.select().from(revisions).where(eq(revisions.itemId, made.id));
    const next = await writer.call(contracts.startRevision, { params });
    await writer.call(contracts.saveDraft, {
      params,
      body: { version: next.revision.version, content: gunContent({ title: 'Second' }) },
    });
    const item = await open(writer, made.id);
    expect(item).toMatchObject({ state: 'drafting', approvedRevision: { number: 1 } });
    const first = await writer.call(contracts.getRevision, { params: { ...params, number: 1 } });
    expect(first).toMatchObject({ state: 'approved', content: gunContent(), assay: { stale: false } });
    const [after] = await database.select().from(revisions).where(eq(revisions.itemId, made.id));
    expect(after).toEqual(before);
    const none = await writer.attempt(contracts.getRevision, { params: { ...params, number: 9 } });
    expect(none).toMatchObject({ status: 404 });
  });

  it('is withdrawn with a reason by its owner or an administrator, for good', async () => {
    const { client: writer } = await app.signIn(['writer']);
    const { client: reviewer } = await app.signIn(['reviewer']);
    const { client: stranger } = await app.signIn(['writer']);
    const { client: administrator } = await app.signIn(['administrator']);
    const made = await approvedItem(writer, reviewer, (await makeTopic(database)).id);
    const params = { itemId: made.id };
    const body = { reason: 'an ambiguous figure' };
    expect((await stranger.attempt(contracts.withdrawItem, { params, body })).status).toBe(403);
    const gone = await administrator.call(contracts.withdrawItem, { params, body });
    expect(gone).toMatchObject({ state: 'withdrawn', approvedRevision: null });
    for (const endpoint of [contracts.withdrawItem, contracts.startRevision])
      expect((await writer.attempt(endpoint, { params, body })).status).toBe(409);
  });
});

describe('an item whose review a person has taken on', () => {
  it('stays shut to them wherever else they could read it, until the answers are shown', async () => {
    const { writer, made } = await bench(cautionedContent());
    const { client: both } = await app.signIn(['reviewer', 'moderator']);
    const reviewId = await sendItem(writer, made.id);
    const params = { itemId: made.id };
    expect((await open(both, made.id)).code).toBe(made.code);
    await both.call(claimReview, { params: { reviewId } });
    for (const endpoint of [contracts.getItem, contracts.listRevisions, contracts.assayItem]) {
      const reply = await both.attempt(endpoint, { params });
      expect(reply).toMatchObject({ status: 403 });
      expect(reply.body.detail).toMatch(/working this item independently/);
    }
    expect((await both.attempt(contracts.getRevision, { params: { ...params, number: 1 } })).status).toBe(
      403,
    );
    expect((await both.call(contracts.listItems)).rows[0]?.worstFinding).toBeNull();
    expect((await both.call(contracts.listItems, { query: { finding: 'caution' } })).total).toBe(0);
    // The claim of another reviewer changes nothing for the writer.
    expect((await writer.call(contracts.listItems)).rows[0]?.worstFinding).toBe('caution');
  });

  it('opens to them once they have worked it', async () => {
    const { writer, made } = await bench(cautionedContent());
    const { client: both } = await app.signIn(['reviewer', 'moderator']);
    await workReview(both, await sendItem(writer, made.id));
    expect((await open(both, made.id)).code).toBe(made.code);
    expect((await both.call(contracts.listItems)).rows[0]?.worstFinding).toBe('caution');
  });
});
