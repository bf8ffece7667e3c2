import type { ItemContent, Verdict } from '#shared/engine/index.ts';

/** A reviewer's answer to one part of one draw. */
export interface WorkingToMark {
  content: ItemContent;
  partId: string;
  draw: number;
  text: string;
}

/** How a reviewer's answer compares with the script's. */
export interface MarkedWorking {
  /** Whether the answer lies in the band, right in unit and sign. */
  agrees: boolean;
  /** Why, for after the reveal; it may tell the answer. */
  verdict: Verdict;
  /** What the reviewer may be told before the reveal; it never tells the answer. */
  remark: string;
}

/** A picture's natural proportions, by which the sheet reserves its space. */
export interface FigureSize {
  figureId: number;
  mediaType: string;
  width: number;
  height: number;
}
