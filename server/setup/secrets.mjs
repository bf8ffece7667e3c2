import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

import { inData, makeDataFolder } from './places.mjs';

/** A new password, 256 bits in 64 letters and digits. */
export function newSecret() {
  return randomBytes(32).toString('hex');
}

/** The secret kept under `name` in the data folder, made at its first use and readable by its owner alone. */
export function keptSecret(name) {
  makeDataFolder();
  const file = inData(name);
  if (existsSync(file)) {
    const secret = readFileSync(file, 'utf8').trim();
    if (secret.length >= 32) return secret;
  }
  const secret = newSecret();
  writeFileSync(file, `${secret}\n`, { mode: 0o600 });
  return secret;
}
