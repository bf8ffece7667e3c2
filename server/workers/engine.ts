import { availableParallelism } from 'node:os';

import type { DrawView } from '#shared/contracts/checking.ts';
import type { AssayReport, FigureFacts, ItemContent } from '#shared/engine/index.ts';
import type { StoredFigure } from '#shared/sheet/build-item.ts';

import { createTaskPool, type TaskLimits, type TaskPool } from './task-pool.ts';
import type { BuiltPaper, ChosenDraw, MarkedWorking, PaperToBuild, WorkingToMark } from './task-types.ts';
import { findWorkerFile } from './worker-file.ts';

interface TaskOptions {
  /** Gives the work up when the client has gone. */
  signal?: AbortSignal;
}

/** The checker in its own threads; every method rejects with AppError timedOut or busy when it must. */
export interface Engine {
  /** The full check of one revision's content with its figures; at most 20 s. */
  assay: (
    content: ItemContent,
    options?: TaskOptions & { figures?: readonly FigureFacts[] },
  ) => Promise<AssayReport>;
  /** Sheet, mark scheme, values and mistakes at one draw (null: the first kept one); at most 3 s. */
  viewDraw: (
    content: ItemContent,
    draw: number | null,
    figures?: readonly StoredFigure[],
    options?: TaskOptions,
  ) => Promise<DrawView>;
  /** Compares a reviewer's answer with the script's; at most 3 s. */
  markWorking: (working: WorkingToMark, options?: TaskOptions) => Promise<MarkedWorking>;
  /** A draw by chance that every `require` keeps, null when there is none; `chance` lies in [0, 1). At most 3 s. */
  chooseDraw: (content: ItemContent, chance: number, options?: TaskOptions) => Promise<ChosenDraw>;
  /** The usual cautions for an item's apparatus, by its words and its values; at most 3 s. */
  cautions: (content: ItemContent, options?: TaskOptions) => Promise<string[]>;
  /** Question paper and mark scheme with every item at its draw; at most 20 s. */
  buildPaper: (paper: PaperToBuild, options?: TaskOptions) => Promise<BuiltPaper>;
  close: () => Promise<void>;
}

const ASSAY = {
  milliseconds: 20_000,
  tooLong: 'The assay took longer than 20 seconds and was stopped. Make the script or its grid smaller.',
};
const PAPER = {
  milliseconds: 20_000,
  tooLong: 'Building the paper took longer than 20 seconds and was stopped. Try again.',
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

  const ask = async <Result>(
    pool: TaskPool,
    task: string,
    payload: unknown,
    limits: Omit<TaskLimits, 'signal'>,
    options: TaskOptions = {},
  ): Promise<Result> => (await pool.run(task, payload, { ...limits, signal: options.signal })) as Result;

  return {
    assay: (content, options) =>
      ask(thorough, 'assay', { content, figures: options?.figures ?? [] }, ASSAY, options),
    buildPaper: (paper, options) => ask(thorough, 'buildPaper', paper, PAPER, options),
    viewDraw: (content, draw, figures = [], options) =>
      ask(quick, 'viewDraw', { content, draw, figures }, QUICK, options),
    markWorking: (working, options) => ask(quick, 'markWorking', working, QUICK, options),
    chooseDraw: (content, chance, options) => ask(quick, 'chooseDraw', { content, chance }, QUICK, options),
    cautions: (content, options) => ask(quick, 'cautionsOf', content, QUICK, options),
    close: async () => {
      await Promise.all([thorough.close(), quick.close()]);
    },
  };
}
