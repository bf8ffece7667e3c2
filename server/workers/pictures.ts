import { createTaskPool, type TaskPool } from './task-pool.ts';
import type { PictureVerdict } from './task-types.ts';
import { findWorkerFile } from './worker-file.ts';

/** Looks at uploaded pictures in a thread of its own, since cleaning a drawing takes long and reads hostile text. */
export interface Pictures {
  /** What the file is and whether it may be stored; at most 10 s. Rejects with AppError timedOut or busy when it must. */
  inspect: (bytes: Uint8Array, options?: { signal?: AbortSignal }) => Promise<PictureVerdict>;
  close: () => Promise<void>;
}

const LIMITS = {
  milliseconds: 10_000,
  tooLong: 'Reading this picture took longer than 10 seconds and was stopped. Simplify the drawing.',
};

/** A look-out whose thread starts with its first picture. */
export function createPictures({ report }: { report: (error: Error) => void }): Pictures {
  let pool: TaskPool | null = null;
  const started = () =>
    (pool ??= createTaskPool({
      worker: findWorkerFile('picture-worker', import.meta.url),
      threads: 1,
      queue: 8,
      memory: 256,
      report,
    }));
  return {
    inspect: async (bytes, options = {}) =>
      (await started().run('inspect', bytes, { ...LIMITS, signal: options.signal })) as PictureVerdict,
    close: async () => {
      await pool?.close();
    },
  };
}
