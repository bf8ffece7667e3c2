/** The 12 statements that engine, NumPy and C work through: one million draws, values, rounding and conditions. */
export const BENCH_SCRIPT = `Va = draw(150 V, 349 V, 1 V)
B = draw(0.50 mT, 1.49 mT, 0.01 mT)
d = draw(2.0 cm, 6.9 cm, 0.1 cm)
v = sqrt(2 * e * Va / m_e)
r = given(m_e * v / (e * B), 3)
E = given(Va / d, 3)
F = e * E
a = F / m_e
t = d / v
sc = 2 * Va / (B^2 * r^2)
require(r < 8.0 cm)
require(v < 0.1 * c)`;

export const BENCH_DRAWS = 1_000_000;

/** A script of `count` statements that uses every part of the language, for timing the compiler. */
export function longScript(count: number): string {
  const lines = [
    'V0 = draw(150 V, 300 V, 10 V)',
    'B0 = draw(0.70 mT, 1.30 mT, 0.05 mT)',
    'xs = spread(1 cm, 6 cm, 6)',
  ];
  for (let index = 1; lines.length < count; index += 1) {
    lines.push(
      `v${index} = sqrt(2 * e * V0 / m_e) * (1 + ${index} / 100)   // speed`,
      `r${index} = given(m_e * v${index} / (e * B0), 3)`,
      `ys${index} = xs^2 * ${index} + 2.5 cm^2`,
      `k${index} = slope(xs, ys${index}) + mean(xs)`,
      `require(0 m < r${index} < 50.0 cm and v${index} < c)`,
    );
  }
  return lines.slice(0, count).join('\n');
}
