import type { ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import type { BuiltPaper } from '../../workers/task-types.ts';
import { coincidences } from './paper-findings.ts';

/** An item for a paper; `draw` is null where the server is to choose. */
export interface DrawWanted {
  itemId: number;
  code: string;
  content: ItemContent;
  draw: number | null;
}

/** Chances, evenly spread from the first one, that are taken to find values that another paper does not have. */
const TRIES_FOR_NEW = 8;
/** Rounds in which draws that give an answer away are chosen anew. */
const ROUNDS = 4;

async function choose(
  context: AppContext,
  { content }: DrawWanted,
  used: ReadonlySet<number>,
): Promise<number> {
  const start = context.random();
  let first: number | null = null;
  for (let trial = 0; trial < TRIES_FOR_NEW; trial += 1) {
    const chance = (start + trial / TRIES_FOR_NEW) % 1;
    const chosen = await context.engine.chooseDraw(content, chance);
    // Where no draw is kept, the paper's own checks say so.
    if (chosen.draw === null) return 1;
    if (!used.has(chosen.draw)) return chosen.draw;
    first ??= chosen.draw;
    if (!chosen.open && chosen.gridSize <= used.size) break;
  }
  return first ?? 1;
}

/** Throws AppError invalid where a draw is asked for that the item's grid does not have. */
async function demandExisting(context: AppContext, wanted: readonly DrawWanted[]): Promise<void> {
  for (const [index, { content, code, draw }] of wanted.entries()) {
    if (draw === null) continue;
    const { gridSize, open } = await context.engine.chooseDraw(content, 0);
    if (draw >= 1 && (open || draw <= gridSize)) continue;
    const range = open ? 'draws from 1 on' : `draws 1 to ${gridSize.toLocaleString('en-GB')}`;
    throw new AppError('invalid', `${code} has ${range}, so there is no draw ${draw}.`, {
      fields: [{ path: `places.${index}.draw`, message: `Choose one of ${range}.` }],
    });
  }
}

/**
 * A draw for every item: the one asked for, or one by chance that the script keeps, if possible not one of
 * `used` (by item id), and whose values give no answer of another item away. A few rounds are tried; what
 * remains the paper's own checks tell. `build` gives the paper with these draws.
 */
export async function chooseDraws(
  context: AppContext,
  wanted: readonly DrawWanted[],
  used: ReadonlyMap<number, ReadonlySet<number>>,
  build: (draws: readonly number[]) => Promise<Pick<BuiltPaper, 'facts'>>,
): Promise<number[]> {
  await demandExisting(context, wanted);
  const pick = (item: DrawWanted) => choose(context, item, used.get(item.itemId) ?? new Set());
  const draws: number[] = [];
  for (const item of wanted) draws.push(item.draw ?? (await pick(item)));
  const free = new Set(wanted.flatMap((item, index) => (item.draw === null ? [index] : [])));
  let best = { draws: [...draws], faults: Infinity };
  for (let round = 0; round < ROUNDS && free.size > 0; round += 1) {
    const found = coincidences((await build(draws)).facts);
    // One of the two items is enough.
    const anew = found.flatMap(({ printedBy, answers }) =>
      [answers, printedBy].filter((index) => free.has(index)).slice(0, 1),
    );
    if (anew.length < best.faults) best = { draws: [...draws], faults: anew.length };
    if (anew.length === 0) break;
    for (const index of new Set(anew)) {
      const item = wanted[index];
      if (item !== undefined) draws[index] = await pick(item);
    }
  }
  return best.draws;
}
