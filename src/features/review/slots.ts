import type { ReactNode } from 'react';

import type { ItemContent, PartScale } from '#shared/engine/index.ts';
import type { ItemScheme, ItemSheet } from '#shared/sheet/model.ts';

/** Pictures that other features draw; the page hands them in. */
export interface ReviewSlots {
  sheet: (sheet: ItemSheet) => ReactNode;
  scheme: (scheme: ItemScheme) => ReactNode;
  scale: (request: { scale: PartScale; name: string; answer: number | null }) => ReactNode;
  changes: (before: ItemContent, after: ItemContent) => ReactNode;
}
