import { Link } from 'react-router';
import { Page } from '../layout/Page.tsx';

/** For a screen that this person's roles do not open. */
export function NotAllowed({ what }: { what: string }) {
  return (
    <Page title={what}>
      <p className="max-w-prose">
        Your roles do not open this screen. Ask an administrator if you need it, or go back to{' '}
        <Link className="link" to="/desk">
          your desk
        </Link>
        .
      </p>
    </Page>
  );
}
