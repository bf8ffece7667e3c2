import type { Dimension } from '../units/dimension.ts';
import { literalToSI } from '../units/convert.ts';
import { readUnit } from '../units/read-unit.ts';
import { roundToFigures } from '../units/rounding.ts';
import { NO_UNIT } from '../units/unit.ts';

/** A physical constant that scripts can read and never redefine; values in coherent SI units. */
export interface PhysicalConstant {
  /** Name in scripts, as `m_e`. */
  name: string;
  /** LaTeX, as `m_\mathrm{e}`. */
  symbol: string;
  /** What it is, as `electron mass`. */
  description: string;
  value: number;
  /** Standard uncertainty in SI; 0 when exact by definition. */
  uncertainty: number;
  /** Unit in the script's own notation; empty for a plain number. */
  unit: string;
  dimension: Dimension;
  /** As a data sheet prints it. */
  dataSheet: { figures: number; value: number };
  source: string;
}

const CODATA = 'CODATA recommended values of the fundamental physical constants: 2022 (NIST)';
/** Figures that school data sheets commonly print; common practice. */
const DATA_SHEET_FIGURES = 3;

function constant(
  name: string,
  symbol: string,
  description: string,
  digits: string,
  uncertainty: string,
  unit: string,
  dataSheetFigures = DATA_SHEET_FIGURES,
  source = CODATA,
): PhysicalConstant {
  const reading = readUnit(unit);
  if (!reading.ok) throw new RangeError(reading.message);
  const value = literalToSI(digits, NO_UNIT);
  return {
    name,
    symbol,
    description,
    value,
    uncertainty: Number(uncertainty),
    unit,
    dimension: reading.unit.dimension,
    dataSheet: { figures: dataSheetFigures, value: roundToFigures(value, dataSheetFigures) },
    source,
  };
}

const EXACT = '0';

const TABLE: readonly PhysicalConstant[] = [
  constant(
    'pi',
    '\\pi',
    'ratio of circumference to diameter',
    String(Math.PI),
    EXACT,
    '',
    15,
    'mathematical',
  ),
  constant('e', 'e', 'elementary charge', '1.602176634e-19', EXACT, 'C'),
  constant('m_e', 'm_\\mathrm{e}', 'electron mass', '9.1093837139e-31', '0.0000000028e-31', 'kg'),
  constant('m_p', 'm_\\mathrm{p}', 'proton mass', '1.67262192595e-27', '0.00000000052e-27', 'kg'),
  constant('m_n', 'm_\\mathrm{n}', 'neutron mass', '1.67492750056e-27', '0.00000000085e-27', 'kg'),
  constant('m_alpha', 'm_\\alpha', 'alpha particle mass', '6.6446573450e-27', '0.0000000021e-27', 'kg'),
  constant('u', 'u', 'atomic mass constant', '1.66053906892e-27', '0.00000000052e-27', 'kg'),
  constant('c', 'c', 'speed of light in a vacuum', '299792458', EXACT, 'm s^-1'),
  constant('h', 'h', 'Planck constant', '6.62607015e-34', EXACT, 'J s'),
  constant('hbar', '\\hbar', 'reduced Planck constant', '1.054571817e-34', EXACT, 'J s'),
  constant('k_B', 'k_\\mathrm{B}', 'Boltzmann constant', '1.380649e-23', EXACT, 'J K^-1'),
  constant(
    'eps0',
    '\\varepsilon_0',
    'permittivity of free space',
    '8.8541878188e-12',
    '0.0000000014e-12',
    'F m^-1',
  ),
  constant('mu0', '\\mu_0', 'permeability of free space', '1.25663706127e-6', '0.00000000020e-6', 'H m^-1'),
  constant('N_A', 'N_\\mathrm{A}', 'Avogadro constant', '6.02214076e23', EXACT, 'mol^-1'),
  constant('g', 'g', 'acceleration of free fall (standard)', '9.80665', EXACT, 'm s^-2'),
  constant('sigma_SB', '\\sigma', 'Stefan–Boltzmann constant', '5.670374419e-8', EXACT, 'W m^-2 K^-4'),
  constant('R_inf', 'R_\\infty', 'Rydberg constant', '10973731.568157', '0.000012', 'm^-1'),
  constant('a0', 'a_0', 'Bohr radius', '5.29177210544e-11', '0.00000000082e-11', 'm'),
  constant('alpha_fs', '\\alpha', 'fine-structure constant', '7.2973525643e-3', '0.0000000011e-3', ''),
];

/** Every constant by name. */
export const CONSTANTS: ReadonlyMap<string, PhysicalConstant> = new Map(TABLE.map((row) => [row.name, row]));
