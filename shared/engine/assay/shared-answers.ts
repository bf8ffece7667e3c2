/**
 * Chance that of two different draws, taken at random, the answer to one lies in the band of the other. Answers
 * and half-widths of their bands in one unit, draw by draw.
 */
export function sharedAnswerChance(answers: readonly number[], halfWidths: readonly number[]): number {
  const count = answers.length;
  if (count < 2) return 0;
  const sorted = Float64Array.from(answers).sort();
  const below = (limit: number): number => {
    let from = 0;
    let to = count;
    while (from < to) {
      const middle = (from + to) >> 1;
      if ((sorted[middle] ?? Infinity) < limit) from = middle + 1;
      else to = middle;
    }
    return from;
  };
  let pairs = 0;
  for (let index = 0; index < count; index += 1) {
    const answer = answers[index] ?? NaN;
    // A little room, so that an answer always counts itself, which is then taken off.
    const half = (halfWidths[index] ?? 0) + 1e-9 * Math.abs(answer);
    pairs += below(answer + half) - below(answer - half) - 1;
  }
  return Math.max(0, pairs) / (count * (count - 1));
}
