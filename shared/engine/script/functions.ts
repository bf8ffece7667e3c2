/** The mathematical functions that scripts may call, and what the editor says of each. */
interface FunctionRow {
  signature: string;
  description: string;
}

const FUNCTIONS = {
  sqrt: { signature: 'sqrt(x)', description: 'Square root.' },
  cbrt: { signature: 'cbrt(x)', description: 'Cube root.' },
  exp: { signature: 'exp(x)', description: 'e to the power of a plain number.' },
  ln: { signature: 'ln(x)', description: 'Natural logarithm of a plain number.' },
  log10: { signature: 'log10(x)', description: 'Logarithm to base ten of a plain number.' },
  sin: { signature: 'sin(angle)', description: 'Sine; the angle in radians, or with its unit as 30°.' },
  cos: { signature: 'cos(angle)', description: 'Cosine; the angle in radians, or with its unit as 30°.' },
  tan: { signature: 'tan(angle)', description: 'Tangent; the angle in radians, or with its unit as 30°.' },
  asin: { signature: 'asin(x)', description: 'Angle whose sine is x, in radians.' },
  acos: { signature: 'acos(x)', description: 'Angle whose cosine is x, in radians.' },
  atan: { signature: 'atan(x)', description: 'Angle whose tangent is x, in radians.' },
  abs: { signature: 'abs(x)', description: 'Size without the sign.' },
  min: { signature: 'min(a, b, ...)', description: 'The smallest of several values.' },
  max: { signature: 'max(a, b, ...)', description: 'The largest of several values.' },
  floor: { signature: 'floor(x)', description: 'The next whole number down, of a plain number.' },
  ceil: { signature: 'ceil(x)', description: 'The next whole number up, of a plain number.' },
  round: { signature: 'round(x)', description: 'The nearest whole number, halves away from zero.' },
  mean: { signature: 'mean(series)', description: 'Arithmetic mean of a series.' },
  least: { signature: 'least(series)', description: 'Smallest value of a series.' },
  greatest: { signature: 'greatest(series)', description: 'Largest value of a series.' },
  sum: { signature: 'sum(series)', description: 'Sum of a series.' },
  slope: { signature: 'slope(x, y)', description: 'Gradient of the least-squares line of y against x.' },
  intercept: {
    signature: 'intercept(x, y)',
    description: 'Where the least-squares line of y against x meets x = 0.',
  },
  quantum: {
    signature: 'quantum(series)',
    description: 'The largest amount of which all values are whole multiples within their scatter.',
  },
} as const satisfies Record<string, FunctionRow>;

export type FunctionName = keyof typeof FUNCTIONS;

/** Every function by name. A Map, so that no name reaches anything but what stands in the table. */
export const FUNCTION_TABLE: ReadonlyMap<string, FunctionRow> = new Map(Object.entries(FUNCTIONS));

/** Whether a name is one of the functions. */
export function isFunctionName(name: string): name is FunctionName {
  return FUNCTION_TABLE.has(name);
}

/** What stands alone on the right of an assignment, or alone on a line. */
export const DRAWING_TABLE: ReadonlyMap<string, FunctionRow> = new Map([
  [
    'draw',
    {
      signature: 'draw(from, to, step)',
      description: 'One value out of equal steps, printed with the decimals of the step.',
    },
  ],
  ['oneOf', { signature: 'oneOf(a, b, ...)', description: 'One of the values listed.' }],
  ['whole', { signature: 'whole(from, to)', description: 'A whole number between two, both included.' }],
  [
    'scatter',
    {
      signature: 'scatter(deviation) or scatter(deviation, count)',
      description: 'Gaussian reading error of this standard deviation, one value or a series.',
    },
  ],
  [
    'given',
    {
      signature: 'given(x, figures) or given(x, figures, unit)',
      description:
        'A value as it is printed, rounded to significant figures; what follows uses the rounded value.',
    },
  ],
  [
    'require',
    { signature: 'require(condition)', description: 'Leaves out every draw on which the condition fails.' },
  ],
  [
    'spread',
    {
      signature: 'spread(from, to, count)',
      description: 'A series in equal steps, first and last included.',
    },
  ],
]);
