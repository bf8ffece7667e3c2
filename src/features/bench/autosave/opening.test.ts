import { describe, expect, it } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import { openingOf } from './opening.ts';

const content = itemContentSchema.parse({ title: 'Gun', stem: 'Server.' });
const mine = { ...content, stem: 'Kept.' };
const server = { content, topicId: 1, version: 4 };
const keptAt = '2026-03-02T14:32:00.000Z';

describe('opening the bench', () => {
  it('takes the server’s copy when nothing was kept, or the same was', () => {
    expect(openingOf(server, null)).toEqual({ kind: 'server' });
    expect(
      openingOf(server, { content: structuredClone(content), topicId: 1, version: 3, keptAt }).kind,
    ).toBe('server');
  });

  it('goes on with what was kept when nobody saved meanwhile', () => {
    expect(openingOf(server, { content: mine, topicId: 1, version: 4, keptAt })).toMatchObject({
      kind: 'restored',
      content: mine,
    });
  });

  it('asks when somebody saved meanwhile', () => {
    expect(openingOf(server, { content: mine, topicId: 1, version: 3, keptAt }).kind).toBe('conflict');
  });

  it('counts a change of topic as a change', () => {
    expect(openingOf(server, { content, topicId: 2, version: 4, keptAt }).kind).toBe('restored');
  });
});
