import { CONSTANTS } from '../physics/constants.ts';
import type { ConstantPrecision } from './compiled-script.ts';

/** The value of a constant at a precision, SI; NaN for an unknown name. */
export function constantValue(name: string, precision: ConstantPrecision = 'full'): number {
  const constant = CONSTANTS.get(name);
  if (constant === undefined) return NaN;
  if (precision === 'full') return constant.value;
  if (precision === 'dataSheet') return constant.dataSheet.value;
  return precision.get(name) ?? constant.value;
}
