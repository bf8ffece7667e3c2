import { formatNumber, type PartScale, type StripMark } from '#shared/engine/index.ts';
import type { Interval } from './geometry.ts';

/** Narrow space that never breaks. */
const SPACE = '\u202f';

/** From this relative error on (1,000 %) a ratio says more than a percentage. */
const AS_RATIO = 10;

/**
 * A relative error as a signed percentage: 0.021 gives “+2.1 %”; one that is far too large as how many times
 * the model answer it is.
 */
export function percentText(error: number, figures = 2): string {
  if (!Number.isFinite(error)) return 'without limit';
  if (Math.abs(error) >= AS_RATIO) return `${formatNumber(1 + error, { figures: 2 }).text} times`;
  const percent = Number((error * 100).toPrecision(Math.abs(error) >= 1 ? 3 : figures));
  const text = formatNumber(percent, { figures: figuresOf(percent) }).text;
  return `${percent > 0 ? '+' : ''}${text}${SPACE}%`;
}

/** Figures that a number needs when it is written without trailing zeros. */
function figuresOf(value: number): number {
  const digits = value.toExponential().split('e')[0]?.replace(/\D/g, '') ?? '1';
  const power = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
  return Math.max(digits.length, power < 5 ? power + 1 : 1);
}

/** A sentence of the checker with a space before “%” at which no line breaks. */
export function unbroken(sentence: string): string {
  return sentence.replace(/(\d) %/g, `$1${SPACE}%`);
}

const KIND: Readonly<Record<StripMark['kind'], string>> = {
  route: 'Rounding route',
  slip: 'Slip',
  nearMiss: 'Near miss',
};

/** The kind of a mark in the house's words. */
export function kindName(mark: StripMark): string {
  return KIND[mark.kind];
}

/** One mark in a sentence, as a screen reader says it and as the line under the strip shows it. */
export function describeMark(mark: StripMark): string {
  if (mark.kind === 'route') {
    return `${KIND.route}: ${mark.label}, at its furthest ${percentText(mark.furthest, 3)} from the model answer, draw ${mark.draw}.`;
  }
  const where =
    mark.relativeError === 0
      ? 'equal to the model answer'
      : `${percentText(mark.relativeError, 3)} from the model answer`;
  const verdict = mark.insideBand ? 'inside the band, so it would earn the marks' : 'outside the band';
  const far =
    mark.furthest === mark.relativeError ? '' : `, at its furthest ${percentText(mark.furthest, 3)}`;
  return `${KIND[mark.kind]}: ${mark.label}, at its closest ${where}${far}; ${verdict}. Draw ${mark.draw}.`;
}

/** The band in words. */
export function describeBand(band: Interval): string {
  return `${percentText(band.low, 3)} to ${percentText(band.high, 3)}`;
}

/** What the whole strip shows, in one or two sentences. */
export function describeScale(scale: PartScale, band: Interval): string {
  const wrong = scale.marks.filter((mark) => mark.kind !== 'route');
  const inside = wrong.filter((mark) => mark.insideBand).length;
  const misses =
    wrong.length === 0
      ? 'No slip or near miss is known.'
      : `${wrong.length === 1 ? '1 slip or near miss' : `${wrong.length} slips and near misses`}, ${inside === 0 ? 'all outside the band' : `${inside} inside the band`}.`;
  return `Band ${describeBand(band)}. Rounding routes spread from ${percentText(scale.routeSpread.below, 3)} to ${percentText(scale.routeSpread.above, 3)}. ${misses}`;
}

const VERDICTS: Readonly<Record<PartScale['recommended']['verdict'], string>> = {
  sound: 'The band is sound.',
  tooTight: 'The band is too tight.',
  wide: 'The band is wider than it needs to be.',
  impossible: 'No band takes every route and keeps every wrong working out.',
};

/** The verdict on the band as a short sentence. */
export function bandVerdict(scale: PartScale): string {
  return VERDICTS[scale.recommended.verdict];
}
