/** The root above 1 of x^(d+1) = x + 1. */
function generalisedGoldenRatio(dimensions: number): number {
  let x = 2;
  for (let round = 0; round < 64; round += 1) x = (1 + x) ** (1 / (dimensions + 1));
  return x;
}

/**
 * A low-discrepancy sequence in the unit cube of so many dimensions: the additive recurrence on powers of the
 * generalised golden ratio (M. Roberts, 2018, after H. Niederreiter's additive sequences). Gives point n (from 1).
 */
export function lowDiscrepancy(dimensions: number): (n: number) => number[] {
  const ratio = generalisedGoldenRatio(dimensions);
  const steps = Array.from({ length: dimensions }, (_, index) => ratio ** -(index + 1));
  return (n) => steps.map((step) => (0.5 + step * n) % 1);
}
