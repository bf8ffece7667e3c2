import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { figures as figureTable } from '#server/db/schema/index.ts';
import { figureSchema, getFigureContent, listFigures } from '#shared/contracts/figures.ts';
import { getItem, saveDraft } from '#shared/contracts/items.ts';
import { claimReview } from '#shared/contracts/reviews.ts';
import { problemSchema } from '#shared/errors/app-error.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import { jpeg, png, svg } from '#tests/support/pictures.ts';
import { gunContent, sendItem, startEngine, writeItem } from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(() => startEngine(app), 120_000);
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

async function upload(client: Client, itemId: number, bytes: Buffer, name: string, type: string) {
  return client.agent
    .post(`/api/items/${itemId}/figures`)
    .set('x-csrf-token', await client.csrfToken())
    .attach('file', bytes, { filename: name, contentType: type });
}

async function bench() {
  const { client: writer } = await app.signIn(['writer']);
  const made = await writeItem(writer, (await makeTopic(database)).id);
  return { writer, itemId: made.id };
}

const content = (client: Client, figureId: number) => client.agent.get(`/api/figures/${figureId}/content`);

describe('adding a figure', () => {
  it('takes a picture by what it is, not by its name or type', async () => {
    const { writer, itemId } = await bench();
    const reply = await upload(writer, itemId, png(12, 9), 'tube.svg', 'text/html');
    expect(reply.status).toBe(200);
    const figure = figureSchema.parse(reply.body);
    expect(figure).toMatchObject({
      itemId,
      fileName: 'tube.svg',
      mediaType: 'image/png',
      width: 12,
      height: 9,
    });
    const shown = await content(writer, figure.id);
    expect(shown.headers['content-type']).toBe('image/png');
    expect(Buffer.compare(shown.body as Buffer, png(12, 9))).toBe(0);
  });

  it('serves every picture so that nothing in it can run', async () => {
    const { writer, itemId } = await bench();
    const hostile = svg(
      '<script>alert(1)</script><rect onload="alert(1)" width="2" height="2"/><a href="https://evil.example"><text>x</text></a>',
    );
    const { body } = await upload(writer, itemId, hostile, 'a.svg', 'image/svg+xml');
    const shown = await content(writer, figureSchema.parse(body).id);
    expect(shown.headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'content-type': expect.stringMatching(/^image\/svg\+xml/) as string,
      'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox",
    });
    const text = (shown.body as Buffer).toString('utf8');
    expect(text).toContain('<rect');
    expect(text).not.toMatch(/script|onload|evil|<a/);
  });

  it.each([
    [
      'HTML under a picture’s name',
      Buffer.from('<!doctype html><script>alert(1)</script>'),
      'a.png',
      'image/png',
    ],
    ['a PNG that is damaged', png(5, 5).subarray(0, 30), 'a.png', 'image/png'],
    ['a JPEG without a picture', jpeg(5, 5).subarray(0, 12), 'a.jpg', 'image/jpeg'],
    ['an empty file', Buffer.alloc(0), 'a.png', 'image/png'],
  ])('refuses %s with a sentence, and stores nothing', async (_name, bytes, name, type) => {
    const { writer, itemId } = await bench();
    const reply = await upload(writer, itemId, bytes, name, type);
    expect(reply.status).toBe(415);
    expect(problemSchema.parse(reply.body).detail).toMatch(/^[A-Z].*\.$/);
    expect(await database.select({ id: figureTable.id }).from(figureTable)).toEqual([]);
  });

  it('refuses a file that is too large, or more than one', async () => {
    const { writer, itemId } = await bench();
    const huge = await upload(writer, itemId, Buffer.alloc(4 * 1024 * 1024 + 1), 'a.png', 'image/png');
    expect(huge.status).toBe(413);
    expect(problemSchema.parse(huge.body).detail).toMatch(/larger/);
    const two = await writer.agent
      .post(`/api/items/${itemId}/figures`)
      .set('x-csrf-token', await writer.csrfToken())
      .attach('file', png(5, 5), 'a.png')
      .attach('file', png(6, 6), 'b.png');
    expect(two.status).toBe(400);
    const none = await writer.agent
      .post(`/api/items/${itemId}/figures`)
      .set('x-csrf-token', await writer.csrfToken());
    expect(none.status).toBe(400);
    expect((await writer.call(listFigures, { params: { itemId } })).figures).toEqual([]);
  });

  it('keeps one row of equal pictures and every row of different ones, the newest first', async () => {
    const { writer, itemId } = await bench();
    const first = figureSchema.parse((await upload(writer, itemId, png(5, 5), 'a.png', 'image/png')).body);
    const again = figureSchema.parse((await upload(writer, itemId, png(5, 5), 'b.png', 'image/png')).body);
    const other = figureSchema.parse((await upload(writer, itemId, jpeg(6, 6), 'c.jpg', 'image/jpeg')).body);
    expect(again.id).toBe(first.id);
    const { figures } = await writer.call(listFigures, { params: { itemId } });
    expect(figures.map(({ id }) => id)).toEqual([other.id, first.id]);
  });

  it('is for the item’s owner', async () => {
    const { itemId } = await bench();
    const { client: stranger } = await app.signIn(['writer']);
    expect((await upload(stranger, itemId, png(5, 5), 'a.png', 'image/png')).status).toBe(403);
  });
});

describe('the figures of another item', () => {
  it('cannot be put into a draft', async () => {
    const { writer, itemId } = await bench();
    const other = await bench();
    const { id } = figureSchema.parse(
      (await upload(other.writer, other.itemId, png(5, 5), 'a.png', '')).body,
    );
    const figures = [
      { figureId: id, alternativeText: 'Theirs.', caption: '', widthPercent: 60, place: 'stem' },
    ];
    const reply = await writer.attempt(saveDraft, {
      params: { itemId },
      body: { version: 2, content: gunContent({ figures }) },
    });
    expect(reply).toMatchObject({ status: 422, body: { fields: [{ path: 'content.figures.0.figureId' }] } });
    expect((await writer.call(getItem, { params: { itemId } })).revision.version).toBe(2);
  });
});

describe('a reviewer', () => {
  it('sees the bitmaps of the sheet they work, no other picture and no drawing with its holes open', async () => {
    const { writer, itemId } = await bench();
    const add = async (bytes: Buffer, name: string) =>
      figureSchema.parse((await upload(writer, itemId, bytes, name, '')).body).id;
    const [shown, drawing, unused] = [
      await add(png(5, 5), 'a.png'),
      await add(svg('<text>{{swift}}</text>'), 'b.svg'),
      await add(png(7, 7), 'c.png'),
    ];
    const figures = [shown, drawing].map((figureId) => ({
      figureId,
      alternativeText: 'A tube.',
      caption: '',
      widthPercent: 60,
      place: 'stem',
    }));
    await writer.call(saveDraft, {
      params: { itemId },
      body: { version: 2, content: gunContent({ figures }) },
    });
    const { client: reviewer } = await app.signIn(['reviewer']);
    const { client: stranger } = await app.signIn(['reviewer']);
    const reviewId = await sendItem(writer, itemId);
    await reviewer.call(claimReview, { params: { reviewId } });
    expect((await content(reviewer, shown)).status).toBe(200);
    expect((await content(reviewer, drawing)).status).toBe(403);
    expect((await content(reviewer, unused)).status).toBe(403);
    expect((await content(stranger, shown)).status).toBe(403);
    expect((await reviewer.attempt(getFigureContent, { params: { figureId: 999_999 } })).status).toBe(404);
  });
});
