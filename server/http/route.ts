import type { Request } from 'express';
import type { z } from 'zod';

import type { Endpoint } from '#shared/contracts/endpoint.ts';
import type { Action } from '#shared/domain/permissions.ts';

import { FileReply } from './file-reply.ts';
import { parseInput } from './parse-input.ts';
import type { SignedIn } from './signed-in.ts';

/** Who may call a route, and what it takes beside JSON. */
export interface Guard {
  /**
   * An action of the permission table (the role is asked here, ownership by the service with `demand`), anyone
   * who is signed in, or anyone at all.
   */
  can: Action | 'signedIn' | 'anyone';
  /** The route takes multipart/form-data with one file in the field `file`, at most so many bytes. */
  uploadBytes?: number;
}

export interface UploadedFile {
  name: string;
  bytes: Buffer;
}

/** What a route has to work with besides what the contract describes. */
interface Surroundings<Caller extends SignedIn | null> {
  actor: Caller;
  /** Null unless the guard has `uploadBytes`; then never null. */
  file: UploadedFile | null;
  /** Aborted when the client goes away before the answer. */
  signal: AbortSignal;
  /** The client's network address. */
  address: string;
  /** The request itself, for what belongs to the session. */
  request: Request;
}

export type RouteInput<Params, Query, Body, Caller extends SignedIn | null> = Surroundings<Caller> & {
  params: Params;
  query: Query;
  body: Body;
};

export interface Route {
  contract: Endpoint;
  guard: Guard;
  /** Parses, works and gives the reply as the response schema lets it through. */
  answer: (surroundings: Surroundings<SignedIn | null>) => Promise<unknown>;
}

type CallerOf<Can> = Can extends 'anyone' ? SignedIn | null : SignedIn;

/**
 * One endpoint with its guard and its work. The handler gets parsed input; what it returns goes through the
 * contract's response schema, so nothing leaves that the contract does not name. A FileReply is sent as it is.
 */
export function route<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Response extends z.ZodType,
  const Can extends Guard['can'],
>(
  contract: Endpoint<Params, Query, Body, Response>,
  guard: Guard & { can: Can },
  handler: (
    input: RouteInput<z.output<Params>, z.output<Query>, z.output<Body>, CallerOf<Can>>,
  ) => Promise<z.input<Response> | FileReply>,
): Route {
  return {
    contract,
    guard,
    answer: async (surroundings) => {
      const input = parseInput(contract, surroundings.request);
      // The guard has seen to it that a caller is there wherever the type says so.
      const actor = surroundings.actor as CallerOf<Can>;
      const reply = await handler({ ...surroundings, ...input, actor });
      return reply instanceof FileReply ? reply : contract.response.parse(reply);
    },
  };
}
