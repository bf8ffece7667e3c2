import { convert } from '../units/convert.ts';
import { sameDimension } from '../units/dimension.ts';
import { readUnit } from '../units/read-unit.ts';
import { NO_UNIT, type Unit } from '../units/unit.ts';
import { readNumber } from './read-number.ts';
import { unitWordsToSymbols } from './unit-words.ts';

/** A candidate's answer as read, or the reason that a person must look. */
export type ResponseReading =
  | {
      ok: true;
      /** The number as written, in the unit as written. */
      value: number;
      /** Null when the answer has none. */
      unit: Unit | null;
      unitText: string;
      /** Significant figures; a range where trailing zeros are ambiguous. */
      figures: { least: number; most: number };
    }
  | { ok: false; reason: string };

const MOST_CHARACTERS = 400;
const SUPERSCRIPTS: ReadonlyMap<string, string> = new Map([
  ...Array.from('⁰¹²³⁴⁵⁶⁷⁸⁹', (sign, digit): [string, string] => [sign, String(digit)]),
  ['⁻', '-'],
  ['⁺', '+'],
]);

/** Signs that look alike become one: minus signs, spaces, and superscripts written with a caret. */
function normalise(text: string): string {
  return text
    .replace(
      /[⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺]+/g,
      (run) => `^${Array.from(run, (sign) => SUPERSCRIPTS.get(sign) ?? '').join('')}`,
    )
    .replace(/[−–—‐‑﹣-]/g, '-')
    .replace(/[\s\u00A0\u2009\u202F]+/g, ' ')
    .trim();
}

/** Remarks on figures, as “(3 s.f.)” or “to 3 sig figs”, which are no second value. */
const FIGURES_REMARK =
  /[(,;]?\s*(?:to\s+)?\d{1,2}\s*(?:s\.?\s?f\.?|sig(?:nificant)?\.?\s*fig(?:ure)?s?\.?|d\.?\s?p\.?|decimal places?)\s*\)?/gi;
const COMPARISON = /[<>≤≥±]|\b(?:less|more|greater|than|between|not|least|most|or)\b/i;
const LEAD_NAME =
  /^(?:[\p{L}][\p{L}\p{N}_'′]*(?:\s*\/\s*\(?[\p{L}][\p{L}\p{N}_'′]*\)?)?|[\p{L}\s,]*)\s*(?:[=≈~:≃]|is|was)\s*/u;

/** Takes off what leads up to the number: `v =`, `≈`, `Answer:`; a reason when it is more than that. */
function stripLead(text: string): { rest: string } | { reason: string } {
  let rest = text;
  for (let round = 0; round < 6; round += 1) {
    const lead = LEAD_NAME.exec(rest)?.[0] ?? '';
    if (lead === '' || lead.length === rest.length) break;
    if (COMPARISON.test(lead)) return { reason: 'The answer is given as a limit or a range.' };
    rest = rest.slice(lead.length);
  }
  rest = rest.replace(/^[≈~=:\s]+/u, '');
  const start = rest.search(/(?:[+-]\s*)?[.,]?\d/);
  if (start < 0) return { reason: 'No number is written.' };
  const words = rest.slice(0, start);
  if (COMPARISON.test(words)) return { reason: 'The answer is given as a limit or a range.' };
  if (/[^\p{L}\s.,]/u.test(words) || /\p{L}$/u.test(words))
    return { reason: 'A working stands before the number.' };
  return { rest: rest.slice(start) };
}

/** Words that begin a remark although they could be read as units (attosecond, attometre). */
const REMARKS: ReadonlySet<string> = new Set(['as', 'am', 'at', 'and', 'to', 'so', 'in', 'is', 'if']);

interface UnitPart {
  unit: Unit | null;
  text: string;
  rest: string;
}

/** Both readings of letters such as `ms^-1`: with a prefix, and as metre times the rest. */
function withMetreApart(text: string): string {
  return text.replace(/(?<![\p{L}])m(?=(?:s)(?:\^?-))/gu, 'm ');
}

