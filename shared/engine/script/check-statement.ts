import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt, hasError, joinSpans } from '../diagnostics/spans.ts';
import { sameDimension, type Dimension } from '../units/dimension.ts';
import { coherentUnit, describeDimension } from '../units/quantity-kinds.ts';
import { readUnit } from '../units/read-unit.ts';
import type { Unit } from '../units/unit.ts';
import { checkSteps, checkWhole } from './check-levels.ts';
import { decimalLiteral } from './decimal-literal.ts';
import type { ExpressionTree } from './expression-tree.ts';
import { TypeInference } from './infer-type.ts';
import { SCRIPT_LIMITS } from './limits.ts';
import { parseExpression } from './parse-expression.ts';
import type { FormArgument, ParsedStatement } from './parse-statement.ts';
import type { Scope, ValueType } from './scope.ts';
import type { Statement } from './statement.ts';
import { suggestUnitFor } from './suggest-unit.ts';
import { namesIn } from './walk-tree.ts';

/** A statement that was checked: the statement where it is sound, and what is known of its name in any case. */
export interface CheckedStatement {
  statement: Statement | null;
  type: ValueType | null;
  /** Unit in which the value is spoken of and, unless the item says otherwise, printed. */
  unit: Unit | null;
  decimals: number | null;
  figures: number | null;
  diagnostics: Diagnostic[];
}

type FormStatement = Extract<ParsedStatement, { kind: 'form' }>;

const MOST_FIGURES = 12;
const MOST_CHOICES = 64;

/** Checks one statement in the scope of those before it. */
export function checkStatement(parsed: ParsedStatement, scope: Scope): CheckedStatement {
  if (parsed.kind === 'form') return new FormChecker(parsed, scope).check();
  const inference = new TypeInference(scope);
  if (parsed.kind === 'require') {
    inference.condition(parsed.tree, '`require`');
    const sound = !hasError(inference.diagnostics);
    return { ...NOTHING, statement: sound ? parsed : null, diagnostics: inference.diagnostics };
  }
  const type = inference.infer(parsed.tree);
  const { name, nameSpan, span, tree } = parsed;
  return {
    ...NOTHING,
    statement: type === null ? null : { kind: 'computed', name, nameSpan, span, tree },
    type,
    unit:
      type === null ? null : (suggestUnitFor(tree, scope, type.dimension) ?? coherentUnit(type.dimension)),
    diagnostics: inference.diagnostics,
  };
}

const NOTHING: CheckedStatement = {
  statement: null,
  type: null,
  unit: null,
  decimals: null,
  figures: null,
  diagnostics: [],
};

/** Checks the forms that stand alone: draw, oneOf, whole, scatter and given. */
class FormChecker {
  private readonly parsed: FormStatement;
  private readonly scope: Scope;
  private readonly diagnostics: Diagnostic[] = [];

  constructor(parsed: FormStatement, scope: Scope) {
    this.parsed = parsed;
    this.scope = scope;
  }

  check(): CheckedStatement {
    switch (this.parsed.form) {
      case 'draw':
      case 'whole':
        return this.steps();
      case 'oneOf':
        return this.choices();
      case 'scatter':
        return this.scatter();
      case 'given':
        return this.given();
    }
  }

  private fail(span: Span, code: string, message: string): CheckedStatement {
    this.diagnostics.push(errorAt(span, code, message));
    return { ...NOTHING, diagnostics: this.diagnostics };
  }

  private tree(argument: FormArgument): ExpressionTree | null {
    const { tree, diagnostics } = parseExpression(argument.tokens, this.scope.all, argument.span);
    this.diagnostics.push(...diagnostics);
    return tree;
  }

  private trees(): ExpressionTree[] | null {
    const trees = this.parsed.arguments.map((argument) => this.tree(argument));
    return trees.every((tree) => tree !== null) ? trees : null;
  }

  private base(): { name: string; nameSpan: Span; span: Span } {
    const { name, nameSpan, span } = this.parsed;
    return { name, nameSpan, span };
  }

  private steps(): CheckedStatement {
    const trees = this.trees();
    if (trees === null) return { ...NOTHING, diagnostics: this.diagnostics };
    const checked = (this.parsed.form === 'draw' ? checkSteps : checkWhole)(trees, this.parsed.formSpan);
    this.diagnostics.push(...checked.diagnostics);
    const { levels } = checked;
    if (levels === null) return { ...NOTHING, diagnostics: this.diagnostics };
    return {
      ...NOTHING,
      statement: { kind: 'drawn', ...this.base(), levels },
      type: { dimension: levels.unit.dimension, shape: { kind: 'scalar' } },
      unit: levels.unit,
      decimals: checked.decimals,
      diagnostics: this.diagnostics,
    };
  }

  private choices(): CheckedStatement {
    const trees = this.trees();
    if (trees === null) return { ...NOTHING, diagnostics: this.diagnostics };
    const [first] = trees;
    if (first === undefined || trees.length > MOST_CHOICES) {
      return this.fail(
        this.parsed.formSpan,
        'argument-count',
        `oneOf takes between one and ${MOST_CHOICES} values: oneOf(a, b, ...).`,
      );
    }
    const inference = new TypeInference(this.scope);
    const type = inference.alike(trees, 'oneOf chooses among values of one kind')?.[0] ?? null;
    this.diagnostics.push(...inference.diagnostics);
    for (const tree of trees) {
      const name = namesIn(tree).names[0];
      if (name !== undefined && !hasError(this.diagnostics)) {
        return this.fail(
          tree.span,
          'draw-not-literal',
          `oneOf takes numbers and constants, not \`${name}\`, so that its values can be counted.`,
        );
      }
    }
    if (type?.shape.kind === 'series')
      return this.fail(this.parsed.formSpan, 'series-in-list', 'oneOf takes single values.');
    if (type === null) return { ...NOTHING, diagnostics: this.diagnostics };
    const unit = suggestUnitFor(first, this.scope, type.dimension) ?? coherentUnit(type.dimension);
    return {
      ...NOTHING,
      statement: { kind: 'drawn', ...this.base(), levels: { kind: 'choices', choices: trees } },
      type,
      unit,
      decimals: commonDecimals(trees, unit),
      diagnostics: this.diagnostics,
    };
  }

