import type { Request } from 'express';
import type { z } from 'zod';

import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { AppError, type FieldProblem } from '#shared/errors/app-error.ts';

type Source = 'params' | 'query' | 'body';

function problemsOf(error: z.ZodError): FieldProblem[] {
  return error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
}

function sentence(source: Source, problems: readonly FieldProblem[]): string {
  const [first] = problems;
  if (source === 'params') return 'The address names something that cannot exist. Go back and try again.';
  if (source === 'query') {
    return `The search cannot be understood (${first?.path ?? 'query'}: ${first?.message ?? 'not readable'}).`;
  }
  // A schema's own words are a sentence; the library's are none.
  const isSentence = first !== undefined && first.path !== '' && first.message.endsWith('.');
  if (problems.length === 1 && isSentence) return first.message;
  return 'Some fields are not right. Each is marked with what it needs.';
}

function parse<Schema extends z.ZodType>(schema: Schema, value: unknown, source: Source): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const fields = problemsOf(parsed.error);
  throw new AppError('invalid', sentence(source, fields), { fields });
}

/** Reads path, query and body by the contract's schemas. Throws AppError invalid with the fields' problems. */
export function parseInput<Params extends z.ZodType, Query extends z.ZodType, Body extends z.ZodType>(
  contract: Endpoint<Params, Query, Body>,
  request: Request,
): { params: z.output<Params>; query: z.output<Query>; body: z.output<Body> } {
  const body: unknown = request.body;
  return {
    params: parse(contract.params, request.params, 'params'),
    query: parse(contract.query, request.query, 'query'),
    body: parse(contract.body, body ?? {}, 'body'),
  };
}
