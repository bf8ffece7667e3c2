import { fromSI } from '../units/convert.ts';
import { isDimensionless, sameDimension } from '../units/dimension.ts';
import { roundToFigures } from '../units/rounding.ts';
import { drawsInWords, finding, Tally, type RunningCheck } from './check.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { bandsOfBlock } from './part-marking.ts';
import { isWhole } from './part-roles.ts';
import type { Finding } from './report.ts';
import { sharedAnswerChance } from './shared-answers.ts';

/** Fewer different answers than this over many draws make a parallel paper too easy to copy. */
const FEW_ANSWERS = 5;
const MANY_DRAWS = 20;
/** Answers that differ by less than this, relative, over all draws are one measured constant: not for this check. */
const ONE_CONSTANT = 0.05;
/** Counting stops here: an item with so many answers is varied enough. */
const ENOUGH = 5_000;
/** Chance that two draws share an answer, above which the writer is told. */
const OFTEN_SHARED = 0.25;
/** Relative difference below which two printed values are equal. */
const EQUAL = 1e-6;

interface Watched {
  part: AssayPart;
  different: Set<number>;
  answers: number[];
  halfWidths: number[];
  seen: number;
  equal: Map<string, Tally>;
}

interface Pair {
  names: [string, string];
  tally: Tally;
}

function note(tallies: Map<string, Tally>, name: string, draw: number): void {
  let tally = tallies.get(name);
  if (tally === undefined) tallies.set(name, (tally = new Tally()));
  tally.add(draw, 0);
}

function tellPart(context: AssayContext, entry: Watched): Finding[] {
  const { part, letter } = entry.part;
  const place = { partId: part.id };
  const findings = [...entry.equal].map(([name, tally]) =>
    finding('answer-equals-given', {
      about: `${part.id}:${name}`,
      statement: `The answer to part (${letter}) equals the printed “${name}” on ${drawsInWords(tally.count)}, first on draw ${tally.worstDraw}.`,
      cure: 'Leave such draws out with a require.',
      place: { partId: part.id, quantity: name },
      tally,
    }),
  );
  const sizes = entry.answers.map(Math.abs);
  const varied = Math.max(...sizes) > (1 + ONE_CONSTANT) * Math.min(...sizes);
  if (entry.seen < MANY_DRAWS || !varied || isWhole(context, entry.part)) return findings;
  const count = entry.seen.toLocaleString('en-GB');
  if (entry.different.size < FEW_ANSWERS) {
    findings.push(
      finding('few-answers', {
        about: part.id,
        statement: `The ${count} draws give only ${entry.different.size} different answers to part (${letter}).`,
        cure: 'Widen the ranges or make the steps finer.',
        place,
      }),
    );
    return findings;
  }
  const chance = sharedAnswerChance(entry.answers, entry.halfWidths);
  if (chance > OFTEN_SHARED) {
    findings.push(
      finding('answers-shared', {
        about: part.id,
        statement: `Two draws have a chance of ${Math.round(chance * 100)} % that the answer to one earns the mark for part (${letter}) of the other.`,
        cure: 'Widen the ranges where papers must differ.',
        place,
      }),
    );
  }
  return findings;
}

/** 9. Different draws give different answers, and no draw has unfortunate numbers. */
export function checkVariety(
  context: AssayContext,
): RunningCheck & { sharedAnswers: (partId: string) => number | null } {
  const givens = context.printed;
  const watched: Watched[] = context.parts.map((part) => ({
    part,
    different: new Set(),
    answers: [],
    halfWidths: [],
    seen: 0,
    equal: new Map(),
  }));
  const pairs: Pair[] = givens.flatMap((one, index) =>
    givens
      .slice(index + 1)
      .filter((other) => !isDimensionless(one.dimension) && sameDimension(one.dimension, other.dimension))
      .map((other): Pair => ({ names: [one.name, other.name], tally: new Tally() })),
  );
  return {
    visit: (block) => {
      const equalAt = (a: string, b: string, index: number) => {
        const other = block.columns.get(b)?.[index] ?? NaN;
        return Math.abs((block.columns.get(a)?.[index] ?? NaN) - other) <= EQUAL * Math.abs(other);
      };
      for (const entry of watched) {
        const { info, part } = entry.part;
        const bands = entry.answers.length < ENOUGH ? bandsOfBlock(entry.part, block) : null;
        const column = block.columns.get(info.name);
        if (column === undefined) continue;
        const alike = givens.filter(
          (given) => !isDimensionless(info.dimension) && sameDimension(given.dimension, info.dimension),
        );
        for (let index = 0; index < column.length; index += 1) {
          if (block.kept[index] === 0) continue;
          entry.seen += 1;
          if (entry.answers.length < ENOUGH) {
            const answer = fromSI(column[index] ?? NaN, entry.part.unit);
            entry.answers.push(answer);
            entry.halfWidths.push(
              bands === null ? 0 : ((bands.to[index] ?? 0) - (bands.from[index] ?? 0)) / 2,
            );
            entry.different.add(roundToFigures(answer, part.answer.figures));
          }
          for (const { name } of alike) {
            if (name !== info.name && equalAt(name, info.name, index)) {
              note(entry.equal, name, block.draws[index] ?? 0);
            }
          }
        }
      }
      for (const { names, tally } of pairs) {
        for (let index = 0; index < block.draws.length; index += 1) {
          if (block.kept[index] === 1 && equalAt(names[0], names[1], index)) {
            tally.add(block.draws[index] ?? 0, 0);
          }
        }
      }
    },
    finish: () => [
      ...watched.flatMap((entry) => tellPart(context, entry)),
      ...pairs
        .filter(({ tally }) => tally.count > 0 && context.plan.count > 1)
        .map(({ names: [one, other], tally }) =>
          finding('equal-givens', {
            about: `${one}:${other}`,
            statement: `“${one}” and “${other}” are printed equal on ${drawsInWords(tally.count)}, first on draw ${tally.worstDraw}.`,
            cure: 'A require can leave such draws out, so that one cannot be taken for the other unseen.',
            place: { quantity: one },
            tally,
          }),
        ),
    ],
    sharedAnswers: (partId) => {
      const entry = watched.find(({ part }) => part.part.id === partId);
      if (entry === undefined || entry.answers.length < 2) return null;
      return sharedAnswerChance(entry.answers, entry.halfWidths);
    },
  };
}
