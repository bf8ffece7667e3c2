import { queryOptions } from '@tanstack/react-query';

import { checkItem, viewDraw } from '#shared/contracts/checking.ts';
import { figureSchema, uploadFigure } from '#shared/contracts/figures.ts';
import {
  assayItem,
  getItem,
  getRevision,
  itemSchema,
  listRevisions,
  recallItem,
  saveDraft,
  sendToReview,
  startRevision,
  withdrawItem,
  type Item,
} from '#shared/contracts/items.ts';
import { choosePeople } from '#shared/contracts/people.ts';
import { listTopics } from '#shared/contracts/topics.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { call, NoConnection, sendFile, sentenceOf } from '#src/lib/api.ts';
import type { Draft, SaveFailure } from './autosave/autosave-machine.ts';
import type { Sending } from './sending/SendForm.tsx';

/** One item with its latest revision. */
export const itemQuery = (itemId: number) =>
  queryOptions({
    queryKey: ['item', itemId],
    queryFn: ({ signal }) => call(getItem, { params: { itemId }, signal }),
  });

export const topicsQuery = queryOptions({
  queryKey: ['topics'],
  queryFn: ({ signal }) => call(listTopics, { signal }),
});

export const reviewersQuery = queryOptions({
  queryKey: ['people', 'reviewer'],
  queryFn: ({ signal }) => call(choosePeople, { query: { role: 'reviewer' }, signal }),
});

export const revisionsQuery = (itemId: number) =>
  queryOptions({
    queryKey: ['item', itemId, 'revisions'],
    queryFn: ({ signal }) => call(listRevisions, { params: { itemId }, signal }),
  });

/** Requests of one item's bench. */
export function benchCalls(itemId: number) {
  const params = { itemId };
  return {
    viewDraw: (content: ItemContent, draw: number | null, signal: AbortSignal) =>
      call(viewDraw, { params, body: { content, draw }, signal }),
    checkItem: (content: ItemContent, draw: number | null, signal: AbortSignal) =>
      call(checkItem, { params, body: { content, draw }, signal }),
    save: ({ content, topicId }: Draft, version: number) =>
      call(saveDraft, { params, body: { version, content, topicId } }),
    assay: () => call(assayItem, { params }),
    send: (sending: Sending, version: number) =>
      call(sendToReview, { params, body: { ...sending, version } }),
    recall: (reason: string) => call(recallItem, { params, body: { reason } }),
    withdraw: (reason: string) => call(withdrawItem, { params, body: { reason } }),
    startRevision: () => call(startRevision, { params }),
    revision: (number: number) => call(getRevision, { params: { itemId, number } }),
    upload: async (file: File) => figureSchema.parse(await sendFile(uploadFigure, { params, file })).id,
  };
}

export type BenchCalls = ReturnType<typeof benchCalls>;

/** What the server holds, from the answer to a stale save; null when the error is something else. */
export function storedItemOf(error: unknown): Item | null {
  if (!(error instanceof AppError) || error.code !== 'conflict') return null;
  const parsed = itemSchema.safeParse(error.current);
  return parsed.success ? parsed.data : null;
}

/** Sorts an error of a save: no connection, no session, a conflict, or a refusal with its sentence. */
export function saveFailureOf(error: unknown): SaveFailure {
  if (error instanceof NoConnection) return { kind: 'offline' };
  if (!(error instanceof AppError)) return { kind: 'refused', message: sentenceOf(error) };
  switch (error.code) {
    case 'notSignedIn':
    case 'badCsrfToken':
      return { kind: 'signedOut' };
    case 'conflict':
      return storedItemOf(error) === null
        ? { kind: 'refused', message: error.message }
        : { kind: 'conflict' };
    case 'timedOut':
    case 'busy':
    case 'internal':
      return { kind: 'offline' };
    default:
      return { kind: 'refused', message: sentenceOf(error) };
  }
}
