import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's own folder. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/** Everything the project keeps on this machine: databases, passwords, records of what is built. */
export const dataFolder = path.join(root, '.data');

/** Makes the data folder, which holds secrets and is therefore closed to others. */
export function makeDataFolder() {
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
}

/** A path within the project. */
export function inProject(...parts) {
  return path.join(root, ...parts);
}

/** A path within the data folder. */
export function inData(...parts) {
  return path.join(dataFolder, ...parts);
}
