import { z } from 'zod';

export type Method = 'GET' | 'POST' | 'PUT' | 'DELETE';

/** One endpoint: what goes in and what comes out. Server, client and tests all read this. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  method: Method;
  /** As Express writes it: `/api/items/:itemId`. */
  path: string;
  params: Params;
  query: Query;
  body: Body;
  response: Response;
}

const none = z.object({});
type None = typeof none;

interface Parts<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Response extends z.ZodType,
> {
  params?: Params;
  query?: Query;
  body?: Body;
  response: Response;
}

/** Declares an endpoint; parts left out are empty objects. */
export function endpoint<
  Response extends z.ZodType,
  Params extends z.ZodType = None,
  Query extends z.ZodType = None,
  Body extends z.ZodType = None,
>(
  method: Method,
  path: string,
  parts: Parts<Params, Query, Body, Response>,
): Endpoint<Params, Query, Body, Response> {
  return {
    method,
    path,
    params: parts.params ?? (none as unknown as Params),
    query: parts.query ?? (none as unknown as Query),
    body: parts.body ?? (none as unknown as Body),
    response: parts.response,
  };
}

/** An id in a path. */
export const idParam = z.coerce.number().int().positive();

/** A point in time as ISO 8601 text in UTC. */
export const instant = z.iso.datetime();

export const emptyReply = z.object({});

/** A page of a list: `total` counts all rows that match. */
export function pageOf<Row extends z.ZodType>(row: Row) {
  return z.object({
    rows: z.array(row),
    total: z.number().int(),
    page: z.number().int(),
    pageSize: z.number().int(),
  });
}

export const pageQuery = {
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
};
