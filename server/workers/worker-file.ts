import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const STEPS_UP = 4;

export interface WorkerFile {
  /** What the thread runs. */
  path: string;
  /** The TypeScript source that `path` loads, as a URL; null for a bundled worker. */
  source: string | null;
}

/** A worker's TypeScript source, run as it stands; `folder` is that of the server's other workers. */
export function sourceWorker(source: string, folder: string): WorkerFile {
  return { path: join(folder, 'source-worker.mjs'), source: pathToFileURL(source).href };
}

/**
 * Finds `<name>.js` of the bundle or `<name>.ts` of the sources, beside the calling module or in a folder
 * `workers` at or above it. Throws when neither is there.
 */
export function findWorkerFile(name: string, moduleUrl: string): WorkerFile {
  let folder = dirname(fileURLToPath(moduleUrl));
  for (let step = 0; step < STEPS_UP; step += 1) {
    for (const place of [folder, join(folder, 'workers')]) {
      const bundled = join(place, `${name}.js`);
      if (existsSync(bundled)) return { path: bundled, source: null };
      const source = join(place, `${name}.ts`);
      if (existsSync(source)) return sourceWorker(source, place);
    }
    folder = dirname(folder);
  }
  throw new Error(`The worker file ${name} is missing beside the server.`);
}
