import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { inData, makeDataFolder, root } from './places.mjs';

/** Every file under `place` (a file or a folder), sorted, without those `leftOut` says. */
function filesUnder(place, leftOut) {
  if (!existsSync(place)) return [];
  if (statSync(place).isFile()) return [place];
  return readdirSync(place, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .filter((entry) => !leftOut(entry.name))
    .flatMap((entry) => filesUnder(path.join(place, entry.name), leftOut));
}

/**
 * A hash over names and contents of files and folders of the project.
 * @param {readonly string[]} places relative to the project
 * @param {(name: string) => boolean} [leftOut] names of files and folders that do not count
 */
export function fingerprint(places, leftOut = () => false) {
  const hash = createHash('sha256').update(process.version);
  for (const place of places) {
    for (const file of filesUnder(path.join(root, place), leftOut)) {
      hash.update(`\0${path.relative(root, file)}\0`).update(readFileSync(file));
    }
  }
  return hash.digest('hex');
}

/** Whether `value` is what was last recorded under `name`. */
export function isRecorded(name, value) {
  const file = inData(`${name}.sha256`);
  return existsSync(file) && readFileSync(file, 'utf8').trim() === value;
}

/** Records `value` under `name`, for the next start. */
export function record(name, value) {
  makeDataFolder();
  writeFileSync(inData(`${name}.sha256`), `${value}\n`);
}