/** Reads the unit that a text begins with: the longest run of words that is one; the rest are remarks. */
function splitUnit(text: string, expected: Unit | null): UnitPart | { reason: string } {
  const words = text.split(' ').filter((word) => word !== '');
  const remark = words.findIndex((word) => REMARKS.has(word.toLowerCase()));
  const most = remark < 0 ? words.length : remark;
  for (let count = most; count > 0; count -= 1) {
    const candidate = words
      .slice(0, count)
      .join(' ')
      .replace(/[.,;:!)]+$/, (end) =>
        end.includes(')') && words.slice(0, count).join(' ').includes('(') ? ')' : '',
      );
    const reading = readUnit(candidate, { lenient: true });
    if (!reading.ok || reading.unit.text === '') continue;
    const rest = words.slice(count).join(' ');
    const apart = withMetreApart(candidate);
    if (apart !== candidate) {
      const other = readUnit(apart, { lenient: true });
      if (other.ok) {
        if (expected !== null && sameDimension(other.unit.dimension, expected.dimension)) {
          return { unit: other.unit, text: candidate, rest };
        }
        if (expected === null || !sameDimension(reading.unit.dimension, expected.dimension)) {
          return { reason: `“${candidate}” can be read as per millisecond or as metre per second.` };
        }
      }
    }
    return { unit: reading.unit, text: candidate, rest };
  }
  return { unit: null, text: '', rest: words.join(' ') };
}

const SAME = 1e-9;

/** Whether a second number after the first says the same in another unit, within its figures; a reason if not. */
function checkRest(rest: string, value: number, unit: Unit | null, expected: Unit | null): string | null {
  if (/^[\s,;(]*or\b/i.test(rest)) return 'Two answers are written.';
  const remark = rest.replace(/^[\s(=≈,;.or]*(?=[+-]?\d)/, '');
  if (!/\d/.test(remark)) {
    return COMPARISON.test(remark) ? 'A remark changes what the number means.' : null;
  }
  const number = readNumber(remark);
  if (!number.ok) return 'More than one number is written.';
  const second = splitUnit(unitWordsToSymbols(remark.slice(number.length).replace(/[)]+$/, '')), expected);
  if ('reason' in second || /\d/.test(second.rest)) return 'More than one number is written.';
  const from = second.unit ?? NO_UNIT;
  const to = unit ?? NO_UNIT;
  if (!sameDimension(from.dimension, to.dimension)) return 'Two different values are written.';
  const again = convert(number.value, from, to);
  // Half a unit in the last figure that the second number may have.
  const lastFigure = 10 ** (Math.floor(Math.log10(Math.abs(again) || 1)) + 1 - number.figures.most);
  return Math.abs(again - value) <= 0.5 * lastFigure * (1 + SAME)
    ? null
    : 'Two different values are written.';
}

/**
 * Reads what a candidate wrote: number, unit and figures, in any of the usual notations; never guesses silently.
 * `expected` is the unit asked for, which settles `ms^-1` (metre per second, or per millisecond) and nothing else.
 */
export function readResponse(text: string, expected: Unit | null = null): ResponseReading {
  if (text.length > MOST_CHARACTERS)
    return { ok: false, reason: 'The answer is too long to be a number with a unit.' };
  const plain = normalise(text).replace(FIGURES_REMARK, ' ').replace(/ +/g, ' ').trim();
  if (plain === '') return { ok: false, reason: 'Nothing is written.' };
  const lead = stripLead(plain);
  if ('reason' in lead) return { ok: false, reason: lead.reason };
  const number = readNumber(lead.rest);
  if (!number.ok) return { ok: false, reason: number.reason };
  const rest = lead.rest.slice(number.length).trim();
  if (/^[±]/.test(rest)) return { ok: false, reason: 'An uncertainty is written beside the number.' };
  if (/^(?:[+\-*×x·^]|\/\s*\d)/.test(rest))
    return { ok: false, reason: 'The answer is not worked out to one number.' };
  const part = splitUnit(unitWordsToSymbols(rest), expected);
  if ('reason' in part) return { ok: false, reason: part.reason };
  if (
    part.unit === null &&
    /^[\p{L}°%/]/u.test(part.rest) &&
    !/^(?:as|at|and|to|so|in|is|if|or)\b/i.test(part.rest)
  ) {
    const word = part.rest.split(' ')[0] ?? part.rest;
    return { ok: false, reason: `“${word}” is not a unit that is known.` };
  }
  const problem = checkRest(part.rest, number.value, part.unit, expected);
  if (problem !== null) return { ok: false, reason: problem };
  return { ok: true, value: number.value, unit: part.unit, unitText: part.text, figures: number.figures };
}
