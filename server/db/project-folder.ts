import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder with package.json above a module, wherever the bundler has put that module. */
export function projectFolder(moduleUrl: string): string {
  let folder = dirname(fileURLToPath(moduleUrl));
  while (!existsSync(join(folder, 'package.json'))) {
    const above = dirname(folder);
    if (above === folder) throw new Error('No package.json stands above the server’s code.');
    folder = above;
  }
  return folder;
}
