import type { Answer, Band } from '#shared/engine/index.ts';

/** Rounds a number to so many significant figures. */
const tidy = (value: number, figures: number): number => Number(value.toPrecision(figures));

/**
 * The band that a stretch of the scale stands for, in the form that the writer chose: `low` and `high` are
 * signed relative errors, `model` is the model answer in the answer's unit (null when it is not known).
 * Null when that form cannot express it.
 */
export function bandFromStrip(
  answer: Answer,
  stretch: { low: number; high: number },
  model: number | null,
): Band | null {
  const half = Math.max(Math.abs(stretch.low), Math.abs(stretch.high));
  const { band } = answer;
  switch (band.kind) {
    case 'percent':
      return { ...band, percent: Math.min(100, tidy(half * 100, 3)) };
    case 'absolute':
      return model === null || band.unit !== answer.unit
        ? null
        : { ...band, plusMinus: tidy(Math.abs(model) * half, 3) };
    case 'lastFigure': {
      if (model === null || model === 0) return null;
      const unit = 10 ** (Math.floor(Math.log10(Math.abs(model))) + 1 - answer.figures);
      return { ...band, units: Math.min(50, tidy((Math.abs(model) * half) / unit, 2)) };
    }
    case 'limits': {
      if (model === null || band.unit !== answer.unit) return null;
      const figures = answer.figures + 1;
      const ends = [model * (1 + stretch.low), model * (1 + stretch.high)].map((end) => tidy(end, figures));
      return { ...band, from: Math.min(...ends), to: Math.max(...ends) };
    }
  }
}
