import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { independentWorkings, outgoingMail } from '#server/db/schema/index.ts';
import * as items from '#shared/contracts/items.ts';
import * as contracts from '#shared/contracts/reviews.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import {
  approve,
  cautionedContent,
  gunAnswers,
  gunContent,
  printedVolts,
  sendItem,
  startEngine,
  workReview,
  writeItem,
} from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(() => startEngine(app), 150_000);
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

/** An item in review, with its writer and a reviewer who has not claimed it. */
async function waiting(content?: ItemContent) {
  const { client: writer } = await app.signIn(['writer']);
  const { client: reviewer, person } = await app.signIn(['reviewer']);
  const made = await writeItem(writer, (await makeTopic(database)).id, content);
  const reviewId = await sendItem(writer, made.id);
  return { writer, reviewer, person, made, reviewId, params: { reviewId } };
}

async function claimed(content?: ItemContent) {
  const stage = await waiting(content);
  const review = await stage.reviewer.call(contracts.claimReview, { params: stage.params });
  return { ...stage, review, answers: gunAnswers(printedVolts(review.sheet)) };
}

const WRONG = '3.0e-19 J';
const work = (client: Client, reviewId: number, partId: string, text: string) =>
  client.attempt(contracts.addWorking, { params: { reviewId }, body: { partId, text } });

describe('the queue', () => {
  it('shows what waits, to the reviewer as something to claim and to the writer as theirs', async () => {
    const { writer, reviewer, made, reviewId } = await waiting();
    const { reviews } = await reviewer.call(contracts.listReviews);
    expect(reviews).toMatchObject([
      { id: reviewId, itemCode: made.code, stage: 'waiting', reviewer: null, marks: 6, revision: 1 },
    ]);
    expect(reviews[0]?.abilities).toContain('review.claim');
    const own = await writer.call(contracts.listReviews, { query: { scope: 'mine' } });
    expect(own.reviews.map(({ id }) => id)).toEqual([reviewId]);
    expect(own.reviews[0]?.abilities).not.toContain('review.claim');
    expect((await reviewer.call(contracts.listReviews, { query: { scope: 'decided' } })).reviews).toEqual([]);
  });

  it('shows no sheet before the claim', async () => {
    const { reviewer, params } = await waiting();
    const review = await reviewer.call(contracts.getReview, { params });
    expect(review).toMatchObject({ stage: 'waiting', sheet: null, reveal: null, numericParts: [] });
    expect(await reviewer.attempt(contracts.getReview, { params: { reviewId: 999_999 } })).toMatchObject({
      status: 404,
    });
  });

  it('gives a review to one of two who claim it at the same moment', async () => {
    const { reviewer, params } = await waiting();
    const { client: second } = await app.signIn(['reviewer']);
    const replies = await Promise.all(
      [reviewer, second].map((client) => client.attempt(contracts.claimReview, { params })),
    );
    const lost = replies.find((reply) => reply.status !== 200);
    expect(replies.filter((reply) => reply.status === 200)).toHaveLength(1);
    // Whoever comes later finds it addressed to the other person.
    expect([403, 409]).toContain(lost?.status);
  });

  it('lets nobody review what they wrote, whatever their roles', async () => {
    const { client: both } = await app.signIn(['writer', 'reviewer', 'administrator']);
    const made = await writeItem(both, (await makeTopic(database)).id);
    const reviewId = await sendItem(both, made.id);
    const reply = await both.attempt(contracts.claimReview, { params: { reviewId } });
    expect(reply).toMatchObject({
      status: 403,
      body: { detail: 'You wrote some of this item, so another person must review it.' },
    });
  });

  it('keeps an addressed review for the person it is addressed to', async () => {
    const { client: writer } = await app.signIn(['writer']);
    const { client: chosen, person } = await app.signIn(['reviewer']);
    const { client: other } = await app.signIn(['reviewer']);
    const made = await writeItem(writer, (await makeTopic(database)).id);
    const params = { reviewId: await sendItem(writer, made.id, person.id) };
    expect((await other.attempt(contracts.claimReview, { params })).status).toBe(403);
    expect((await chosen.attempt(contracts.claimReview, { params })).status).toBe(200);
  });
});

