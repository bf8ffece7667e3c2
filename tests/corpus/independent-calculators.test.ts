import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import {
  CONSTANTS,
  compileScript,
  convert,
  evaluateDraw,
  NO_UNIT,
  readUnit,
  toSI,
  type Unit,
} from '#shared/engine/index.ts';

/** GNU Units and SciPy are Debian packages that the test command installs; they know nothing of this engine. */

function mustRead(text: string): Unit {
  const reading = readUnit(text);
  if (!reading.ok) throw new Error(reading.message);
  return reading.unit;
}

/** Our unit, the same for GNU Units, and the unit to compare in (both spellings). */
const UNITS: readonly (readonly [ours: string, gnu: string, inOurs: string, inGnu: string])[] = [
  ['keV', 'keV', 'J', 'J'],
  ['GeV', 'GeV', 'J', 'J'],
  ['u', 'u', 'kg', 'kg'],
  ['Å', 'angstrom', 'm', 'm'],
  ['mT', 'mT', 'kg A^-1 s^-2', 'kg / A s^2'],
  ['V m^-1', 'V/m', 'kg m A^-1 s^-3', 'kg m / A s^3'],
  ['C/kg', 'C/kg', 'A s kg^-1', 'A s / kg'],
  ['Pa s', 'Pa s', 'kg m^-1 s^-1', 'kg / m s'],
  ['F/m', 'F/m', 'A^2 s^4 kg^-1 m^-3', 'A^2 s^4 / kg m^3'],
  ['Ω', 'ohm', 'kg m^2 A^-2 s^-3', 'kg m^2 / A^2 s^3'],
  ['H/m', 'H/m', 'kg m A^-2 s^-2', 'kg m / A^2 s^2'],
  ['Wb', 'Wb', 'kg m^2 A^-1 s^-2', 'kg m^2 / A s^2'],
  ['mbar', 'mbar', 'Pa', 'Pa'],
  ['L', 'liter', 'm^3', 'm^3'],
  ['min', 'min', 's', 's'],
  ['h', 'hour', 's', 's'],
  ['g/cm^3', 'g/cm^3', 'kg m^-3', 'kg/m^3'],
  ['kW', 'kW', 'J s^-1', 'J/s'],
  ['°', 'degree', 'rad', 'radian'],
  ['µC', 'microC', 'A s', 'A s'],
  ['pF', 'pF', 'C V^-1', 'C/V'],
  ['nm', 'nm', 'm', 'm'],
  ['THz', 'THz', 's^-1', '/s'],
  ['J/(kg K)', 'J/kg K', 'm^2 s^-2 K^-1', 'm^2 / s^2 K'],
];

describe('GNU Units', () => {
  it.each(UNITS)('agrees that %s is the same amount of base units', (ours, gnu, inOurs, inGnu) => {
    const output = execFileSync('units', ['--digits', '15', '-t', '-o', '%.15g', gnu, inGnu], {
      encoding: 'utf8',
    });
    // The atomic mass unit moved by 1.4 parts in 10^9 between the CODATA sets of 2018 and 2022.
    expect(convert(1, mustRead(ours), mustRead(inOurs)) / Number(output.trim())).toBeCloseTo(1, 8);
  });
});

interface PythonAnswers {
  constants: Record<string, number>;
  line: [slope: number, intercept: number];
  values: Record<string, number>;
}

const PYTHON = `
import json, math
from scipy import constants as k, stats
pc = lambda name: k.physical_constants[name][0]
x = [0.2, 337.4, 118.2, 884.6, 10.1, 226.5]
y = [0.1, 338.8, 118.1, 888.0, 9.2, 228.1]
line = stats.linregress(x, y)
e, m_e, m_p, c, h = k.e, k.m_e, k.m_p, k.c, k.h
print(json.dumps({
  "constants": {
    "e": e, "m_e": m_e, "m_p": m_p, "m_n": k.m_n, "m_alpha": pc("alpha particle mass"), "u": k.u, "c": c, "h": h,
    "hbar": k.hbar, "k_B": k.k, "eps0": k.epsilon_0, "mu0": k.mu_0, "N_A": k.N_A, "g": k.g, "sigma_SB": k.sigma,
    "R_inf": k.Rydberg, "a0": pc("Bohr radius"), "alpha_fs": k.alpha, "pi": math.pi,
  },
  "line": [line.slope, line.intercept],
  "values": {
    "v": math.sqrt(2 * e * 250 / m_e),
    "r": m_p * 3.0e6 / (e * 0.45),
    "lam": h / math.sqrt(2 * m_e * e * 4000),
    "stop": (h * c / 320e-9 - 2.3 * e) / e,
    "fall": 2 * (8.5e-7) ** 2 * (870 - 1.2) * k.g / (9 * 1.82e-5),
    "angle": math.degrees(math.asin(0.154e-9 / (2 * 0.282e-9))),
  },
}))
`;

const SCRIPT = `v = sqrt(2 * e * 250 V / m_e)
r = m_p * 3.0e6 m/s / (e * 0.45 T)
lam = h / sqrt(2 * m_e * e * 4.00 kV)
stop = (h * c / 320 nm - 2.3 eV) / e
fall = 2 * (0.85 µm)^2 * (870 kg/m^3 - 1.2 kg/m^3) * g / (9 * 1.82e-5 Pa s)
angle = asin(1.54 Å / (2 * 2.82 Å))
x = [0.2, 337.4, 118.2, 884.6, 10.1, 226.5]
y = [0.1, 338.8, 118.1, 888.0, 9.2, 228.1]
gradient = slope(x, y)
start = intercept(x, y)`;

describe('SciPy', () => {
  const answers = JSON.parse(
    execFileSync('/usr/bin/python3', ['-c', PYTHON], { encoding: 'utf8' }),
  ) as PythonAnswers;
  const { script } = compileScript(SCRIPT);
  if (script === null) throw new Error('The script does not compile.');
  const ours = new Map(Object.entries(evaluateDraw(script, 1).values));

  it.each([...CONSTANTS.values()].map(({ name, value }) => [name, value] as const))(
    'agrees on the constant %s',
    (name, value) => {
      // Debian 12 carries the CODATA set of 2018; no constant moved by a part in 10^8 since.
      expect(value / (answers.constants[name] ?? NaN)).toBeCloseTo(1, 8);
    },
  );

  it.each(['v', 'r', 'lam', 'stop', 'fall'])('agrees on %s', (name) => {
    expect(Number(ours.get(name)) / (answers.values[name] ?? NaN)).toBeCloseTo(1, 8);
  });

  it('agrees on an angle in degrees and on a line', () => {
    const degree = toSI(1, mustRead('°')) / toSI(1, NO_UNIT);
    expect(Number(ours.get('angle')) / degree).toBeCloseTo(answers.values['angle'] ?? NaN, 10);
    expect(Number(ours.get('gradient'))).toBeCloseTo(answers.line[0], 12);
    expect(Number(ours.get('start'))).toBeCloseTo(answers.line[1], 10);
  });
});
