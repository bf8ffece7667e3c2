import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const STEPS_UP = 4;

export interface WorkerFile {
  path: string;
  /** What Node needs before it can run the file: tsx for a source file, nothing for a bundled one. */
  execArgv: string[];
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
      if (existsSync(bundled)) return { path: bundled, execArgv: [] };
      const source = join(place, `${name}.ts`);
      if (existsSync(source)) return { path: source, execArgv: ['--import', 'tsx'] };
    }
    folder = dirname(folder);
  }
  throw new Error(`The worker file ${name} is missing beside the server.`);
}
