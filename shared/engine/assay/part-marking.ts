import type { BlockValues } from '../compile/compiled-script.ts';
import { fromSI } from '../units/convert.ts';
import { bandAround } from './answer-band.ts';
import type { AssayPart } from './context.ts';

/** Model answers and accepted intervals of one part over a block, in the answer's unit. */
interface PartBlock {
  answers: Float64Array;
  from: Float64Array;
  to: Float64Array;
}

/** Half the width of a band about each of many answers, in their unit; null for a band that goes by limits. */
function halfWidthOf({ part, unit }: AssayPart): ((answer: number) => number) | null {
  const { band, figures } = part.answer;
  if (band.kind === 'percent') return (answer) => (Math.abs(answer) * band.percent) / 100;
  if (band.kind === 'limits' || band.kind === 'lastFigure') return null;
  const around = bandAround(band, 0, figures, unit);
  return around === null ? null : () => around.to;
}

/** Works out the bands of a block; null when the band itself makes no sense in the answer's unit. */
export function bandsOfBlock(entry: AssayPart, block: BlockValues): PartBlock | null {
  const { part, info, unit } = entry;
  const column = block.columns.get(info.name);
  if (column === undefined) return null;
  const { band, figures } = part.answer;
  const answers = column.map((value) => fromSI(value, unit));
  const from = new Float64Array(answers.length);
  const to = new Float64Array(answers.length);
  const halfWidth = halfWidthOf(entry);
  if (halfWidth === null && bandAround(band, 1, figures, unit) === null) return null;
  for (let index = 0; index < answers.length; index += 1) {
    const answer = answers[index] ?? NaN;
    if (halfWidth !== null) {
      const half = halfWidth(answer);
      from[index] = answer - half;
      to[index] = answer + half;
      continue;
    }
    const around = bandAround(band, answer, figures, unit);
    from[index] = around?.from ?? NaN;
    to[index] = around?.to ?? NaN;
  }
  return { answers, from, to };
}

/** Room for floating-point arithmetic at the ends of a band. */
const EDGE = 1e-9;

/** Whether a value lies in the interval, ends included. */
export function within(value: number, from: number, to: number): boolean {
  const room = EDGE * Math.max(Math.abs(from), Math.abs(to), Math.abs(value));
  return value >= from - room && value <= to + room;
}
