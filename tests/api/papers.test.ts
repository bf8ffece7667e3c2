import { eq } from 'drizzle-orm';
import { unzipSync } from 'fflate';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { auditEvents, figures, outgoingMail, seals } from '#server/db/schema/index.ts';
import { figureSchema } from '#shared/contracts/figures.ts';
import * as items from '#shared/contracts/items.ts';
import * as contracts from '#shared/contracts/papers.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import { png } from '#tests/support/pictures.ts';
import {
  approve,
  approvedItem,
  assemblePaper,
  gunContent,
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

/** A bank with one approved item, its people, a setter and a moderator. */
async function bank(content?: ItemContent) {
  const { client: writer } = await app.signIn(['writer']);
  const { client: reviewer } = await app.signIn(['reviewer']);
  const { client: setter } = await app.signIn(['setter']);
  const { client: moderator } = await app.signIn(['moderator']);
  const topic = await makeTopic(database);
  const made = await approvedItem(writer, reviewer, topic.id, content);
  return { writer, reviewer, setter, moderator, topic, made };
}

const codesOf = (paper: contracts.Paper) => paper.findings.map(({ code }) => code);
const open = (client: Client, paperId: number) => client.call(contracts.getPaper, { params: { paperId } });

async function sealed() {
  const stage = await bank();
  const paper = await assemblePaper(stage.setter, [stage.made.id]);
  const params = { paperId: paper.id };
  const proposed = await stage.setter.call(contracts.proposePaper, {
    params,
    body: { version: paper.version },
  });
  const done = await stage.moderator.call(contracts.sealPaper, {
    params,
    body: { version: proposed.version },
  });
  return { ...stage, params, paper: done };
}

async function download(client: Client, paperId: number, kind: contracts.ExportKind) {
  const reply = await client.agent.get(`/api/papers/${paperId}/exports/${kind}`).responseType('blob');
  expect(reply.status).toBe(200);
  const bytes = new Uint8Array(reply.body as Buffer);
  const files = unzipSync(bytes);
  const text = (name: string) => new TextDecoder().decode(files[name]);
  const all = Object.keys(files)
    .filter((name) => /^word\/(document|header\d*|footer\d*)\.xml$/.test(name))
    .map(text)
    .join('');
  return {
    name: String(reply.headers['content-disposition']),
    all,
    bytes,
    type: reply.headers['content-type'],
  };
}

describe('a new paper', () => {
  it('is coded by the next number, however many are begun at once', async () => {
    const { client } = await app.signIn(['setter']);
    const made = await Promise.all(
      Array.from({ length: 4 }, () => client.call(contracts.createPaper, { body: { title: 'Fields' } })),
    );
    expect(made.map(({ code }) => code).sort()).toEqual(['P-001', 'P-002', 'P-003', 'P-004']);
    expect(made[0]).toMatchObject({
      state: 'assembling',
      targetMarks: 60,
      durationMinutes: 75,
      places: [],
      marks: 0,
      seal: null,
    });
    expect(made.map(codesOf)).toEqual(Array.from({ length: 4 }, () => ['no-items']));
  });

  it.each([
    [{ title: ' ' }, 'title'],
    [{ title: 'Fields', targetMarks: 0 }, 'targetMarks'],
    [{ title: 'Fields', durationMinutes: 'long' }, 'durationMinutes'],
  ])('is refused with %j', async (body, path) => {
    const { client } = await app.signIn(['setter']);
    const reply = await client.attempt(contracts.createPaper, { body });
    expect(reply).toMatchObject({ status: 422, body: { fields: [{ path }] } });
    expect((await client.call(contracts.listPapers)).papers).toEqual([]);
  });
});

describe('the running order', () => {
  it('takes approved revisions, with draws that the server chooses and the script keeps', async () => {
    const { setter, made, topic } = await bank();
    const paper = await assemblePaper(setter, [made.id]);
    expect(paper.places).toMatchObject([
      { position: 1, itemCode: made.code, revision: 1, newerRevision: null, marks: 6, gridSize: 25 },
    ]);
    expect(paper).toMatchObject({ marks: 6, findings: [], marksByTopic: [{ marks: 6 }] });
    expect(paper.marksByTopic[0]?.topic.id).toBe(topic.id);
    // 490 V, the fifth of the grid, is the first that gives more than 1.3e7 m/s.
    expect(paper.places[0]?.draw).toBeGreaterThanOrEqual(5);
    const { papers } = await setter.call(contracts.listPapers);
    expect(papers).toMatchObject([{ code: paper.code, items: 1, marks: 6 }]);
    const { rows } = await setter.call(items.listItems);
    expect(rows[0]?.usedOn).toBe(1);
  });

  it('refuses drafts, unknown items, an item twice and a draw that there is not; nothing changes', async () => {
    const { writer, setter, made, topic } = await bank();
    const draft = await writeItem(writer, topic.id);
    const paper = await assemblePaper(setter, [made.id]);
    const save = (places: object[]) =>
      setter.attempt(contracts.savePaperPlaces, {
        params: { paperId: paper.id },
        body: { version: paper.version, places },
      });
    const place = { itemId: made.id, draw: 7 };
    for (const [places, path] of [
      [[place, { itemId: draft.id, draw: null }], 'places.1.itemId'],
      [[{ itemId: 999_999, draw: null }], 'places.0.itemId'],
      [[place, place], 'places.1.itemId'],
      [[{ ...place, draw: 26 }], 'places.0.draw'],
      [[{ ...place, draw: 0 }], 'places.0.draw'],
      [[{ ...place, draw: -1 }], 'places.0.draw'],
    ] as const) {
      expect(await save([...places])).toMatchObject({ status: 422, body: { fields: [{ path }] } });
    }
    expect(await open(setter, paper.id)).toMatchObject({ version: paper.version, places: paper.places });
  });

  it('is never overwritten by a stale one', async () => {
    const { setter, made } = await bank();
    const paper = await assemblePaper(setter, [made.id]);
    const params = { paperId: paper.id };
    const { version, title, subtitle, targetMarks, durationMinutes, instructions } = paper;
    const details = { title, subtitle, targetMarks, durationMinutes, instructions };
    await setter.call(contracts.savePaperDetails, {
      params,
      body: { ...details, title: 'Renamed', version },
    });
    for (const reply of [
      await setter.attempt(contracts.savePaperPlaces, { params, body: { version, places: [] } }),
      await setter.attempt(contracts.savePaperDetails, { params, body: { ...details, version } }),
    ]) {
      expect(reply).toMatchObject({ status: 409, body: { code: 'conflict' } });
      const current = contracts.paperSchema.parse(reply.body.current);
      expect(current).toMatchObject({ title: 'Renamed', version: version + 1, places: paper.places });
    }
    const both = await Promise.all(
      ['One', 'Two'].map((name) =>
        setter.attempt(contracts.savePaperDetails, {
          params,
          body: { ...details, title: name, version: version + 1 },
        }),
      ),
    );
    expect(both.map((reply) => reply.status).sort()).toEqual([200, 409]);
  });

  it('keeps the revision that it took until the newest is asked for', async () => {
    const { writer, reviewer, setter, made } = await bank();
    const paper = await assemblePaper(setter, [made.id]);
    const next = await writer.call(items.startRevision, { params: { itemId: made.id } });
    await writer.call(items.saveDraft, {
      params: { itemId: made.id },
      body: { version: next.revision.version, content: gunContent({ title: 'Second' }) },
    });
    const reviewId = await sendItem(writer, made.id);
    await workReview(reviewer, reviewId);
    await approve(reviewer, reviewId);
    const behind = await open(setter, paper.id);
    expect(behind.places).toMatchObject([{ revision: 1, newerRevision: 2, title: gunContent().title }]);
    expect(codesOf(behind)).toEqual(['newer-revision']);
    const save = (version: number, takeNewest: boolean) =>
      setter.call(contracts.savePaperPlaces, {
        params: { paperId: paper.id },
        body: { version, places: [{ itemId: made.id, draw: 9, takeNewest }] },
      });
    const kept = await save(paper.version, false);
    expect(kept.places[0]).toMatchObject({ revision: 1, draw: 9 });
    expect((await save(kept.version, true)).places[0]).toMatchObject({ revision: 2, title: 'Second' });
  });

  it('chooses other values than another paper has, and tells where an item is used already', async () => {
    const { setter, made } = await bank(
      gunContent({
        script: 'Va = oneOf(510 V, 530 V)\nworkdone = e * Va\nswift = sqrt(2 * workdone / m_e)',
      }),
    );
    const first = await assemblePaper(setter, [made.id]);
    const second = await assemblePaper(setter, [made.id]);
    expect(second.places[0]?.draw).toBe(first.places[0]?.draw === 1 ? 2 : 1);
    expect(codesOf(second)).toEqual(['item-on-other-paper']);
    const same = await setter.call(contracts.savePaperPlaces, {
      params: { paperId: second.id },
      body: {
        version: second.version,
        places: [{ itemId: made.id, draw: first.places[0]?.draw ?? null }],
      },
    });
    expect(same.findings).toMatchObject([{ code: 'same-draw-on-other-paper', severity: 'caution' }]);
  });
});

describe('the paper’s own checks', () => {
  it('find a total off the target and a draw that the script discards, and keep both from being proposed', async () => {
    const { setter, made } = await bank();
    const paper = await assemblePaper(setter, [made.id], 10);
    const saved = await setter.call(contracts.savePaperPlaces, {
      params: { paperId: paper.id },
      body: { version: paper.version, places: [{ itemId: made.id, draw: 1 }] },
    });
    expect(saved.findings).toMatchObject([
      { code: 'total-off-target', severity: 'blocker' },
      { code: 'draw-discarded', severity: 'blocker' },
    ]);
    expect(saved.findings[0]?.statement).toBe('The paper carries 6 marks, 4 short of the target of 10.');
    const reply = await setter.attempt(contracts.proposePaper, {
      params: { paperId: paper.id },
      body: { version: saved.version },
    });
    expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
    expect((await open(setter, paper.id)).state).toBe('assembling');
  });

  it('keep a withdrawn item from being sealed', async () => {
    const { writer, setter, moderator, made } = await bank();
    const paper = await assemblePaper(setter, [made.id]);
    const params = { paperId: paper.id };
    const { version } = await setter.call(contracts.proposePaper, {
      params,
      body: { version: paper.version },
    });
    await writer.call(items.withdrawItem, { params: { itemId: made.id }, body: { reason: 'a flaw' } });
    const reply = await moderator.attempt(contracts.sealPaper, { params, body: { version } });
    expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
    const back = await moderator.call(contracts.returnPaper, {
      params,
      body: { version, reason: 'An item was withdrawn.' },
    });
    expect(back).toMatchObject({ state: 'assembling', proposedBy: null });
    expect(codesOf(back)).toEqual(['item-withdrawn']);
  });
});

describe('sealing', () => {
  it('needs a second person, whoever proposed it and whatever their roles', async () => {
    const { made } = await bank();
    const { client: both } = await app.signIn(['setter', 'moderator', 'administrator']);
    const { client: second } = await app.signIn(['setter']);
    const paper = await assemblePaper(both, [made.id]);
    const params = { paperId: paper.id };
    const early = await second.attempt(contracts.sealPaper, { params, body: { version: paper.version } });
    expect(early).toMatchObject({ status: 409, body: { detail: 'Only a proposed paper can be sealed.' } });
    const { version } = await both.call(contracts.proposePaper, { params, body: { version: paper.version } });
    const alone = await both.attempt(contracts.sealPaper, { params, body: { version } });
    expect(alone).toMatchObject({ status: 403 });
    expect(alone.body.detail).toMatch(/second setter or a moderator must confirm/);
    expect(await database.select().from(seals)).toEqual([]);
    const edit = await both.attempt(contracts.savePaperPlaces, { params, body: { version, places: [] } });
    expect(edit).toMatchObject({ status: 409, body: { code: 'notPossible' } });
    const done = await second.call(contracts.sealPaper, { params, body: { version } });
    expect(done).toMatchObject({ state: 'sealed', seal: { intact: true } });
    expect(done.seal?.proposedBy.id).not.toBe(done.seal?.confirmedBy.id);
  });

  it('happens once when two people confirm at the same moment', async () => {
    const { setter, moderator, made } = await bank();
    const { client: other } = await app.signIn(['moderator']);
    const paper = await assemblePaper(setter, [made.id]);
    const params = { paperId: paper.id };
    const { version } = await setter.call(contracts.proposePaper, {
      params,
      body: { version: paper.version },
    });
    const replies = await Promise.all(
      [moderator, other].map((client) => client.attempt(contracts.sealPaper, { params, body: { version } })),
    );
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409]);
    expect(await database.select().from(seals)).toHaveLength(1);
  });

  it('writes to those who can confirm, and to the proposer, without content', async () => {
    const { setter, moderator, made } = await bank();
    await database.delete(outgoingMail);
    const paper = await assemblePaper(setter, [made.id]);
    const params = { paperId: paper.id };
    const { version } = await setter.call(contracts.proposePaper, {
      params,
      body: { version: paper.version },
    });
    await moderator.call(contracts.sealPaper, { params, body: { version } });
    const letters = await database.select().from(outgoingMail);
    expect(letters.map(({ kind }) => kind)).toEqual(['paperProposed', 'paperSealed']);
    expect(new Set(letters.map(({ personId }) => personId)).size).toBe(2);
    expect(JSON.stringify(letters)).not.toMatch(/gun|Beams/);
  });
});

