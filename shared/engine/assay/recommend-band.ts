import { shareInWords } from './check.ts';
import type { PartScale } from './report.ts';

/** Tidy half-widths, percent: what people write on mark schemes. */
export const TIDY_PERCENTS = [0.5, 1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12, 15, 20] as const;

/** Bands wider than this many times the recommended one are called wide, unless they are narrow in themselves. */
const WIDE = 3;
/** Half-width, relative, below which nobody calls a band wide; common practice. */
const NEVER_WIDE = 0.05;

interface BandQuestion {
  /** Extremes of the honest routes, relative, signed. */
  below: number;
  above: number;
  /** Closest wrong working, relative, positive; Infinity for none. */
  nearestWrong: number;
  /** The writer's own band, narrowest over the draws, relative, positive. */
  bandBelow: number;
  bandAbove: number;
  /** True for a whole number, where only the exact answer earns the mark. */
  exact: boolean;
}

/** The narrowest tidy band that takes all routes and leaves the nearest wrong working out. */
export function recommendBand(question: BandQuestion): PartScale['recommended'] {
  const { below, above, nearestWrong, bandBelow, bandAbove, exact } = question;
  const spread = Math.max(above, -below);
  if (exact && spread === 0) {
    return { percent: 0, verdict: 'sound', reason: 'Every honest route gives the whole number itself.' };
  }
  const tidy = TIDY_PERCENTS.find((candidate) => candidate / 100 >= spread - 1e-9) ?? null;
  const own = Math.min(bandBelow, bandAbove);
  const needs = `Honest rounding needs ${shareInWords(spread)}`;
  const nearest = Number.isFinite(nearestWrong)
    ? `; the nearest wrong working lies ${shareInWords(nearestWrong)} away.`
    : '; no wrong working is near.';
  if (tidy === null || tidy / 100 >= nearestWrong) {
    return { percent: null, verdict: 'impossible', reason: `${needs}${nearest}` };
  }
  if (-below > bandBelow + 1e-9 || above > bandAbove + 1e-9) {
    return { percent: tidy, verdict: 'tooTight', reason: `${needs}, more than the band gives${nearest}` };
  }
  if (own >= NEVER_WIDE && own > (WIDE * tidy) / 100) {
    return {
      percent: tidy,
      verdict: 'wide',
      reason: `${needs}; the band gives ${shareInWords(own)}${nearest}`,
    };
  }
  return {
    percent: tidy,
    verdict: 'sound',
    reason: `${needs}; the band gives ${shareInWords(own)}${nearest}`,
  };
}
