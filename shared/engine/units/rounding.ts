/** `x` rounded to `figures` significant figures: equal to Number(x.toPrecision(figures)) for every finite x. */
export function roundToFigures(x: number, figures: number): number {
  return Number(x.toPrecision(figures));
}

/** `x` rounded to `decimals` decimals (may be negative), ties away from zero. */
export function roundToDecimals(x: number, decimals: number): number {
  return decimals >= 0 ? Number(x.toFixed(decimals)) : x;
}
