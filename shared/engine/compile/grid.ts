import type { Statement } from '../script/statement.ts';
import type { CompiledScript } from './compiled-script.ts';

/** A drawn statement's place in the mixed-radix grid: its digit is floor(index / stride) mod count. */
export interface GridPlace {
  name: string;
  count: number;
  stride: number;
}

function levelCount(statement: Extract<Statement, { kind: 'drawn' }>): number {
  return statement.levels.kind === 'steps' ? statement.levels.count : statement.levels.choices.length;
}

const placesByScript = new WeakMap<CompiledScript, readonly GridPlace[]>();

/** The places of all drawn names in script order; the last varies fastest. */
export function gridPlaces(script: CompiledScript): readonly GridPlace[] {
  const known = placesByScript.get(script);
  if (known !== undefined) return known;
  const drawn = script.statements.filter((statement) => statement.kind === 'drawn');
  let stride = 1;
  const places = drawn
    .toReversed()
    .map((statement) => {
      const place = { name: statement.name, count: levelCount(statement), stride };
      stride *= place.count;
      return place;
    })
    .reverse();
  placesByScript.set(script, places);
  return places;
}

/** The digit of a grid index (from 0) at a place; exact for every whole number that doubles hold. */
export function digitAt(index: number, place: GridPlace): number {
  return ((index - (index % place.stride)) / place.stride) % place.count;
}

/** The digits of a draw number (from 1), one a drawn name in script order. */
export function digitsOfDraw(script: CompiledScript, draw: number): number[] {
  const index = (draw - 1) % script.grid.size;
  return gridPlaces(script).map((place) => digitAt(index, place));
}

/** The draw number (from 1) with these digits: the inverse of digitsOfDraw on the grid. */
export function drawOfDigits(script: CompiledScript, digits: readonly number[]): number {
  let index = 0;
  for (const [at, place] of gridPlaces(script).entries()) index += (digits[at] ?? 0) * place.stride;
  return index + 1;
}

/** Throws RangeError unless `draw` is a draw number of the script. */
export function requireDraw(script: CompiledScript, draw: number): void {
  const last = script.grid.open ? Number.MAX_SAFE_INTEGER : script.grid.size;
  if (!(Number.isInteger(draw) && draw >= 1 && draw <= last)) {
    throw new RangeError(`Draw ${draw} does not exist: draws are numbered from 1 to ${last}.`);
  }
}
