import { CONSTANTS } from '../physics/constants.ts';
import { findUnitSymbol } from '../units/unit.ts';
import { FUNCTION_TABLE, isFunctionName } from './functions.ts';
import { nameProblem, type Scope } from './scope.ts';
import { mostSimilar } from './similar.ts';

/** Why a name has no value here, and what would give it one. */
export function unknownName(name: string, scope: Scope): { code: string; message: string } {
  if (scope.all.has(name)) {
    return {
      code: 'used-before-defined',
      message: `\`${name}\` is used before it has a value: move the line that defines it above this one.`,
    };
  }
  const problem = nameProblem(name);
  if (problem !== null) return { code: 'name-not-allowed', message: problem };
  if (isFunctionName(name)) {
    return {
      code: 'function-without-brackets',
      message: `\`${name}\` is a function: write ${FUNCTION_TABLE.get(name)?.signature ?? name}.`,
    };
  }
  if (findUnitSymbol(name) !== null) {
    return {
      code: 'unit-not-after-number',
      message: `\`${name}\` is a unit and stands only straight after a number: write 1 ${name}.`,
    };
  }
  const similar = mostSimilar(name, [...scope.defined.keys(), ...CONSTANTS.keys()]);
  const cure = similar === null ? 'define it on a line above.' : `did you mean \`${similar}\`?`;
  return { code: 'unknown-name', message: `\`${name}\` has no value: ${cure}` };
}
