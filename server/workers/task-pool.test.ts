import { fileURLToPath } from 'node:url';

import { afterAll, describe, expect, it } from 'vitest';

import { createTaskPool } from './task-pool.ts';
import { sourceWorker } from './worker-file.ts';

const worker = sourceWorker(
  fileURLToPath(new URL('../../tests/support/stubborn-worker.ts', import.meta.url)),
  fileURLToPath(new URL('.', import.meta.url)),
);
const pool = createTaskPool({ worker, threads: 1, queue: 2, memory: 64 });
afterAll(() => pool.close());

const limits = { milliseconds: 20_000, tooLong: 'That took too long.' };

describe('a pool of threads', () => {
  it('gives what the task gives', async () => {
    expect(await pool.run('answer', { a: [1, 2] }, limits)).toEqual({ payload: { a: [1, 2] } });
  });

  it('passes on what the task throws', async () => {
    await expect(pool.run('fail', null, limits)).rejects.toThrow('the task broke');
  });

  it('ends a task that never ends, says so, and goes on working', async () => {
    await expect(pool.run('spin', null, { ...limits, milliseconds: 300 })).rejects.toMatchObject({
      code: 'timedOut',
      message: 'That took too long.',
    });
    expect(await pool.run('answer', 1, limits)).toEqual({ payload: 1 });
  });

  it('refuses what no longer fits in the queue as busy, and finishes the rest', async () => {
    const outcomes = await Promise.allSettled(Array.from({ length: 10 }, () => pool.run('hold', 50, limits)));
    const refused = outcomes.filter((outcome) => outcome.status === 'rejected');
    // One runs and two wait.
    expect(refused).toHaveLength(7);
    for (const { reason } of refused) expect(reason).toMatchObject({ code: 'busy' });
  });

  it('does not charge a task for the time that it waits', async () => {
    const first = pool.run('hold', 600, limits);
    expect(await pool.run('answer', 1, { ...limits, milliseconds: 300 })).toEqual({ payload: 1 });
    expect(await first).toBe(600);
  });

  it('lets go at once when the client has gone, and ends the task soon after', async () => {
    const client = new AbortController();
    const gone = pool.run('spin', null, { ...limits, signal: client.signal });
    const started = performance.now();
    setTimeout(() => client.abort(new Error('the client left')), 100);
    await expect(gone).rejects.toThrow('the client left');
    expect(performance.now() - started).toBeLessThan(1_000);
    // The only thread is free again although the task never ends by itself.
    expect(await pool.run('answer', 2, limits)).toEqual({ payload: 2 });
  });

  it('does not start for a client that has already gone', async () => {
    const signal = AbortSignal.abort(new Error('never there'));
    await expect(pool.run('answer', 1, { ...limits, signal })).rejects.toThrow('never there');
  });

  it('survives a task that takes all memory', async () => {
    await expect(pool.run('hoard', null, limits)).rejects.toMatchObject({ code: 'notPossible' });
    expect(await pool.run('answer', 3, limits)).toEqual({ payload: 3 });
  });

  it('hides the environment of the server from its threads', async () => {
    process.env['GRATICULE_TEST_SECRET'] = 'secret';
    const fresh = createTaskPool({ worker, threads: 1, queue: 2, memory: 64 });
    expect(await fresh.run('environment', null, limits)).not.toContain('GRATICULE_TEST_SECRET');
    await fresh.close();
    delete process.env['GRATICULE_TEST_SECRET'];
  });
});