describe('the independent working', () => {
  it('is at a draw that the server chose, on a sheet without answers', async () => {
    const { review } = await claimed();
    expect(review).toMatchObject({ stage: 'working', reveal: null, workings: [] });
    expect(review.draw).toBeGreaterThanOrEqual(1);
    expect(review.draw).toBeLessThanOrEqual(25);
    // The speed is above 1.3e7 m/s, so that draws below 480.6 V are not kept: eV = ½mv² by CODATA 2022.
    expect(printedVolts(review.sheet)).toBeGreaterThan(480);
    expect(review.numericParts.map(({ letter, unit }) => [letter, unit])).toEqual([
      ['a', 'J'],
      ['b', 'm s^-1'],
    ]);
  });

  it('is told only whether it agrees', async () => {
    const { reviewer, reviewId, answers } = await claimed();
    const wrong = await work(reviewer, reviewId, 'work', WRONG);
    expect(contracts.reviewSchema.parse(wrong.body).workings).toMatchObject([
      {
        partId: 'work',
        attempt: 1,
        text: WRONG,
        agrees: false,
        remark: 'Your working does not agree with the checker.',
      },
    ]);
    const right = await work(reviewer, reviewId, 'work', answers.work);
    expect(contracts.reviewSchema.parse(right.body).workings[1]).toMatchObject({ attempt: 2, agrees: true });
    expect(await work(reviewer, reviewId, 'work', answers.work)).toMatchObject({
      status: 409,
      body: { detail: 'Your working of this part agrees already.' },
    });
  });

  it('takes no try for what cannot be read or measures another thing', async () => {
    const { reviewer, reviewId, params } = await claimed();
    for (const text of ['quite fast', '3.0e-17 kg', '1.2e-17 J or 1.3e-17 J']) {
      const reply = await work(reviewer, reviewId, 'work', text);
      expect(reply).toMatchObject({ status: 422, body: { fields: [{ path: 'text' }] } });
      expect(reply.body.detail).toMatch(/^[A-Z].*\.$/);
    }
    expect((await reviewer.call(contracts.getReview, { params })).workings).toEqual([]);
  });

  it('has two tries, then may be held to', async () => {
    const { reviewer, reviewId, params } = await claimed();
    const dispute = () => reviewer.attempt(contracts.disputePart, { params, body: { partId: 'work' } });
    expect((await dispute()).status).toBe(409);
    await work(reviewer, reviewId, 'work', WRONG);
    expect(await dispute()).toMatchObject({
      status: 409,
      body: { detail: 'Try this part once more before you hold to your working.' },
    });
    await work(reviewer, reviewId, 'work', WRONG);
    expect(await work(reviewer, reviewId, 'work', WRONG)).toMatchObject({
      status: 409,
      body: { detail: 'Both tries at this part are used. You can hold to your working.' },
    });
    expect(contracts.reviewSchema.parse((await dispute()).body).workings.at(-1)?.disputed).toBe(true);
  });

  it('gives two tries even when they come at the same moment', async () => {
    const { reviewer, reviewId } = await claimed();
    const replies = await Promise.all([1, 2, 3, 4].map(() => work(reviewer, reviewId, 'work', WRONG)));
    expect(replies.filter((reply) => reply.status === 200)).toHaveLength(2);
    expect(await database.select().from(independentWorkings)).toHaveLength(2);
  });

  it('is refused for a written part, an unknown part and anybody else', async () => {
    const { writer, reviewer, reviewId } = await claimed();
    const { client: other } = await app.signIn(['reviewer']);
    expect((await work(reviewer, reviewId, 'why', '1 J')).status).toBe(422);
    expect((await work(reviewer, reviewId, 'nothing', '1 J')).status).toBe(422);
    expect((await work(reviewer, reviewId, 'work', ' ')).status).toBe(422);
    expect((await work(other, reviewId, 'work', '1 J')).status).toBe(403);
    expect((await work(writer, reviewId, 'work', '1 J')).status).toBe(403);
  });

  it('starts afresh when another person takes the review on', async () => {
    const { reviewer, reviewId, params, answers } = await claimed();
    await work(reviewer, reviewId, 'work', answers.work);
    await reviewer.call(contracts.releaseReview, { params });
    const { client: second } = await app.signIn(['reviewer']);
    const review = await second.call(contracts.claimReview, { params });
    expect(review.workings).toEqual([]);
    const own = gunAnswers(printedVolts(review.sheet));
    await work(second, reviewId, 'speed', own.speed);
    // What the first person worked out is not the second person's working.
    expect(await second.attempt(contracts.revealReview, { params })).toMatchObject({ status: 409 });
    const again = contracts.reviewSchema.parse((await work(second, reviewId, 'work', own.work)).body);
    expect(again.workings.map(({ partId, attempt }) => [partId, attempt])).toEqual([
      ['speed', 1],
      ['work', 1],
    ]);
    expect(await database.select().from(independentWorkings)).toHaveLength(3);
    expect((await reviewer.attempt(contracts.getReview, { params })).status).toBe(403);
  });
});

