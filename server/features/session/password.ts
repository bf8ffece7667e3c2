import { hash, verify } from '@node-rs/argon2';

/** OWASP's smallest recommended argon2id setting: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** argon2id hash of a password in PHC notation; takes some tens of milliseconds, off the event loop. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

let nobodysHash: Promise<string> | null = null;

/**
 * Whether a password belongs to a stored hash. Without a hash (no such person, or none chosen yet) it takes as
 * long and is false, so that the time of an answer does not tell which addresses exist.
 */
export async function passwordMatches(storedHash: string | null, password: string): Promise<boolean> {
  nobodysHash ??= hashPassword('a password that nobody has');
  const matches = await verify(storedHash ?? (await nobodysHash), password);
  return storedHash !== null && matches;
}