describe('a sealed paper', () => {
  it('stays as it was sealed when an item gets a new approved revision', async () => {
    const { writer, reviewer, setter, made, params } = await sealed();
    const before = await setter.call(contracts.getPaperSheet, { params });
    const next = await writer.call(items.startRevision, { params: { itemId: made.id } });
    await writer.call(items.saveDraft, {
      params: { itemId: made.id },
      body: { version: next.revision.version, content: gunContent({ title: 'Second' }) },
    });
    const reviewId = await sendItem(writer, made.id);
    await workReview(reviewer, reviewId);
    await approve(reviewer, reviewId);
    await writer.call(items.withdrawItem, { params: { itemId: made.id }, body: { reason: 'a flaw' } });
    expect(await setter.call(contracts.getPaperSheet, { params })).toEqual(before);
    expect(await open(setter, params.paperId)).toMatchObject({
      state: 'sealed',
      places: [{ revision: 1, title: gunContent().title }],
      findings: [],
      seal: { intact: true },
    });
    expect(before.sheet.sealHash).toHaveLength(12);
  });

  it('cannot be changed, returned or sealed again, only released', async () => {
    const { setter, moderator, params, paper } = await sealed();
    const body = { version: paper.version, places: [], reason: 'no', title: 'Other' };
    for (const endpoint of [
      contracts.savePaperPlaces,
      contracts.savePaperDetails,
      contracts.returnPaper,
      contracts.proposePaper,
    ])
      expect(await setter.attempt(endpoint, { params, body })).toMatchObject({ status: 409 });
    expect((await moderator.attempt(contracts.sealPaper, { params, body })).status).toBe(409);
    const released = await setter.call(contracts.releasePaper, { params, body });
    expect(released).toMatchObject({ state: 'released', seal: { sha256: paper.seal?.sha256 } });
  });

  it('prints nothing once the stored content no longer has its hash', async () => {
    const { setter, params } = await sealed();
    const [seal] = await database.select().from(seals);
    const canonical = seal?.canonical.replace('"marks":6', '"marks":7') ?? '';
    await database.update(seals).set({ canonical }).where(eq(seals.paperId, params.paperId));
    expect((await open(setter, params.paperId)).seal?.intact).toBe(false);
    for (const endpoint of [contracts.getPaperSheet, contracts.exportPaper]) {
      const reply = await setter.attempt(endpoint, { params: { ...params, kind: 'question-paper' } });
      expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
      expect(reply.body.detail).toMatch(/no longer what was sealed/);
    }
  });

  it('prints nothing once a picture is no longer the one that was sealed', async () => {
    const { client: writer } = await app.signIn(['writer']);
    const { client: reviewer } = await app.signIn(['reviewer']);
    const { client: setter } = await app.signIn(['setter']);
    const { client: moderator } = await app.signIn(['moderator']);
    const made = await writeItem(writer, (await makeTopic(database)).id);
    const upload = await writer.agent
      .post(`/api/items/${made.id}/figures`)
      .set('x-csrf-token', await writer.csrfToken())
      .attach('file', png(9, 9), 'tube.png');
    const figure = {
      figureId: figureSchema.parse(upload.body).id,
      alternativeText: 'A tube.',
      caption: '',
      widthPercent: 60,
      place: 'stem',
    };
    await writer.call(items.saveDraft, {
      params: { itemId: made.id },
      body: { version: 2, content: gunContent({ figures: [figure] }) },
    });
    const reviewId = await sendItem(writer, made.id);
    await workReview(reviewer, reviewId);
    await approve(reviewer, reviewId);
    const paper = await assemblePaper(setter, [made.id]);
    const params = { paperId: paper.id };
    const { version } = await setter.call(contracts.proposePaper, {
      params,
      body: { version: paper.version },
    });
    await moderator.call(contracts.sealPaper, { params, body: { version } });
    expect(Object.keys(unzipSync((await download(setter, paper.id, 'question-paper')).bytes))).toContainEqual(
      expect.stringMatching(/^word\/media\/.*\.png$/),
    );
    await database.update(figures).set({ content: png(8, 8) });
    const reply = await setter.attempt(contracts.getPaperSheet, { params });
    expect(reply).toMatchObject({ status: 409, body: { code: 'notPossible' } });
  });
});

