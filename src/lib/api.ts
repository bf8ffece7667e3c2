import type { z } from 'zod';

import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { getSession, type SessionReply } from '#shared/contracts/session.ts';
import { AppError, problemSchema } from '#shared/errors/app-error.ts';
import { reportReachable } from './connection.ts';

/** What goes into a call; parts that the contract leaves empty may be left out. */
interface CallInput<Params, Query, Body> {
  params?: Params;
  query?: Query;
  body?: Body;
  signal?: AbortSignal;
}

const NO_CONNECTION = 'The server cannot be reached. Check the connection; nothing that you typed is lost.';

/** Thrown when no answer came at all; whatever was typed stays where it is. */
export class NoConnection extends Error {
  constructor(cause: unknown) {
    super(NO_CONNECTION, { cause });
    this.name = 'NoConnection';
  }
}

/** Asks the person to sign in again; gives whether they did. */
type SignInAgain = () => Promise<boolean>;

let csrfToken: string | null = null;
let signInAgain: SignInAgain | null = null;

/** Remembers the token that changing requests carry; every session reply brings one. */
export function rememberSession(session: SessionReply): void {
  csrfToken = session.csrfToken;
}

/**
 * While a screen is open: requests that find the session ended wait for `ask`, and go out once more when the
 * person has signed in again. Returns how to stop.
 */
export function whenSessionEnds(ask: SignInAgain): () => void {
  signInAgain = ask;
  return () => {
    if (signInAgain === ask) signInAgain = null;
  };
}

/** The path of an endpoint with its parameters and query filled in. */
export function pathOf(endpoint: Pick<Endpoint, 'path'>, params: unknown, query: unknown): string {
  // Every contract’s parameters and query are of these kinds.
  type Sent = Record<string, string | number | boolean | null | undefined>;
  const values = (params ?? {}) as Sent;
  const path = endpoint.path.replace(/:(\w+)/g, (_whole, name: string) =>
    encodeURIComponent(String(values[name])),
  );
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries((query ?? {}) as Sent)) {
    if (value !== undefined && value !== null && value !== '') search.set(name, String(value));
  }
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}

async function problemOf(response: Response): Promise<AppError> {
  const parsed = problemSchema.safeParse(await response.json().catch(() => null));
  if (!parsed.success) {
    return new AppError('internal', 'The server gave an answer that cannot be read. Try again.');
  }
  const { code, detail, fields, current } = parsed.data;
  return new AppError(code, detail, { current, ...(fields === undefined ? {} : { fields }) });
}

/** What has been tried already for a request, so that nothing is tried for ever. */
interface Tried {
  token?: true;
  signIn?: true;
}

async function fetchReply(path: string, init: RequestInit): Promise<Response> {
  try {
    const response = await fetch(path, { ...init, credentials: 'same-origin' });
    reportReachable(true);
    return response;
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    reportReachable(false);
    throw new NoConnection(error);
  }
}

async function send(path: string, init: RequestInit, tried: Tried = {}): Promise<Response> {
  const changes = init.method !== 'GET';
  if (changes && csrfToken === null) rememberSession(await call(getSession));
  const headers = new Headers(init.headers);
  if (changes && csrfToken !== null) headers.set('x-csrf-token', csrfToken);
  const response = await fetchReply(path, { ...init, headers });
  if (response.ok) return response;
  const problem = await problemOf(response);
  if (problem.code === 'badCsrfToken' && tried.token === undefined) {
    csrfToken = null;
    return send(path, init, { ...tried, token: true });
  }
  if (problem.code === 'notSignedIn' && tried.signIn === undefined && (await signInAgain?.()) === true) {
    return send(path, init, { signIn: true });
  }
  throw problem;
}

/**
 * Calls an endpoint by its contract; the reply is checked against it. Throws AppError with the server's
 * sentence, NoConnection when there is no answer, or the AbortError of `signal`.
 */
export async function call<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Reply extends z.ZodType,
>(
  endpoint: Endpoint<Params, Query, Body, Reply>,
  input: CallInput<z.input<Params>, z.input<Query>, z.input<Body>> = {},
): Promise<z.output<Reply>> {
  const hasBody = endpoint.method !== 'GET';
  const response = await send(pathOf(endpoint, input.params, input.query), {
    method: endpoint.method,
    ...(input.signal === undefined ? {} : { signal: input.signal }),
    ...(hasBody
      ? { body: JSON.stringify(input.body ?? {}), headers: { 'content-type': 'application/json' } }
      : {}),
  });
  return endpoint.response.parse(await response.json());
}

/** Sends one file in the field `file`; gives the reply as it came. */
export async function sendFile(
  endpoint: Endpoint,
  { params, file, signal }: { params: unknown; file: File; signal?: AbortSignal },
): Promise<unknown> {
  const body = new FormData();
  body.set('file', file, file.name);
  const response = await send(pathOf(endpoint, params, {}), {
    method: endpoint.method,
    body,
    ...(signal === undefined ? {} : { signal }),
  });
  return response.json();
}

/** The file name in a Content-Disposition header, quoted or not (RFC 6266); "export" where there is none. */
export function fileNameOf(header: string): string {
  const [, quoted, plain] = /filename=(?:"([^"]+)"|([^\s;"]+))/.exec(header) ?? [];
  return quoted ?? plain ?? 'export';
}

/** Fetches a file and hands it to the browser to save under the name that the server gives it. */
export async function download(endpoint: Endpoint, params: unknown, signal?: AbortSignal): Promise<void> {
  const response = await send(pathOf(endpoint, params, {}), {
    method: endpoint.method,
    ...(signal === undefined ? {} : { signal }),
  });
  const name = fileNameOf(response.headers.get('content-disposition') ?? '');
  const address = URL.createObjectURL(await response.blob());
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

/** An error as a sentence that can be shown. */
export function sentenceOf(error: unknown): string {
  if (error instanceof AppError) {
    const details = error.fields?.map((field) => field.message) ?? [];
    return [error.message, ...details].join(' ');
  }
  return error instanceof NoConnection ? error.message : 'Something went wrong on this page. Load it again.';
}
