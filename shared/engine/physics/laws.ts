import { CONSTANTS } from './constants.ts';

/** Values of one set on one draw: roles by id, and `m` and `q` of the particle where they are known. */
export type RoleValues = (role: string) => number;

/** One published law: what the subject must be, given the others. */
export interface LawRow {
  id: string;
  /** As it reads in a sentence: `eV = ½mv²`. */
  statement: string;
  subject: string;
  /** Roles that must all be bound; `mass` and `particle charge` may come from the particle of the set. */
  others: readonly string[];
  /** What the others say the subject is, coherent SI. */
  formula: (value: RoleValues) => number;
  source: string;
}

const constant = (name: string): number => CONSTANTS.get(name)?.value ?? NaN;
const e = constant('e');
const h = constant('h');
const c = constant('c');
const g = constant('g');
const rydberg = constant('R_inf');

const UP1 = 'OpenStax, University Physics vol. 1';
const UP2 = 'OpenStax, University Physics vol. 2';
const UP3 = 'OpenStax, University Physics vol. 3';
const COMMON = 'common practice in school texts, derived from the laws above it';

/** Laws about particles take the set's own mass and charge: roles, else the particle that the script speaks of. */
export const MASS = 'particleMass';
export const CHARGE = 'particleCharge';

/** Every law that is held against an item, each with the book it can be read in. */
export const LAWS: readonly LawRow[] = [
  {
    id: 'gunEnergy',
    statement: 'E_k = qV',
    subject: 'kineticEnergy',
    others: ['acceleratingPd', CHARGE],
    formula: (v) => v(CHARGE) * v('acceleratingPd'),
    source: `${UP2}, ch. 7 (electric potential)`,
  },
  {
    id: 'gunSpeed',
    statement: 'qV = ½mv²',
    subject: 'speed',
    others: ['acceleratingPd', MASS, CHARGE],
    formula: (v) => Math.sqrt((2 * v(CHARGE) * v('acceleratingPd')) / v(MASS)),
    source: `${UP2}, ch. 7`,
  },
  {
    id: 'kineticEnergy',
    statement: 'E_k = ½mv²',
    subject: 'kineticEnergy',
    others: ['speed', MASS],
    formula: (v) => 0.5 * v(MASS) * v('speed') ** 2,
    source: `${UP1}, ch. 7`,
  },
  {
    id: 'uniformField',
    statement: 'E = V/d',
    subject: 'fieldStrength',
    others: ['platePd', 'plateSeparation'],
    formula: (v) => v('platePd') / v('plateSeparation'),
    source: `${UP2}, ch. 7`,
  },
  {
    id: 'gapField',
    statement: 'E = V/d',
    subject: 'fieldStrength',
    others: ['acceleratingPd', 'gap'],
    formula: (v) => v('acceleratingPd') / v('gap'),
    source: `${UP2}, ch. 7`,
  },
  {
    id: 'crossedFields',
    statement: 'v = E/B',
    subject: 'speed',
    others: ['fieldStrength', 'fluxDensity'],
    formula: (v) => v('fieldStrength') / v('fluxDensity'),
    source: `${UP2}, ch. 11 (velocity selector)`,
  },
  {
    id: 'circularPath',
    statement: 'r = mv/(Bq)',
    subject: 'orbitRadius',
    others: ['speed', 'fluxDensity', MASS, CHARGE],
    formula: (v) => (v(MASS) * v('speed')) / (v('fluxDensity') * v(CHARGE)),
    source: `${UP2}, ch. 11`,
  },
  {
    id: 'circularMomentum',
    statement: 'p = Bqr',
    subject: 'momentum',
    others: ['fluxDensity', 'orbitRadius', CHARGE],
    formula: (v) => v('fluxDensity') * v(CHARGE) * v('orbitRadius'),
    source: `${UP2}, ch. 11`,
  },
  {
    id: 'circularPeriod',
    statement: 'T = 2πm/(Bq)',
    subject: 'orbitPeriod',
    others: ['fluxDensity', MASS, CHARGE],
    formula: (v) => (2 * Math.PI * v(MASS)) / (v('fluxDensity') * v(CHARGE)),
    source: `${UP2}, ch. 11`,
  },
  {
    id: 'cyclotronFrequency',
    statement: 'f = Bq/(2πm)',
    subject: 'cyclotronFrequency',
    others: ['fluxDensity', MASS, CHARGE],
    formula: (v) => (v('fluxDensity') * v(CHARGE)) / (2 * Math.PI * v(MASS)),
    source: `${UP2}, ch. 11`,
  },
  {
    id: 'specificChargeRing',
    statement: 'q/m = 2V/(B²r²)',
    subject: 'specificCharge',
    others: ['acceleratingPd', 'fluxDensity', 'orbitRadius'],
    formula: (v) => (2 * v('acceleratingPd')) / (v('fluxDensity') * v('orbitRadius')) ** 2,
    source: COMMON,
  },
  {
    id: 'specificChargeSpeed',
    statement: 'q/m = v/(Br)',
    subject: 'specificCharge',
    others: ['speed', 'fluxDensity', 'orbitRadius'],
    formula: (v) => v('speed') / (v('fluxDensity') * v('orbitRadius')),
    source: COMMON,
  },
  {
    id: 'specificChargeSelector',
    statement: 'q/m = E²/(2VB²)',
    subject: 'specificCharge',
    others: ['fieldStrength', 'fluxDensity', 'acceleratingPd'],
    formula: (v) => (v('fieldStrength') / v('fluxDensity')) ** 2 / (2 * v('acceleratingPd')),
    source: COMMON,
  },
  {
    id: 'transitTime',
    statement: 't = L/v',
    subject: 'transitTime',
    others: ['plateLength', 'speed'],
    formula: (v) => v('plateLength') / v('speed'),
    source: `${UP1}, ch. 4`,
  },
  {
    id: 'plateAcceleration',
    statement: 'a = qV/(md)',
    subject: 'acceleration',
    others: ['platePd', 'plateSeparation', MASS, CHARGE],
    formula: (v) => (v(CHARGE) * v('platePd')) / (v(MASS) * v('plateSeparation')),
    source: `${UP2}, ch. 5`,
  },
  {
    id: 'fieldAcceleration',
    statement: 'a = qE/m',
    subject: 'acceleration',
    others: ['fieldStrength', MASS, CHARGE],
    formula: (v) => (v(CHARGE) * v('fieldStrength')) / v(MASS),
    source: `${UP2}, ch. 5`,
  },
  {
    id: 'plateDeflection',
    statement: 'y = ½at²',
    subject: 'deflection',
    others: ['acceleration', 'transitTime'],
    formula: (v) => 0.5 * v('acceleration') * v('transitTime') ** 2,
    source: `${UP1}, ch. 3`,
  },
  {
    id: 'deflectionFromPd',
    statement: 'y = VL²/(4V_a d)',
    subject: 'deflection',
    others: ['platePd', 'plateLength', 'acceleratingPd', 'plateSeparation'],
    formula: (v) => (v('platePd') * v('plateLength') ** 2) / (4 * v('acceleratingPd') * v('plateSeparation')),
    source: COMMON,
  },
  {
    id: 'speedAcross',
    statement: 'v = at',
    subject: 'exitSpeedAcross',
    others: ['acceleration', 'transitTime'],
    formula: (v) => v('acceleration') * v('transitTime'),
    source: `${UP1}, ch. 3`,
  },
  {
    id: 'sphereMass',
    statement: 'm = (4/3)πr³ρ',
    subject: 'dropMass',
    others: ['dropRadius', 'dropDensity'],
    formula: (v) => (4 / 3) * Math.PI * v('dropRadius') ** 3 * v('dropDensity'),
    source: 'geometry of the sphere',
  },
  {
    id: 'diameter',
    statement: 'd = 2r',
    subject: 'dropDiameter',
    others: ['dropRadius'],
    formula: (v) => 2 * v('dropRadius'),
    source: 'geometry of the sphere',
  },
  {
    id: 'weight',
    statement: 'W = mg',
    subject: 'weight',
    others: ['dropMass'],
    formula: (v) => v('dropMass') * g,
    source: `${UP1}, ch. 5`,
  },
  {
    id: 'stokesFall',
    statement: 'v = 2r²ρg/(9η)',
    subject: 'terminalSpeed',
    others: ['dropRadius', 'dropDensity', 'viscosity'],
    formula: (v) =>
      (2 * v('dropRadius') ** 2 * (v('dropDensity') - v('airDensity')) * g) / (9 * v('viscosity')),
    source: `${UP1}, ch. 6 and 14 (drag and terminal speed); with the density of air where it is bound`,
  },
  {
    id: 'stokesDrag',
    statement: 'F = 6πηrv',
    subject: 'drag',
    others: ['viscosity', 'dropRadius', 'terminalSpeed'],
    formula: (v) => 6 * Math.PI * v('viscosity') * v('dropRadius') * v('terminalSpeed'),
    source: `${UP1}, ch. 6`,
  },
  {
    id: 'hoveringMass',
    statement: 'q = mgd/V',
    subject: 'charge',
    others: ['dropMass', 'plateSeparation', 'balancePd'],
    formula: (v) => (v('dropMass') * g * v('plateSeparation')) / v('balancePd'),
    source: 'OpenStax, College Physics 2e, ch. 30',
  },
  {
    id: 'hoveringWeight',
    statement: 'q = Wd/V',
    subject: 'charge',
    others: ['weight', 'plateSeparation', 'balancePd'],
    formula: (v) => (v('weight') * v('plateSeparation')) / v('balancePd'),
    source: 'OpenStax, College Physics 2e, ch. 30',
  },
  {
    id: 'chargeNumber',
    statement: 'q = ne',
    subject: 'charge',
    others: ['chargeNumber'],
    formula: (v) => v('chargeNumber') * e,
    source: 'R. A. Millikan, Phys. Rev. 2, 109 (1913)',
  },
  {
    id: 'photonFrequency',
    statement: 'E = hf',
    subject: 'photonEnergy',
    others: ['frequency'],
    formula: (v) => h * v('frequency'),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'photonWavelength',
    statement: 'E = hc/λ',
    subject: 'photonEnergy',
    others: ['wavelength'],
    formula: (v) => (h * c) / v('wavelength'),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'waveSpeed',
    statement: 'c = fλ',
    subject: 'frequency',
    others: ['wavelength'],
    formula: (v) => c / v('wavelength'),
    source: `${UP3}, ch. 1`,
  },
  {
    id: 'photoelectric',
    statement: 'hf = φ + E_k',
    subject: 'greatestKineticEnergy',
    others: ['photonEnergy', 'workFunction'],
    formula: (v) => v('photonEnergy') - v('workFunction'),
    source: `${UP3}, ch. 6 (photoelectric effect)`,
  },
  {
    id: 'stoppingPd',
    statement: 'eV_s = E_k',
    subject: 'stoppingPd',
    others: ['greatestKineticEnergy'],
    formula: (v) => v('greatestKineticEnergy') / e,
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'stoppingPdPhoton',
    statement: 'eV_s = hf − φ',
    subject: 'stoppingPd',
    others: ['photonEnergy', 'workFunction'],
    formula: (v) => (v('photonEnergy') - v('workFunction')) / e,
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'threshold',
    statement: 'φ = hf₀',
    subject: 'thresholdFrequency',
    others: ['workFunction'],
    formula: (v) => v('workFunction') / h,
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'thresholdWavelength',
    statement: 'λ₀ = hc/φ',
    subject: 'thresholdWavelength',
    others: ['workFunction'],
    formula: (v) => (h * c) / v('workFunction'),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'photonRate',
    statement: 'N/t = P/E',
    subject: 'photonRate',
    others: ['power', 'photonEnergy'],
    formula: (v) => v('power') / v('photonEnergy'),
    source: 'OpenStax, College Physics 2e, ch. 29',
  },
  {
    id: 'photocurrent',
    statement: 'I = e N/t',
    subject: 'photocurrent',
    others: ['electronRate'],
    formula: (v) => e * v('electronRate'),
    source: `${UP2}, ch. 9`,
  },
  {
    id: 'xrayLimit',
    statement: 'hf = eV',
    subject: 'photonEnergy',
    others: ['tubePd'],
    formula: (v) => e * v('tubePd'),
    source: 'OpenStax, College Physics 2e, ch. 29',
  },
  {
    id: 'levels',
    statement: 'hf = E₂ − E₁',
    subject: 'photonEnergy',
    others: ['upperLevel', 'lowerLevel'],
    formula: (v) => v('upperLevel') - v('lowerLevel'),
    source: `${UP3}, ch. 6 (Bohr’s model)`,
  },
  {
    id: 'hydrogenLevel',
    statement: 'E = −hcR/n²',
    subject: 'upperLevel',
    others: ['levelNumber'],
    formula: (v) => (-h * c * rydberg) / v('levelNumber') ** 2,
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'matterMomentum',
    statement: 'λ = h/p',
    subject: 'deBroglieWavelength',
    others: ['momentum'],
    formula: (v) => h / v('momentum'),
    source: `${UP3}, ch. 6 (de Broglie)`,
  },
  {
    id: 'matterSpeed',
    statement: 'λ = h/(mv)',
    subject: 'deBroglieWavelength',
    others: ['speed', MASS],
    formula: (v) => h / (v(MASS) * v('speed')),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'matterEnergy',
    statement: 'λ = h/√(2mE_k)',
    subject: 'deBroglieWavelength',
    others: ['kineticEnergy', MASS],
    formula: (v) => h / Math.sqrt(2 * v(MASS) * v('kineticEnergy')),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'matterPd',
    statement: 'λ = h/√(2mqV)',
    subject: 'deBroglieWavelength',
    others: ['acceleratingPd', MASS, CHARGE],
    formula: (v) => h / Math.sqrt(2 * v(MASS) * v(CHARGE) * v('acceleratingPd')),
    source: `${UP3}, ch. 6`,
  },
  {
    id: 'momentum',
    statement: 'p = mv',
    subject: 'momentum',
    others: ['speed', MASS],
    formula: (v) => v(MASS) * v('speed'),
    source: `${UP1}, ch. 9`,
  },
  {
    id: 'grating',
    statement: 'd sin θ = nλ',
    subject: 'deBroglieWavelength',
    others: ['slitSeparation', 'diffractionAngle', 'diffractionOrder'],
    formula: (v) => (v('slitSeparation') * Math.sin(v('diffractionAngle'))) / v('diffractionOrder'),
    source: `${UP3}, ch. 4`,
  },
  {
    id: 'bragg',
    statement: '2d sin θ = nλ',
    subject: 'deBroglieWavelength',
    others: ['planeSpacing', 'glancingAngle', 'diffractionOrder'],
    formula: (v) => (2 * v('planeSpacing') * Math.sin(v('glancingAngle'))) / v('diffractionOrder'),
    source: `${UP3}, ch. 4`,
  },
  {
    id: 'ring',
    statement: 'D = 2Lλ/d',
    subject: 'ringDiameter',
    others: ['screenDistance', 'deBroglieWavelength', 'planeSpacing'],
    formula: (v) => (2 * v('screenDistance') * v('deBroglieWavelength')) / v('planeSpacing'),
    source: COMMON,
  },
  {
    id: 'ringHalf',
    statement: 'D = 2R',
    subject: 'ringDiameter',
    others: ['ringRadius'],
    formula: (v) => 2 * v('ringRadius'),
    source: 'geometry of the circle',
  },
];

