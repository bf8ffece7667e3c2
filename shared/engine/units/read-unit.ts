import { rational, type Rational } from './dimension.ts';
import { findUnitSymbol, unitFromTerms, type Unit, type UnitTerm } from './unit.ts';

/** A unit, or one sentence that says what cannot be read and how to write it; `start` and `end` are offsets in the text. */
export type UnitReading =
  { ok: true; unit: Unit } | { ok: false; message: string; start: number; end: number };

const SUPERSCRIPT_DIGITS = new Map(Array.from('⁰¹²³⁴⁵⁶⁷⁸⁹', (sign, digit) => [sign, String(digit)]));
const TOKEN =
  /(?<space>[\s\u00A0\u2009\u202F]+)|(?<dot>[·⋅.*×])|(?<slash>[/∕])|(?<open>\()|(?<close>\))|(?<exponent>\^?[-−]?\d{1,2}|\^\([-−]?\d{1,2}(?:\/\d{1,2})?\)|[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]{1,2})|(?<symbol>A\u030A|[\p{L}%°º]+|per\b)/uy;

/** The whole or fractional exponent written as `^-2`, `-2`, `⁻²` or `^(1/2)`. */
function readExponent(text: string): Rational {
  const plain = Array.from(text, (sign) => SUPERSCRIPT_DIGITS.get(sign) ?? sign)
    .join('')
    .replace(/[⁻−]/g, '-')
    .replace(/[⁺^()]/g, '');
  const [numerator = '1', denominator = '1'] = plain.split('/');
  return rational(Number(numerator), Math.max(1, Number(denominator)));
}

/** Splits letters that run together, as `Js`, into the fewest unit symbols; null when they are none. */
function splitJammed(letters: string): string[] | null {
  if (letters === '') return [];
  for (let length = letters.length; length > 0; length -= 1) {
    const head = letters.slice(0, length);
    if (findUnitSymbol(head) === null) continue;
    const rest = splitJammed(letters.slice(length));
    if (rest !== null) return [head, ...rest];
  }
  return null;
}

interface Token {
  kind: string;
  text: string;
  start: number;
}

function tokenise(text: string): Token[] | { badAt: number } {
  const tokens: Token[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < text.length) {
    const start = TOKEN.lastIndex;
    const match = TOKEN.exec(text);
    if (match?.groups === undefined) return { badAt: start };
    const kind = Object.entries(match.groups).find(([, value]) => value !== undefined)?.[0] ?? 'space';
    tokens.push({ kind, text: match[0], start });
  }
  return tokens;
}

/**
 * Reads a unit as people write it: `m s^-2`, `m/s²`, `C/kg`, `C kg⁻¹`, `J/(kg K)`, `keV`, `µm`, `Ω`, `Å`, `°`.
 * Empty text is the unit of a plain number. A slash divides by the one unit or bracket after it; two units
 * after a slash without a bracket are refused because they can be read two ways, unless `lenient`, which takes
 * both as divided and also takes letters that run together apart, as candidates write (`J/kg K`, `Js`).
 */
export function readUnit(text: string, { lenient = false }: { lenient?: boolean } = {}): UnitReading {
  const fail = (message: string, start: number, end: number): UnitReading => ({
    ok: false,
    message,
    start,
    end,
  });
  const tokens = tokenise(text);
  if (!Array.isArray(tokens)) {
    const sign = Array.from(text.slice(tokens.badAt))[0] ?? '';
    return fail(`“${sign}” cannot stand in a unit.`, tokens.badAt, tokens.badAt + sign.length);
  }
  const terms: UnitTerm[] = [];
  let divided = false;
  let bracket = false;
  let sinceSlash = 0;
  let afterUnit = false;
  for (const token of tokens) {
    const end = token.start + token.text.length;
    if (token.kind === 'space' || token.kind === 'dot') {
      afterUnit = token.kind === 'dot' ? false : afterUnit;
    } else if (token.kind === 'slash') {
      if (bracket) return fail('A slash cannot stand inside the brackets of a unit.', token.start, end);
      divided = true;
      sinceSlash = 0;
    } else if (token.kind === 'open') {
      if (bracket || !divided || sinceSlash > 0)
        return fail('Brackets in a unit stand after a slash, as J/(kg K).', token.start, end);
      bracket = true;
    } else if (token.kind === 'close') {
      if (!bracket) return fail('This bracket was never opened.', token.start, end);
      bracket = false;
      sinceSlash = 1;
    } else if (token.kind === 'exponent') {
      const last = terms.at(-1);
      if (last === undefined || !afterUnit)
        return fail(`“${token.text}” stands where a unit is expected.`, token.start, end);
      const exponent = readExponent(token.text);
      if (exponent[0] === 0)
        return fail('A unit to the power 0 says nothing: leave it out.', token.start, end);
      terms[terms.length - 1] = {
        ...last,
        exponent: rational(exponent[0] * last.exponent[0], exponent[1] * last.exponent[1]),
      };
      afterUnit = false;
    } else {
      const symbols =
        findUnitSymbol(token.text) !== null || !lenient ? [token.text] : splitJammed(token.text);
      for (const written of symbols ?? [token.text]) {
        const found = findUnitSymbol(written);
        if (found === null) return fail(`“${written}” is not a unit that is known here.`, token.start, end);
        if (divided && !bracket && sinceSlash > 0 && !lenient) {
          return fail(
            'Two units after a slash can be read two ways: write negative powers, as J kg^-1 K^-1, or brackets, as J/(kg K).',
            token.start,
            end,
          );
        }
        terms.push({
          prefix: found.prefix,
          symbol: found.definition.symbol,
          exponent: [divided ? -1 : 1, 1],
        });
        sinceSlash += 1;
      }
      afterUnit = true;
    }
  }
  if (bracket) return fail('A bracket is not closed.', text.length, text.length);
  if (divided && sinceSlash === 0) return fail('No unit stands after the slash.', text.length, text.length);
  return { ok: true, unit: unitFromTerms(terms) };
}
