import { unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { getDesk } from '#shared/contracts/desk.ts';
import * as items from '#shared/contracts/items.ts';
import * as papers from '#shared/contracts/papers.ts';
import { listRecords } from '#shared/contracts/records.ts';
import * as reviews from '#shared/contracts/reviews.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import { gunAnswers, gunContent, printedVolts, startEngine } from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(async () => {
  await emptyTables(database);
  await startEngine(app);
}, 150_000);
afterAll(() => app.close());

const waits = async (client: Client) =>
  (await client.call(getDesk)).groups.flatMap(({ entries }) => entries.map(({ code }) => code));

async function documentText(client: Client, paperId: number, kind: papers.ExportKind): Promise<string> {
  const reply = await client.agent.get(`/api/papers/${paperId}/exports/${kind}`).responseType('blob');
  expect(reply.status).toBe(200);
  const body = unzipSync(new Uint8Array(reply.body as Buffer))['word/document.xml'];
  return new TextDecoder().decode(body).replace(/<[^>]+>/g, '');
}

describe('one item, from a blank page to the sealed paper', () => {
  it('goes the whole way through the hands of four people', async () => {
    const [{ client: writer }, { client: reviewer }, { client: setter }, { client: moderator }] =
      await Promise.all([
        app.signIn(['writer']),
        app.signIn(['reviewer']),
        app.signIn(['setter']),
        app.signIn(['moderator']),
      ]);
    const topic = await makeTopic(database);

    // The writer begins with a mistake, which the assay finds, and mends it.
    const { id: itemId, code } = await writer.call(items.createItem, {
      body: { title: 'A gun', topicId: topic.id },
    });
    const item = { itemId };
    expect(await waits(writer)).toEqual([code]);
    const content = gunContent();
    const faulty = gunContent({ script: content.script.replace('sqrt(2 *', 'sqrt(') });
    await writer.call(items.saveDraft, { params: item, body: { version: 1, content: faulty } });
    const { report } = await writer.call(items.assayItem, { params: item });
    expect(report.findings.some(({ severity }) => severity === 'blocker')).toBe(true);
    const refused = await writer.attempt(items.sendToReview, { params: item, body: { version: 2 } });
    expect(refused.body.detail).toMatch(/blocker/);
    await writer.call(items.saveDraft, { params: item, body: { version: 2, content } });
    const sent = await writer.call(items.sendToReview, { params: item, body: { version: 3 } });
    expect(sent.state).toBe('inReview');

    // The reviewer works it without the answers and sends it back with a reason.
    const review = { reviewId: sent.reviewId ?? 0 };
    expect(await waits(reviewer)).toEqual([code]);
    await reviewer.call(reviews.claimReview, { params: review });
    await reviewer.call(reviews.addComment, {
      params: review,
      body: { anchor: 'why', text: 'Say what the electrons would meet.' },
    });
    await reviewer.call(reviews.decideReview, {
      params: review,
      body: { decision: 'returned', reason: 'Part (c) is too open.' },
    });
    expect(await waits(writer)).toEqual([code]);

    // The writer answers in a second revision, and the reviewer approves that.
    const second = await writer.call(items.startRevision, { params: item });
    expect(second).toMatchObject({ returnedBecause: 'Part (c) is too open.', revision: { number: 2 } });
    const mended = gunContent({ stem: `${content.stem} The air has been pumped out.` });
    const saved = await writer.call(items.saveDraft, {
      params: item,
      body: { version: second.revision.version, content: mended },
    });
    const again = await writer.call(items.sendToReview, { params: item, body: { version: saved.version } });
    const secondReview = { reviewId: again.reviewId ?? 0 };
    const { sheet } = await reviewer.call(reviews.claimReview, { params: secondReview });
    const answers = gunAnswers(printedVolts(sheet));
    for (const [partId, text] of Object.entries(answers))
      await reviewer.call(reviews.addWorking, { params: secondReview, body: { partId, text } });
    await reviewer.call(reviews.revealReview, { params: secondReview });
    const decided = await reviewer.call(reviews.decideReview, {
      params: secondReview,
      body: { decision: 'approved' },
    });
    expect(decided.decision).toBe('approved');

    // The setter puts it on a paper and proposes it; the moderator confirms.
    const made = await setter.call(papers.createPaper, { body: { title: 'Beams', targetMarks: 6 } });
    const params = { paperId: made.id };
    const placed = await setter.call(papers.savePaperPlaces, {
      params,
      body: { version: made.version, places: [{ itemId, draw: null }] },
    });
    expect(placed).toMatchObject({ marks: 6, findings: [], places: [{ revision: 2 }] });
    const proposed = await setter.call(papers.proposePaper, { params, body: { version: placed.version } });
    expect(await waits(moderator)).toEqual([made.code]);
    const alone = await setter.attempt(papers.sealPaper, { params, body: { version: proposed.version } });
    expect(alone.status).toBe(403);
    const sealed = await moderator.call(papers.sealPaper, { params, body: { version: proposed.version } });
    expect(sealed.seal).toMatchObject({ intact: true });

    // What prints holds the item and, in the mark scheme alone, its answers at the paper's draw.
    const { sheet: printed } = await setter.call(papers.getPaperSheet, { params });
    const volts = printedVolts(printed);
    const questions = await documentText(setter, made.id, 'question-paper');
    const scheme = await documentText(setter, made.id, 'mark-scheme');
    expect(questions).toContain('The air has been pumped out.');
    expect(questions).toContain(`${volts}\u202FV`);
    const figures = Number(gunAnswers(volts).speed.split('e')[0]).toFixed(2);
    expect(scheme).toContain(figures);
    expect(questions).not.toContain('halving overlooked');

    // Everything stands in the records, in order, and nothing of the content does.
    const { client: administrator } = await app.signIn(['administrator']);
    const { rows } = await administrator.call(listRecords, { query: { pageSize: 200 } });
    const told = rows.map(({ event }) => event).reverse();
    const wanted = [
      'item.created',
      'item.assayed',
      'item.sent',
      'review.claimed',
      'review.commented',
      'item.returned',
      'item.revisionStarted',
      'item.sent',
      'review.claimed',
      'review.worked',
      'review.revealed',
      'item.approved',
      'paper.created',
      'paper.edited',
      'paper.proposed',
      'paper.sealed',
      'paper.viewed',
      'paper.exported',
    ];
    let from = 0;
    for (const event of wanted) {
      const at = told.indexOf(event, from);
      expect([event, at]).not.toEqual([event, -1]);
      from = at + 1;
    }
    expect(JSON.stringify(rows)).not.toMatch(/workdone|halving|Work out/);
  }, 120_000);
});
