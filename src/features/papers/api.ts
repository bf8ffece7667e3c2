import { keepPreviousData, queryOptions } from '@tanstack/react-query';

import { listItems } from '#shared/contracts/items.ts';
import {
  createPaper,
  exportPaper,
  type ExportKind,
  getPaper,
  getPaperSheet,
  listPapers,
  type Paper,
  type PaperDetails,
  paperSchema,
  proposePaper,
  releasePaper,
  returnPaper,
  savePaperDetails,
  savePaperPlaces,
  sealPaper,
} from '#shared/contracts/papers.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { call, download } from '#src/lib/api.ts';

export const papersQuery = queryOptions({
  queryKey: ['papers'],
  queryFn: ({ signal }) => call(listPapers, { signal }),
});

export const paperQuery = (paperId: number) =>
  queryOptions({
    queryKey: ['paper', paperId],
    queryFn: ({ signal }) => call(getPaper, { params: { paperId }, signal }),
    // Every view is recorded, so a glance at another window asks no new one.
    refetchOnWindowFocus: false,
  });

export const paperSheetQuery = (paperId: number, version: number) =>
  queryOptions({
    queryKey: ['paper', paperId, 'sheet', version],
    queryFn: ({ signal }) => call(getPaperSheet, { params: { paperId }, signal }),
    refetchOnWindowFocus: false,
  });

export const approvedItemsQuery = (search: string) =>
  queryOptions({
    queryKey: ['items', 'approved', search],
    queryFn: ({ signal }) =>
      call(listItems, {
        query: { state: 'approved', search, sort: 'code', direction: 'ascending', pageSize: 100 },
        signal,
      }),
    placeholderData: keepPreviousData,
  });

/** One place as it is saved. */
export interface Place {
  itemId: number;
  draw: number | null;
  takeNewest?: boolean;
}

export const beginPaper = (details: PaperDetails) => call(createPaper, { body: details });

/** Requests of one paper; each gives the paper as it then stands. */
export function paperCalls(paperId: number) {
  const params = { paperId };
  return {
    saveDetails: (version: number, details: PaperDetails) =>
      call(savePaperDetails, { params, body: { version, ...details } }),
    savePlaces: (version: number, places: Place[]) =>
      call(savePaperPlaces, { params, body: { version, places } }),
    propose: (version: number) => call(proposePaper, { params, body: { version } }),
    giveBack: (version: number, reason: string) => call(returnPaper, { params, body: { version, reason } }),
    seal: (version: number) => call(sealPaper, { params, body: { version } }),
    release: (version: number) => call(releasePaper, { params, body: { version } }),
    export: (kind: ExportKind, signal: AbortSignal) => download(exportPaper, { paperId, kind }, signal),
  };
}
export type PaperCalls = ReturnType<typeof paperCalls>;

/** The paper as the server holds it, when a request failed because somebody else had changed it. */
export function storedPaperOf(error: unknown): Paper | null {
  if (!(error instanceof AppError) || error.code !== 'conflict') return null;
  return paperSchema.safeParse(error.current).data ?? null;
}

/** The running order of a paper as it is sent back. */
export const placesOf = (paper: Paper): Place[] => paper.places.map(({ itemId, draw }) => ({ itemId, draw }));
