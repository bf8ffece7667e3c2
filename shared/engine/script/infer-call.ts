import { DIMENSIONLESS, divideDimensions, powerOfDimension } from '../units/dimension.ts';
import type { ExpressionTree } from './expression-tree.ts';
import type { FunctionName } from './functions.ts';
import { FUNCTION_TABLE } from './functions.ts';
import { quote } from './describe-clash.ts';
import type { InferenceTools } from './inference-tools.ts';
import type { Shape, ValueType } from './scope.ts';

type Call = Extract<ExpressionTree, { kind: 'call' }>;

/** How many values a function takes. */
const COUNTS: ReadonlyMap<FunctionName, readonly [least: number, most: number]> = new Map([
  ['min', [2, 64]],
  ['max', [2, 64]],
  ['slope', [2, 2]],
  ['intercept', [2, 2]],
]);

const ROUNDING: ReadonlySet<FunctionName> = new Set(['floor', 'ceil', 'round']);
const SERIES: ReadonlySet<FunctionName> = new Set(['mean', 'least', 'greatest', 'sum', 'quantum']);

/** Dimension and shape of a function's value; null, with a message, when its arguments do not fit. */
export function inferCall(inference: InferenceTools, call: Call): ValueType | null {
  const name = call.function;
  const [least, most] = COUNTS.get(name) ?? [1, 1];
  const count = call.arguments.length;
  const [first, second] = call.arguments;
  if (first === undefined || count < least || count > most) {
    const signature = FUNCTION_TABLE.get(name)?.signature ?? name;
    return inference.fail(
      call.span,
      'argument-count',
      `\`${name}\` is written ${signature}; here it has ${count} ${count === 1 ? 'value' : 'values'}.`,
    );
  }
  if (SERIES.has(name)) return seriesFunction(inference, name, first);
  if (name === 'slope' || name === 'intercept') {
    return second === undefined ? null : lineFunction(inference, name, first, second);
  }
  if (name === 'min' || name === 'max') return extreme(inference, call);
  if (name === 'abs') return inference.value(first);
  if (name === 'sqrt' || name === 'cbrt') {
    const type = inference.value(first);
    return type === null
      ? null
      : { ...type, dimension: powerOfDimension(type.dimension, [1, name === 'sqrt' ? 2 : 3]) };
  }
  const cure = ROUNDING.has(name)
    ? `Divide by the unit first, as ${name}(x / 1 mm) * 1 mm.`
    : 'Divide by another of its kind.';
  const type = inference.plain(first, `\`${name}\``, cure);
  return type === null ? null : { dimension: DIMENSIONLESS, shape: type.shape };
}

function seriesFunction(
  inference: InferenceTools,
  name: FunctionName,
  series: ExpressionTree,
): ValueType | null {
  const type = inference.value(series);
  if (type === null) return null;
  if (type.shape.kind !== 'series') return notSeries(inference, name, series);
  return { dimension: type.dimension, shape: { kind: 'scalar' } };
}

function notSeries(inference: InferenceTools, name: FunctionName, tree: ExpressionTree): null {
  const other =
    name === 'least'
      ? ' For the smallest of several values use min.'
      : name === 'greatest'
        ? ' For the largest of several values use max.'
        : '';
  return inference.fail(
    tree.span,
    'series-needed',
    `\`${name}\` takes a series, as [a, b, c] or spread(...); ${quote(tree)} is a single value.${other}`,
  );
}

function lineFunction(
  inference: InferenceTools,
  name: FunctionName,
  xTree: ExpressionTree,
  yTree: ExpressionTree,
): ValueType | null {
  const x = inference.value(xTree);
  const y = inference.value(yTree);
  if (x === null || y === null) return null;
  if (x.shape.kind !== 'series') return notSeries(inference, name, xTree);
  if (y.shape.kind !== 'series') return notSeries(inference, name, yTree);
  if (inference.joinShapes(x.shape, y.shape, yTree.span) === null) return null;
  if (x.shape.length < 2)
    return inference.fail(xTree.span, 'line-too-short', 'A line needs at least two points.');
  const dimension = name === 'slope' ? divideDimensions(y.dimension, x.dimension) : y.dimension;
  return { dimension, shape: { kind: 'scalar' } };
}

function extreme(inference: InferenceTools, call: Call): ValueType | null {
  const types = inference.alike(call.arguments, 'only values of one kind can be compared');
  if (types === null) return null;
  let shape: Shape | null = { kind: 'scalar' };
  for (const type of types) shape = shape && inference.joinShapes(shape, type.shape, call.span);
  const [first] = types;
  return shape === null || first === undefined ? null : { dimension: first.dimension, shape };
}
