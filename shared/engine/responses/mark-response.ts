import type { Unit } from '../units/unit.ts';
import type { ResponseReading } from './read-response.ts';

/** A wrong working with the value it gives on this draw, SI. */
export interface WrongWorking {
  name: string;
  value: number;
  guidance?: string;
  marks?: number;
}

/** What an answer to one part on one draw is marked against; all values SI. */
export interface MarkingTarget {
  value: number;
  unit: Unit;
  /** The interval that earns the mark, ends included. */
  band: { from: number; to: number };
  figures: number;
  enforceFigures: boolean;
  marks: number;
  slips: readonly WrongWorking[];
  nearMisses: readonly WrongWorking[];
  /** The right answer and its band recomputed from the candidate's own earlier answers, or null. */
  carriedForward: { value: number; band: { from: number; to: number } } | null;
}

export type VerdictKind =
  | 'accepted'
  | 'carriedForward'
  | 'unit'
  | 'powerOfTen'
  | 'sign'
  | 'figures'
  | 'slip'
  | 'nearMiss'
  | 'outside'
  | 'notRead';

export interface Verdict {
  kind: VerdictKind;
  marks: number;
  /** One sentence that says why. */
  reason: string;
  /** The answer in SI where it could be read, taking the part's unit when none is written. */
  value: number | null;
  /** (answer − right) / right where both are known. */
  relativeError: number | null;
}

/** One verdict for one answer, in the order: read, unit, band, carry forward, figures, slip, near miss, power of ten, sign. */
export function markResponse(target: MarkingTarget, response: string | ResponseReading): Verdict {
  throw new Error(`no marking yet: ${target.value} ${typeof response}`);
}
