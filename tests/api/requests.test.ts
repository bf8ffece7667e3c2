import { mkdtemp, mkdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import express from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { z } from 'zod';

import { createErrorHandler } from '#server/http/error-handler.ts';
import { FileReply } from '#server/http/file-reply.ts';
import { mountRoutes } from '#server/http/mount-routes.ts';
import { logRequests } from '#server/http/request-log.ts';
import { route } from '#server/http/route.ts';
import { endpoint } from '#shared/contracts/endpoint.ts';
import { getHealth } from '#shared/contracts/health.ts';
import { listPeople, setRoles } from '#shared/contracts/people.ts';
import { listRecords } from '#shared/contracts/records.ts';
import { AppError, problemSchema } from '#shared/errors/app-error.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
beforeEach(() => emptyTables(app.context.database));
afterAll(() => app.close());

const rolesPath = '/api/people/1/roles';

describe('a request that cannot be served', () => {
  it('is answered as problem details with the request’s id', async () => {
    const reply = await app.visitor().agent.get('/api/nothing/here');
    expect(reply.status).toBe(404);
    expect(reply.headers['content-type']).toBe('application/problem+json; charset=utf-8');
    const problem = problemSchema.parse(reply.body);
    expect(problem).toMatchObject({ status: 404, code: 'notFound', title: 'Not found' });
    expect(problem.requestId).toBe(reply.headers['x-request-id']);
  });

  it('is a 404 for a method that a path does not have', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.agent.delete(listPeople.path).set('x-csrf-token', await client.csrfToken());
    expect(reply.status).toBe(404);
  });

  it.each([
    ['malformed JSON', 'application/json', '{"version": 1,', 400, 'badRequest'],
    ['JSON that is no object', 'application/json', '7', 400, 'badRequest'],
    ['a form', 'application/x-www-form-urlencoded', 'version=1', 415, 'unsupportedFile'],
    ['a text', 'text/plain', 'hello', 415, 'unsupportedFile'],
    ['an encoding that nobody reads', 'application/json; charset=ebcdic', '{}', 415, 'unsupportedFile'],
    [
      'a body too large',
      'application/json',
      JSON.stringify({ roles: ['x'.repeat(2_200_000)] }),
      413,
      'tooLarge',
    ],
  ] as const)('says what is wrong with %s', async (_name, type, body, status, code) => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.agent
      .put(rolesPath)
      .set('x-csrf-token', await client.csrfToken())
      .set('Content-Type', type)
      .send(body);
    expect(reply.status).toBe(status);
    const problem = problemSchema.parse(reply.body);
    expect(problem.code).toBe(code);
    expect(problem.detail).toMatch(/^[A-Z].+\.$/);
    expect(problem.detail).not.toMatch(/JSON at position|Unexpected token/);
  });

  it('asks who it is before it reads a body', async () => {
    const visitor = app.visitor();
    const reply = await visitor.agent
      .put(rolesPath)
      .set('x-csrf-token', await visitor.csrfToken())
      .set('Content-Type', 'application/json')
      .send('{"broken');
    expect(reply.status).toBe(401);
  });

  it('names each field that is wrong', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.attempt(setRoles, {
      params: { personId: 1 },
      body: { version: 'one', roles: ['writer', 'king'] },
    });
    expect(reply.status).toBe(422);
    expect(reply.body.fields?.map((field) => field.path)).toEqual(['version', 'roles.1']);
  });

  it('says when the path names nothing that can exist', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.attempt(setRoles, {
      params: { personId: 'x' },
      body: { version: 1, roles: [] },
    });
    expect(reply.status).toBe(422);
    expect(reply.body.fields?.[0]?.path).toBe('personId');
  });

  it('says which part of a search is wrong', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.attempt(listRecords, { query: { page: 0 } });
    expect(reply.status).toBe(422);
    expect(reply.body.detail).toMatch(/page/);
  });

  it('takes a path that is not well encoded as a bad request', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.agent
      .put('/api/people/%E0%A4%A/roles')
      .set('x-csrf-token', await client.csrfToken())
      .send({ version: 1, roles: [] });
    expect(reply.status).toBe(400);
  });
});

