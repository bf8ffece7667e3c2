import { dispatcher } from '#server/workers/dispatcher.ts';

function answer(payload: unknown): unknown {
  return { payload };
}

function fail(): never {
  throw new Error('the task broke');
}

/** Never ends and never lets go of its thread. */
function spin(): never {
  for (;;) Math.sqrt(2);
}

/** Holds its thread for some milliseconds. */
function hold(milliseconds: number): number {
  const end = Date.now() + milliseconds;
  while (Date.now() < end) Math.sqrt(2);
  return milliseconds;
}

/** Takes memory until the thread has no more. */
function hoard(): number {
  const kept: number[][] = [];
  for (;;) kept.push(Array.from({ length: 100_000 }, (_, index) => index + kept.length));
}

function environment(): string[] {
  return Object.keys(process.env);
}

/** Tasks that misbehave, to try a pool with. */
export default dispatcher({ answer, fail, spin, hold, hoard, environment });
