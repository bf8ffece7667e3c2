/** What the first event of all follows. */
export const GENESIS_HASH = '0'.repeat(64);

/** An event without its own hash. */
export interface ChainedEvent {
  at: Date;
  personId: number | null;
  sessionRef: string | null;
  event: string;
  subjectType: string;
  subjectId: number | null;
  summary: string;
  before: unknown;
  after: unknown;
  previousHash: string;
}

/** JSON with the keys of every object in order, so that equal values always give equal text. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    inner !== null && typeof inner === 'object' && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}

/** The hash that seals an event and, through `previousHash`, every event before it. */
export function chainHash(event: ChainedEvent, digest: (text: string) => string): string {
  return digest(
    canonical([
      event.previousHash,
      event.at.toISOString(),
      event.personId,
      event.sessionRef,
      event.event,
      event.subjectType,
      event.subjectId,
      event.summary,
      event.before,
      event.after,
    ]),
  );
}
