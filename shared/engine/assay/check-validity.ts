import { SIMPLIFICATIONS, type Simplification } from '../physics/simplifications.ts';
import { drawsShow, finding, Tally, type CheckStart } from './check.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { bandsOfBlock } from './part-marking.ts';
import { bindRoles, isBound, roleValue, type BoundSet } from './roles-bound.ts';

/** Share of the band above which a simplification's error is told. */
const NOTABLE_SHARE = 1 / 3;
/** A script whose own value lies further off than this follows another relation, which the laws check tells. */
const FOLLOWS = 0.2;

interface Watched {
  model: Simplification;
  set: BoundSet;
  part: AssayPart;
  power: number;
  tally: Tally;
  worstError: number;
}

/** One simplification for one part, the row of the table that knows most. */
function watchedOf(context: AssayContext): Watched[] {
  const quantities = new Map(context.content.quantities.map((quantity) => [quantity.name, quantity]));
  return bindRoles(context).flatMap((set) =>
    context.parts.flatMap((part): Watched[] => {
      const own = quantities.get(part.info.name);
      if (own?.role == null || own.set !== set.set) return [];
      const told = new Set<string>();
      return SIMPLIFICATIONS.flatMap((model): Watched[] => {
        const power = model.powers[own.role ?? ''];
        if (power === undefined || told.has(model.id)) return [];
        if (!model.needs.every((role) => isBound(set, role))) return [];
        told.add(model.id);
        return [{ model, set, part, power, tally: new Tally(), worstError: 0 }];
      });
    }),
  );
}

/** Whether the script's own value is the finer formula's, so that nothing is simplified. */
function isFiner({ model, set }: Watched, value: (role: string) => number): boolean {
  const { told } = model;
  if (told === undefined || !isBound(set, told.role)) return false;
  const own = value(told.role);
  const offSimple = Math.abs(own / told.simple(value) - 1);
  const offFiner = Math.abs(own / told.finer(value) - 1);
  return offFiner < offSimple || offSimple > FOLLOWS;
}

/** 4. The error of each simplification, compared with the band of the answers it bears upon. */
export const checkValidity: CheckStart = (context) => {
  const watched = watchedOf(context);
  return {
    visit: (block) => {
      for (const entry of watched) {
        const bands = bandsOfBlock(entry.part, block);
        if (bands === null) continue;
        for (let index = 0; index < block.draws.length; index += 1) {
          if (block.kept[index] === 0) continue;
          const value = roleValue(entry.set, block.columns, index);
          const error = Math.abs((1 + entry.model.error(value)) ** entry.power - 1);
          const answer = Math.abs(bands.answers[index] ?? NaN);
          const half = ((bands.to[index] ?? NaN) - (bands.from[index] ?? NaN)) / 2 / answer;
          const share = half > 0 ? error / half : Infinity;
          if (!(error > 0 && share > NOTABLE_SHARE) || isFiner(entry, value)) continue;
          if (share > entry.tally.worstBadness) entry.worstError = error;
          entry.tally.add(block.draws[index] ?? 0, share);
        }
      }
    },
    finish: () =>
      watched
        .filter(({ tally }) => tally.count > 0)
        .map(({ model, part, tally, worstError, set }) => {
          const stated = context.content.assumptions.includes(model.assumption);
          const over = tally.worstBadness > 1;
          const code = stated
            ? 'model-error-stated'
            : over
              ? 'model-error-over-band'
              : 'model-error-near-band';
          return finding(code, {
            about: `${model.id}:${part.part.id}:${set.set}`,
            statement: `${model.words} puts the answer to part (${part.letter}) ${(worstError * 100).toPrecision(2)} % out on draw ${tally.worstDraw}, ${over ? 'more than its band allows' : 'over a third of what its band allows'}; ${drawsShow(tally.count)}.`,
            cure: stated ? '' : model.cure,
            place: { partId: part.part.id },
            tally,
          });
        }),
  };
};
