import type { Request } from 'express';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { assays, reviews } from '#server/db/schema/index.ts';
import { checkItem, viewDraw } from '#shared/contracts/checking.ts';
import { getItem } from '#shared/contracts/items.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeReview, makeTopic } from '#tests/support/factories.ts';
import { gunContent, printedVolts, startEngine, writeItem } from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(() => startEngine(app), 120_000);
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

async function bench() {
  const { client: writer, person } = await app.signIn(['writer']);
  const made = await writeItem(writer, (await makeTopic(database)).id);
  return { writer, person, params: { itemId: made.id } };
}

describe('looking at a draw of unsaved content', () => {
  it('gives sheet, mark scheme and values, and saves nothing', async () => {
    const { writer, params } = await bench();
    const content = gunContent({ title: 'Not saved' });
    const view = await writer.call(viewDraw, { params, body: { content, draw: 25 } });
    expect(view).toMatchObject({ draw: 25, kept: true, gridSize: 25, diagnostics: [] });
    // The twenty-fifth of 410 V to 890 V in steps of 20 V.
    expect(printedVolts(view.sheet)).toBe(890);
    expect(view.sheet.title).toBe('Not saved');
    expect((await writer.call(getItem, { params })).revision.content.title).toBe(gunContent().title);
  });

  it('tells the mistakes of a script where they stand instead of failing', async () => {
    const { writer, params } = await bench();
    const content = gunContent({ script: 'Va = draw(410 V, 890 V, 20 V)\nworkdone = Va + 1 m' });
    const view = await writer.call(viewDraw, { params, body: { content } });
    expect(view.diagnostics[0]).toMatchObject({ severity: 'error', span: { line: 2 } });
  });
});

describe('checking unsaved content', () => {
  it('assays it and stores nothing', async () => {
    const { writer, params } = await bench();
    const { view, report } = await writer.call(checkItem, { params, body: { content: gunContent() } });
    expect(view.draw).toBeGreaterThanOrEqual(1);
    expect(report).toMatchObject({ gridSize: 25, exhaustive: true });
    expect(await database.select().from(assays)).toEqual([]);
  });

  it('is shut to the person who works the item independently', async () => {
    const { params, person } = await bench();
    const { client: both, person: reviewer } = await app.signIn(['reviewer', 'writer']);
    const [revision] = await database.query.revisions.findMany();
    await makeReview(database, { id: params.itemId, revisionId: revision?.id ?? 0 }, person.id, {
      reviewerId: reviewer.id,
      stage: 'working',
    });
    for (const endpoint of [viewDraw, checkItem]) {
      const reply = await both.attempt(endpoint, { params, body: { content: gunContent() } });
      expect(reply).toMatchObject({ status: 403, body: { code: 'notAllowed' } });
    }
    await database.update(reviews).set({ stage: 'revealed' });
    expect((await both.attempt(viewDraw, { params, body: { content: gunContent() } })).status).toBe(200);
  });

  it.each([
    ['a draw below nought', { content: gunContent(), draw: -1 }],
    ['a draw that is no whole number', { content: gunContent(), draw: 1.5 }],
    ['content that is none', { content: 'text' }],
  ])('refuses %s', async (_name, body) => {
    const { writer, params } = await bench();
    expect((await writer.attempt(checkItem, { params, body })).status).toBe(422);
  });

  it('hands the engine a signal that is aborted when the client goes away', async () => {
    const signals: (AbortSignal | undefined)[] = [];
    const leaving = new AbortController();
    // The client goes while both tasks are asked for: an engine that is quick could be done a moment later.
    const handed = (signal: AbortSignal | undefined) => {
      signals.push(signal);
      if (signals.length === 2) leaving.abort(new Error('the client left'));
    };
    const { engine } = app.context;
    const watched = openTestApp(
      {},
      {
        engine: {
          ...engine,
          assay: (content, options) => {
            handed(options?.signal);
            return engine.assay(content, options);
          },
          viewDraw: (content, draw, figures, options) => {
            handed(options?.signal);
            return engine.viewDraw(content, draw, figures, options);
          },
        },
      },
    );
    const { person, params } = await bench();
    const route = watched.routes.find(({ contract }) => contract.path === checkItem.path);
    const request = { params, query: {}, body: { content: gunContent() } };
    const answer = route?.answer({
      actor: { ...person, sessionRef: 'session' },
      file: null,
      signal: leaving.signal,
      address: '127.0.0.1',
      request: request as unknown as Request,
    });
    await expect(answer).rejects.toThrow('the client left');
    expect(signals).toEqual([leaving.signal, leaving.signal]);
  });
});
