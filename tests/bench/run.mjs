// Bundles the benchmark as the production build bundles the engine, then runs it.
import { build } from 'esbuild';
import { fileURLToPath, pathToFileURL } from 'node:url';

const entry = fileURLToPath(new URL('./bench.ts', import.meta.url));
const outfile = fileURLToPath(new URL('../../.bench/bench.mjs', import.meta.url));
await build({
  entryPoints: [entry],
  outfile,
  bundle: true,
  platform: 'node',
  format: 'esm',
  logLevel: 'warning',
});
await import(pathToFileURL(outfile).href);
