import { useOutletContext } from 'react-router';

import type { SignedInPerson } from '#shared/contracts/session.ts';

/** The person who is signed in; only screens inside the layout may ask. */
export const usePerson = (): SignedInPerson => useOutletContext<SignedInPerson>();
