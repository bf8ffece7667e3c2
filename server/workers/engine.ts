import { availableParallelism } from 'node:os';

import type { DrawView } from '#shared/contracts/checking.ts';
import type { AssayReport, ItemContent } from '#shared/engine/index.ts';

import { createTaskPool } from './task-pool.ts';
import { findWorkerFile } from './worker-file.ts';
import type { FigureSize, MarkedWorking, WorkingToMark } from './tasks.ts';

interface TaskOptions {
  /** Gives the work up when the client has gone. */
  signal?: AbortSignal;
}

/** The checker in its own threads; every method rejects with AppError timedOut or busy when it must. */
export interface Engine {
  /** The full check of one revision's content; at most 20 s. */
  assay: (content: ItemContent, options?: TaskOptions) => Promise<AssayReport>;
  /** Sheet, mark scheme, values and mistakes at one draw (null: the first kept one); at most 3 s. */
  viewDraw: (
    content: ItemContent,
    draw: number | null,
    figures?: readonly FigureSize[],
    options?: TaskOptions,
  ) => Promise<DrawView>;
  /** Compares a reviewer's answer with the script's; at most 3 s. */
  markWorking: (working: WorkingToMark, options?: TaskOptions) => Promise<MarkedWorking>;
  close: () => Promise<void>;
}

const ASSAY = {
  milliseconds: 20_000,
  tooLong: 'The assay took longer than 20 seconds and was stopped. Make the script or its grid smaller.',
};
const QUICK = {
  milliseconds: 3_000,
  tooLong: 'This draw took longer than 3 seconds and was stopped. Make the script simpler.',
};

interface EngineOptions {
  threads: number;
  /** Told of a thread that broke outside any task. */
  report: (error: Error) => void;
}

/** Starts the engine's threads: `threads` for assays (0: one fewer than the processor has) and one for single draws. */
export function createEngine({ threads, report }: EngineOptions): Engine {
  const worker = findWorkerFile('engine-worker', import.meta.url);
  const thorough = createTaskPool({
    worker,
    threads: threads === 0 ? Math.max(1, availableParallelism() - 1) : threads,
    queue: 32,
    memory: 512,
    report,
  });
  // Single draws have a thread of their own, so that a live sheet never waits behind an assay.
  const quick = createTaskPool({ worker, threads: 1, queue: 64, memory: 256, report });
  return {
    assay: async (content, options = {}) =>
      (await thorough.run('assay', content, { ...ASSAY, signal: options.signal })) as AssayReport,
    viewDraw: async (content, draw, figures = [], options = {}) =>
      (await quick.run(
        'viewDraw',
        { content, draw, figures },
        { ...QUICK, signal: options.signal },
      )) as DrawView,
    markWorking: async (working, options = {}) =>
      (await quick.run('markWorking', working, { ...QUICK, signal: options.signal })) as MarkedWorking,
    close: async () => {
      await Promise.all([thorough.close(), quick.close()]);
    },
  };
}
