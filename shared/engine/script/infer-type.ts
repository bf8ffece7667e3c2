import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt } from '../diagnostics/spans.ts';
import { CONSTANTS } from '../physics/constants.ts';
import {
  DIMENSIONLESS,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  sameDimension,
} from '../units/dimension.ts';
import { exactFraction } from './constant-value.ts';
import { describeClash, describeValue, quote, type TypedTree } from './describe-clash.ts';
import type { ExpressionTree } from './expression-tree.ts';
import { inferCall } from './infer-call.ts';
import type { InferenceTools } from './inference-tools.ts';
import type { Scope, Shape, ValueType } from './scope.ts';
import { unknownName } from './unknown-name.ts';

const CONDITION: ValueType = { dimension: DIMENSIONLESS, shape: { kind: 'condition' } };
const SCALAR: Shape = { kind: 'scalar' };

/**
 * Infers dimension and shape of expressions and collects what clashes. A part that is wrong gives null, and
 * whatever holds it stays silent, so that one mistake is told once.
 */
export class TypeInference implements InferenceTools {
  readonly diagnostics: Diagnostic[] = [];
  readonly scope: Scope;

  constructor(scope: Scope) {
    this.scope = scope;
  }

  fail(span: Span, code: string, message: string): null {
    this.diagnostics.push(errorAt(span, code, message));
    return null;
  }

  /** A value in words with its own unit: `Va` is a potential difference (kV). */
  describe(tree: ExpressionTree, type: ValueType): string {
    return describeValue(tree, type, this.scope);
  }

  infer(tree: ExpressionTree): ValueType | null {
    switch (tree.kind) {
      case 'number':
        return { dimension: tree.unit.dimension, shape: SCALAR };
      case 'constant':
        return { dimension: CONSTANTS.get(tree.name)?.dimension ?? DIMENSIONLESS, shape: SCALAR };
      case 'name':
        return this.inferName(tree.name, tree.span);
      case 'negate':
        return this.value(tree.operand);
      case 'rounded':
        return this.value(tree.operand);
      case 'binary':
        return this.inferBinary(tree);
      case 'call':
        return inferCall(this, tree);
      case 'compare':
        return this.inferCompare(tree);
      case 'logic':
        return this.conditions([tree.left, tree.right], tree.operator);
      case 'not':
        return this.conditions([tree.operand], 'not');
      case 'choose':
        return this.inferChoose(tree);
      case 'list':
        return this.inferList(tree.elements);
      case 'spread':
        return this.inferSpread(tree);
      case 'element':
        return this.inferElement(tree);
    }
  }

  private inferName(name: string, span: Span): ValueType | null {
    const entry = this.scope.defined.get(name);
    if (entry !== undefined) return entry.type;
    const constant = CONSTANTS.get(name);
    if (constant !== undefined) return { dimension: constant.dimension, shape: SCALAR };
    const mistake = unknownName(name, this.scope);
    return this.fail(span, mistake.code, mistake.message);
  }

  /** A number or series of numbers; a condition is refused. */
  value(tree: ExpressionTree): ValueType | null {
    const type = this.infer(tree);
    if (type?.shape.kind !== 'condition') return type;
    return this.fail(
      tree.span,
      'condition-as-number',
      `${quote(tree)} is a condition, true or false: to make a number of it write condition ? 1 : 0.`,
    );
  }

  /** A plain number or series of plain numbers; `what` says what needs it and `cure` how to get it. */
  plain(tree: ExpressionTree, what: string, cure: string): ValueType | null {
    const type = this.value(tree);
    if (type === null || isDimensionless(type.dimension)) return type;
    return this.fail(
      tree.span,
      'plain-number-needed',
      `${what} takes a plain number; ${this.describe(tree, type)}. ${cure}`,
    );
  }

  /** The shape of elementwise work on two values; null (with a message) for series of different lengths. */
  joinShapes(a: Shape, b: Shape, span: Span): Shape | null {
    if (a.kind === 'series' && b.kind === 'series' && a.length !== b.length) {
      return this.fail(
        span,
        'series-lengths',
        `A series of ${a.length} values and one of ${b.length} cannot be combined value by value.`,
      );
    }
    return a.kind === 'series' ? a : b;
  }

  private inferBinary(tree: Extract<ExpressionTree, { kind: 'binary' }>): ValueType | null {
    const left = this.value(tree.left);
    if (tree.operator === '^') return this.inferPower(tree, left);
    const right = this.value(tree.right);
    if (left === null || right === null) return null;
    const shape = this.joinShapes(left.shape, right.shape, tree.span);
    if (shape === null) return null;
    if (tree.operator === '*')
      return { dimension: multiplyDimensions(left.dimension, right.dimension), shape };
    if (tree.operator === '/') return { dimension: divideDimensions(left.dimension, right.dimension), shape };
    if (sameDimension(left.dimension, right.dimension)) return { dimension: left.dimension, shape };
    const deed = tree.operator === '+' ? 'added' : 'subtracted';
    return this.clash(
      { tree: tree.left, type: left },
      { tree: tree.right, type: right },
      `they cannot be ${deed}`,
      tree.span,
    );
  }

  /** Says that two values of different dimension meet, what each is, and what would most likely cure it. */
  clash(left: TypedTree, right: TypedTree, what: string, span: Span): null {
    return this.fail(span, 'dimensions-differ', describeClash(left, right, what, this.scope));
  }

