import type { Span } from '../diagnostics/diagnostic.ts';
import { roundInUnit } from '../units/rounding.ts';
import type {
  BlockValues,
  CompiledScript,
  DrawSelection,
  DrawValues,
  EvaluationOptions,
} from './compiled-script.ts';
import { constantValue } from './constant-precision.ts';
import { selectionLength } from './draw-columns.ts';
import { digitsOfDraw, gridPlaces, requireDraw } from './grid.ts';
import { levelValue } from './levels.ts';
import { evaluateTree, type PlainValue } from './plain-evaluate.ts';
import { BLOCK_LENGTH, isSeries, type ColumnRegister, type Register } from './program.ts';
import { gaussian, seedOfName } from './scatter.ts';
import { buildScriptProgram, roundingUnit, type ScriptProgram } from './script-program.ts';

/** Options of one draw: as for a block, with single values pinned. */
export type DrawOptions = Pick<EvaluationOptions, 'roundIntermediates' | 'constants'> & {
  pinned?: ReadonlyMap<string, number>;
};

function isDefined(value: PlainValue): boolean {
  return typeof value === 'number' ? Number.isFinite(value) : value.every(Number.isFinite);
}

/** One draw by the plain scalar reference evaluator. Draws are numbered from 1; throws RangeError outside the grid. */
export function evaluateDraw(script: CompiledScript, draw: number, options: DrawOptions = {}): DrawValues {
  requireDraw(script, draw);
  const digits = digitsOfDraw(script, draw);
  const digitOf = new Map(gridPlaces(script).map((place, index) => [place.name, digits[index] ?? 0]));
  const values = new Map<string, PlainValue>();
  const scope = {
    name: (name: string): PlainValue => values.get(name) ?? NaN,
    constant: (name: string): number => constantValue(name, options.constants),
  };
  let kept = true;
  let discardedBy: Span | null = null;
  for (const statement of script.statements) {
    if (statement.kind === 'require') {
      if (evaluateTree(statement.tree, scope) !== 1) {
        kept = false;
        discardedBy ??= statement.span;
      }
      continue;
    }
    const { name } = statement;
    let value: PlainValue;
    const pinned = options.pinned?.get(name);
    if (pinned !== undefined) value = pinned;
    else if (statement.kind === 'drawn') {
      const digit = digitOf.get(name) ?? 0;
      const { levels } = statement;
      if (levels.kind === 'steps') value = levelValue(levels, digit);
      else {
        const choice = levels.choices[digit];
        value = choice === undefined ? NaN : evaluateTree(choice, scope);
      }
    } else if (statement.kind === 'scatter') {
      const deviation = evaluateTree(statement.deviation, scope);
      const size = typeof deviation === 'number' ? deviation : NaN;
      const seed = seedOfName(name);
      value =
        statement.length === 0
          ? size * gaussian(seed, draw, 0)
          : Array.from({ length: statement.length }, (_, index) => size * gaussian(seed, draw, index));
    } else {
      value = evaluateTree(statement.tree, scope);
      if (statement.kind === 'given')
        value = roundPlain(value, (x) => roundInUnit(x, statement.figures, statement.unit));
    }
    const figures = pinned === undefined ? options.roundIntermediates?.get(name) : undefined;
    if (figures !== undefined) {
      const unit = roundingUnit(script, name);
      value = roundPlain(value, (x) => roundInUnit(x, figures, unit));
    }
    values.set(name, value);
    if (!isDefined(value)) discardedBy ??= statement.span;
  }
  return { draw, values: Object.fromEntries(values), kept, discardedBy };
}

function roundPlain(value: PlainValue, round: (x: number) => number): PlainValue {
  return typeof value === 'number' ? round(value) : value.map(round);
}

const programs = new WeakMap<CompiledScript, Map<string, ScriptProgram>>();
/** Programs kept for a script; beyond it all are built afresh. */
const MOST_PROGRAMS = 200;

/** Programs are kept by what they depend on, since an assay runs the same ones over many blocks. */
function programFor(script: CompiledScript, options: EvaluationOptions): ScriptProgram {
  const { constants = 'full' } = options;
  const key = JSON.stringify([
    options.wanted ?? null,
    options.conditions !== false,
    [...(options.roundIntermediates ?? [])],
    typeof constants === 'string' ? constants : [...constants],
    [...(options.pinned?.keys() ?? [])],
  ]);
  let kept = programs.get(script);
  if (kept === undefined || kept.size >= MOST_PROGRAMS) {
    kept = new Map();
    programs.set(script, kept);
  }
  let program = kept.get(key);
  if (program === undefined) {
    program = buildScriptProgram(script, options);
    kept.set(key, program);
  }
  return program;
}

