import type { Unit } from '../units/unit.ts';

/** A candidate's answer as read, or the reason that a person must look. */
export type ResponseReading =
  | {
      ok: true;
      /** The number as written, in the unit as written. */
      value: number;
      /** Null when the answer has none. */
      unit: Unit | null;
      unitText: string;
      /** Significant figures; a range where trailing zeros are ambiguous. */
      figures: { least: number; most: number };
    }
  | { ok: false; reason: string };

/** Reads what a candidate wrote; never guesses silently. */
export function readResponse(text: string): ResponseReading {
  throw new Error(`no reading yet: ${text.length}`);
}
