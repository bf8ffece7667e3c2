const PREFIX_WORDS: readonly (readonly [word: string, prefix: string])[] = [
  ['tera', 'T'],
  ['giga', 'G'],
  ['mega', 'M'],
  ['kilo', 'k'],
  ['centi', 'c'],
  ['milli', 'm'],
  ['micro', 'µ'],
  ['nano', 'n'],
  ['pico', 'p'],
  ['femto', 'f'],
];

const UNIT_WORDS: readonly (readonly [words: string, symbol: string])[] = [
  ['metre metres meter meters', 'm'],
  ['gram grams', 'g'],
  ['second seconds', 's'],
  ['ampere amperes amp amps', 'A'],
  ['kelvin kelvins', 'K'],
  ['volt volts', 'V'],
  ['joule joules', 'J'],
  ['newton newtons', 'N'],
  ['tesla teslas', 'T'],
  ['coulomb coulombs', 'C'],
  ['watt watts', 'W'],
  ['hertz', 'Hz'],
  ['pascal pascals', 'Pa'],
  ['farad farads', 'F'],
  ['weber webers', 'Wb'],
  ['henry henries', 'H'],
  ['electronvolt electronvolts', 'eV'],
  ['ohm ohms', 'Ω'],
  ['degree degrees', '°'],
];

/** Spellings of symbols in other capitals that can mean one thing alone. */
const OTHER_CAPITALS: ReadonlyMap<string, string> = new Map([
  ['ev', 'eV'],
  ['EV', 'eV'],
  ['Ev', 'eV'],
  ['kev', 'keV'],
  ['KeV', 'keV'],
  ['KEV', 'keV'],
  ['Mev', 'MeV'],
  ['MEV', 'MeV'],
  ['Kg', 'kg'],
  ['KG', 'kg'],
  ['hz', 'Hz'],
  ['HZ', 'Hz'],
  ['Kv', 'kV'],
  ['KV', 'kV'],
  ['v', 'V'],
  ['j', 'J'],
  ['per', '/'],
]);

const SYMBOL_OF_WORD: ReadonlyMap<string, string> = new Map(
  UNIT_WORDS.flatMap(([words, symbol]) =>
    words
      .split(' ')
      .flatMap((word): [string, string][] => [
        [word, symbol],
        ...PREFIX_WORDS.map(([prefixWord, prefix]): [string, string] => [prefixWord + word, prefix + symbol]),
      ]),
  ),
);

/** Writes units that are spelled out, as `metres per second`, in symbols; other words stay as they are. */
export function unitWordsToSymbols(text: string): string {
  return text.replace(
    /(?<![\p{L}\d])\p{L}+/gu,
    (word) => SYMBOL_OF_WORD.get(word.toLowerCase()) ?? OTHER_CAPITALS.get(word) ?? word,
  );
}
