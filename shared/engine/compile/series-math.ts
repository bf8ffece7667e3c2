/** Sum in the order given. */
export function sumOf(values: readonly number[]): number {
  let total = 0;
  for (const value of values) total += value;
  return total;
}

/** Arithmetic mean. */
export function meanOf(values: readonly number[]): number {
  return sumOf(values) / values.length;
}

/**
 * Gradient of the least-squares line of y against x, from deviations from the means, which keeps full
 * precision where sums of squares would cancel (checked against NIST StRD).
 */
export function slopeOf(xs: readonly number[], ys: readonly number[]): number {
  const xMean = meanOf(xs);
  const yMean = meanOf(ys);
  let above = 0;
  let below = 0;
  for (const [index, x] of xs.entries()) {
    above += (x - xMean) * ((ys[index] ?? NaN) - yMean);
    below += (x - xMean) ** 2;
  }
  return above / below;
}

/** Where the least-squares line of y against x meets x = 0. */
export function interceptOf(xs: readonly number[], ys: readonly number[]): number {
  return meanOf(ys) - slopeOf(xs, ys) * meanOf(xs);
}

/** Mean cosine of the phases of the values against a quantum: 1 when all are whole multiples of it. */
function agreement(sizes: readonly number[], frequency: number): number {
  let total = 0;
  for (const size of sizes) total += Math.cos(2 * Math.PI * size * frequency);
  return total / sizes.length;
}

/** Agreement of readings that scatter by about a tenth of the quantum: exp(-2 (pi / 10)^2). */
const LEAST_AGREEMENT = 0.8;
/** A coarse step may miss the top of a peak by this much. */
const COARSE_AGREEMENT = 0.7;
/** Quanta smaller than this part of the smallest value would fit almost any readings. */
const LARGEST_MULTIPLE_OF_LEAST = 12;
/** Disagreements within this ratio are not told apart, and the larger quantum is taken. */
const SAME_DISAGREEMENT = 1.2;
const NO_DISAGREEMENT = 1e-9;

/**
 * The largest amount of which all values are whole multiples to within their scatter: of the peaks of the cosine
 * quantogram (D. G. Kendall, Phil. Trans. R. Soc. A 276, 231, 1974), each refined by least squares, the one with
 * the best agreement, and of equally good ones the largest. NaN when the values scatter by more than a tenth of
 * any quantum, or one of them is zero.
 */
export function quantumOf(values: readonly number[]): number {
  const sizes = values.map(Math.abs);
  const least = Math.min(...sizes);
  const greatest = Math.max(...sizes);
  if (!(least > 0) || !(greatest / least < 1_000)) return NaN;
  const step = 1 / (10 * greatest);
  const limit = (LARGEST_MULTIPLE_OF_LEAST + 0.5) / least;
  const peaks: { quantum: number; disagreement: number }[] = [];
  let previous = 0;
  let frequency = 0.8 / least;
  let here = agreement(sizes, frequency);
  while (frequency < limit) {
    const next = agreement(sizes, frequency + step);
    if (here >= COARSE_AGREEMENT && here >= previous && here >= next) {
      const quantum = refine(sizes, refine(sizes, 1 / frequency));
      peaks.push({ quantum, disagreement: 1 - agreement(sizes, 1 / quantum) });
    }
    previous = here;
    here = next;
    frequency += step;
  }
  const best = Math.min(...peaks.map((peak) => peak.disagreement));
  if (!(best <= 1 - LEAST_AGREEMENT)) return NaN;
  const good = peaks.filter((peak) => peak.disagreement <= SAME_DISAGREEMENT * best + NO_DISAGREEMENT);
  return Math.max(...good.map((peak) => peak.quantum));
}

/** Least squares through the origin of the values against the whole multiples that a quantum gives them. */
function refine(sizes: readonly number[], quantum: number): number {
  let above = 0;
  let below = 0;
  for (const size of sizes) {
    const multiple = Math.max(1, Math.round(size / quantum));
    above += multiple * size;
    below += multiple * multiple;
  }
  return above / below;
}
