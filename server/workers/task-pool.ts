import { Piscina } from 'piscina';

import { AppError } from '#shared/errors/app-error.ts';

import { findWorkerFile } from './worker-file.ts';

export interface PoolOptions {
  /** Name of the worker file without its ending. */
  worker: string;
  threads: number;
  /** Tasks that may wait; one more is refused as busy. */
  queue: number;
  /** Heap of one thread, MB. */
  memory: number;
}

export interface TaskLimits {
  /** From handing the task in to its end, ms. */
  milliseconds: number;
  /** What a person reads when that is not enough. */
  tooLong: string;
  /** Gives the task up when the client has gone. */
  signal?: AbortSignal | undefined;
}

/** A running task is left to finish for so long after its client has gone: starting a thread anew costs more. */
const GRACE = 1_500;

export interface TaskPool {
  run: (task: string, payload: unknown, limits: TaskLimits) => Promise<unknown>;
  close: () => Promise<void>;
}

function translate(error: unknown, timedOut: boolean, limits: TaskLimits): unknown {
  if (timedOut) return new AppError('timedOut', limits.tooLong, { cause: error });
  if (!(error instanceof Error)) return error;
  if (error.message === 'Task queue is at limit') {
    return new AppError('busy', 'Many checks are running at the moment. Try again in a few seconds.', {
      cause: error,
    });
  }
  if ('code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY') {
    return new AppError(
      'notPossible',
      'This needs more memory than one check may use. Make the script smaller.',
      {
        cause: error,
      },
    );
  }
  return error;
}

/**
 * A bounded pool of threads. `run` rejects with AppError timedOut (the thread is ended and replaced), busy or
 * notPossible (out of memory), with the client's abort reason, or with what the task threw.
 */
export function createTaskPool(options: PoolOptions): TaskPool {
  const file = findWorkerFile(options.worker, import.meta.url);
  const pool = new Piscina({
    filename: file.path,
    execArgv: file.execArgv,
    minThreads: 1,
    maxThreads: options.threads,
    idleTimeout: 60_000,
    maxQueue: options.queue,
    resourceLimits: { maxOldGenerationSizeMb: options.memory },
    // Threads see no secrets of the server's environment.
    env: {},
  });

  async function run(task: string, payload: unknown, limits: TaskLimits): Promise<unknown> {
    limits.signal?.throwIfAborted();
    const stop = new AbortController();
    let timedOut = false;
    const clock = setTimeout(() => {
      timedOut = true;
      stop.abort();
    }, limits.milliseconds);
    let grace: NodeJS.Timeout | undefined;
    let clientLeft: (() => void) | undefined;
    const work: Promise<unknown> = pool.run(payload, { name: task, signal: stop.signal });
    const clear = () => {
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
        throw translate(error, timedOut, limits);
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