/** A column to write over where it has the right length, else a new one. */
function reusable(column: Float64Array | undefined, length: number): Float64Array {
  return column?.length === length ? column : new Float64Array(length);
}

/** The numbers of the draws selected; throws RangeError when one lies outside the grid. */
function drawNumbers(
  script: CompiledScript,
  draws: DrawSelection,
  into: BlockValues | undefined,
): Float64Array {
  if (draws instanceof Float64Array) {
    for (const draw of draws) requireDraw(script, draw);
    return draws;
  }
  if (draws.count > 0) {
    requireDraw(script, draws.from);
    requireDraw(script, draws.from + draws.count - 1);
  }
  const numbers = reusable(into?.draws, draws.count);
  for (let index = 0; index < draws.count; index += 1) numbers[index] = draws.from + index;
  return numbers;
}

/** Many draws by the compiled evaluator. Draws are numbered from 1; throws RangeError outside the grid. */
export function evaluateBlock(
  script: CompiledScript,
  draws: DrawSelection,
  options: EvaluationOptions = {},
): BlockValues {
  const length = selectionLength(draws);
  const { into } = options;
  const numbers = drawNumbers(script, draws, into);
  for (const [name, column] of options.pinned ?? []) {
    if (column.length !== length)
      throw new RangeError(`The column pinned on ${name} has ${column.length} values for ${length} draws.`);
  }
  const program = programFor(script, options);
  const columns = new Map<string, Float64Array>();
  const series = new Map<string, Float64Array[]>();
  const outputs = new Outputs();
  const output = (register: Register, earlier: Float64Array | undefined): Float64Array =>
    outputs.add(reusable(earlier, length), register);
  for (const [name, value] of program.results) {
    if (isSeries(value)) {
      const earlier = into?.series.get(name);
      series.set(
        name,
        value.map((register, index) => output(register, earlier?.[index])),
      );
    } else columns.set(name, output(value, into?.columns.get(name)));
  }
  const kept = (into?.kept.length === length ? into.kept : new Uint8Array(length)).fill(1);
  const { state } = program;
  state.pinned = options.pinned ?? NOTHING_PINNED;
  for (let offset = 0; offset < length; offset += BLOCK_LENGTH) {
    const count = Math.min(BLOCK_LENGTH, length - offset);
    state.offset = offset;
    state.count = count;
    state.from = draws instanceof Float64Array ? null : draws.from + offset;
    state.numbers = numbers.subarray(offset, offset + count);
    outputs.aim(offset, count);
    for (const step of program.steps) step(count);
    for (const condition of program.conditions) keepWhere(kept, condition, offset, count);
  }
  outputs.finish();
  state.pinned = NOTHING_PINNED;
  state.numbers = new Float64Array(0);
  return { draws: numbers, columns, series, kept };
}

const NOTHING_PINNED: ReadonlyMap<string, Float64Array> = new Map();

/** The caller's columns. Registers are aimed at them block by block, so that results need no copying. */
class Outputs {
  private readonly aimed = new Map<ColumnRegister, { out: Float64Array; home: Float64Array }>();
  private readonly copies: { out: Float64Array; from: Float64Array }[] = [];

  /** Ties a register to a column; a second name of the same register gets a copy in the end. */
  add(out: Float64Array, register: Register): Float64Array {
    if (typeof register === 'number') return out.fill(register);
    const first = this.aimed.get(register);
    if (first === undefined) this.aimed.set(register, { out, home: register.column });
    else this.copies.push({ out, from: first.out });
    return out;
  }

  aim(offset: number, count: number): void {
    for (const [register, { out }] of this.aimed) register.column = out.subarray(offset, offset + count);
  }

  /** Gives the registers their own columns back. */
  finish(): void {
    for (const [register, { home }] of this.aimed) register.column = home;
    for (const { out, from } of this.copies) out.set(from);
  }
}

function keepWhere(kept: Uint8Array, condition: Register, offset: number, count: number): void {
  if (typeof condition === 'number') {
    if (condition !== 1) kept.fill(0, offset, offset + count);
    return;
  }
  const { column } = condition;
  for (let index = 0; index < count; index += 1) if (column[index] !== 1) kept[offset + index] = 0;
}
