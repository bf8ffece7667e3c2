import type { CompiledScript, DrawValues } from '../compile/compiled-script.ts';
import type { Band, NumericPart } from '../item/content.ts';
import { fromSI, toSI } from '../units/convert.ts';
import { sameDimension } from '../units/dimension.ts';
import { formatNumber, formatQuantity, type PrintedQuantity } from '../units/format.ts';
import { readUnit } from '../units/read-unit.ts';
import { unitText, type Unit } from '../units/unit.ts';

/** The accepted interval of one answer at one draw. */
export interface AnswerBand {
  unit: Unit;
  /** The model answer as printed, at the part's figures. */
  answer: PrintedQuantity;
  /** Model answer, unrounded, in coherent SI. */
  answerSI: number;
  fromSI: number;
  toSI: number;
  /** As "1.72 × 10¹¹ to 1.80 × 10¹¹ C kg⁻¹". */
  text: string;
}

/** Half-widths of a band below and above `answer`; all in the answer's unit. */
export function bandAround(
  band: Band,
  answer: number,
  figures: number,
  unit: Unit,
): { from: number; to: number } | null {
  const inUnit = (value: number, name: string): number | null => {
    const reading = readUnit(name);
    if (name === '') return value;
    if (!reading.ok || !sameDimension(reading.unit.dimension, unit.dimension)) return null;
    return fromSI(toSI(value, reading.unit), unit);
  };
  switch (band.kind) {
    case 'percent': {
      const half = (Math.abs(answer) * band.percent) / 100;
      return { from: answer - half, to: answer + half };
    }
    case 'absolute': {
      const half = inUnit(band.plusMinus, band.unit);
      return half === null ? null : { from: answer - half, to: answer + half };
    }
    case 'lastFigure': {
      const exponent = answer === 0 ? 0 : Math.floor(Math.log10(Math.abs(answer)));
      const half = band.units * 10 ** (exponent - figures + 1);
      return { from: answer - half, to: answer + half };
    }
    case 'limits': {
      const from = inUnit(band.from, band.unit);
      const to = inUnit(band.to, band.unit);
      return from === null || to === null ? null : { from: Math.min(from, to), to: Math.max(from, to) };
    }
  }
}

/** Prints an interval with as many figures as its width needs, never fewer than the answer's. */
function intervalText(from: number, to: number, unit: Unit, figures: number): string {
  const width = Math.abs(to - from);
  const size = Math.max(Math.abs(from), Math.abs(to));
  const needed = width === 0 || size === 0 ? figures : Math.ceil(Math.log10(size / width)) + 2;
  const precision = { figures: Math.min(8, Math.max(figures, needed)) };
  const name = unitText(unit);
  const low = formatNumber(from, precision).text;
  const high = formatNumber(to, precision).text;
  return `${low === high ? low : `${low} to ${high}`}${name === '' ? '' : `\u202F${name}`}`;
}

/**
 * The answers that earn the mark on one draw. Null where the answer's quantity, unit or value is missing, or
 * the band's unit does not fit.
 */
export function answerBand(script: CompiledScript, part: NumericPart, values: DrawValues): AnswerBand | null {
  const info = script.quantities.find((quantity) => quantity.name === part.answer.quantity);
  const value = values.values[part.answer.quantity];
  if (info === undefined || typeof value !== 'number' || !Number.isFinite(value)) return null;
  const reading = readUnit(part.answer.unit);
  if (!reading.ok || !sameDimension(reading.unit.dimension, info.dimension)) return null;
  const unit = reading.unit;
  const around = bandAround(part.answer.band, fromSI(value, unit), part.answer.figures, unit);
  if (around === null) return null;
  return {
    unit,
    answer: formatQuantity(value, unit, { figures: part.answer.figures }),
    answerSI: value,
    fromSI: toSI(around.from, unit),
    toSI: toSI(around.to, unit),
    text: intervalText(around.from, around.to, unit, part.answer.figures),
  };
}
