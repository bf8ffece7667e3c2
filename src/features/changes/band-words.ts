import { formatNumber, formatQuantity, readUnit, type Band } from '#shared/engine/index.ts';

/** A number as a writer typed it, with real signs. */
function typed(value: number): string {
  const figures = Math.max(1, value.toExponential().split('e')[0]?.replace(/\D/g, '').length ?? 1);
  return formatNumber(value, { figures }).text;
}

function withUnit(number: string, unit: string): string {
  const reading = readUnit(unit);
  const words = reading.ok ? formatQuantity(1, reading.unit, { figures: 1 }).unitText : unit;
  return words === '' ? number : `${number}\u202f${words}`;
}

/** A band as its writer states it, in words. */
export function bandWords(band: Band): string {
  switch (band.kind) {
    case 'percent':
      return `± ${typed(band.percent)}\u202f%`;
    case 'absolute':
      return `± ${withUnit(typed(band.plusMinus), band.unit)}`;
    case 'lastFigure':
      return `± ${typed(band.units)} in the last figure`;
    case 'limits':
      return `${typed(band.from)} to ${withUnit(typed(band.to), band.unit)}`;
  }
}
