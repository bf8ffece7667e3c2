import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';

import { AppError } from '#shared/errors/app-error.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { Failure, Loading, WholeFailure } from './states.tsx';

interface AwaitedProps<Data> {
  query: UseQueryResult<Data>;
  /** Finishes "Loading …". */
  what: string;
  /** What is asked for is the whole screen, so that a failure brings a title and a way out. */
  whole?: boolean;
  children: (data: Data) => ReactNode;
}

/** Whether the server now refuses what it gave before. */
const isRefused = (error: unknown) =>
  error instanceof AppError && (error.code === 'notAllowed' || error.code === 'notFound');

/**
 * What was asked for, once it is here. When a later look fails, what is here stays on the screen with whatever
 * was typed into it, and the failure is told above it; what the server refuses by now goes.
 */
export function Awaited<Data>({ query, what, whole = false, children }: AwaitedProps<Data>) {
  const { data, error } = query;
  const retry = () => void query.refetch();
  if (data === undefined && error === null) return <Loading what={what} />;
  if (data === undefined || isRefused(error)) {
    return whole ? (
      <WholeFailure error={error} onRetry={retry} />
    ) : (
      <Failure message={sentenceOf(error)} onRetry={retry} />
    );
  }
  return (
    <>
      {error !== null && <Failure message={sentenceOf(error)} onRetry={retry} />}
      {children(data)}
    </>
  );
}
