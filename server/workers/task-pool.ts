import { MessageChannel } from 'node:worker_threads';

import { Piscina } from 'piscina';

import { AppError } from '#shared/errors/app-error.ts';

import type { TaskCall } from './dispatcher.ts';
import type { WorkerFile } from './worker-file.ts';

export interface PoolOptions {
  worker: WorkerFile;
  threads: number;
  /** Tasks that may wait; one more is refused as busy. */
  queue: number;
  /** Heap of one thread, MB. */
  memory: number;
  /** Told of a thread that broke outside any task. */
  report?: (error: Error) => void;
}

export interface TaskLimits {
  /** From a thread's taking the task up to its end, ms. */
  milliseconds: number;
  /** What a person reads when that is not enough. */
  tooLong: string;
  /** Gives the task up when the client has gone. */
  signal?: AbortSignal | undefined;
}

/** How long a task may wait for a thread, ms; a thread that starts anew on a loaded machine needs seconds. */
const PATIENCE = 30_000;
/** A running task is left to finish for so long after its client has gone: starting a thread anew costs more. */
const GRACE = 1_500;

export interface TaskPool {
  run: (task: string, payload: unknown, limits: TaskLimits) => Promise<unknown>;
  close: () => Promise<void>;
}

const busy = (cause?: unknown) =>
  new AppError('busy', 'Many checks are running at the moment. Try again in a few seconds.', { cause });

/** Why the pool itself gave a task up. */
type Verdict = 'ranTooLong' | 'waitedTooLong' | null;

function translate(error: unknown, verdict: Verdict, limits: TaskLimits): unknown {
  if (verdict === 'ranTooLong') return new AppError('timedOut', limits.tooLong, { cause: error });
  if (verdict === 'waitedTooLong') return busy(error);
  if (error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY') {
    return new AppError(
      'notPossible',
      'This needs more memory than one check may use. Make the script smaller.',
      { cause: error },
    );
  }
  return error;
}

/**
 * A bounded pool of threads. `run` rejects with AppError timedOut (the thread is ended and replaced), busy (too
 * many wait, or none came free) or notPossible (out of memory), with the client's abort reason, or with what the task threw.
 */
export function createTaskPool(options: PoolOptions): TaskPool {
  const pool = new Piscina({
    filename: options.worker.path,
    // Nothing of the parent's own arguments: its loaders are not for threads.
    execArgv: [],
    workerData: { source: options.worker.source },
    minThreads: 1,
    maxThreads: options.threads,
    idleTimeout: 60_000,
    // First come, first served; how many may wait is counted below, since the pool's own limit lets more in.
    stricterFIFO: true,
    resourceLimits: { maxOldGenerationSizeMb: options.memory },
    // Threads see no secrets of the server's environment.
    env: {},
  });

  pool.on('error', (error: Error) => options.report?.(error));

  /** Tasks that run or wait. */
  let inHand = 0;

  async function run(task: string, payload: unknown, limits: TaskLimits): Promise<unknown> {
    limits.signal?.throwIfAborted();
    if (inHand >= options.threads + options.queue) throw busy();
    inHand += 1;
    const stop = new AbortController();
    let verdict: Verdict = null;
    const giveUp = (reason: Verdict) => () => {
      verdict = reason;
      stop.abort();
    };
    let clock = setTimeout(giveUp('waitedTooLong'), PATIENCE);
    const { port1: told, port2: started } = new MessageChannel();
    told.once('message', () => {
      clearTimeout(clock);
      clock = setTimeout(giveUp('ranTooLong'), limits.milliseconds);
    });
    told.unref();
    let grace: NodeJS.Timeout | undefined;
    let clientLeft: (() => void) | undefined;
    const work: Promise<unknown> = pool.run({ task, payload, started } satisfies TaskCall, {
      signal: stop.signal,
      transferList: [started],
    });
    const clear = () => {
      told.close();
      inHand -= 1;
      clearTimeout(clock);
      clearTimeout(grace);
      if (clientLeft !== undefined) limits.signal?.removeEventListener('abort', clientLeft);
    };
    const settled = work.then(
      (result) => {
        clear();
        return result;
      },
      (error: unknown) => {
        clear();
        throw translate(error, verdict, limits);
      },
    );
    if (limits.signal === undefined) return settled;
    const left = new Promise<never>((_resolve, reject) => {
      clientLeft = () => {
        grace = setTimeout(() => stop.abort(), GRACE);
        reject(limits.signal?.reason as Error);
      };
      limits.signal?.addEventListener('abort', clientLeft, { once: true });
    });
    return Promise.race([settled, left]);
  }

  return { run, close: () => pool.destroy() };
}
