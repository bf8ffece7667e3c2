import type { Actor } from '#shared/domain/permissions.ts';

/** The person behind a request. */
export interface SignedIn extends Actor {
  name: string;
  email: string;
  /** Tells sessions apart in the records without naming them. */
  sessionRef: string;
}
