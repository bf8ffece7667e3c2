import type { ExpressionTree } from '../script/expression-tree.ts';
import type { FunctionName } from '../script/functions.ts';
import { roundColumnToFigures, roundInUnit } from '../units/rounding.ts';
import type { Unit } from '../units/unit.ts';
import {
  ARITHMETIC,
  COMPARISONS,
  EXTREMES,
  LOGIC,
  mapColumn,
  selectColumn,
  squareRoots,
  type BinaryKernels,
} from './kernels.ts';
import { spreadValue, UNARY_FUNCTIONS } from './scalar-math.ts';
import { interceptOf, meanOf, quantumOf, slopeOf, sumOf } from './series-math.ts';

/** Draws that are worked on at a time: a block's columns stay in the processor's cache. */
export const BLOCK_LENGTH = 1024;

/**
 * A column of a block. A kept one belongs to a name and is never written over; steps read `column` anew each
 * time, so that a result can be made to land straight in the caller's own column.
 */
export interface ColumnRegister {
  column: Float64Array;
  kept: boolean;
}

/** One value for all draws, or a column of a block. */
export type Register = number | ColumnRegister;
export type RegisterValue = Register | readonly Register[];

/** What the names of a tree stand for while it is compiled. */
export interface RegisterScope {
  name(name: string): RegisterValue;
  constant(name: string): number;
}

type ColumnLoop = (out: Float64Array, a: Float64Array, count: number) => void;

/** One step of a program: works on the first `count` draws of the block. */
export type Step = (count: number) => void;

/** Compiles checked trees to steps over blocks of draws; parts that are the same for all draws are worked out at once. */
export class ProgramBuilder {
  readonly steps: Step[] = [];
  private readonly free: ColumnRegister[] = [];

  /** A column that belongs to a name from the start. */
  named(): ColumnRegister {
    return { column: new Float64Array(BLOCK_LENGTH), kept: true };
  }

  /** A column to write into, taken from an operand that is needed no more where there is one. */
  private target(...operands: readonly Register[]): ColumnRegister {
    for (const operand of operands) if (typeof operand === 'object' && !operand.kept) return operand;
    return this.free.pop() ?? { column: new Float64Array(BLOCK_LENGTH), kept: false };
  }

  /** Gives back the columns of operands that are needed no more, except the one that now holds the result. */
  private release(result: ColumnRegister, ...operands: readonly Register[]): void {
    for (const operand of operands) {
      if (typeof operand === 'object' && !operand.kept && operand !== result) this.free.push(operand);
    }
  }

  /** Marks a register as one that is never written over. */
  keep(register: Register): Register {
    if (typeof register === 'object') register.kept = true;
    return register;
  }

  private binary(kernels: BinaryKernels, a: Register, b: Register): Register {
    if (typeof a === 'number') {
      if (typeof b === 'number') return kernels.scalars(a, b);
      const out = this.target(b);
      this.steps.push((count) => kernels.leftScalar(out.column, a, b.column, count));
      return out;
    }
    const out = this.target(a, b);
    if (typeof b === 'number')
      this.steps.push((count) => kernels.rightScalar(out.column, a.column, b, count));
    else this.steps.push((count) => kernels.columns(out.column, a.column, b.column, count));
    this.release(out, a, b);
    return out;
  }

  private unary(a: Register, work: (x: number) => number, loop?: ColumnLoop): Register {
    if (typeof a === 'number') return work(a);
    const out = this.target(a);
    this.steps.push(
      loop === undefined
        ? (count) => mapColumn(out.column, a.column, count, work)
        : (count) => loop(out.column, a.column, count),
    );
    return out;
  }

  /** Elementwise work on two values of which either may be a series. */
  private pairwise(kernels: BinaryKernels, a: RegisterValue, b: RegisterValue): RegisterValue {
    if (!isSeries(a) && !isSeries(b)) return this.binary(kernels, a, b);
    const length = isSeries(a) ? a.length : isSeries(b) ? b.length : 0;
    // A single value meets every element, so it must survive the first of them.
    const left = isSeries(a) ? a : this.keep(a);
    const right = isSeries(b) ? b : this.keep(b);
    return Array.from({ length }, (_, index) =>
      this.binary(kernels, elementOf(left, index), elementOf(right, index)),
    );
  }

  private each(a: RegisterValue, work: (register: Register) => Register): RegisterValue {
    return isSeries(a) ? a.map(work) : work(a);
  }

  /** Rounds to significant figures in a unit. */
  round(value: RegisterValue, figures: number, unit: Unit): RegisterValue {
    const loop =
      unit.coefficient === 1
        ? (out: Float64Array, a: Float64Array, count: number) => roundColumnToFigures(out, a, count, figures)
        : undefined;
    return this.each(value, (register) => this.unary(register, (x) => roundInUnit(x, figures, unit), loop));
  }

