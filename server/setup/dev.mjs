import { spawn } from 'node:child_process';

import { claimProject } from './claim.mjs';
import { ensureDebianPackages, toServe } from './debian-packages.mjs';
import { choosePort, prepareDatabase, productEnvironment, provideDatabase } from './environment.mjs';
import { ensureNpmPackages } from './npm-packages.mjs';
import { inData, inProject } from './places.mjs';
import { freePort } from './ports.mjs';
import { endProcess } from './processes.mjs';
import { main, say } from './say.mjs';
import { endOrphanedServer, startServer } from './serve.mjs';
import { showSignIns } from './sign-ins.mjs';
import { createStoppers } from './stoppers.mjs';

const WATCHER = 'node_modules/tsx/dist/cli.mjs';
const pidFile = inData('server.pid');

/** Vite in front: it serves the client with hot reload and hands /api on. */
function startVite(env, port, apiPort) {
  const host = process.env['HOST'] ? ['--host', process.env['HOST']] : [];
  const child = spawn(
    process.execPath,
    [inProject('node_modules/vite/bin/vite.js'), '--port', String(port), '--strictPort', ...host],
    { cwd: inProject(), env: { ...env, API_PORT: String(apiPort) }, detached: true, stdio: 'inherit' },
  );
  const ended = new Promise((resolve) => child.once('exit', (code) => resolve(code ?? 1)));
  return { ended, stop: () => endProcess(child.pid, 5000) };
}

await main(async () => {
  const unclaim = claimProject();
  const stoppers = createStoppers();
  stoppers.add(unclaim);
  try {
    await endOrphanedServer(pidFile, WATCHER);
    const port = await choosePort();
    await ensureDebianPackages(process.env['DATABASE_URL'] ? {} : toServe);
    await ensureNpmPackages();

    const database = await provideDatabase(stoppers);
    const apiPort = await freePort();
    const extra = { NODE_ENV: 'development', PORT: String(apiPort), HOST: '127.0.0.1', STATIC_DIR: '' };
    const owner = productEnvironment(database.ownerUrl, extra);
    await prepareDatabase(['--import', 'tsx'], ['server/db/migrate.ts', 'server/db/seed/main.ts'], owner);

    const env = productEnvironment(database.applicationUrl, extra);
    const server = await startServer({
      args: [WATCHER],
      tail: ['watch', '--clear-screen=false', inProject('server/main.ts')],
      env,
      port: apiPort,
      pidFile,
      stoppers,
    });
    const vite = startVite(env, port, apiPort);
    stoppers.add(vite.stop);
    const { tsImport } = await import('tsx/esm/api');
    await showSignIns((url) => tsImport(url, import.meta.url), 'server/db/seed/demo-people.ts');
    say('Changes show at once. Ctrl-C stops everything.');
    await Promise.race([server.ended, vite.ended, database.ended]);
  } finally {
    await stoppers.stopAll();
  }
});
