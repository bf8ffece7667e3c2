import { existsSync, readdirSync, rmSync } from 'node:fs';

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

/** The client for browsers into dist/client. */
function buildClient() {
  return run('node', ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn'], {
    env: { ...process.env, NODE_ENV: 'production' },
  });
}

/** The server, its threads and its one-off programs, one bundle each, into dist/server. */
async function buildServer() {
  // Loaded late: this file is read before the packages are installed.
  const { build } = await import('esbuild');
  const workers = readdirSync(inProject('server/workers')).filter((name) => name.endsWith('-worker.ts'));
  const entries = {
    main: 'server/main.ts',
    migrate: 'server/db/migrate.ts',
    seed: 'server/db/seed/main.ts',
  };
  for (const name of workers) entries[`workers/${name.slice(0, -'.ts'.length)}`] = `server/workers/${name}`;
  const present = Object.fromEntries(
    Object.entries(entries).filter(([, file]) => existsSync(inProject(file))),
  );
  await build({
    absWorkingDir: inProject(),
    entryPoints: present,
    outdir: 'dist/server',
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

/** Builds client and server into dist/, unless the sources are those of the last build. */
export async function ensureBuilt() {
  const sources = fingerprint(SOURCES, leftOut);
  const present =
    existsSync(inProject('dist/client/index.html')) && existsSync(inProject('dist/server/main.js'));
  if (present && isRecorded('build', sources)) return;
  say('Building.');
  rmSync(inProject('dist'), { recursive: true, force: true });
  await buildClient();
  await buildServer();
  record('build', sources);
}
