import { MAX_ATTEMPTS, type Review, type Working } from '#shared/contracts/reviews.ts';
import type { Finding } from '#shared/engine/index.ts';

/** How far the reviewer's own working of one part has come. */
export interface PartProgress {
  partId: string;
  letter: string;
  unit: string;
  tries: Working[];
  triesLeft: number;
  state: 'open' | 'agrees' | 'disagrees' | 'disputed' | 'settled';
}

/**
 * The state of each numeric part's working: `open` while a try is left, `disagrees` when none is, `disputed`
 * when the reviewer holds to it, `agrees` once a try came out right, `settled` when the reviewer came to agree
 * after the reveal.
 */
export function partsProgress(review: Pick<Review, 'numericParts' | 'workings'>): PartProgress[] {
  return review.numericParts.map(({ partId, letter, unit }) => {
    const tries = review.workings
      .filter((working) => working.partId === partId)
      .sort((a, b) => a.attempt - b.attempt);
    const last = tries.at(-1);
    const triesLeft = Math.max(0, MAX_ATTEMPTS - tries.length);
    return { partId, letter, unit, tries, triesLeft, state: stateOf(last, triesLeft) };
  });
}

function stateOf(last: Working | undefined, triesLeft: number): PartProgress['state'] {
  if (last === undefined) return 'open';
  if (last.agrees) return 'agrees';
  if (last.settledReason !== null) return 'settled';
  if (last.disputed) return 'disputed';
  return triesLeft > 0 ? 'open' : 'disagrees';
}

const letters = (parts: readonly PartProgress[]): string =>
  parts.map((part) => `(${part.letter})`).join(', ');

/** What still stands before the answers can be shown, as a sentence; null when nothing does. */
export function revealHindrance(parts: readonly PartProgress[]): string | null {
  const unworked = parts.filter((part) => part.tries.length === 0);
  const undecided = parts.filter((part) => part.state === 'open' && part.tries.length > 0);
  const unresolved = parts.filter((part) => part.state === 'disagrees');
  if (unworked.length === 1) return `Part ${letters(unworked)} has no working yet.`;
  if (unworked.length > 1) return `Parts ${letters(unworked)} have no working yet.`;
  if (undecided.length > 0) return `Try ${letters(undecided)} once more.`;
  if (unresolved.length > 0) return `Hold to your working of ${letters(unresolved)} to go on.`;
  return null;
}

/** Cautions that neither the writer nor (in `accepted`) the reviewer has accepted with a reason. */
export function openCautions(review: Review, accepted: Readonly<Record<string, string>>): Finding[] {
  if (review.reveal === null) return [];
  const { content, report } = review.reveal;
  const has = (reasons: Readonly<Record<string, string>>, key: string): boolean =>
    (reasons[key] ?? '').trim() !== '';
  return report.findings.filter(
    (finding) =>
      finding.severity === 'caution' &&
      !has(content.acceptedCautions, finding.key) &&
      !has(accepted, finding.key),
  );
}

/** Everything that keeps the item from being approved, as sentences; empty when it may be. */
export function approvalHindrances(review: Review, accepted: Readonly<Record<string, string>>): string[] {
  if (review.reveal === null) return ['The answers have not been shown yet.'];
  const parts = partsProgress(review);
  const unworked = parts.filter((part) => part.tries.length === 0);
  const disagreeing = parts.filter((part) => part.state === 'disagrees' || part.state === 'disputed');
  const blockers = review.reveal.report.findings.filter((finding) => finding.severity === 'blocker').length;
  const cautions = openCautions(review, accepted).length;
  return [
    ...(review.reveal.assayStale ? ['The assay is stale; the writer has to run it again.'] : []),
    ...(blockers === 0 ? [] : [`The assay found ${blockers === 1 ? 'a blocker' : `${blockers} blockers`}.`]),
    ...(unworked.length === 0 ? [] : [`There is no working of ${letters(unworked)}.`]),
    ...(disagreeing.length === 0
      ? []
      : [`Your working of ${letters(disagreeing)} does not agree and is not settled.`]),
    ...(cautions === 0
      ? []
      : [`${cautions === 1 ? 'One caution has' : `${cautions} cautions have`} no word of reason yet.`]),
  ];
}
