import type { ReactNode } from 'react';
import { Link } from 'react-router';

import { AppError } from '#shared/errors/app-error.ts';
import { NoConnection, sentenceOf } from '#src/lib/api.ts';

/** While something loads: one quiet line, told to screen readers; it shows only when it takes a moment. */
export function Loading({ what }: { what: string }) {
  return (
    <p role="status" className="appear-late py-8 text-muted">
      Loading {what}…
    </p>
  );
}

/** Nothing to show, and what to do about it. */
export function Empty({ children }: { children: ReactNode }) {
  return <div className="max-w-prose py-8 text-muted">{children}</div>;
}

/** Something failed: a sentence, and a way to try again. */
export function Failure({ message, onRetry }: { message: string; onRetry?: () => void }) {
  return (
    <div role="alert" className="notice notice-blocker my-6 grid justify-items-start gap-2">
      <p>{message}</p>
      {onRetry !== undefined && (
        <button type="button" className="button" onClick={onRetry}>
          Try again
        </button>
      )}
    </div>
  );
}

function titleOf(error: unknown): string {
  if (error instanceof NoConnection) return 'No answer from the server';
  if (!(error instanceof AppError)) return 'Something went wrong';
  if (error.code === 'notFound') return 'Nothing stands here';
  return error.code === 'notAllowed' ? 'Not open to you' : 'Something went wrong';
}

/** A whole screen failed: what happened, whether it can be tried again, and the way to the desk. */
export function WholeFailure({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  const final = error instanceof AppError && ['notFound', 'notAllowed'].includes(error.code);
  return (
    <div role="alert" className="max-w-prose py-10">
      <h1 className="mb-4 text-2xl font-semibold">{titleOf(error)}</h1>
      <p className="mb-6">{sentenceOf(error)}</p>
      <p className="flex flex-wrap items-baseline gap-6">
        {onRetry !== undefined && !final && (
          <button type="button" className="button" onClick={onRetry}>
            Try again
          </button>
        )}
        <Link className="link" to="/desk">
          Go to the desk
        </Link>
      </p>
    </div>
  );
}