describe('a route', () => {
  const logged: string[] = [];
  const logger = pino({ level: 'info' }, { write: (line: string) => void logged.push(line) });
  const shape = z.object({ shown: z.string() });
  const bare = express();
  bare.use(logRequests(logger));
  mountRoutes(bare, [
    route(endpoint('GET', '/strips', { response: shape }), { can: 'anyone' }, async () =>
      Object.assign({ shown: 'yes' }, { secret: 'no' }),
    ),
    route(endpoint('GET', '/breaks', { response: shape }), { can: 'anyone' }, async () => {
      throw new Error('the pump lost its prime');
    }),
    route(endpoint('GET', '/lies', { response: shape }), { can: 'anyone' }, async () => {
      return JSON.parse('{"other": 1}') as { shown: string };
    }),
    route(endpoint('GET', '/conflicts', { response: shape }), { can: 'anyone' }, async () => {
      throw new AppError('conflict', 'Somebody else changed this.', { current: { version: 4 } });
    }),
    route(endpoint('GET', '/file', { response: z.unknown() }), { can: 'anyone' }, async () => {
      return new FileReply(Buffer.from('<svg/>'), 'image/svg+xml', { fileName: 'tube “one”.svg' });
    }),
  ]);
  bare.use(createErrorHandler(logger));

  it('lets nothing out that its contract does not name', async () => {
    const reply = await supertest(bare).get('/strips');
    expect(reply.body).toEqual({ shown: 'yes' });
    expect(reply.headers['cache-control']).toBe('no-store');
  });

  it('tells of a fault only its request id, and logs the whole of it', async () => {
    const reply = await supertest(bare).get('/breaks');
    expect(reply.status).toBe(500);
    expect(reply.text).not.toContain('pump');
    const problem = problemSchema.parse(reply.body);
    const line = logged.find((text) => text.includes('the pump lost its prime'));
    expect(line).toContain(problem.requestId);
    expect(line).toContain('requests.test.ts');
  });

  it('takes a reply that breaks the contract as a fault', async () => {
    expect((await supertest(bare).get('/lies')).status).toBe(500);
  });

  it('sends what the server holds along with a conflict', async () => {
    const reply = await supertest(bare).get('/conflicts');
    expect(reply.status).toBe(409);
    expect(problemSchema.parse(reply.body).current).toEqual({ version: 4 });
  });

  it('sends a file that can run nothing', async () => {
    const reply = await supertest(bare).get('/file');
    expect(reply.headers['content-type']).toMatch(/^image\/svg\+xml/);
    expect(reply.headers['content-security-policy']).toContain('sandbox');
    expect(reply.headers['content-disposition']).toMatch(/^attachment; filename=/);
  });
});

describe('what every answer carries', () => {
  it('binds the browser to this server', async () => {
    const { headers } = await app.visitor().agent.get(getHealth.path);
    const policy = String(headers['content-security-policy']);
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['strict-transport-security']).toBeUndefined();
  });

  it('says that the server is ready without beginning a session', async () => {
    const reply = await app.visitor().agent.get(getHealth.path);
    expect(reply.status).toBe(200);
    expect(getHealth.response.parse(reply.body).status).toBe('ready');
    expect(reply.headers['set-cookie']).toBeUndefined();
  });

  it('says that it is not ready when the database is gone', async () => {
    const lost = openTestApp({ databaseUrl: 'mysql://nobody@127.0.0.1:1/none' });
    const reply = await lost.visitor().agent.get(getHealth.path);
    expect(reply.status).toBe(503);
    await lost.close();
  });
});

describe('the built client', () => {
  let folder = '';
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'client-'));
    await mkdir(join(folder, 'assets'));
    await writeFile(join(folder, 'index.html'), '<!doctype html><title>Bank</title>');
    await writeFile(join(folder, 'assets', 'main-1a2b.js'), 'export {};');
  });
  afterAll(() => rm(folder, { recursive: true }));

  it('is served with its pages, its assets for a year, and no page in place of a missing asset or endpoint', async () => {
    const served = openTestApp({ staticFolder: folder });
    const { agent } = served.visitor();
    for (const path of ['/', '/items/12']) {
      const page = await agent.get(path);
      expect(page.status).toBe(200);
      expect(page.text).toContain('<title>Bank</title>');
      expect(page.headers['cache-control']).toBe('no-cache');
    }
    const asset = await agent.get('/assets/main-1a2b.js');
    expect(asset.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect((await agent.get('/assets/gone-9.js')).status).toBe(404);
    expect((await agent.get('/api/gone')).status).toBe(404);
    await served.close();
  });
});
