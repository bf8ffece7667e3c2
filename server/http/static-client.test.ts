import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import express from 'express';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { serveClient } from './static-client.ts';

let above = '';

beforeAll(() => {
  above = mkdtempSync(join(tmpdir(), 'client-'));
});
afterAll(() => rmSync(above, { recursive: true, force: true }));

function clientIn(folderName: string) {
  const folder = join(above, folderName, 'client');
  mkdirSync(join(folder, 'assets'), { recursive: true });
  writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Graticule</title>');
  writeFileSync(join(folder, 'assets', 'main-1a2b.js'), 'export {};');
  const app = express();
  serveClient(app, folder);
  return request(app);
}

describe.each(['plain', '.hidden'])('a client in a folder called %s', (folderName) => {
  it.each(['/', '/items/12'])('is opened at %s and asked for anew each time', async (path) => {
    const reply = await clientIn(folderName).get(path);
    expect(reply.status).toBe(200);
    expect(reply.text).toContain('<title>Graticule</title>');
    expect(reply.headers['cache-control']).toBe('no-cache');
  });

  it('keeps its hashed assets for a year', async () => {
    const reply = await clientIn(folderName).get('/assets/main-1a2b.js');
    expect(reply.status).toBe(200);
    expect(reply.headers['cache-control']).toContain('immutable');
  });
});
