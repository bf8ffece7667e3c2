import type { PartScale, StripMark } from '#shared/engine/index.ts';
import type { Interval } from './geometry.ts';

const MINUS = '−';

/** A number with so many significant figures at most, a real minus sign and no trailing zeros. */
function plain(value: number, figures: number): string {
  const magnitude = Math.abs(value);
  if (magnitude !== 0 && (magnitude >= 1e4 || magnitude < 1e-3)) {
    const [lead, power] = magnitude.toExponential(figures - 1).split('e');
    const sign = value < 0 ? MINUS : '';
    return `${sign}${lead ?? ''} × 10^${String(Number(power)).replace('-', MINUS)}`;
  }
  const text = String(Number(magnitude.toPrecision(figures)));
  return value < 0 && Number(text) !== 0 ? `${MINUS}${text}` : text;
}

/** A relative error as a signed percentage: 0.021 gives “+2.1 %”. Two figures, more near the band's ends. */
export function percentText(error: number, figures = 2): string {
  if (!Number.isFinite(error)) return 'without limit';
  const percent = error * 100;
  const text = plain(percent, Math.abs(percent) >= 100 ? 3 : figures);
  return `${percent > 0 && text !== '0' ? '+' : ''}${text}\u202f%`;
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
  const where =
    mark.relativeError === 0
      ? 'equal to the model answer'
      : `${percentText(mark.relativeError, 3)} from the model answer`;
  if (mark.kind === 'route') return `${KIND.route}: ${mark.label}, ${where}, draw ${mark.draw}.`;
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
