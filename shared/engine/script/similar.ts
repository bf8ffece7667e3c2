/** Number of single-letter changes between two words, counted up to `limit` + 1. */
function distance(a: string, b: string, limit: number): number {
  if (Math.abs(a.length - b.length) > limit) return limit + 1;
  let previous = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const change = (previous[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      row.push(Math.min(change, (previous[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1));
    }
    previous = row;
  }
  return previous[b.length] ?? limit + 1;
}

/** The known word most like `word` (capitals alone count least), or null when none is near. */
export function mostSimilar(word: string, known: Iterable<string>): string | null {
  const limit = word.length <= 2 ? 0 : word.length <= 4 ? 1 : 2;
  let best: string | null = null;
  let least = limit + 1;
  for (const candidate of known) {
    const cost = candidate.toLowerCase() === word.toLowerCase() ? 0.5 : distance(candidate, word, limit);
    if (cost < least) {
      best = candidate;
      least = cost;
    }
  }
  return best;
}
