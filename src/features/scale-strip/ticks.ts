/** One tick of a scale: where it stands (in the axis' own quantity), and whether it is long and numbered. */
export interface Tick {
  value: number;
  major: boolean;
}

/**
 * The step among 1, 2 and 5 times a power of ten that is at least `rough`.
 * `rough` must be finite and above zero; anything else gives 1.
 */
export function tidyStep(rough: number): number {
  if (!Number.isFinite(rough) || rough <= 0) return 1;
  const power = 10 ** Math.floor(Math.log10(rough) + 1e-9);
  const lead = rough / power;
  if (lead <= 1 + 1e-9) return power;
  if (lead <= 2 + 1e-9) return 2 * power;
  return lead <= 5 + 1e-9 ? 5 * power : 10 * power;
}

/**
 * Ticks from `from` to `to`: long ones about `majors` in number on tidy values, and four or five short
 * ones between two of them. Values are whole multiples of the short step, free of floating-point dust.
 */
export function ticksBetween(from: number, to: number, majors: number): Tick[] {
  if (!(to > from)) return [];
  const step = tidyStep((to - from) / Math.max(1, majors));
  const lead = Math.round(step / 10 ** Math.floor(Math.log10(step) + 1e-9));
  const divisions = lead === 2 ? 4 : 5;
  const minor = step / divisions;
  const digits = Math.max(0, 2 - Math.floor(Math.log10(minor)));
  const ticks: Tick[] = [];
  for (let n = Math.ceil(from / minor - 1e-9); n <= Math.floor(to / minor + 1e-9); n += 1) {
    ticks.push({ value: Number((n * minor).toFixed(Math.min(digits, 100))), major: n % divisions === 0 });
  }
  return ticks;
}
