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
/** Quanta smaller than this part of the smallest value would fit almost any readings. */
const LARGEST_MULTIPLE_OF_LEAST = 12;

/**
 * The largest amount of which all values are whole multiples, to within scatter of a tenth of it: the first
 * peak of the cosine quantogram (D. G. Kendall, Phil. Trans. R. Soc. A 276, 231, 1974) at or above that
 * agreement, then refined by least squares on the multiples found. NaN when there is none.
 */
export function quantumOf(values: readonly number[]): number {
  const sizes = values.map(Math.abs);
  const least = Math.min(...sizes);
  const greatest = Math.max(...sizes);
  if (!(least > 0) || !Number.isFinite(greatest)) return NaN;
  const step = 1 / (20 * greatest);
  let frequency = 0.8 / least;
  let previous = agreement(sizes, frequency - step);
  let here = agreement(sizes, frequency);
  const limit = (LARGEST_MULTIPLE_OF_LEAST + 0.5) / least;
  for (let tries = 0; frequency < limit && tries < 100_000; tries += 1) {
    const next = agreement(sizes, frequency + step);
    if (here >= LEAST_AGREEMENT && here >= previous && here >= next) return refine(sizes, 1 / frequency);
    previous = here;
    here = next;
    frequency += step;
  }
  return NaN;
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