/** Ratios that tell what was most likely done, by script value over law value. */
const KNOWN_FACTORS: readonly [factor: number, suggestion: string][] = [
  [2, 'A factor of two too many, or a half left out.'],
  [0.5, 'A half too many, or a factor of two left out.'],
  [4, 'A square of two, as when a diameter is taken for a radius.'],
  [0.25, 'A square of a half, as when a diameter is taken for a radius.'],
  [8, 'A cube of two, as when a diameter is taken for a radius.'],
  [0.125, 'A cube of a half, as when a diameter is taken for a radius.'],
  [Math.SQRT2, 'A root of two: a half left out under the root.'],
  [Math.SQRT1_2, 'A root of a half: a two left out under the root.'],
  [Math.PI, 'A factor of π.'],
  [2 * Math.PI, 'A factor of 2π, as between frequency and angular frequency.'],
  [1 / (2 * Math.PI), 'A factor of 2π, as between frequency and angular frequency.'],
  [1e3, 'A power of ten: a prefix.'],
  [1e-3, 'A power of ten: a prefix.'],
  [1e6, 'A power of ten: a prefix.'],
  [1e-6, 'A power of ten: a prefix.'],
  [1e9, 'A power of ten: a prefix.'],
  [1e-9, 'A power of ten: a prefix.'],
  [e, 'The elementary charge: joules and electronvolts mixed.'],
  [1 / e, 'The elementary charge: joules and electronvolts mixed.'],
];

/** What a factor by which a law is missed suggests; empty when it is none that is known. */
export function suggestForFactor(ratio: number): string {
  const known = KNOWN_FACTORS.find(([factor]) => Math.abs(ratio / factor - 1) < 0.01);
  return known?.[1] ?? '';
}
