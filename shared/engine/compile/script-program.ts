import { coherentUnit } from '../units/quantity-kinds.ts';
import { readUnit } from '../units/read-unit.ts';
import type { Unit } from '../units/unit.ts';
import type { ChoiceLevels, Statement, StepLevels } from '../script/statement.ts';
import { usesOf } from '../script/statement-uses.ts';
import type { CompiledScript, EvaluationOptions } from './compiled-script.ts';
import { constantValue } from './constant-precision.ts';
import { fillDrawn, type BlockDraws } from './draw-columns.ts';
import { gridPlaces } from './grid.ts';
import { levelTable, levelValue } from './levels.ts';
import { evaluateTree } from './plain-evaluate.ts';
import { isSeries, ProgramBuilder, type Register, type RegisterValue, type Step } from './program.ts';
import { gaussian, seedOfName } from './scatter.ts';

/** What the steps of a program see of the block they work on. */
export interface BlockState extends BlockDraws {
  /** Place of the block's first draw in the whole selection. */
  offset: number;
  pinned: ReadonlyMap<string, Float64Array>;
}

/** A script's program for certain wanted names and options. */
export interface ScriptProgram {
  state: BlockState;
  steps: readonly Step[];
  /** Where each wanted name stands after the steps. */
  results: ReadonlyMap<string, RegisterValue>;
  conditions: readonly Register[];
}

type NamedStatement = Exclude<Statement, { kind: 'require' }>;

/** Unit in which a name is rounded: that of its script, or the coherent one. */
export function roundingUnit(script: CompiledScript, name: string): Unit {
  const quantity = script.quantities.find((candidate) => candidate.name === name);
  const reading = readUnit(quantity?.scriptUnit ?? '');
  return reading.ok ? reading.unit : coherentUnit(quantity?.dimension ?? []);
}

/** Names that must be worked out for `wanted`, transitively; pinned names rest on nothing. */
function neededNames(
  byName: ReadonlyMap<string, NamedStatement>,
  wanted: Iterable<string>,
  pinned: ReadonlySet<string>,
): Set<string> {
  const needed = new Set<string>();
  const open = [...wanted];
  for (let name = open.pop(); name !== undefined; name = open.pop()) {
    if (needed.has(name)) continue;
    needed.add(name);
    const statement = byName.get(name);
    if (statement !== undefined && !pinned.has(name)) open.push(...usesOf(statement).names);
  }
  return needed;
}

/** Builds the program. Throws RangeError for a wanted name that the script does not have. */
export function buildScriptProgram(script: CompiledScript, options: EvaluationOptions): ScriptProgram {
  const byName = new Map<string, NamedStatement>();
  for (const statement of script.statements)
    if (statement.kind !== 'require') byName.set(statement.name, statement);
  const wanted = options.wanted ?? [...byName.keys()];
  const unknown = wanted.find((name) => !byName.has(name));
  if (unknown !== undefined) throw new RangeError(`The script has no name ${unknown}.`);
  const requires =
    options.conditions === false ? [] : script.statements.filter((statement) => statement.kind === 'require');
  const pinned = new Set(options.pinned?.keys());
  const roots = [...wanted, ...requires.flatMap((statement) => usesOf(statement).names)];
  const needed = neededNames(byName, roots, pinned);

  const state: BlockState = {
    from: null,
    numbers: new Float64Array(0),
    count: 0,
    offset: 0,
    pinned: new Map(),
  };
  const builder = new ProgramBuilder();
  const registers = new Map<string, RegisterValue>();
  const scope = {
    name: (name: string): RegisterValue => registers.get(name) ?? NaN,
    constant: (name: string): number => constantValue(name, options.constants),
  };
  for (const statement of byName.values()) {
    if (!needed.has(statement.name)) continue;
    const value = pinned.has(statement.name)
      ? pinnedColumn(builder, state, statement.name)
      : statementValue(builder, state, script, statement, scope);
    const figures = pinned.has(statement.name) ? undefined : options.roundIntermediates?.get(statement.name);
    const rounded =
      figures === undefined ? value : builder.round(value, figures, roundingUnit(script, statement.name));
    registers.set(
      statement.name,
      isSeries(rounded) ? rounded.map((register) => builder.keep(register)) : builder.keep(rounded),
    );
  }
  const conditions = requires.map((statement) => {
    const value = builder.compile(statement.tree, scope);
    return isSeries(value) ? NaN : builder.keep(value);
  });
  const results = new Map(wanted.map((name) => [name, registers.get(name) ?? NaN]));
  return { state, steps: builder.steps, results, conditions };
}

function pinnedColumn(builder: ProgramBuilder, state: BlockState, name: string): Register {
  const register = builder.named();
  builder.steps.push((count) => {
    const source = state.pinned.get(name);
    if (source !== undefined) register.column.set(source.subarray(state.offset, state.offset + count));
  });
  return register;
}

/** The levels of a drawn value as a table where that is small, else by the digit. */
function levelColumn(
  levels: StepLevels | ChoiceLevels,
  constant: (name: string) => number,
): Float64Array | ((digit: number) => number) {
  if (levels.kind === 'steps') return levelTable(levels) ?? ((digit) => levelValue(levels, digit));
  return Float64Array.from(levels.choices, (tree) => {
    const value = evaluateTree(tree, { name: () => NaN, constant });
    return typeof value === 'number' ? value : NaN;
  });
}

function statementValue(
  builder: ProgramBuilder,
  state: BlockState,
  script: CompiledScript,
  statement: NamedStatement,
  scope: { name: (name: string) => RegisterValue; constant: (name: string) => number },
): RegisterValue {
  switch (statement.kind) {
    case 'computed':
      return builder.compile(statement.tree, scope);
    case 'given':
      return builder.round(builder.compile(statement.tree, scope), statement.figures, statement.unit);
    case 'drawn': {
      const place = gridPlaces(script).find((candidate) => candidate.name === statement.name);
      const register = builder.named();
      const levels = levelColumn(statement.levels, scope.constant);
      if (place !== undefined) {
        builder.steps.push(() => fillDrawn(register.column, state, place, script.grid.size, levels));
      }
      return register;
    }
    case 'scatter': {
      const deviation = builder.compile(statement.deviation, scope);
      const spread = isSeries(deviation) ? NaN : builder.keep(deviation);
      const seed = seedOfName(statement.name);
      const element = (index: number): Register => {
        const register = builder.named();
        builder.steps.push((count) => {
          for (let i = 0; i < count; i += 1) {
            const size = typeof spread === 'number' ? spread : (spread.column[i] ?? NaN);
            register.column[i] = size * gaussian(seed, state.numbers[i] ?? NaN, index);
          }
        });
        return register;
      };
      return statement.length === 0
        ? element(0)
        : Array.from({ length: statement.length }, (_, index) => element(index));
    }
  }
}
