import { describe, expect, it } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';
import type { AppContext } from '../../context.ts';
import type { ItemFacts } from '../../workers/task-types.ts';
import { chooseDraws } from './choose-draws.ts';

/** An engine whose every draw is kept, on a grid of ten (or without end), and a chance that stands still. */
function contextOf(chances: number[], open = false): AppContext {
  let taken = 0;
  return {
    random: () => chances[taken++ % chances.length] ?? 0,
    engine: {
      chooseDraw: async (_content: unknown, chance: number) => ({
        draw: 1 + Math.floor(chance * 10),
        gridSize: 10,
        open,
      }),
    },
  } as unknown as AppContext;
}

const content = itemContentSchema.parse({ title: 'Gun' });
const item = (itemId: number, draw: number | null) => ({ itemId, code: `EG-${itemId}`, content, draw });
const silent = async () => ({ facts: [] });

/** Item 1 answers 1 metre; item 2 prints 1 metre on draws up to `until`, else 2 metres. */
const givingAway =
  (until: number) =>
  async ([, second = 0]: readonly number[]): Promise<{ facts: ItemFacts[] }> => ({
    facts: [
      {
        answers: [
          { partId: 'a', letter: 'a', text: '1 m', answerSI: 1, fromSI: 0.9, toSI: 1.1, dimension: 'm' },
        ],
        printed: [],
        undefinedParts: [],
      },
      {
        answers: [],
        printed: [{ text: 'x', valueSI: second <= until ? 1 : 2, dimension: 'm' }],
        undefinedParts: [],
      },
    ],
  });

describe('choosing the draws of a paper', () => {
  it('keeps those that are asked for and takes the others by chance', async () => {
    const draws = await chooseDraws(contextOf([0.35]), [item(1, 9), item(2, null)], new Map(), silent);
    expect(draws).toEqual([9, 4]);
  });

  it('goes on from values that another paper has, unless it has them all', async () => {
    const used = new Map([[1, new Set([4, 5])]]);
    // From 0.35 on by eighths: 4, 5 (0.475), 7 (0.6).
    expect(await chooseDraws(contextOf([0.35]), [item(1, null)], used, silent)).toEqual([7]);
    const all = new Map([[1, new Set([1, 2, 3, 4, 5, 6, 7, 8, 9, 10])]]);
    expect(await chooseDraws(contextOf([0.35]), [item(1, null)], all, silent)).toEqual([4]);
  });

  it('chooses anew where an answer is given away, but never a draw that was asked for', async () => {
    const chances = [0.05, 0.15, 0.95];
    expect(
      await chooseDraws(contextOf(chances), [item(1, 3), item(2, null)], new Map(), givingAway(5)),
    ).toEqual([3, 10]);
    expect(await chooseDraws(contextOf(chances), [item(1, 3), item(2, 2)], new Map(), givingAway(5))).toEqual(
      [3, 2],
    );
  });

  it('stops after a few rounds where it cannot be helped', async () => {
    let built = 0;
    const draws = await chooseDraws(contextOf([0.05]), [item(1, 3), item(2, null)], new Map(), (chosen) => {
      built += 1;
      return givingAway(10)(chosen);
    });
    expect(draws).toEqual([3, 1]);
    expect(built).toBeLessThanOrEqual(4);
  });

  it.each([
    [0, 'EG-2 has draws 1 to 10, so there is no draw 0.'],
    [11, 'EG-2 has draws 1 to 10, so there is no draw 11.'],
  ])('refuses draw %d, at its place', async (draw, message) => {
    const failure = await chooseDraws(contextOf([0]), [item(1, 1), item(2, draw)], new Map(), silent).catch(
      (error: unknown) => error,
    );
    expect(failure).toBeInstanceOf(AppError);
    expect(failure).toMatchObject({ code: 'invalid', message, fields: [{ path: 'places.1.draw' }] });
  });

  it('takes any draw from 1 on where the grid has no end', async () => {
    expect(await chooseDraws(contextOf([0], true), [item(1, 5_000)], new Map(), silent)).toEqual([5_000]);
  });
});