  private inferPower(
    tree: Extract<ExpressionTree, { kind: 'binary' }>,
    left: ValueType | null,
  ): ValueType | null {
    const right = this.plain(tree.right, 'A power', 'Powers are plain numbers.');
    if (left === null || right === null) return null;
    const shape = this.joinShapes(left.shape, right.shape, tree.span);
    if (shape === null) return null;
    const exponent = exactFraction(tree.right);
    if (exponent !== null) return { dimension: powerOfDimension(left.dimension, exponent), shape };
    if (isDimensionless(left.dimension)) return { dimension: DIMENSIONLESS, shape };
    return this.fail(
      tree.right.span,
      'power-not-fixed',
      `${this.describe(tree.left, left)}: its power must be a number written out, as 2 or (3/2), so that the unit of the result is known.`,
    );
  }

  private inferCompare(tree: Extract<ExpressionTree, { kind: 'compare' }>): ValueType | null {
    const types = tree.operands.map((operand) => this.value(operand));
    for (const [index, right] of types.entries()) {
      const left = types[index - 1];
      const leftTree = tree.operands[index - 1];
      const rightTree = tree.operands[index];
      if (!left || !right || leftTree === undefined || rightTree === undefined) continue;
      if (!sameDimension(left.dimension, right.dimension)) {
        return this.clash(
          { tree: leftTree, type: left },
          { tree: rightTree, type: right },
          'they cannot be compared',
          tree.span,
        );
      }
      if (this.joinShapes(left.shape, right.shape, tree.span) === null) return null;
    }
    return types.includes(null) ? null : CONDITION;
  }

  /** All of these must be conditions. */
  private conditions(trees: readonly ExpressionTree[], word: string): ValueType | null {
    const types = trees.map((tree) => this.condition(tree, `\`${word}\``));
    return types.includes(null) ? null : CONDITION;
  }

  condition(tree: ExpressionTree, what: string): ValueType | null {
    const type = this.infer(tree);
    if (type === null || type.shape.kind === 'condition') return type;
    return this.fail(
      tree.span,
      'condition-needed',
      `${what} takes a condition, as r < 8 cm; ${this.describe(tree, type)}.`,
    );
  }

  private inferChoose(tree: Extract<ExpressionTree, { kind: 'choose' }>): ValueType | null {
    const condition = this.condition(tree.condition, 'A choice');
    const yes = this.infer(tree.whenTrue);
    const no = this.infer(tree.whenFalse);
    if (condition === null || yes === null || no === null) return null;
    if ((yes.shape.kind === 'condition') !== (no.shape.kind === 'condition')) {
      return this.fail(
        tree.span,
        'choice-kinds',
        'Both values of a choice must be numbers, or both conditions.',
      );
    }
    if (!sameDimension(yes.dimension, no.dimension)) {
      return this.clash(
        { tree: tree.whenTrue, type: yes },
        { tree: tree.whenFalse, type: no },
        'a choice gives one kind of value',
        tree.span,
      );
    }
    const shape = this.joinShapes(yes.shape, no.shape, tree.span);
    return shape === null ? null : { dimension: yes.dimension, shape };
  }

  /** The types of values that must share one dimension; null when one is wrong or they differ. */
  alike(trees: readonly ExpressionTree[], what: string): ValueType[] | null {
    const types = trees.map((tree) => this.value(tree));
    const known = types.findIndex((type) => type !== null);
    const first = types[known];
    const firstTree = trees[known];
    for (const [index, type] of types.entries()) {
      const tree = trees[index];
      if (!first || !type || firstTree === undefined || tree === undefined) continue;
      if (!sameDimension(first.dimension, type.dimension)) {
        return this.clash({ tree: firstTree, type: first }, { tree, type }, what, tree.span);
      }
    }
    return types.every((type) => type !== null) ? types : null;
  }

  private inferList(elements: readonly ExpressionTree[]): ValueType | null {
    const types = this.alike(elements, 'a list holds one kind of value');
    const [first] = types ?? [];
    if (types === null || first === undefined) return null;
    const series = elements[types.findIndex((type) => type.shape.kind === 'series')];
    if (series !== undefined)
      return this.fail(series.span, 'series-in-list', 'A list holds single values, not series.');
    return { dimension: first.dimension, shape: { kind: 'series', length: elements.length } };
  }

  private inferSpread(tree: Extract<ExpressionTree, { kind: 'spread' }>): ValueType | null {
    const types = this.alike([tree.from, tree.to], 'a spread runs between two values of one kind');
    const [first] = types ?? [];
    if (types === null || first === undefined) return null;
    if (types.some((type) => type.shape.kind === 'series')) {
      return this.fail(tree.span, 'series-in-list', 'A spread runs between two single values.');
    }
    return { dimension: first.dimension, shape: { kind: 'series', length: tree.count } };
  }

  private inferElement(tree: Extract<ExpressionTree, { kind: 'element' }>): ValueType | null {
    const type = this.value(tree.series);
    if (type === null) return null;
    if (type.shape.kind !== 'series') {
      return this.fail(
        tree.span,
        'element-of-single',
        `${quote(tree.series)} is a single value: only a series has numbered values.`,
      );
    }
    if (tree.index > type.shape.length) {
      return this.fail(
        tree.span,
        'element-beyond-end',
        `${quote(tree.series)} has ${type.shape.length} values; there is no number ${tree.index}.`,
      );
    }
    return { dimension: type.dimension, shape: SCALAR };
  }
}
