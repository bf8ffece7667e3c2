import { isRouteErrorResponse, Link, useRouteError } from 'react-router';

import { AppError } from '#shared/errors/app-error.ts';
import { sentenceOf } from '#src/lib/api.ts';

/** Whatever went wrong on a screen, as a sentence with a way out. */
export function ErrorPage() {
  const error = useRouteError();
  const missing = isRouteErrorResponse(error) || (error instanceof AppError && error.code === 'notFound');
  return (
    <div className="mx-auto max-w-prose px-4 py-16">
      <h1 className="mb-4 text-2xl font-semibold">
        {missing ? 'Nothing stands here' : 'Something went wrong'}
      </h1>
      <p className="mb-6">
        {missing ? 'The address leads nowhere, or the thing is no longer there.' : sentenceOf(error)}
      </p>
      <p>
        <Link className="link" to="/desk" reloadDocument={!missing}>
          Go to the desk
        </Link>
      </p>
    </div>
  );
}
