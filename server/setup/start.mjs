import { ensureBuilt } from './build.mjs';
import { claimProject } from './claim.mjs';
import { ensureDebianPackages, toServe } from './debian-packages.mjs';
import { choosePort, prepareDatabase, productEnvironment, provideDatabase } from './environment.mjs';
import { ensureNpmPackages } from './npm-packages.mjs';
import { inData, inProject } from './places.mjs';
import { main, say, SetupError } from './say.mjs';
import { endOrphanedServer, startServer } from './serve.mjs';
import { showSignIns } from './sign-ins.mjs';
import { createStoppers } from './stoppers.mjs';

const SERVER = 'dist/server/main.js';
const serverPidFile = inData('server.pid');

await main(async () => {
  const unclaim = claimProject();
  const stoppers = createStoppers();
  stoppers.add(unclaim);
  try {
    await endOrphanedServer(serverPidFile, SERVER);
    const port = await choosePort();
    await ensureDebianPackages(process.env['DATABASE_URL'] ? {} : toServe);
    await ensureNpmPackages();
    await ensureBuilt('dist');

    const database = await provideDatabase(stoppers);
    const extra = { NODE_ENV: 'production', PORT: String(port), STATIC_DIR: inProject('dist/client') };
    const owner = productEnvironment(database.ownerUrl, extra);
    await prepareDatabase([], ['dist/server/migrate.js', 'dist/server/seed.js'], owner);

    const server = await startServer({
      args: ['--enable-source-maps', SERVER],
      env: productEnvironment(database.applicationUrl, extra),
      port,
      pidFile: serverPidFile,
      stoppers,
    });
    say(`Graticule is at http://${process.env['HOST'] || 'localhost'}:${port}`);
    await showSignIns((url) => import(url), 'dist/server/demo-people.js');
    say('Ctrl-C stops it.');

    const ended = await Promise.race([server.ended, database.ended]);
    if (!stoppers.isStopping()) throw new SetupError(`The server ended by itself with code ${ended}.`);
  } finally {
    await stoppers.stopAll();
  }
});