describe('exports', () => {
  it('are Word files named by code and short hash; the mark scheme tells what the question paper does not', async () => {
    const { setter, params, paper } = await sealed();
    const hash = paper.seal?.sha256.slice(0, 12) ?? '';
    const questions = await download(setter, params.paperId, 'question-paper');
    const scheme = await download(setter, params.paperId, 'mark-scheme');
    expect(questions.type).toContain('wordprocessingml');
    expect(questions.name).toBe(`attachment; filename=${paper.code}-question-paper-${hash}.docx`);
    expect(scheme.name).toContain(`${paper.code}-mark-scheme-${hash}.docx`);
    expect(questions.all).toContain('Work out the speed at the anode.');
    expect(questions.all).toContain(hash);
    expect(questions.all).not.toMatch(/halving overlooked|collisions would slow|DRAFT/);
    expect(scheme.all).toContain('halving overlooked');
    const again = await download(setter, params.paperId, 'question-paper');
    expect(Buffer.compare(Buffer.from(questions.bytes), Buffer.from(again.bytes))).toBe(0);
  }, 90_000);

  it('carry the word DRAFT until there is a seal', async () => {
    const { setter, made } = await bank();
    const paper = await assemblePaper(setter, [made.id]);
    const { name, all } = await download(setter, paper.id, 'question-paper');
    expect(name).toContain(`${paper.code}-question-paper-draft.docx`);
    expect(all).toContain('DRAFT');
  }, 90_000);

  it('are recorded, as every look at the paper is', async () => {
    const { setter, moderator, params, paper } = await sealed();
    await database.delete(auditEvents);
    await open(moderator, params.paperId);
    await moderator.call(contracts.getPaperSheet, { params });
    await download(setter, params.paperId, 'mark-scheme');
    const events = await database.select().from(auditEvents).orderBy(auditEvents.id);
    expect(events.map(({ event, summary }) => [event, summary])).toEqual([
      ['paper.viewed', `Looked at ${paper.code}.`],
      ['paper.viewed', `Read ${paper.code}.`],
      ['paper.exported', expect.stringMatching(/^Exported the mark scheme \([0-9a-f]{12}\) of P-001\.$/)],
    ]);
  }, 90_000);

  it('refuse a kind that there is not, a paper that there is not, and people without papers', async () => {
    const { writer, setter, params } = await sealed();
    const kind = (name: string, paperId = params.paperId) => ({ params: { paperId, kind: name } });
    expect((await setter.attempt(contracts.exportPaper, kind('answers'))).status).toBe(422);
    expect((await setter.attempt(contracts.exportPaper, kind('mark-scheme', 999))).status).toBe(404);
    expect((await writer.attempt(contracts.exportPaper, kind('mark-scheme'))).status).toBe(403);
    expect((await writer.attempt(contracts.getPaper, { params })).status).toBe(403);
  });
});
