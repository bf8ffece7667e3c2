import type { FIGURE_TYPES } from '#shared/contracts/figures.ts';
import type { PaperFront } from '#shared/sheet/build-paper.ts';
import type { StoredFigure } from '#shared/sheet/build-item.ts';
import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';
import type { FigureFacts, ItemContent, Verdict } from '#shared/engine/index.ts';

/** One revision's content to be checked in full, with what its figures hold. */
export interface ContentToAssay {
  content: ItemContent;
  figures: readonly FigureFacts[];
}

/** A draw of an item to be looked at; null asks for the first that every `require` keeps. */
export interface DrawToView {
  content: ItemContent;
  draw: number | null;
  figures: readonly StoredFigure[];
}

/** A reviewer's answer to one part of one draw. */
export interface WorkingToMark {
  content: ItemContent;
  partId: string;
  draw: number;
  text: string;
}

/** How a reviewer's answer compares with the script's. */
export interface MarkedWorking {
  /** Whether the answer lies in the band. */
  agrees: boolean;
  /** False when there was nothing to compare: the text could not be read, or its unit measures another thing. */
  comparable: boolean;
  /** Why, for after the reveal; it may tell the answer. */
  verdict: Verdict;
  /** What the reviewer may be told before the reveal; it never tells the answer. */
  remark: string;
}

/** An item on a paper, in running order. */
export interface PlacedItem {
  code: string;
  content: ItemContent;
  draw: number;
  figures: readonly StoredFigure[];
}

export interface PaperToBuild {
  front: PaperFront;
  items: readonly PlacedItem[];
}

export interface BuiltPaper {
  sheet: PaperSheet;
  scheme: PaperScheme;
  /** Of each item in order: what its draw is like; `exists` is false for one beyond the grid. */
  draws: { gridSize: number; open: boolean; exists: boolean; kept: boolean; compiles: boolean }[];
  /** Of each item in order. */
  facts: ItemFacts[];
}

/** Answers and printed values of an item at a draw, SI; dimensions as text that equal dimensions share. */
export interface ItemFacts {
  answers: {
    partId: string;
    letter: string;
    text: string;
    answerSI: number;
    fromSI: number;
    toSI: number;
    /** Null for a bare number. */
    dimension: string | null;
  }[];
  /** Values with a unit that a candidate sees. */
  printed: { text: string; valueSI: number; dimension: string }[];
  /** Letters of numeric parts that have no answer on this draw. */
  undefinedParts: string[];
}

/** A draw to be chosen by chance: `chance` in [0, 1) decides. */
export interface DrawToChoose {
  content: ItemContent;
  chance: number;
}

export interface ChosenDraw {
  /** Null when the script does not compile or keeps no draw. */
  draw: number | null;
  gridSize: number;
  open: boolean;
}

/** A picture that may be stored: what it is by its content, cleaned, with its natural size. */
export interface InspectedPicture {
  mediaType: (typeof FIGURE_TYPES)[number];
  bytes: Uint8Array;
  width: number;
  height: number;
}

export type PictureVerdict =
  | { usable: true; picture: InspectedPicture }
  /** `reason` is a sentence for the person who chose the file. */
  | { usable: false; code: 'unsupportedFile' | 'tooLarge'; reason: string };