  private scatter(): CheckedStatement {
    const [deviation, count, ...others] = this.trees() ?? [];
    if (hasError(this.diagnostics)) return { ...NOTHING, diagnostics: this.diagnostics };
    if (deviation === undefined || others.length > 0) {
      return this.fail(
        this.parsed.formSpan,
        'argument-count',
        'scatter takes the standard deviation, and for a series how many values: scatter(0.2 mm) or scatter(0.2 mm, 6).',
      );
    }
    let length = 0;
    if (count !== undefined) {
      length = count.kind === 'number' && count.unit.text === '' ? count.value : NaN;
      if (!Number.isInteger(length) || length < 2 || length > SCRIPT_LIMITS.seriesElements) {
        return this.fail(
          count.span,
          'whole-number',
          `The number of values is a whole number from 2 to ${SCRIPT_LIMITS.seriesElements}.`,
        );
      }
    }
    const inference = new TypeInference(this.scope);
    const type = inference.value(deviation);
    this.diagnostics.push(...inference.diagnostics);
    if (type === null) return { ...NOTHING, diagnostics: this.diagnostics };
    if (type.shape.kind === 'series')
      return this.fail(deviation.span, 'series-in-list', 'The standard deviation is a single value.');
    return {
      ...NOTHING,
      statement: { kind: 'scatter', ...this.base(), deviation, length },
      type: {
        dimension: type.dimension,
        shape: length === 0 ? { kind: 'scalar' } : { kind: 'series', length },
      },
      unit: suggestUnitFor(deviation, this.scope, type.dimension) ?? coherentUnit(type.dimension),
      diagnostics: this.diagnostics,
    };
  }

  private given(): CheckedStatement {
    const [value, figuresArgument, unitArgument, ...others] = this.parsed.arguments;
    if (value === undefined || figuresArgument === undefined || others.length > 0) {
      return this.fail(
        this.parsed.formSpan,
        'argument-count',
        'given takes a value and its significant figures: given(x, 3).',
      );
    }
    const tree = this.tree(value);
    const figuresTree = this.tree(figuresArgument);
    if (tree === null || figuresTree === null) return { ...NOTHING, diagnostics: this.diagnostics };
    const literal = decimalLiteral(figuresTree);
    const figures = literal === null ? NaN : literal.digits * 10 ** literal.exponent;
    if (literal?.unit.text !== '' || !Number.isInteger(figures) || figures < 1 || figures > MOST_FIGURES) {
      return this.fail(
        figuresArgument.span,
        'whole-number',
        `The significant figures are a whole number from 1 to ${MOST_FIGURES}, written out.`,
      );
    }
    const inference = new TypeInference(this.scope);
    const type = inference.value(tree);
    this.diagnostics.push(...inference.diagnostics);
    if (type === null) return { ...NOTHING, diagnostics: this.diagnostics };
    let unit = suggestUnitFor(tree, this.scope, type.dimension) ?? coherentUnit(type.dimension);
    if (unitArgument !== undefined) {
      const read = this.unitOf(unitArgument, type.dimension);
      if (read === null) return { ...NOTHING, diagnostics: this.diagnostics };
      unit = read;
    }
    return {
      ...NOTHING,
      statement: { kind: 'given', ...this.base(), tree, figures, unit },
      type,
      unit,
      figures,
      diagnostics: this.diagnostics,
    };
  }

  /** The unit written as an argument of its own, as the eV of `given(E, 3, eV)`. */
  private unitOf(argument: FormArgument, dimension: Dimension): Unit | null {
    const text = argument.tokens
      .map((token) => token.written)
      .join(' ')
      .replace(/ ?\^ ?/g, '^')
      .replace(/\^- /g, '^-');
    const reading = readUnit(text);
    const [first] = argument.tokens;
    const last = argument.tokens.at(-1);
    const span = first === undefined || last === undefined ? argument.span : joinSpans(first.span, last.span);
    if (!reading.ok) {
      this.fail(
        span,
        'unknown-unit',
        `${reading.message} The third value of given is the unit it is printed in, as given(E, 3, eV).`,
      );
      return null;
    }
    if (!sameDimension(reading.unit.dimension, dimension)) {
      this.fail(
        span,
        'dimensions-differ',
        `The value is ${describeDimension(dimension)}, which cannot be printed in ${text || 'no unit'}.`,
      );
      return null;
    }
    return reading.unit;
  }
}

/** Decimals that print every literal of a list exactly, or null when one is no literal in that unit. */
function commonDecimals(trees: readonly ExpressionTree[], unit: Unit): number | null {
  let decimals = -Infinity;
  for (const tree of trees) {
    const literal = decimalLiteral(tree);
    if (literal?.unit.text !== unit.text) return null;
    decimals = Math.max(decimals, -literal.exponent);
  }
  return decimals;
}