describe('the reveal', () => {
  it('waits for a working of every numeric part, and names those that lack one', async () => {
    const { reviewer, reviewId, params, answers } = await claimed();
    const reveal = () => reviewer.attempt(contracts.revealReview, { params });
    expect((await reveal()).body.detail).toContain('Parts (a), (b)');
    await work(reviewer, reviewId, 'work', answers.work);
    await work(reviewer, reviewId, 'speed', '1 m/s');
    await work(reviewer, reviewId, 'speed', '2 m/s');
    expect((await reveal()).body.detail).toContain('Part (b) has no working yet');
    await reviewer.call(contracts.disputePart, { params, body: { partId: 'speed' } });
    const shown = contracts.reviewSchema.parse((await reveal()).body);
    expect(shown.reveal).toMatchObject({ content: gunContent(), assayStale: false, previous: null });
    expect(shown.reveal?.scheme.parts[1]?.guidance).toMatchObject([{ name: 'halving overlooked' }]);
    expect((await reveal()).status).toBe(409);
    expect((await work(reviewer, reviewId, 'speed', answers.speed)).status).toBe(409);
    expect((await reviewer.attempt(contracts.releaseReview, { params })).status).toBe(409);
  });

  it('shows the last approved revision beside the next', async () => {
    const { writer, reviewer, made, reviewId } = await waiting();
    await workReview(reviewer, reviewId);
    await approve(reviewer, reviewId);
    const next = await writer.call(items.startRevision, { params: { itemId: made.id } });
    const content = gunContent({ title: 'Second' });
    await writer.call(items.saveDraft, {
      params: { itemId: made.id },
      body: { version: next.revision.version, content },
    });
    const shown = await workReview(reviewer, await sendItem(writer, made.id));
    expect(shown.reveal?.previous).toEqual({ revision: 1, content: gunContent() });
  });

  it('never comes for a review that was taken back before it', async () => {
    const { writer, reviewer, made, params } = await claimed();
    await writer.call(items.recallItem, {
      params: { itemId: made.id },
      body: { reason: 'an oversight of mine' },
    });
    const over = await reviewer.call(contracts.getReview, { params });
    expect(over).toMatchObject({ stage: 'decided', decision: 'recalled', reveal: null, sheet: null });
  });
});

describe('comments', () => {
  it('are for reviewer and writers, anchored to what exists, and stay', async () => {
    const { writer, reviewer, params } = await claimed();
    const { client: other } = await app.signIn(['reviewer', 'writer']);
    const say = (client: Client, anchor: string, text = 'Which p.d. is meant?') =>
      client.attempt(contracts.addComment, { params, body: { anchor, text } });
    expect((await say(reviewer, 'work')).status).toBe(200);
    expect((await say(writer, '')).status).toBe(200);
    expect((await say(other, 'work')).status).toBe(403);
    expect((await say(reviewer, 'nowhere')).status).toBe(422);
    expect((await say(reviewer, 'stem', '  ')).status).toBe(422);
    const { comments } = await writer.call(contracts.getReview, { params });
    expect(comments.map(({ anchor }) => anchor)).toEqual(['work', '']);
  });
});

