import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useSyncExternalStore } from 'react';

import { getHealth } from '#shared/contracts/health.ts';
import { call } from '#src/lib/api.ts';
import { isReachable, onReachableChange, reportReachable } from '#src/lib/connection.ts';

const TRY_EVERY_MS = 5_000;

/** A line under the top while the server cannot be reached; it is tried again and again. */
export function ConnectionLine() {
  const reachable = useSyncExternalStore(onReachableChange, isReachable);
  const queries = useQueryClient();
  useEffect(() => {
    const lost = () => reportReachable(false);
    window.addEventListener('offline', lost);
    return () => window.removeEventListener('offline', lost);
  }, []);
  useEffect(() => {
    if (reachable) return undefined;
    const ask = () =>
      void call(getHealth)
        .then(() => {
          reportReachable(true);
          window.dispatchEvent(new Event('online'));
          return queries.invalidateQueries();
        })
        .catch(() => undefined);
    const timer = setInterval(ask, TRY_EVERY_MS);
    return () => clearInterval(timer);
  }, [reachable, queries]);
  return (
    <div role="status" className="mx-auto w-full max-w-[100rem] px-4 sm:px-8">
      {!reachable && (
        <p className="notice mt-3">
          The server cannot be reached. What you typed stays on this screen; the connection is tried every few
          seconds.
        </p>
      )}
    </div>
  );
}
