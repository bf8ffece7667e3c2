import type { PlacedMark } from './geometry.ts';

/** A label and the line it stands on. */
export interface LabelPlace {
  index: number;
  /** 0 is the line next to the scale. */
  lane: number;
  x: number;
  anchor: 'start' | 'end';
  text: string;
}

/** Mean width of a letter at the label's size, in pixels; a little generous so that labels do not touch. */
const LETTER = 6.6;
const GAP = 14;

/** The text cut to `room` pixels, with an ellipsis where something is left out. */
export function shortened(text: string, room: number): string {
  const letters = Math.floor(room / LETTER);
  return text.length <= letters ? text : `${text.slice(0, Math.max(1, letters - 1)).trimEnd()}…`;
}

/** A stretch of a line, in pixels. */
export interface Stretch {
  from: number;
  to: number;
}

/** How wide a label is about, in pixels. */
export function labelWidth(text: string): number {
  return text.length * LETTER;
}

/** How much a mark wants its label: those inside the band first, then slips, then the nearest. */
function urgency(mark: PlacedMark): number {
  const kind = mark.mark.insideBand ? 0 : mark.mark.kind === 'slip' ? 1 : 2;
  return kind * 1_000 + Math.min(999, Math.abs(mark.mark.relativeError) * 100);
}

/**
 * Places labels on up to `lanes` lines so that none covers another. A label runs away from its mark towards
 * the side with more room; one that finds no line has none (its mark still has its full description). `reserved` is taken on the line next to the scale.
 */
export function placeLabels(
  marks: readonly PlacedMark[],
  width: number,
  lanes: number,
  reserved: readonly Stretch[] = [],
): LabelPlace[] {
  const taken: Stretch[][] = Array.from({ length: lanes }, (_, lane) => (lane === 0 ? [...reserved] : []));
  const places: LabelPlace[] = [];
  for (const placed of [...marks].sort((a, b) => urgency(a) - urgency(b))) {
    const anchor = placed.x < width / 2 ? 'start' : 'end';
    const room = anchor === 'start' ? width - placed.x : placed.x;
    const text = shortened(placed.mark.label, Math.min(room - 4, width * 0.62));
    const length = text.length * LETTER;
    const from = anchor === 'start' ? placed.x - 4 : placed.x - length;
    const to = anchor === 'start' ? placed.x + length : placed.x + 4;
    const lane = taken.findIndex((line) =>
      line.every((other) => to + GAP < other.from || from > other.to + GAP),
    );
    if (lane < 0) continue;
    taken[lane]?.push({ from, to });
    places.push({ index: placed.index, lane, x: placed.x, anchor, text });
  }
  return places;
}
