import type { z } from 'zod';

import type { itemContentSchema } from '#shared/engine/index.ts';

/** A figure of a demo item: a file of public/figures and how the item shows it. */
export interface DemoFigure {
  file: string;
  alternativeText: string;
  caption?: string;
  widthPercent?: number;
  place?: string;
}

/**
 * How far a demo item has come. `faulty` items stand in review although they should never have got there:
 * they show what the checker and the review catch.
 */
export type DemoLife = 'drafting' | 'waiting' | 'working' | 'returned' | 'approved' | 'withdrawn' | 'faulty';

/** One invented item with the state it is brought to. */
export interface DemoItem {
  topic: string;
  content: z.input<typeof itemContentSchema>;
  figures?: DemoFigure[];
  life: DemoLife;
  /** The reviewer's or writer's words that go with the life. */
  remark?: string;
}
