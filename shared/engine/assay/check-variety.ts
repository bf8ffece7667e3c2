import { fromSI } from '../units/convert.ts';
import { roundToFigures } from '../units/rounding.ts';
import { drawsInWords, finding, Tally, type CheckStart } from './check.ts';

/** Fewer different answers than this over many draws make a parallel paper too easy to copy. */
const FEW_ANSWERS = 5;
const MANY_DRAWS = 20;
/** Counting stops here: an item with so many answers is varied enough. */
const ENOUGH = 5_000;

/** 9. Different draws give different answers, and no answer is printed as a given. */
export const checkVariety: CheckStart = (context) => {
  const givens = context.script.quantities.filter(
    (info) => info.kind !== 'computed' && info.shape.kind === 'scalar',
  );
  const whole = new Set(
    context.content.quantities.filter(({ role }) => role === 'chargeNumber').map(({ name }) => name),
  );
  const parts = context.parts.map((part) => ({
    part,
    answers: new Set<number>(),
    seen: 0,
    equal: new Map<string, Tally>(),
  }));
  return {
    visit: (block) => {
      for (const entry of parts) {
        const { info, unit, part } = entry.part;
        const column = block.columns.get(info.name);
        if (column === undefined) continue;
        for (let index = 0; index < column.length; index += 1) {
          if (block.kept[index] === 0) continue;
          entry.seen += 1;
          const value = column[index] ?? NaN;
          if (entry.answers.size < ENOUGH) {
            entry.answers.add(roundToFigures(fromSI(value, unit), part.answer.figures));
          }
          for (const given of givens) {
            if (whole.has(info.name)) continue;
            if (given.dimension.some((power, at) => power[0] !== info.dimension[at]?.[0])) continue;
            const printed = block.columns.get(given.name)?.[index] ?? NaN;
            if (Math.abs(printed / value - 1) > 1e-6) continue;
            let tally = entry.equal.get(given.name);
            if (tally === undefined) entry.equal.set(given.name, (tally = new Tally()));
            tally.add(block.draws[index] ?? 0, 0);
          }
        }
      }
    },
    finish: () =>
      parts.flatMap(({ part: { part, letter, info }, answers, seen, equal }) => {
        const findings = [...equal].map(([name, tally]) =>
          finding('answer-equals-given', {
            about: `${part.id}:${name}`,
            statement: `The answer to part (${letter}) equals the printed “${name}” on ${drawsInWords(tally.count)}, first on draw ${tally.worstDraw}.`,
            cure: 'Leave such draws out with a require.',
            place: { partId: part.id, quantity: name },
            tally,
          }),
        );
        if (seen >= MANY_DRAWS && answers.size > 1 && answers.size < FEW_ANSWERS && !whole.has(info.name)) {
          findings.push(
            finding('few-answers', {
              about: part.id,
              statement: `The ${seen.toLocaleString('en-GB')} draws give only ${answers.size} different answers to part (${letter}).`,
              cure: 'Widen the ranges or make the steps finer.',
              place: { partId: part.id },
            }),
          );
        }
        return findings;
      }),
  };
};