  /** Compiles a tree; its steps are appended, and the registers that will hold its value are given. */
  compile(tree: ExpressionTree, scope: RegisterScope): RegisterValue {
    switch (tree.kind) {
      case 'number':
        return tree.value;
      case 'constant':
        return scope.constant(tree.name);
      case 'name':
        return scope.name(tree.name);
      case 'negate':
        return this.each(this.compile(tree.operand, scope), (register) => this.unary(register, (x) => -x));
      case 'rounded':
        return this.round(this.compile(tree.operand, scope), tree.figures, tree.unit);
      case 'binary':
        return this.pairwise(
          ARITHMETIC[tree.operator],
          this.compile(tree.left, scope),
          this.compile(tree.right, scope),
        );
      case 'call':
        return this.call(
          tree.function,
          tree.arguments.map((argument) => this.compile(argument, scope)),
        );
      case 'compare':
        return this.compare(tree, scope);
      case 'logic':
        return this.pairwise(
          LOGIC[tree.operator],
          this.compile(tree.left, scope),
          this.compile(tree.right, scope),
        );
      case 'not':
        return this.each(this.compile(tree.operand, scope), (register) =>
          this.unary(register, (x) => (x === 0 ? 1 : 0)),
        );
      case 'choose':
        return this.choose(tree, scope);
      case 'list':
        return tree.elements.map((element) => single(this.compile(element, scope)));
      case 'spread':
        return this.spread(tree, scope);
      case 'element': {
        const series = this.compile(tree.series, scope);
        return isSeries(series) ? (series[tree.index - 1] ?? NaN) : series;
      }
    }
  }

  private compare(tree: Extract<ExpressionTree, { kind: 'compare' }>, scope: RegisterScope): Register {
    // A chain uses its middle operands twice, so none may be written over.
    const operands = tree.operands.map((operand) => {
      const value = this.compile(operand, scope);
      return isSeries(value) ? value.map((register) => this.keep(register)) : this.keep(value);
    });
    const tests = tree.operators.flatMap((operator, index) => {
      const pair = this.pairwise(COMPARISONS[operator], operands[index] ?? NaN, operands[index + 1] ?? NaN);
      return isSeries(pair) ? pair : [pair];
    });
    return tests.reduce((all, test) => this.binary(LOGIC.and, all, test));
  }

  private choose(tree: Extract<ExpressionTree, { kind: 'choose' }>, scope: RegisterScope): RegisterValue {
    const condition = this.keep(single(this.compile(tree.condition, scope)));
    const yes = this.compile(tree.whenTrue, scope);
    const no = this.compile(tree.whenFalse, scope);
    if (typeof condition === 'number') return condition !== 0 ? yes : no;
    const select = (a: Register, b: Register): Register => {
      const left = this.asColumn(a);
      const right = this.asColumn(b);
      const out = this.target();
      this.steps.push((count) =>
        selectColumn(out.column, condition.column, left.column, right.column, count),
      );
      return out;
    };
    if (!isSeries(yes) && !isSeries(no)) return select(yes, no);
    const length = isSeries(yes) ? yes.length : isSeries(no) ? no.length : 0;
    return Array.from({ length }, (_, index) => select(elementOf(yes, index), elementOf(no, index)));
  }

  private asColumn(register: Register): ColumnRegister {
    if (typeof register === 'object') return register;
    const filled = this.named();
    filled.column.fill(register);
    return filled;
  }

  private spread(tree: Extract<ExpressionTree, { kind: 'spread' }>, scope: RegisterScope): RegisterValue {
    const from = this.keep(single(this.compile(tree.from, scope)));
    const to = this.keep(single(this.compile(tree.to, scope)));
    return Array.from({ length: tree.count }, (_, index) =>
      this.gather([from, to], ([start = NaN, end = NaN]) => spreadValue(start, end, tree.count, index)),
    );
  }

  private call(name: FunctionName, values: readonly RegisterValue[]): RegisterValue {
    const [first = NaN, second = NaN] = values;
    const unary = UNARY_FUNCTIONS.get(name);
    if (unary !== undefined) {
      return this.each(first, (register) =>
        this.unary(register, unary, name === 'sqrt' ? squareRoots : undefined),
      );
    }
    const xs = isSeries(first) ? first : [first];
    const ys = isSeries(second) ? second : [second];
    switch (name) {
      case 'min':
      case 'max':
        return values
          .slice(1)
          .reduce<RegisterValue>((all, value) => this.pairwise(EXTREMES[name], all, value), first);
      case 'mean':
        return this.gather(xs, meanOf);
      case 'sum':
        return this.gather(xs, sumOf);
      case 'least':
        return this.gather(xs, (numbers) => Math.min(...numbers));
      case 'greatest':
        return this.gather(xs, (numbers) => Math.max(...numbers));
      case 'quantum':
        return this.gather(xs, quantumOf);
      case 'slope':
      case 'intercept': {
        const line = name === 'slope' ? slopeOf : interceptOf;
        const length = xs.length;
        return this.gather([...xs, ...ys], (numbers) =>
          line(numbers.slice(0, length), numbers.slice(length)),
        );
      }
      default:
        return NaN;
    }
  }

  /** Gathers the values of one draw from several registers and works on them together. */
  private gather(registers: readonly Register[], work: (numbers: number[]) => number): Register {
    const fixed = registers.map((register) => (typeof register === 'number' ? register : NaN));
    if (registers.every((register) => typeof register === 'number')) return work(fixed);
    const out = this.target();
    const numbers = [...fixed];
    this.steps.push((count) => {
      for (let i = 0; i < count; i += 1) {
        for (const [index, register] of registers.entries()) {
          if (typeof register === 'object') numbers[index] = register.column[i] ?? NaN;
        }
        out.column[i] = work(numbers);
      }
    });
    return out;
  }
}

/** Whether a value is a series of registers. */
export function isSeries(value: RegisterValue): value is readonly Register[] {
  return Array.isArray(value);
}

function elementOf(value: RegisterValue, index: number): Register {
  return isSeries(value) ? (value[index] ?? NaN) : value;
}

function single(value: RegisterValue): Register {
  return isSeries(value) ? NaN : value;
}
