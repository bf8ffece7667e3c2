import { itemContentSchema, type ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import type { Connection } from '../../db/client.ts';
import type { BuiltPaper, PlacedItem } from '../../workers/task-types.ts';
import { storedFigures } from '../figures/stored-figures.ts';
import * as queries from './queries.ts';

/** A paper with its places and what they print. */
export interface AssembledPaper {
  paper: queries.PaperRecord;
  places: queries.PlaceRecord[];
  built: BuiltPaper;
}

/** The paper's row; throws AppError notFound. */
export async function requirePaper(
  connection: Connection,
  paperId: number,
  lock = false,
): Promise<queries.PaperRecord> {
  const paper = await queries.selectPaper(connection, paperId, lock);
  if (paper === null) throw new AppError('notFound', 'There is no such paper.');
  return paper;
}

/** What a paper with these items at these draws prints, worked out in the engine's threads. */
export async function buildPlaces(
  context: AppContext,
  paper: queries.PaperRecord,
  places: readonly { itemCode: string; content: ItemContent; draw: number }[],
): Promise<BuiltPaper> {
  const items: PlacedItem[] = [];
  for (const { itemCode, content, draw } of places) {
    items.push({ code: itemCode, content, draw, figures: await storedFigures(context.database, content) });
  }
  return context.engine.buildPaper({
    front: {
      organisation: context.settings.organisation,
      code: paper.code,
      title: paper.title,
      subtitle: paper.subtitle,
      durationMinutes: paper.durationMinutes,
      instructions: paper.instructions,
      sealHash: null,
    },
    items,
  });
}

/** The paper as it would print now. Not to be called within a transaction: the engine's threads take their time. */
export async function assemble(context: AppContext, paperId: number): Promise<AssembledPaper> {
  const paper = await requirePaper(context.database, paperId);
  const rows = await queries.selectPlaces(context.database, paperId);
  const places = rows.map((row) => ({ ...row, content: itemContentSchema.parse(row.content) }));
  return { paper, places, built: await buildPlaces(context, paper, places) };
}
