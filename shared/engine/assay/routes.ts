import type { BlockValues, ConstantPrecision } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import { fromSI, toSI } from '../units/convert.ts';
import { roundToFigures } from '../units/rounding.ts';
import { printingOf } from '../holes/fill-hole.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { isWhole, roleOf, WHOLE_ROLES } from './part-roles.ts';

/** One honest way to carry the working. */
export interface Route {
  /** Computed names that are rounded before they are used, with the figures that are kept. */
  rounded: ReadonlyMap<string, number>;
  constants: Extract<ConstantPrecision, string>;
  /** Earlier show-that values taken as the text states them. */
  stated: readonly StatedValue[];
}

/** A show-that value of an earlier part, as its text states it. */
interface StatedValue {
  name: string;
  letter: string;
  figures: number;
  /** Rounds a value (SI) as the text prints it. */
  round: (value: number) => number;
}

/** Up to so many intermediates all combinations are tried. */
const MOST_COMBINED = 8;

function subsets(names: readonly string[]): string[][] {
  if (names.length <= MOST_COMBINED) {
    return Array.from({ length: 2 ** names.length }, (_, bits) =>
      names.filter((_name, index) => (bits & (1 << index)) !== 0),
    );
  }
  return [[], ...names.map((name) => [name]), [...names]];
}

/** Values that earlier show-that parts state and that this part's working rests on. */
function statedValues(context: AssayContext, part: AssayPart): StatedValue[] {
  const rests = new Set(dependenciesOf(context.script, part.info.name).names);
  const holes = { script: context.script, quantities: context.content.quantities };
  return context.parts
    .filter((earlier) => earlier.index < part.index && rests.has(earlier.info.name))
    .flatMap(({ part: earlier, letter, info }): StatedValue[] => {
      if (earlier.kind !== 'showThat') return [];
      const figures = earlier.statedFigures;
      const printing = printingOf(holes, info.name);
      const unit = 'problem' in printing ? null : printing.unit;
      const round = (value: number) =>
        unit === null
          ? roundToFigures(value, figures)
          : toSI(roundToFigures(fromSI(value, unit), figures), unit);
      return [{ name: info.name, letter, figures, round }];
    });
}

/** Nobody rounds on the way to a whole number to fewer figures than this; common practice. */
const LEAST_ROUTE_FIGURES = 3;

/** The figures that a candidate keeps on the way: the part's own, and enough to reach a whole number. */
function routeFigures(context: AssayContext, part: AssayPart): number {
  const { figures } = part.part.answer;
  return isWhole(context, part) ? Math.max(LEAST_ROUTE_FIGURES, figures) : figures;
}

/** Results on the way that a candidate may round, with the figures: an earlier answer's own, else the part's. */
function roundable(context: AssayContext, part: AssayPart): Map<string, number> {
  const usual = routeFigures(context, part);
  const names = part.dependencies.intermediates.filter((name) => {
    const info = context.script.quantities.find((quantity) => quantity.name === name);
    return info?.shape.kind === 'scalar' && !WHOLE_ROLES.has(roleOf(context, name));
  });
  return new Map(
    names.map((name) => {
      const earlier = context.parts.find((other) => other.index < part.index && other.info.name === name);
      return [name, earlier === undefined ? usual : Math.max(usual, earlier.part.answer.figures)];
    }),
  );
}

/**
 * Every route of a part's working: which results are rounded (each alone and together to the part's figures;
 * all together to one more), which constants and which stated values are taken.
 */
export function routesOf(context: AssayContext, part: AssayPart): Route[] {
  const figures = roundable(context, part);
  const names = [...figures.keys()];
  const choices = subsets(names).map(
    (chosen) => new Map(chosen.map((name) => [name, figures.get(name) ?? 1])),
  );
  if (names.length > 0) choices.push(new Map(names.map((name) => [name, (figures.get(name) ?? 1) + 1])));
  const constants: Route['constants'][] =
    part.dependencies.constants.length === 0 ? ['full'] : ['full', 'dataSheet'];
  const stated = statedValues(context, part);
  const statedChoices = stated.length === 0 ? [[]] : [[], stated];
  return choices.flatMap((rounded) =>
    constants.flatMap((precision) =>
      statedChoices
        // A value that is taken as stated is not worked out, so rounding it makes no other route.
        .filter((taken) => !taken.some(({ name }) => rounded.has(name)))
        .map((taken) => ({ rounded, constants: precision, stated: taken })),
    ),
  );
}

/** The answers (SI, before the final rounding) that a route gives on the draws of a block. */
export function followRoute(
  context: AssayContext,
  part: AssayPart,
  route: Route,
  block: BlockValues,
): Float64Array {
  const pinned = new Map<string, Float64Array>();
  for (const { name, round } of route.stated) {
    const column = block.columns.get(name);
    if (column !== undefined) pinned.set(name, column.map(round));
  }
  const values = evaluateBlock(context.script, block.draws, {
    wanted: [part.info.name],
    conditions: false,
    roundIntermediates: route.rounded,
    constants: route.constants,
    pinned,
  });
  return values.columns.get(part.info.name) ?? new Float64Array(block.draws.length).fill(NaN);
}

function list(names: readonly string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

const figuresInWords = (count: number) => `${count} ${count === 1 ? 'figure' : 'figures'}`;

/** A route in the words that a candidate would use. */
export function routeInWords(route: Route, part: AssayPart): string {
  const pieces = route.stated.map(
    ({ name, letter, figures }) =>
      `taking “${name}” as part (${letter}) states it, to ${figuresInWords(figures)}`,
  );
  const byFigures = new Map<number, string[]>();
  for (const [name, figures] of route.rounded) {
    byFigures.set(figures, [...(byFigures.get(figures) ?? []), `“${name}”`]);
  }
  for (const [figures, names] of byFigures) {
    pieces.push(`rounding ${list(names)} to ${figuresInWords(figures)} on the way`);
  }
  if (route.constants === 'dataSheet') pieces.push('using the data sheet’s constants');
  if (pieces.length === 0) pieces.push('carrying everything in full');
  return `${pieces.join(', ')}, and rounding the answer to ${figuresInWords(part.part.answer.figures)}`;
}
