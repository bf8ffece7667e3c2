import { isRouteErrorResponse, useRouteError } from 'react-router';

import { AppError } from '#shared/errors/app-error.ts';
import { WholeFailure } from '#src/components/ui/states.tsx';
import { usePageTitle } from './use-page-title.ts';

/** An address that leads nowhere. */
export function NothingHere() {
  usePageTitle('Nothing stands here');
  return (
    <WholeFailure
      error={new AppError('notFound', 'The address leads nowhere, or the thing is no longer there.')}
    />
  );
}

/** Whatever went wrong on a screen, as a sentence with a way out. */
export function ErrorPage() {
  const error = useRouteError();
  usePageTitle('Something went wrong');
  if (isRouteErrorResponse(error)) return <NothingHere />;
  return (
    <div className="mx-auto w-full max-w-[100rem] px-4 sm:px-8">
      <WholeFailure error={error} onRetry={() => window.location.reload()} />
    </div>
  );
}
