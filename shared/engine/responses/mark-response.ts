import { fromSI, toSI } from '../units/convert.ts';
import { sameDimension } from '../units/dimension.ts';
import { formatNumber } from '../units/format.ts';
import { unitText, type Unit } from '../units/unit.ts';
import { readResponse, type ResponseReading } from './read-response.ts';

/** A wrong working with the value it gives on this draw, SI. */
export interface WrongWorking {
  name: string;
  value: number;
  guidance?: string;
  marks?: number;
}

/** What an answer to one part on one draw is marked against; all values SI. */
export interface MarkingTarget {
  value: number;
  unit: Unit;
  /** The interval that earns the mark, ends included. */
  band: { from: number; to: number };
  figures: number;
  enforceFigures: boolean;
  marks: number;
  slips: readonly WrongWorking[];
  nearMisses: readonly WrongWorking[];
  /** The right answer and its band recomputed from the candidate's own earlier answers, or null. */
  carriedForward: { value: number; band: { from: number; to: number } } | null;
  /** Whether the answer line prints the unit, so that leaving it out is no fault; default false. */
  unitPrinted?: boolean;
}

export type VerdictKind =
  | 'accepted'
  | 'carriedForward'
  | 'unit'
  | 'powerOfTen'
  | 'sign'
  | 'figures'
  | 'slip'
  | 'nearMiss'
  | 'outside'
  | 'notRead';

export interface Verdict {
  kind: VerdictKind;
  marks: number;
  /** One sentence that says why. */
  reason: string;
  /** The answer in SI where it could be read, taking the part's unit when none is written. */
  value: number | null;
  /** (answer − right) / right where both are known. */
  relativeError: number | null;
}

interface Interval {
  from: number;
  to: number;
}

/** A band's ends are printed decimals; an answer on the end must not be lost to a last bit. */
const EDGE = 1e-12;

function within(value: number, band: Interval): boolean {
  const slack = EDGE * Math.max(Math.abs(band.from), Math.abs(band.to));
  return value >= band.from - slack && value <= band.to + slack;
}

/** The band moved to another centre, in proportion. */
function bandAround(value: number, target: MarkingTarget): Interval {
  const factor = value / target.value;
  const ends = [target.band.from * factor, target.band.to * factor];
  return { from: Math.min(...ends), to: Math.max(...ends) };
}

function percent(fraction: number): string {
  return `${formatNumber(Math.abs(fraction) * 100, { figures: 2 }).text} %`;
}

/** The power of ten by which the answer is off, or null when it is not off by one. */
function powerOfTenOff(value: number, target: MarkingTarget): number | null {
  const ratio = Math.abs(value / target.value);
  const power = Math.round(Math.log10(ratio));
  if (power === 0 || !Number.isFinite(power)) return null;
  return within(value / 10 ** power, target.band) ? power : null;
}

/**
 * One verdict for one answer. After reading, in this order: the band, the band carried forward, the unit, named
 * slips, a power of ten, the sign, near misses, outside the band.
 */
export function markResponse(target: MarkingTarget, response: string | ResponseReading): Verdict {
  const reading = typeof response === 'string' ? readResponse(response, target.unit) : response;
  if (!reading.ok)
    return { kind: 'notRead', marks: 0, reason: reading.reason, value: null, relativeError: null };
  const sameKind = reading.unit === null || sameDimension(reading.unit.dimension, target.unit.dimension);
  const asAsked = toSI(reading.value, target.unit);
  const value = sameKind ? toSI(reading.value, reading.unit ?? target.unit) : asAsked;
  const relativeError = (value - target.value) / target.value;
  const verdict = (kind: VerdictKind, marks: number, reason: string): Verdict => ({
    kind,
    marks,
    reason,
    value: sameKind ? value : null,
    relativeError: sameKind && Number.isFinite(relativeError) ? relativeError : null,
  });
  const asked = unitText(target.unit);

  if (!sameKind) {
    return within(asAsked, target.band)
      ? verdict(
          'unit',
          0,
          `The number is right; the unit should be ${asked || 'none'}, not ${reading.unitText}.`,
        )
      : verdict(
          'outside',
          0,
          `The unit ${reading.unitText} does not measure what is asked for, and the number is not right in ${asked || 'no unit'}.`,
        );
  }
  if (within(value, target.band)) return insideBand(target, reading, verdict);
  if (target.carriedForward !== null && within(value, target.carriedForward.band)) {
    return verdict('carriedForward', target.marks, 'Right for the candidate’s own earlier answer.');
  }
  if (reading.unit !== null && within(asAsked, target.band)) {
    return verdict('unit', 0, `The number is right in ${asked}; it is written in ${reading.unitText}.`);
  }
  const slip = nearest(value, target.slips, target);
  if (slip !== null) {
    return verdict('slip', slip.marks ?? 0, `${slip.name}.${slip.guidance ? ` ${slip.guidance}` : ''}`);
  }
  const power = powerOfTenOff(value, target);
  if (power !== null) {
    const size = formatNumber(10 ** Math.abs(power), {
      figures: Math.abs(power) > 4 ? 1 : Math.abs(power) + 1,
    }).text;
    return verdict(
      'powerOfTen',
      0,
      `The digits are right; the answer is ${size} times too ${power > 0 ? 'large' : 'small'}.`,
    );
  }
  if (within(-value, target.band)) return verdict('sign', 0, 'The size is right; the sign is wrong.');
  const miss = nearest(value, target.nearMisses, target);
  if (miss !== null) return verdict('nearMiss', 0, `${miss.name}.`);
  return verdict('outside', 0, outsideReason(value, target));
}

function insideBand(
  target: MarkingTarget,
  reading: Extract<ResponseReading, { ok: true }>,
  verdict: (kind: VerdictKind, marks: number, reason: string) => Verdict,
): Verdict {
  if (reading.unit === null && target.unit.text !== '' && target.unitPrinted !== true) {
    return verdict('unit', 0, `The number is right; the unit ${unitText(target.unit)} is missing.`);
  }
  const { least, most } = reading.figures;
  if (target.enforceFigures && (target.figures < least || target.figures > most)) {
    const written = least === most ? String(least) : `between ${least} and ${most}`;
    return verdict(
      'figures',
      0,
      `The value is right; it has ${written} significant figures where ${target.figures} are asked for.`,
    );
  }
  return verdict('accepted', target.marks, 'Inside the band.');
}

/** The wrong working whose value is nearest, among those whose own band holds the answer. */
function nearest(
  value: number,
  workings: readonly WrongWorking[],
  target: MarkingTarget,
): WrongWorking | null {
  let best: WrongWorking | null = null;
  for (const working of workings) {
    if (!within(value, bandAround(working.value, target))) continue;
    if (best === null || Math.abs(value - working.value) < Math.abs(value - best.value)) best = working;
  }
  return best;
}

function outsideReason(value: number, target: MarkingTarget): string {
  const error = (value - target.value) / target.value;
  const edge = value > target.band.to ? target.band.to : target.band.from;
  const beyond = percent((value - edge) / target.value);
  const limit = formatNumber(fromSI(edge, target.unit), { figures: Math.max(4, target.figures + 1) }).text;
  const unit = unitText(target.unit);
  const side = Math.abs(value) > Math.abs(target.value) ? 'above' : 'below';
  if (!Number.isFinite(error)) return 'Outside the band.';
  return `Outside the band: ${percent(error)} ${side} the model answer, ${beyond} beyond the band’s end at ${limit}${unit === '' ? '' : ` ${unit}`}.`;
}
