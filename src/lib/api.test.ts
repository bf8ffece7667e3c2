import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';

import { endpoint, idParam } from '#shared/contracts/endpoint.ts';
import { AppError } from '#shared/errors/app-error.ts';
import {
  call,
  fileNameOf,
  NoConnection,
  pathOf,
  rememberSession,
  sentenceOf,
  whenSessionEnds,
} from './api.ts';

const read = endpoint('GET', '/api/things/:thingId', {
  params: z.object({ thingId: idParam }),
  query: z.object({ search: z.string().optional() }),
  response: z.object({ name: z.string() }),
});
const change = endpoint('PUT', '/api/things/:thingId', {
  params: z.object({ thingId: idParam }),
  body: z.object({ name: z.string() }),
  response: z.object({ name: z.string() }),
});
const params = { thingId: 7 };

interface Sent {
  path: string;
  method: string;
  token: string | null;
  body: unknown;
}
const sent: Sent[] = [];
let replies: (() => Response)[] = [];

const problem = (code: string, status: number, more: object = {}) =>
  Response.json(
    { type: `urn:graticule:problem:${code}`, title: code, status, detail: `Told: ${code}.`, code, ...more },
    { status },
  );
const session = (csrfToken: string) => Response.json({ person: null, csrfToken });

beforeEach(() => {
  sent.length = 0;
  replies = [];
  rememberSession({ person: null, csrfToken: 'first' });
  vi.stubGlobal('fetch', (path: string, init: RequestInit) => {
    const headers = new Headers(init.headers);
    sent.push({ path, method: init.method ?? '', token: headers.get('x-csrf-token'), body: init.body });
    const reply = replies.shift();
    return reply === undefined ? Promise.reject(new TypeError('no route')) : Promise.resolve(reply());
  });
});
afterEach(() => vi.unstubAllGlobals());

describe('calling an endpoint', () => {
  it('fills in path and query and sends no token with a reading request', async () => {
    replies = [() => Response.json({ name: 'lens' })];
    expect(await call(read, { params, query: { search: 'a & b' } })).toEqual({ name: 'lens' });
    expect(sent).toEqual([
      { path: '/api/things/7?search=a+%26+b', method: 'GET', token: null, body: undefined },
    ]);
  });

  it('sends the page’s token and the body with a changing request', async () => {
    replies = [() => Response.json({ name: 'lens' })];
    await call(change, { params, body: { name: 'lens' } });
    expect(sent).toEqual([{ path: '/api/things/7', method: 'PUT', token: 'first', body: '{"name":"lens"}' }]);
  });

  it('fetches a new token once when the old one is refused', async () => {
    replies = [
      () => problem('badCsrfToken', 403),
      () => session('second'),
      () => Response.json({ name: 'lens' }),
    ];
    await call(change, { params, body: { name: 'lens' } });
    expect(sent.map(({ path, token }) => [path, token])).toEqual([
      ['/api/things/7', 'first'],
      ['/api/session', null],
      ['/api/things/7', 'second'],
    ]);
  });

  it('gives up when the new token is refused too', async () => {
    replies = [
      () => problem('badCsrfToken', 403),
      () => session('second'),
      () => problem('badCsrfToken', 403),
    ];
    await expect(call(change, { params, body: { name: 'lens' } })).rejects.toMatchObject({
      code: 'badCsrfToken',
    });
    expect(sent).toHaveLength(3);
  });

  it('throws the server’s problem with its sentence, its fields and what the server holds', async () => {
    replies = [
      () =>
        problem('conflict', 409, {
          fields: [{ path: 'name', message: 'Give it a name.' }],
          current: { name: 'mirror' },
        }),
    ];
    const error: unknown = await call(change, { params, body: { name: '' } }).catch(
      (caught: unknown) => caught,
    );
    expect(error).toBeInstanceOf(AppError);
    expect(error).toMatchObject({ code: 'conflict', current: { name: 'mirror' } });
    expect(sentenceOf(error)).toBe('Told: conflict. Give it a name.');
  });

  it('tells a missing connection from a refusal', async () => {
    const error: unknown = await call(read, { params }).catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(NoConnection);
    expect(sentenceOf(error)).toMatch(/cannot be reached/);
  });

  it('throws a readable failure when the answer is no problem document', async () => {
    replies = [() => new Response('<html>', { status: 502 })];
    await expect(call(read, { params })).rejects.toMatchObject({ code: 'internal' });
  });

  it('refuses a reply that is not what the contract says', async () => {
    replies = [() => Response.json({ name: 3 })];
    await expect(call(read, { params })).rejects.toThrow();
  });
});

describe('when the session has ended', () => {
  it('waits for the person to sign in again, then sends the request once more', async () => {
    const stop = whenSessionEnds(() => {
      rememberSession({ person: null, csrfToken: 'after' });
      return Promise.resolve(true);
    });
    replies = [() => problem('notSignedIn', 401), () => Response.json({ name: 'lens' })];
    expect(await call(change, { params, body: { name: 'lens' } })).toEqual({ name: 'lens' });
    expect(sent.map(({ token }) => token)).toEqual(['first', 'after']);
    stop();
  });

  it('fails with the server’s sentence when the person does not', async () => {
    const stop = whenSessionEnds(() => Promise.resolve(false));
    replies = [() => problem('notSignedIn', 401)];
    await expect(call(read, { params })).rejects.toMatchObject({ code: 'notSignedIn' });
    expect(sent).toHaveLength(1);
    stop();
  });
});

describe('addresses and file names', () => {
  it('leaves out query values that say nothing', () => {
    expect(pathOf(read, params, { search: '', page: undefined, sort: null, size: 0 })).toBe(
      '/api/things/7?size=0',
    );
  });

  it('reads a file name with quotes and without (RFC 6266, section 4)', () => {
    expect(fileNameOf('attachment; filename="P-001 mark scheme.docx"')).toBe('P-001 mark scheme.docx');
    expect(fileNameOf('attachment; filename=P-001-mark-scheme.docx')).toBe('P-001-mark-scheme.docx');
    expect(fileNameOf('')).toBe('export');
  });
});
