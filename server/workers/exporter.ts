import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';

import type { Bitmaps } from '../export/bitmaps.ts';
import { createTaskPool, type TaskPool } from './task-pool.ts';
import { findWorkerFile } from './worker-file.ts';

/** A document to be written. */
export type ExportRequest =
  | { kind: 'question-paper'; sheet: PaperSheet; bitmaps: Bitmaps }
  | { kind: 'mark-scheme'; scheme: PaperScheme };

/** Writes documents in a thread of its own. */
export interface Exporter {
  /** The document as DOCX bytes; at most 30 s. Rejects with AppError timedOut or busy when it must. */
  export: (request: ExportRequest, options?: { signal?: AbortSignal }) => Promise<Uint8Array>;
  close: () => Promise<void>;
}

const LIMITS = {
  milliseconds: 30_000,
  tooLong: 'Writing the document took longer than 30 seconds and was stopped. Try again.',
};

/** An exporter whose thread starts with its first document. */
export function createExporter({ report }: { report: (error: Error) => void }): Exporter {
  let pool: TaskPool | null = null;
  const started = () =>
    (pool ??= createTaskPool({
      worker: findWorkerFile('export-worker', import.meta.url),
      threads: 1,
      queue: 8,
      memory: 768,
      report,
    }));
  return {
    export: async (request, options = {}) =>
      (await started().run('export', request, { ...LIMITS, signal: options.signal })) as Uint8Array,
    close: async () => {
      await pool?.close();
    },
  };
}
