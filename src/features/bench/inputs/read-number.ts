/** A number as people type it (`2`, `0,5`, `1.2e-3`, `3 × 10^-4`, `−2`); null when it is none. */
export function readTypedNumber(text: string): number | null {
  const plain = text
    .replace(/[\s\u2009\u202f]/g, '')
    .replace(/[−–]/g, '-')
    .replace(',', '.')
    .replace(/[×x*]10\^?/, 'e');
  if (!/^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}