describe('the decision', () => {
  const decide = (client: Client, reviewId: number, body: object) =>
    client.attempt(contracts.decideReview, { params: { reviewId }, body });

  it('approves a worked item, tells the writer by a letter without content, and is final', async () => {
    const { writer, reviewer, made, reviewId } = await waiting();
    await workReview(reviewer, reviewId);
    const decided = await approve(reviewer, reviewId);
    expect(decided).toMatchObject({ stage: 'decided', decision: 'approved' });
    const item = await writer.call(items.getItem, { params: { itemId: made.id } });
    expect(item).toMatchObject({ state: 'approved', approvedRevision: { number: 1 } });
    const letters = await database.select().from(outgoingMail);
    expect(letters.map(({ kind }) => kind)).toEqual(['reviewDecided']);
    expect(JSON.stringify(letters)).not.toContain(gunContent().title);
    expect((await decide(reviewer, reviewId, { decision: 'returned', reason: 'No.' })).status).toBe(409);
  });

  it('is not to be had before the working', async () => {
    const { reviewer, reviewId } = await claimed();
    const reply = await decide(reviewer, reviewId, { decision: 'approved' });
    expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
  });

  it('returns an item with a reason that the writer reads, also while writing the next revision', async () => {
    const { writer, reviewer, made, reviewId } = await waiting();
    await workReview(reviewer, reviewId);
    expect(await decide(reviewer, reviewId, { decision: 'returned', reason: ' ' })).toMatchObject({
      status: 422,
      body: { fields: [{ path: 'reason' }] },
    });
    const reason = 'Part (b) does not say where.';
    expect((await decide(reviewer, reviewId, { decision: 'returned', reason })).status).toBe(200);
    const params = { itemId: made.id };
    expect(await writer.call(items.getItem, { params })).toMatchObject({
      state: 'returned',
      returnedBecause: reason,
    });
    expect(await writer.call(items.startRevision, { params })).toMatchObject({
      state: 'drafting',
      returnedBecause: reason,
      revision: { number: 2 },
    });
  });

  it('can return an item that cannot be worked, and shows no answers for it', async () => {
    const { reviewer, reviewId } = await claimed();
    const reply = await decide(reviewer, reviewId, { decision: 'returned', reason: 'No p.d. is given.' });
    expect(contracts.reviewSchema.parse(reply.body)).toMatchObject({ stage: 'decided', reveal: null });
  });

  it('waits until a dispute is settled with a reason', async () => {
    const { reviewer, reviewId, params, answers } = await claimed();
    await work(reviewer, reviewId, 'speed', answers.speed);
    for (const text of [WRONG, WRONG]) await work(reviewer, reviewId, 'work', text);
    await reviewer.call(contracts.disputePart, { params, body: { partId: 'work' } });
    await reviewer.call(contracts.revealReview, { params });
    const hindered = await decide(reviewer, reviewId, { decision: 'approved' });
    expect(hindered).toMatchObject({ status: 409 });
    expect(hindered.body.detail).toMatch(/disagrees with the checker in 1 part/);
    const settle = (partId: string, reason: string) =>
      reviewer.attempt(contracts.settlePart, { params, body: { partId, reason } });
    expect((await settle('work', '')).status).toBe(422);
    expect((await settle('speed', 'no need')).status).toBe(409);
    expect((await settle('work', 'I took the charge of two electrons.')).status).toBe(200);
    expect((await decide(reviewer, reviewId, { decision: 'approved' })).status).toBe(200);
  });

  it('waits until every caution has the writer’s or the reviewer’s reason', async () => {
    const { writer, reviewer, reviewId } = await waiting(cautionedContent());
    const { reveal } = await workReview(reviewer, reviewId);
    const cautions = reveal?.report.findings.filter((finding) => finding.severity === 'caution') ?? [];
    expect(cautions.length).toBeGreaterThan(0);
    expect(await decide(writer, reviewId, { decision: 'approved' })).toMatchObject({ status: 403 });
    const open = await decide(reviewer, reviewId, { decision: 'approved' });
    expect(open.body.detail).toMatch(/neither cured nor accepted with a reason/);
    const blank = Object.fromEntries(cautions.map(({ key }) => [key, '  ']));
    expect((await decide(reviewer, reviewId, { decision: 'approved', acceptedCautions: blank })).status).toBe(
      409,
    );
    const reasons = Object.fromEntries(cautions.map(({ key }) => [key, 'The figure asks it.']));
    const done = await decide(reviewer, reviewId, { decision: 'approved', acceptedCautions: reasons });
    expect(done.status).toBe(200);
  });
});
