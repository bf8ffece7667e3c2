import { existsSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';

import { fingerprint, isRecorded, record } from './fingerprint.mjs';
import { inProject } from './places.mjs';
import { run } from './run.mjs';
import { say } from './say.mjs';

/** Everything that the built product depends on. */
const SOURCES = [
  'src',
  'server',
  'shared',
  'public',
  'package-lock.json',
  'package.json',
  'tsconfig.json',
  'vite.config.ts',
  'tailwind.config.ts',
];

/** Tests change nothing in what is built. */
const leftOut = (name) => /\.(test|long)\.tsx?$/.test(name);

/** The client for browsers into `folder`/client. */
function buildClient(folder) {
  const client = path.join(folder, 'client');
  return run(
    'node',
    ['node_modules/vite/bin/vite.js', 'build', '--outDir', client, '--emptyOutDir', '--logLevel', 'warn'],
    { env: { ...process.env, NODE_ENV: 'production' } },
  );
}

/** The server, its threads and its one-off programs, one bundle each, into `folder`/server. */
async function buildServer(folder) {
  // Loaded late: this file is read before the packages are installed.
  const { build } = await import('esbuild');
  const entryPoints = {
    main: 'server/main.ts',
    migrate: 'server/db/migrate.ts',
    seed: 'server/db/seed/main.ts',
    'demo-people': 'server/db/seed/demo-people.ts',
  };
  for (const name of readdirSync(inProject('server/workers'))) {
    if (name.endsWith('-worker.ts'))
      entryPoints[`workers/${path.parse(name).name}`] = `server/workers/${name}`;
  }
  await build({
    absWorkingDir: inProject(),
    entryPoints,
    outdir: path.join(folder, 'server'),
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    // The project's own "#..." imports are bundled; what stands in node_modules is not.
    packages: 'external',
    sourcemap: 'linked',
    legalComments: 'none',
    logLevel: 'warning',
  });
}

/**
 * Builds client and server into `folder` of the project, unless the sources are those of its last build. Tests
 * build into a folder of their own, so that a running server keeps its files.
 */
export async function ensureBuilt(folder) {
  const name = `build-${path.basename(folder)}`;
  const place = inProject(folder);
  const sources = fingerprint(SOURCES, leftOut);
  const present = ['client/index.html', 'server/main.js'].every((file) => existsSync(path.join(place, file)));
  if (present && isRecorded(name, sources)) return;
  say('Building.');
  rmSync(place, { recursive: true, force: true });
  await buildClient(place);
  await buildServer(place);
  record(name, sources);
}
