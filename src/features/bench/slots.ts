import type { ReactNode } from 'react';

import type { ItemContent, PartScale } from '#shared/engine/index.ts';
import type { ItemScheme, ItemSheet } from '#shared/sheet/model.ts';

/** What the bench puts between the pieces of the sheet. */
export interface SheetInserts {
  afterStem: ReactNode;
  afterPart: (partId: string) => ReactNode;
}

/** A scale strip as the bench asks for it. */
export interface ScaleRequest {
  scale: PartScale;
  name: string;
  answer: number | null;
  symmetric: boolean;
  onTryBand: ((band: { low: number; high: number }) => void) | undefined;
  onVisitDraw: (draw: number) => void;
}

/** Pictures that other features draw; the page hands them in. */
export interface BenchSlots {
  sheet: (sheet: ItemSheet, inserts: SheetInserts) => ReactNode;
  scheme: (scheme: ItemScheme) => ReactNode;
  scale: (request: ScaleRequest) => ReactNode;
  changes: (before: ItemContent, after: ItemContent) => ReactNode;
}
