import type { BlockValues } from '../compile/compiled-script.ts';
import { fromSI } from '../units/convert.ts';
import { bandAround } from './answer-band.ts';
import type { AssayPart } from './context.ts';

/** Model answers and accepted intervals of one part over a block, in the answer's unit. */
export interface PartBlock {
  answers: Float64Array;
  from: Float64Array;
  to: Float64Array;
}

/** Works out the bands of a block; null when the band itself makes no sense in the answer's unit. */
export function bandsOfBlock({ part, info, unit }: AssayPart, block: BlockValues): PartBlock | null {
  const column = block.columns.get(info.name);
  if (column === undefined) return null;
  const answers = column.map((value) => fromSI(value, unit));
  const from = new Float64Array(answers.length);
  const to = new Float64Array(answers.length);
  for (let index = 0; index < answers.length; index += 1) {
    const around = bandAround(part.answer.band, answers[index] ?? NaN, part.answer.figures, unit);
    if (around === null) return null;
    from[index] = around.from;
    to[index] = around.to;
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
