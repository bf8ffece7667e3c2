import { compileExpression, compileScript, evaluateBlock, evaluateDraw } from '#shared/engine/index.ts';
import { FAULTY_SCRIPTS } from './faulty-scripts.ts';
import { SOUND_SCRIPTS } from './sound-scripts.ts';

/** A small seeded generator (Mulberry32, T. Ettinger, in the public domain) so that a failure can be run again. */
function seeded(seed: number): () => number {
  let state = seed | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** What is strewn into scripts: every kind of token, names of the host language, look-alikes, extremes. */
const PIECES: readonly string[] = [
  'constructor',
  '__proto__',
  'prototype',
  'this',
  'arguments',
  'toString',
  'import',
  'evaluate',
  'parse',
  'end',
  'to',
  'in',
  'mod',
  'x',
  'a',
  'b',
  'Va',
  'e',
  'm_e',
  'c',
  'pi',
  'i',
  'Infinity',
  'NaN',
  'true',
  'null',
  '1',
  '0',
  '0.5',
  '1e308',
  '1e-320',
  '1e999',
  '9'.repeat(40),
  '.',
  '5.',
  '0x10',
  '1_000',
  'V',
  'mT',
  'eV',
  'kg',
  'm s^-2',
  'C/kg',
  'µm',
  'Ω',
  '°',
  '%',
  'J/(kg K)',
  'Js',
  '+',
  '-',
  '*',
  '/',
  '^',
  '**',
  '^-',
  '(',
  ')',
  '[',
  ']',
  '{',
  '}',
  ',',
  ';',
  ':',
  '?',
  '=',
  '==',
  '!=',
  '<',
  '<=',
  '>',
  '≤',
  '−',
  '×',
  '²',
  '⁻¹',
  '!',
  "'",
  '"',
  '`',
  '\\',
  '#',
  '@',
  '$',
  '&',
  '|',
  '~',
  ' and ',
  ' or ',
  ' not ',
  '\n',
  '\r\n',
  '\t',
  '//',
  '/*',
  '*/',
  'sqrt(',
  'min(',
  'draw(',
  'oneOf(',
  'whole(',
  'given(',
  'require(',
  'scatter(',
  'spread(',
  'slope(',
  'quantum(',
  'f(x) = ',
  'draw(1 V, 3 V, 1 V)',
  'given(x, 3)',
  '[1, 2, 3]',
  'x[2]',
  '0 < x < 3',
  'x ? 1 : 2',
  '\u0430',
  '\u0435',
  '\u200B',
  '\uFEFF',
  '\u202E',
  '\uD83D\uDE00',
  '\uD800',
  '\u0000',
  'ﬀ',
  'Ⅷ',
  '١',
  '('.repeat(60),
  '-'.repeat(150),
  '^2'.repeat(130),
  'x+'.repeat(700),
  '[1'.repeat(50),
  'not '.repeat(120),
  '1?'.repeat(110),
];

const SOUND: readonly string[] = SOUND_SCRIPTS.map((entry) => entry.script);
const SEEDS: readonly string[] = [...SOUND, ...FAULTY_SCRIPTS.map(([script]) => script)];

function mutate(random: () => number): string {
  const pick = <Value>(values: readonly Value[], fallback: Value): Value =>
    values[Math.floor(random() * values.length)] ?? fallback;
  const start = random();
  let text = start < 0.1 ? '' : pick(start < 0.7 ? SOUND : SEEDS, '');
  const changes = 1 + Math.floor(random() * random() * 6);
  for (let change = 0; change < changes; change += 1) {
    const at = Math.floor(random() * (text.length + 1));
    const kind = random();
    if (kind < 0.5) text = text.slice(0, at) + pick(PIECES, '') + text.slice(at);
    else if (kind < 0.7) text = text.slice(0, at) + text.slice(at + 1 + Math.floor(random() * 8));
    else if (kind < 0.85) {
      const other = pick(SEEDS, '');
      text = text.slice(0, at) + other.slice(Math.floor(random() * other.length));
    } else text = text.slice(0, at) + text.slice(0, at).slice(-20) + text.slice(at);
  }
  return random() < 0.01 ? text.repeat(1 + Math.floor(random() * 200)) : text;
}

/** What came of a run: how many scripts compiled, and the slowest compile in milliseconds. */
export interface FuzzOutcome {
  sound: number;
  faulty: number;
  slowest: number;
}

/**
 * Compiles and runs `count` mutated scripts. Throws with the script when one crashes, gives neither a script
 * nor a positioned mistake, or evaluates differently on the two evaluators.
 */
export function fuzz(count: number, seed: number): FuzzOutcome {
  const random = seeded(seed);
  const outcome: FuzzOutcome = { sound: 0, faulty: 0, slowest: 0 };
  for (let round = 0; round < count; round += 1) {
    const source = mutate(random);
    const fail = (what: string, cause?: unknown): never => {
      throw new Error(`${what} in round ${round}: ${JSON.stringify(source)}`, { cause });
    };
    try {
      const started = performance.now();
      const { script, diagnostics } = compileScript(source);
      outcome.slowest = Math.max(outcome.slowest, performance.now() - started);
      if (script === null) {
        outcome.faulty += 1;
        const wrong = diagnostics.find(
          ({ span, message }) =>
            message === '' ||
            span.start < 0 ||
            span.end < span.start ||
            span.end > source.length ||
            span.line < 1 ||
            span.column < 1,
        );
        if (wrong !== undefined) fail(`a mistake without a place: ${JSON.stringify(wrong)}`);
        if (diagnostics.length === 0) fail('no script and no mistake');
        continue;
      }
      outcome.sound += 1;
      const draw = script.grid.open ? 1 : 1 + Math.floor(random() * script.grid.size);
      const plain = new Map(Object.entries(evaluateDraw(script, draw).values));
      for (const [name, column] of evaluateBlock(script, Float64Array.of(draw)).columns) {
        if (!Object.is(column[0], plain.get(name))) fail(`${name} differs between the evaluators`);
      }
      compileExpression(script, mutate(random).split('\n')[0] ?? '');
    } catch (error) {
      if (error instanceof Error && error.message.includes('in round')) throw error;
      fail('a crash', error);
    }
  }
  return outcome;
}
