import { roundToFigures } from '../units/rounding.ts';
import type { DrawPlan } from './sampling.ts';

/** Whole numbers as read aloud: with commas up to a million, then in powers of ten. */
function countText(count: number): string {
  if (count <= EXACT_LIMIT) return String(count).replace(/\B(?=(\d{3})+$)/g, ',');
  const [digits = '', exponent = '0'] = count.toExponential(1).split('e');
  return `${digits} × 10^${Number(exponent)}`;
}

const EXACT_LIMIT = 10_000_000;

/**
 * What was covered, in words: "all 4,320 draws", or "20,000 of 3.1 × 10^9; fewer than 1 in 6,600 fails,
 * 95 % confidence". With no failure among n draws the 95 % upper bound of the rate is 3/n (rule of three,
 * Hanley and Lippman-Hand, JAMA 249, 1743, 1983); with failures the statement counts them instead.
 */
export function coverageStatement(plan: DrawPlan, failures = 0): string {
  if (plan.exhaustive) return plan.count === 1 ? 'the only draw' : `all ${countText(plan.count)} draws`;
  const of = plan.open ? 'as many as scatter gives' : countText(plan.gridSize);
  if (failures > 0) return `${countText(plan.count)} of ${of}; ${countText(failures)} of these fail`;
  const bound = Math.floor(plan.count / 3);
  // Two figures, rounded down so that the claim is never stronger than the rule allows.
  const unit = roundToFigures(10 ** Math.max(0, Math.floor(Math.log10(bound)) - 1), 1);
  return `${countText(plan.count)} of ${of}; fewer than 1 in ${countText(Math.floor(bound / unit) * unit)} fails, 95 % confidence`;
}
