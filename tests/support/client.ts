import type { Express } from 'express';
import supertest from 'supertest';
import type { z } from 'zod';

import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { getSession, signIn } from '#shared/contracts/session.ts';
import type { Problem } from '#shared/errors/app-error.ts';

interface CallParts {
  params?: Record<string, string | number>;
  query?: Record<string, string | number>;
  body?: unknown;
}

export interface Reply<Body> {
  status: number;
  body: Body;
  headers: Record<string, string>;
}

function fillPath(path: string, params: Record<string, string | number>): string {
  return path.replace(/:(\w+)/g, (_whole, name: string) => encodeURIComponent(String(params[name])));
}

/** One browser: keeps its cookies and its page's token. */
export class Client {
  readonly agent: ReturnType<typeof supertest.agent>;
  #csrfToken: string | null = null;

  constructor(app: Express) {
    this.agent = supertest.agent(app);
  }

  /** The token of the session, asked for once. */
  async csrfToken(): Promise<string> {
    if (this.#csrfToken === null) {
      const reply = await this.agent.get(getSession.path);
      this.#csrfToken = (reply.body as { csrfToken: string }).csrfToken;
    }
    return this.#csrfToken;
  }

  /** Calls an endpoint whatever the answer. */
  async attempt(endpoint: Endpoint, parts: CallParts = {}): Promise<Reply<Problem>> {
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'delete';
    // Asked for first, since a request takes its cookies along when it is made.
    const token = method === 'get' ? null : await this.csrfToken();
    const request = this.agent[method](fillPath(endpoint.path, parts.params ?? {}));
    if (parts.query !== undefined) request.query(parts.query);
    if (token !== null) request.set('x-csrf-token', token);
    if (parts.body !== undefined) request.send(parts.body as object);
    const { status, body, headers } = await request;
    return { status, body: body as Problem, headers };
  }

  /** Calls an endpoint that must succeed; gives its reply. */
  async call<Response extends z.ZodType>(
    endpoint: Endpoint<z.ZodType, z.ZodType, z.ZodType, Response>,
    parts: CallParts = {},
  ): Promise<z.output<Response>> {
    const reply = await this.attempt(endpoint, parts);
    if (reply.status !== 200) {
      throw new Error(
        `${endpoint.method} ${endpoint.path} answered ${reply.status}: ${JSON.stringify(reply.body)}`,
      );
    }
    return endpoint.response.parse(reply.body);
  }

  async signIn(email: string, password: string): Promise<Reply<Problem>> {
    const reply = await this.attempt(signIn, { body: { email, password } });
    // A new session has a new token.
    this.#csrfToken = null;
    return reply;
  }
}
