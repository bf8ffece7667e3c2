import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt, warningAt } from '../diagnostics/spans.ts';
import { sameDimension } from '../units/dimension.ts';
import { formatNumber } from '../units/format.ts';
import { describeDimension } from '../units/quantity-kinds.ts';
import { NO_UNIT } from '../units/unit.ts';
import { decimalLiteral, type DecimalLiteral } from './decimal-literal.ts';
import type { ExpressionTree } from './expression-tree.ts';
import type { StepLevels } from './statement.ts';

/** Levels of a drawn value, with the decimals that they print with. */
export interface CheckedSteps {
  levels: StepLevels | null;
  decimals: number | null;
  diagnostics: Diagnostic[];
}

/** More levels than this in one draw say nothing more and cannot be counted exactly. */
const MOST_LEVELS = 1e9;
const SMALLEST_POWER = -300;
const GREATEST_POWER = 300;

/** A literal as a whole number of 10^power of coherent units (times the unit's own coefficient). */
function scaledDigits(literal: DecimalLiteral, power: number): number {
  return literal.digits * 10 ** (literal.exponent + literal.unit.power - power);
}

/** Checks `draw(from, to, step)`: three literals of one dimension whose levels can be counted exactly. */
export function checkSteps(trees: readonly ExpressionTree[], formSpan: Span): CheckedSteps {
  const fail = (span: Span, code: string, message: string): CheckedSteps => ({
    levels: null,
    decimals: null,
    diagnostics: [errorAt(span, code, message)],
  });
  const [fromTree, toTree, stepTree] = trees;
  if (fromTree === undefined || toTree === undefined || stepTree === undefined || trees.length !== 3) {
    return fail(
      formSpan,
      'argument-count',
      'draw takes three values: draw(from, to, step), as draw(150 V, 300 V, 10 V).',
    );
  }
  const literals: DecimalLiteral[] = [];
  for (const tree of trees) {
    const literal = decimalLiteral(tree);
    if (literal === null) {
      return fail(
        tree.span,
        'draw-not-literal',
        'draw takes numbers written out with their units, so that its values can be counted; work out other values on a line of their own.',
      );
    }
    literals.push(literal);
  }
  const [from, to, step] = literals;
  if (from === undefined || to === undefined || step === undefined)
    return fail(formSpan, 'argument-count', 'draw takes three values.');
  for (const [index, literal] of literals.entries()) {
    if (!sameDimension(literal.unit.dimension, from.unit.dimension)) {
      const unit = from.unit.text || 'no unit';
      return fail(
        trees[index]?.span ?? formSpan,
        'dimensions-differ',
        `The first value is ${describeDimension(from.unit.dimension, from.unit.text)}, this one ${describeDimension(literal.unit.dimension, literal.unit.text)}: write all three in one unit (${unit}).`,
      );
    }
    if (literal.unit.coefficient !== from.unit.coefficient) {
      return fail(
        trees[index]?.span ?? formSpan,
        'draw-units-differ',
        `Write all three values in ${from.unit.text || 'one unit'}, so that the steps are exact.`,
      );
    }
  }
  const powers = literals.map((literal) => literal.exponent + literal.unit.power);
  const power = Math.min(...powers);
  const [first = 0, last = 0, stride = 0] = literals.map((literal) => scaledDigits(literal, power));
  if (
    power < SMALLEST_POWER ||
    Math.max(...powers) > GREATEST_POWER ||
    ![first, last, stride].every(Number.isSafeInteger)
  ) {
    return fail(
      formSpan,
      'draw-too-fine',
      'These values are too far apart in size to be counted exactly: use fewer digits.',
    );
  }
  if (stride <= 0) return fail(stepTree.span, 'draw-step', 'The step must be greater than zero.');
  if (last < first)
    return fail(toTree.span, 'draw-order', 'The second value must not be smaller than the first.');
  const count = Math.floor((last - first) / stride) + 1;
  if (count > MOST_LEVELS)
    return fail(stepTree.span, 'draw-too-fine', 'This draw has more than 10^9 values: take a wider step.');
  const rest = (last - first) % stride;
  const diagnostics: Diagnostic[] = [];
  const decimals = from.unit.power - Math.min(powers[0] ?? 0, powers[2] ?? 0);
  if (rest !== 0) {
    const reached = formatNumber((last - rest) * 10 ** (power - from.unit.power), { decimals });
    diagnostics.push(
      warningAt(
        toTree.span,
        'draw-end-not-reached',
        `Steps from the first value do not meet this one: the last value is ${reached.text} ${from.unit.text}`.trim() +
          '.',
      ),
    );
  }
  return {
    levels: { kind: 'steps', count, first, step: stride, power: power - from.unit.power, unit: from.unit },
    decimals,
    diagnostics,
  };
}

/** Checks `whole(from, to)`: two plain whole numbers in ascending order. */
export function checkWhole(trees: readonly ExpressionTree[], formSpan: Span): CheckedSteps {
  const fail = (span: Span, code: string, message: string): CheckedSteps => ({
    levels: null,
    decimals: null,
    diagnostics: [errorAt(span, code, message)],
  });
  const values: number[] = [];
  for (const tree of trees) {
    const literal = decimalLiteral(tree);
    const value = literal === null ? NaN : literal.digits * 10 ** literal.exponent;
    if (literal?.unit.text !== '' || !Number.isSafeInteger(value)) {
      return fail(tree.span, 'whole-number', 'whole takes whole numbers without a unit, as whole(1, 6).');
    }
    values.push(value);
  }
  const [from, to] = values;
  if (from === undefined || to === undefined || values.length !== 2) {
    return fail(formSpan, 'argument-count', 'whole takes two values: whole(from, to), as whole(1, 6).');
  }
  if (to < from) return fail(formSpan, 'draw-order', 'The second value must not be smaller than the first.');
  if (to - from >= MOST_LEVELS)
    return fail(formSpan, 'draw-too-fine', 'This draw has more than 10^9 values.');
  return {
    levels: { kind: 'steps', count: to - from + 1, first: from, step: 1, power: 0, unit: NO_UNIT },
    decimals: 0,
    diagnostics: [],
  };
}
