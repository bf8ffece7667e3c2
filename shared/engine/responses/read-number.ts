/** A number found at the start of a text: its value, figures, and how much of the text it takes. */
export type NumberReading =
  | { ok: true; value: number; figures: { least: number; most: number }; length: number }
  | { ok: false; reason: string };

const SIGN = /^[+-]?\s*/;
/** Digits in groups of three behind spaces, or plain, with a decimal point or comma. */
const MANTISSA =
  /^(?:\d{1,3}(?: \d{3})+(?!\d)|\d{1,3}(?:,\d{3}){2,}(?!\d)|\d{1,3}(?:,\d{3})+(?=\.\d)|\d+)?(?:[.,]\d{3}(?: \d{3})+(?: \d{1,2}(?!\d))?|[.,]\d*)?/;
const LETTER_POWER = /^\s*[eE]\s*([+-]?\s*\d+)(?![\d.,])/;
const TIMES_TEN = /^\s*[x×✕*·⋅∙.]\s*10(?!\d)/i;
const TEN = /^10\s*(?:\^|\*\*)/;
const AFTER_TEN = /^\s*(?:\^|\*\*)?\s*(?:\(\s*([+-]?\s*\d+)\s*\)|([+-]?\s*\d+))/;
const LARGEST_POWER = 300;

function significantFigures(digits: string, hasPoint: boolean): { least: number; most: number } {
  const significant = digits.replace(/^0+/, '');
  if (significant === '') return { least: 1, most: Math.max(1, digits.length) };
  const least = hasPoint ? significant.length : significant.replace(/0+$/, '').length;
  return { least, most: significant.length };
}

interface PowerReading {
  power: number;
  length: number;
}

/** Reads the power of ten after a mantissa; null where none is written, a reason where it is not clear. */
function readPower(text: string): PowerReading | string | null {
  const letter = LETTER_POWER.exec(text);
  if (letter !== null)
    return { power: Number((letter[1] ?? '').replace(/\s/g, '')), length: letter[0].length };
  const times = TIMES_TEN.exec(text);
  if (times === null) {
    return /^\s*[x×✕*·⋅∙]\s*10\d/i.test(text) ? 'The power of ten is not clear.' : null;
  }
  const after = text.slice(times[0].length);
  const exponent = AFTER_TEN.exec(after);
  if (exponent === null) return 'The power of ten is not clear.';
  const marked = /^\s*(?:\^|\*\*)/.test(after) || /^\s*[(+-]/.test(after);
  if (!marked) return 'The power of ten is not clear.';
  return {
    power: Number((exponent[1] ?? exponent[2] ?? '').replace(/\s/g, '')),
    length: times[0].length + exponent[0].length,
  };
}

/** Reads the number that a text begins with, in any of the forms that candidates write. */
export function readNumber(text: string): NumberReading {
  const sign = SIGN.exec(text)?.[0] ?? '';
  const body = text.slice(sign.length);
  const negative = sign.includes('-');
  const ten = TEN.exec(body);
  if (ten !== null) {
    const exponent = AFTER_TEN.exec(body.slice(2));
    const power = Number((exponent?.[1] ?? exponent?.[2] ?? 'NaN').replace(/\s/g, ''));
    if (exponent === null || !(Math.abs(power) <= LARGEST_POWER))
      return { ok: false, reason: 'The power of ten is not clear.' };
    const value = Number(`1e${power}`);
    return {
      ok: true,
      value: negative ? -value : value,
      figures: { least: 1, most: 1 },
      length: sign.length + 2 + exponent[0].length,
    };
  }
  const mantissa = MANTISSA.exec(body)?.[0] ?? '';
  if (!/\d/.test(mantissa)) return { ok: false, reason: 'No number is written.' };
  const rest = body.slice(mantissa.length);
  if (/^[.,]?\d/.test(rest)) return { ok: false, reason: 'The digits of the number are not clear.' };
  const power = readPower(rest);
  if (typeof power === 'string') return { ok: false, reason: power };
  const joined = mantissa.replace(/ /g, '');
  const marks = joined.replace(/\d/g, '');
  if (/^[1-9]\d{0,2},\d{3}$/.test(joined) && !(power !== null && joined.indexOf(',') === 1)) {
    return { ok: false, reason: `“${mantissa}” can be read as a whole number or as a decimal.` };
  }
  const grouped = marks.length > 1;
  const decimal = grouped ? joined.replace(/,/g, '') : joined.replace(',', '.');
  const exponent = power?.power ?? 0;
  if (Math.abs(exponent) > LARGEST_POWER)
    return { ok: false, reason: 'The power of ten is too large to be meant.' };
  const digits = decimal.replace('.', '');
  const value = Number(`${decimal.startsWith('.') ? '0' : ''}${decimal.replace(/\.$/, '')}e${exponent}`);
  return {
    ok: true,
    value: negative && value !== 0 ? -value : value,
    figures: significantFigures(digits, decimal.includes('.')),
    length: sign.length + mantissa.length + (power?.length ?? 0),
  };
}
