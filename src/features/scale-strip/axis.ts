import { formatNumber, formatQuantity, readUnit } from '#shared/engine/index.ts';
import { percentText } from './words.ts';

/** What the numbers of a strip are written in. */
export interface Axis {
  kind: 'relative' | 'unit';
  /** Stands beside the numbers: “error in %”, or the unit. */
  caption: string;
  /** The number under a tick. */
  tickText: (error: number) => string;
  /** The number of a band end or mark, with its unit. */
  valueText: (error: number) => string;
  /** The number that is typed for an error, and back. */
  toTyped: (error: number) => string;
  fromTyped: (text: string) => number | null;
}

/** A typed number with a comma or point, a real or plain minus, a percent sign or none; null when it is none. */
function typedNumber(text: string): number | null {
  const plain = text
    .replace(/[\s%\u2009\u202f]/g, '')
    .replace('−', '-')
    .replace(',', '.')
    .replace(/×10\^?/, 'e');
  return plain === '' || !Number.isFinite(Number(plain)) ? null : Number(plain);
}

/** Relative errors in percent. */
export const RELATIVE_AXIS: Axis = {
  kind: 'relative',
  caption: 'error in %',
  tickText: (error) => percentText(error, 3).replace('\u202f%', ''),
  valueText: (error) => percentText(error, 3),
  toTyped: (error) => String(Number((error * 100).toPrecision(4))),
  fromTyped: (text) => {
    const percent = typedNumber(text);
    return percent === null ? null : percent / 100;
  },
};

/** The unit as it is printed, as `m s⁻¹`; unreadable text stays as it is. */
export function printedUnit(unit: string): string {
  const reading = readUnit(unit);
  return reading.ok ? formatQuantity(1, reading.unit, { figures: 1 }).unitText : unit;
}

/** Powers of ten that are taken out of the ticks into the caption: those that would print in standard form. */
function sharedPower(answer: number): number {
  const power = Math.floor(Math.log10(Math.abs(answer)));
  return power >= -3 && power <= 3 ? 0 : power;
}

/** The answer's own values: `answer` is the model answer in `unit` at the draw on show, neither zero nor infinite. */
export function unitAxis(answer: number, unit: string, range: number): Axis {
  const words = printedUnit(unit);
  const power = sharedPower(answer);
  const at = (error: number): number => answer * (1 + error);
  const figures = Math.min(8, Math.max(3, 2 - Math.floor(Math.log10(range / 4))));
  const withUnit = (text: string): string => (words === '' ? text : `${text}\u202f${words}`);
  const scale =
    power === 0 ? '' : `×\u202f${formatNumber(10 ** power, { figures: 1 }).text.replace(/^1\s×\s/, '')}`;
  return {
    kind: 'unit',
    caption: withUnit(scale).trim() === '' ? 'answer' : withUnit(scale).trim(),
    tickText: (error) => formatNumber(at(error) / 10 ** power, { figures }).text,
    valueText: (error) => withUnit(formatNumber(at(error), { figures }).text),
    toTyped: (error) => String(Number(at(error).toPrecision(figures))),
    fromTyped: (text) => {
      const value = typedNumber(text);
      return value === null ? null : value / answer - 1;
    },
  };
}
