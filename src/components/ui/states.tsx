import type { ReactNode } from 'react';

/** While something loads: one quiet line, told to screen readers. */
export function Loading({ what }: { what: string }) {
  return (
    <p role="status" className="py-8 text-muted">
      Loading {what}…
    </p>
  );
}

/** Nothing to show, and what to do about it. */
export function Empty({ children }: { children: ReactNode }) {
  return <div className="py-8 text-muted">{children}</div>;
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
