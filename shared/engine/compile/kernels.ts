import { compares, power } from './scalar-math.ts';
import type { BinaryOperator, ComparisonOperator } from '../script/expression-tree.ts';

/**
 * Loops over the first `count` values of columns. They are plain functions that see typed arrays alone, so that
 * each compiles to a tight machine loop. `as number`: an index below `count` is always inside the column.
 */
export type ColumnKernel = (out: Float64Array, a: Float64Array, b: Float64Array, count: number) => void;
export type RightScalarKernel = (out: Float64Array, a: Float64Array, b: number, count: number) => void;
export type LeftScalarKernel = (out: Float64Array, a: number, b: Float64Array, count: number) => void;

/** One operation in the three ways in which columns and single numbers meet. */
export interface BinaryKernels {
  columns: ColumnKernel;
  rightScalar: RightScalarKernel;
  leftScalar: LeftScalarKernel;
  scalars: (a: number, b: number) => number;
}

const add: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) + (b[i] as number);
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) + b;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a + (b[i] as number);
  },
  scalars: (a, b) => a + b,
};

const subtract: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) - (b[i] as number);
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) - b;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a - (b[i] as number);
  },
  scalars: (a, b) => a - b,
};

const multiply: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) * (b[i] as number);
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) * b;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a * (b[i] as number);
  },
  scalars: (a, b) => a * b,
};

const divide: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) / (b[i] as number);
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) / b;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a / (b[i] as number);
  },
  scalars: (a, b) => a / b,
};

const raise: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = power(a[i] as number, b[i] as number);
  },
  rightScalar(out, a, b, count) {
    if (b === 2) {
      for (let i = 0; i < count; i += 1) {
        const x = a[i] as number;
        out[i] = x * x;
      }
    } else if (b === 3) {
      for (let i = 0; i < count; i += 1) {
        const x = a[i] as number;
        out[i] = x * x * x;
      }
    } else {
      for (let i = 0; i < count; i += 1) out[i] = power(a[i] as number, b);
    }
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = power(a, b[i] as number);
  },
  scalars: power,
};

/** The arithmetic operations by their sign. */
export const ARITHMETIC: Readonly<Record<BinaryOperator, BinaryKernels>> = {
  '+': add,
  '-': subtract,
  '*': multiply,
  '/': divide,
  '^': raise,
};

/** Makes the loops of an operation that is not worth spelling out three times. */
export function kernelsOf(work: (a: number, b: number) => number): BinaryKernels {
  return {
    columns(out, a, b, count) {
      for (let i = 0; i < count; i += 1) out[i] = work(a[i] as number, b[i] as number);
    },
    rightScalar(out, a, b, count) {
      for (let i = 0; i < count; i += 1) out[i] = work(a[i] as number, b);
    },
    leftScalar(out, a, b, count) {
      for (let i = 0; i < count; i += 1) out[i] = work(a, b[i] as number);
    },
    scalars: work,
  };
}

function comparison(operator: ComparisonOperator): BinaryKernels {
  return kernelsOf((a, b) => (compares(operator, a, b) ? 1 : 0));
}

const less: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) < (b[i] as number) ? 1 : 0;
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) < b ? 1 : 0;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a < (b[i] as number) ? 1 : 0;
  },
  scalars: (a, b) => (a < b ? 1 : 0),
};

const more: BinaryKernels = {
  columns(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) > (b[i] as number) ? 1 : 0;
  },
  rightScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = (a[i] as number) > b ? 1 : 0;
  },
  leftScalar(out, a, b, count) {
    for (let i = 0; i < count; i += 1) out[i] = a > (b[i] as number) ? 1 : 0;
  },
  scalars: (a, b) => (a > b ? 1 : 0),
};

/** The comparisons by their sign; each gives 1 or 0. */
export const COMPARISONS: Readonly<Record<ComparisonOperator, BinaryKernels>> = {
  '<': less,
  '>': more,
  '<=': comparison('<='),
  '>=': comparison('>='),
  '==': comparison('=='),
  '!=': comparison('!='),
};

/** Conditions joined: 1 where both, or either, hold. */
export const LOGIC: Readonly<Record<'and' | 'or', BinaryKernels>> = {
  and: kernelsOf((a, b) => (a !== 0 && b !== 0 ? 1 : 0)),
  or: kernelsOf((a, b) => (a !== 0 || b !== 0 ? 1 : 0)),
};

export const EXTREMES: Readonly<Record<'min' | 'max', BinaryKernels>> = {
  min: kernelsOf(Math.min),
  max: kernelsOf(Math.max),
};

/** Square roots, spelled out because every formula of motion in a field has one. */
export function squareRoots(out: Float64Array, a: Float64Array, count: number): void {
  for (let i = 0; i < count; i += 1) out[i] = Math.sqrt(a[i] as number);
}

/** Any function of one number over a column. */
export function mapColumn(
  out: Float64Array,
  a: Float64Array,
  count: number,
  work: (x: number) => number,
): void {
  for (let i = 0; i < count; i += 1) out[i] = work(a[i] as number);
}

/** One of two columns, by a condition. */
export function selectColumn(
  out: Float64Array,
  condition: Float64Array,
  yes: Float64Array,
  no: Float64Array,
  count: number,
): void {
  for (let i = 0; i < count; i += 1) out[i] = condition[i] !== 0 ? (yes[i] as number) : (no[i] as number);
}
