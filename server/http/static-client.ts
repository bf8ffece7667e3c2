import { join } from 'node:path';

import express, { type Express } from 'express';

const YEAR_SECONDS = 31_536_000;

/**
 * Serves the built client from `folder`: hashed assets for a year, everything else asked for anew; any path
 * that is no file opens the client itself, which knows its own pages.
 */
export function serveClient(app: Express, folder: string): void {
  app.use(
    '/assets',
    express.static(join(folder, 'assets'), {
      immutable: true,
      maxAge: YEAR_SECONDS * 1000,
      fallthrough: false,
    }),
  );
  app.use(express.static(folder, { maxAge: 0, index: false, redirect: false }));
  app.get('/{*path}', (_request, response) => {
    // The folder is the root: in a whole path any part that begins with a dot would be refused.
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root: folder });
  });
}
