import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createServer, type AddressInfo } from 'node:net';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

import mysql from 'mysql2/promise';

import { serverUrl } from './database.ts';

export interface BuiltServer {
  /** As `http://127.0.0.1:4321`, without a slash at the end. */
  url: string;
  databaseUrl: string;
  stop: () => Promise<void>;
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

async function makeDatabase(name: string): Promise<string> {
  const connection = await mysql.createConnection(serverUrl());
  await connection.query(`drop database if exists \`${name}\``);
  await connection.query(`create database \`${name}\` character set utf8mb4 collate utf8mb4_unicode_ci`);
  await connection.end();
  return `${serverUrl()}/${name}`;
}

/** Runs one of the built one-off programs to its end; throws with its output when it fails. */
async function runOnce(script: string, environment: NodeJS.ProcessEnv): Promise<void> {
  const child = spawn(process.execPath, [script], { env: environment, stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (piece: Buffer) => (output += piece.toString()));
  const [code] = await once(child, 'close');
  if (code !== 0) throw new Error(`${path.basename(script)} failed. ${output}`);
}

async function isReady(url: string): Promise<boolean> {
  try {
    return (await fetch(`${url}/api/health`)).status === 200;
  } catch {
    // Nothing listens yet.
    return false;
  }
}

/**
 * Starts the built product on a free port, with a seeded database of its own called `test_<name>`. `npm test`
 * builds it first and says where by TEST_BUILD. Throws when it is not ready within half a minute.
 */
export async function startBuiltServer(name: string): Promise<BuiltServer> {
  const build = process.env['TEST_BUILD'];
  if (!build) throw new Error('TEST_BUILD is not set. Run the tests by npm test.');
  const databaseUrl = await makeDatabase(`test_${name}`);
  const port = await freePort();
  const environment = {
    PATH: process.env['PATH'],
    NODE_ENV: 'production',
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: 'a secret of the tests, long enough to be taken',
    STATIC_DIR: path.join(build, 'client'),
    ORGANISATION: 'Larkmoor Assessment Consortium',
    LOG_LEVEL: 'warn',
    PORT: String(port),
  };
  await runOnce(path.join(build, 'server/migrate.js'), environment);
  await runOnce(path.join(build, 'server/seed.js'), environment);

  const child = spawn(process.execPath, [path.join(build, 'server/main.js')], {
    env: environment,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const ended = once(child, 'exit');
  const stop = async () => {
    child.kill('SIGTERM');
    await ended;
  };
  const url = `http://127.0.0.1:${port}`;
  const limit = Date.now() + 30_000;
  while (!(await isReady(url))) {
    if (child.exitCode !== null) throw new Error('The built server ended before it was ready.');
    if (Date.now() > limit) {
      await stop();
      throw new Error('The built server was not ready within half a minute.');
    }
    await pause(100);
  }
  return { url, databaseUrl, stop };
}
