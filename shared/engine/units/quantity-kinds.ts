import { isDimensionless, rational, type Dimension } from './dimension.ts';
import { readUnit } from './read-unit.ts';
import { NO_UNIT, unitFromTerms, type Unit, type UnitTerm } from './unit.ts';

/** What a dimension most often measures in electron and quantum physics, and the unit it is written in. */
interface QuantityKindRow {
  kind: string;
  unit: Unit;
}

function row(kind: string, unit: string): QuantityKindRow {
  const reading = readUnit(unit);
  if (!reading.ok) throw new RangeError(reading.message);
  return { kind, unit: reading.unit };
}

const ROWS: readonly QuantityKindRow[] = [
  row('length', 'm'),
  row('mass', 'kg'),
  row('time', 's'),
  row('current', 'A'),
  row('temperature', 'K'),
  row('amount of substance', 'mol'),
  row('luminous intensity', 'cd'),
  row('area', 'm^2'),
  row('volume', 'm^3'),
  row('number density', 'm^-3'),
  row('wavenumber', 'm^-1'),
  row('speed', 'm s^-1'),
  row('acceleration', 'm s^-2'),
  row('frequency', 'Hz'),
  row('density', 'kg m^-3'),
  row('force', 'N'),
  row('momentum', 'kg m s^-1'),
  row('energy', 'J'),
  row('power', 'W'),
  row('pressure', 'Pa'),
  row('viscosity', 'Pa s'),
  row('surface tension', 'N m^-1'),
  row('charge', 'C'),
  row('specific charge', 'C kg^-1'),
  row('potential difference', 'V'),
  row('field strength', 'V m^-1'),
  row('resistance', 'Ω'),
  row('conductance', 'S'),
  row('resistivity', 'Ω m'),
  row('capacitance', 'F'),
  row('inductance', 'H'),
  row('magnetic flux', 'Wb'),
  row('magnetic flux density', 'T'),
  row('permittivity', 'F m^-1'),
  row('permeability', 'H m^-1'),
  row('action', 'J s'),
  row('intensity', 'W m^-2'),
  row('heat capacity', 'J K^-1'),
  row('specific heat capacity', 'J kg^-1 K^-1'),
  row('specific energy', 'J kg^-1'),
  row('charge density', 'C m^-3'),
  row('surface charge density', 'C m^-2'),
  row('current density', 'A m^-2'),
  row('molar mass', 'kg mol^-1'),
  row('gradient of p.d. against frequency', 'V s'),
];

/** A text that two dimensions share only when they are the same. */
function keyOf(of: Dimension): string {
  return of.join(' ');
}

const KIND_OF_UNIT: ReadonlyMap<string, QuantityKindRow> = new Map(
  ROWS.map((entry) => [keyOf(entry.unit.dimension), entry]).reverse() as [string, QuantityKindRow][],
);

const BASE_SYMBOLS: readonly UnitTerm[] = [
  { prefix: '', symbol: 'm', exponent: [1, 1] },
  { prefix: 'k', symbol: 'g', exponent: [1, 1] },
  { prefix: '', symbol: 's', exponent: [1, 1] },
  { prefix: '', symbol: 'A', exponent: [1, 1] },
  { prefix: '', symbol: 'K', exponent: [1, 1] },
  { prefix: '', symbol: 'mol', exponent: [1, 1] },
  { prefix: '', symbol: 'cd', exponent: [1, 1] },
];

/** The coherent SI unit in which a dimension is usually written: named where it has a name, else base units. */
export function coherentUnit(of: Dimension): Unit {
  if (isDimensionless(of)) return NO_UNIT;
  const known = KIND_OF_UNIT.get(keyOf(of));
  if (known !== undefined) return known.unit;
  const order = [1, 0, 2, 3, 4, 5, 6];
  return unitFromTerms(
    order.flatMap((index) => {
      const [numerator, denominator] = of[index] ?? [0, 1];
      const base = BASE_SYMBOLS[index];
      return base === undefined || numerator === 0
        ? []
        : [{ ...base, exponent: rational(numerator, denominator) }];
    }),
  );
}

/** What a dimension measures: a noun such as `potential difference`, or null where it has no common name. */
export function kindOfDimension(of: Dimension): string | null {
  return KIND_OF_UNIT.get(keyOf(of))?.kind ?? null;
}

const VOWEL = /^[aeiou]/;

/**
 * A dimension in words with its unit, for messages: `a potential difference (V)`, `an energy (J)`,
 * `a plain number`, `a quantity in kg m^2 s^-1`.
 */
export function describeDimension(of: Dimension, unit: string = coherentUnit(of).text): string {
  if (isDimensionless(of)) return 'a plain number';
  const kind = kindOfDimension(of);
  if (kind === null) return `a quantity in ${unit}`;
  return `${VOWEL.test(kind) ? 'an' : 'a'} ${kind} (${unit})`;
}
