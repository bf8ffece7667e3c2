import {
  answerBand,
  compileExpression,
  type CompiledScript,
  type DrawValues,
  evaluateExpression,
  isNumericPart,
  markResponse,
  type NumericPart,
  readResponse,
  sameDimension,
  type Verdict,
  type WrongWorking,
} from '#shared/engine/index.ts';

import type { MarkedWorking, WorkingToMark } from '../task-types.ts';
import { itemAtDraw } from './item-at-draw.ts';

function slipValues(script: CompiledScript, part: NumericPart, values: DrawValues): WrongWorking[] {
  const columns = new Map<string, Float64Array>();
  const series = new Map<string, Float64Array[]>();
  for (const [name, value] of Object.entries(values.values)) {
    if (typeof value === 'number') columns.set(name, Float64Array.of(value));
    else {
      series.set(
        name,
        value.map((element) => Float64Array.of(element)),
      );
    }
  }
  const draws = Float64Array.of(values.draw);
  return part.answer.slips.flatMap((slip) => {
    const { expression } = compileExpression(script, slip.expression);
    if (expression === null) return [];
    const [value = NaN] = evaluateExpression(expression, { draws, columns, series });
    return Number.isFinite(value)
      ? [{ name: slip.name, value, guidance: slip.guidance, marks: slip.marks }]
      : [];
  });
}

function unmarked(reason: string, comparable: boolean): MarkedWorking {
  const verdict: Verdict = { kind: 'notRead', marks: 0, reason, value: null, relativeError: null };
  return { agrees: false, comparable, verdict, remark: reason };
}

/**
 * Compares a reviewer's answer with the band of the draw. More figures than asked for are welcome, and the
 * unit may be left out, since the form prints it.
 */
export function markWorking({ content, partId, draw, text }: WorkingToMark): MarkedWorking {
  const part = content.parts.find((candidate) => candidate.id === partId);
  if (part === undefined || !isNumericPart(part)) return unmarked('This part has no numeric answer.', false);
  const { item } = itemAtDraw(content, draw, []);
  const band =
    item.script === null || item.values === null ? null : answerBand(item.script, part, item.values);
  if (band === null || item.script === null || item.values === null) {
    return unmarked('The checker has no answer of its own to this part, so it cannot compare.', true);
  }
  const reading = readResponse(text);
  if (!reading.ok) return unmarked(`This answer could not be read: ${reading.reason}`, false);
  // Told whatever the number is, so that it says nothing of the answer.
  if (reading.unit !== null && !sameDimension(reading.unit.dimension, band.unit.dimension)) {
    return unmarked(`The unit ${reading.unitText} does not measure what is asked for.`, false);
  }
  const verdict = markResponse(
    {
      value: band.answerSI,
      unit: band.unit,
      band: { from: band.fromSI, to: band.toSI },
      figures: part.answer.figures,
      enforceFigures: false,
      marks: part.marks,
      slips: slipValues(item.script, part, item.values),
      nearMisses: [],
      carriedForward: null,
      unitPrinted: true,
    },
    reading,
  );
  const agrees = verdict.kind === 'accepted';
  return {
    agrees,
    comparable: true,
    verdict,
    // Nothing more: that only the unit, the sign or a power of ten is wrong would tell the answer.
    remark: agrees
      ? 'Your working agrees with the checker.'
      : 'Your working does not agree with the checker.',
  };
}
