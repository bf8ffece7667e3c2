import type { ItemContent } from '#shared/engine/index.ts';

/** An answer as it stands in the book: digits, unit and the figures that they carry. */
export interface PrintedAnswer {
  quantity: string;
  unit: string;
  printed: number;
  figures: number;
  /** Where the comparison is not with the printed digits as they stand, why. */
  remark?: string;
}

/** A worked example or exercise of an openly licensed textbook, as an item script. Facts and figures only. */
export interface WorkedExample {
  id: string;
  source: string;
  locator: string;
  script: string;
  /** What the names stand for: `name: role`, or `name: role of set`. */
  roles: Readonly<Record<string, string>>;
  answers: readonly PrintedAnswer[];
  assumptions?: ItemContent['assumptions'];
  claims?: ItemContent['claims'];
}

const COLLEGE = 'OpenStax, College Physics 2e (CC BY 4.0)';
const UNIVERSITY_1 = 'OpenStax, University Physics vol. 1 (CC BY 4.0)';
const UNIVERSITY_2 = 'OpenStax, University Physics vol. 2 (CC BY 4.0)';
const UNIVERSITY_3 = 'OpenStax, University Physics vol. 3 (CC BY 4.0)';

/** Examples that the engine must agree with, each at the figures in which its answer is printed. */
export const WORKED_EXAMPLES: readonly WorkedExample[] = [
  {
    id: 'gun-speed',
    source: UNIVERSITY_2,
    locator: 'module m58430, example fs-id1167584721031',
    script: `Va = 100 V
v = sqrt(2 * e * Va / m_e)`,
    roles: { Va: 'acceleratingPd', v: 'speed' },
    answers: [{ quantity: 'v', unit: 'm s^-1', printed: 5.93e6, figures: 3 }],
  },
  {
    id: 'gun-field',
    source: UNIVERSITY_2,
    locator: 'module m58430, example fs-id1167585171844',
    script: `W = 25.0 keV
d = 4.00 cm
Q = 0.500 µC
U = W / e
E = U / d
F = Q * E`,
    roles: {
      U: 'platePd',
      d: 'plateSeparation',
      E: 'fieldStrength',
      Q: 'particleCharge',
      F: 'force',
    },
    answers: [
      { quantity: 'E', unit: 'V m^-1', printed: 6.25e5, figures: 3 },
      { quantity: 'F', unit: 'N', printed: 0.313, figures: 3 },
    ],
  },
  {
    id: 'gun-energy-field',
    source: UNIVERSITY_2,
    locator: 'module m58430, exercise fs-id1167583524789',
    script: `E = 2.00e6 V/m
d = 0.400 m
K = e * E * d`,
    roles: { E: 'fieldStrength', d: 'gap', K: 'kineticEnergy' },
    answers: [{ quantity: 'K', unit: 'keV', printed: 800, figures: 3 }],
  },
  {
    id: 'selector-circle',
    source: UNIVERSITY_2,
    locator: 'module m58744, example fs-id1171358968547',
    script: `B = 2.0 mT
E = 6.0e3 N/C
v = E / B
a = e * v * B / m_e
r = m_e * v / (e * B)`,
    roles: {
      B: 'fluxDensity',
      E: 'fieldStrength',
      v: 'speed',
      a: 'acceleration',
      r: 'orbitRadius',
    },
    answers: [
      { quantity: 'v', unit: 'm s^-1', printed: 3e6, figures: 1 },
      { quantity: 'a', unit: 'm s^-2', printed: 1.1e15, figures: 2 },
      { quantity: 'r', unit: 'm', printed: 8.5e-3, figures: 2 },
    ],
  },
  {
    id: 'selector-specific-charge',
    source: UNIVERSITY_2,
    locator: 'module m58744, exercise fs-id1171360353816',
    script: `E = 1.0e4 N/C
B = 0.250 T
r = 3.33 mm
sc = E / (B^2 * r)`,
    roles: { E: 'fieldStrength', B: 'fluxDensity', r: 'orbitRadius', sc: 'specificCharge' },
    answers: [{ quantity: 'sc', unit: 'C kg^-1', printed: 4.8e7, figures: 2 }],
  },
  {
    id: 'circle-tv',
    source: COLLEGE,
    locator: 'module m42375, example fs-id2585919',
    script: `v = 6.00e7 m/s
B = 0.500 T
r = m_e * v / (e * B)`,
    roles: { v: 'speed', B: 'fluxDensity', r: 'orbitRadius' },
    assumptions: ['nonRelativistic'],
    answers: [{ quantity: 'r', unit: 'm', printed: 6.83e-4, figures: 3 }],
  },
  {
    id: 'cyclotron-alpha',
    source: UNIVERSITY_2,
    locator: 'module m58745, example fs-id1171361461865',
    script: `M = 6.64e-27 kg
q = 3.2e-19 C
R = 0.50 m
B = 1.8 T
top = 2 * pi * M
period = top / (q * B)
K = (q * B * R)^2 / (2 * M)`,
    roles: {
      M: 'particleMass',
      q: 'particleCharge',
      R: 'orbitRadius',
      B: 'fluxDensity',
      period: 'orbitPeriod',
      K: 'kineticEnergy',
    },
    answers: [
      {
        quantity: 'period',
        unit: 's',
        printed: 7.3e-8,
        figures: 2,
        remark: 'in full 7.24e-8 s: the printed answer is the route that rounds 2πm to 4.2e-26 kg first',
      },
      { quantity: 'K', unit: 'MeV', printed: 39, figures: 2 },
    ],
  },
  {
    id: 'spectrometer-uranium',
    source: UNIVERSITY_2,
    locator: 'module m58745, exercise fs-id1171361694828',
    script: `M1 = 3.90e-25 kg
M2 = 3.95e-25 kg
q = 3 * e
v = 3.0e5 m/s
B = 0.250 T
gap = 2 * v * (M2 - M1) / (q * B)`,
    roles: {},
    answers: [{ quantity: 'gap', unit: 'm', printed: 2.5e-2, figures: 3 }],
  },
  {
    id: 'oil-drop-mass',
    source: COLLEGE,
    locator: 'module m42618, exercise fs-id3188615',
    script: `U = 500 V
d = 2.50 cm
rho = 920 kg/m^3
n = 2
w = 9.80 m/s^2
q = n * e
M = q * U / (d * w)
diameter = 2 * cbrt(3 * M / (4 * pi * rho))`,
    roles: {
      U: 'balancePd',
      d: 'plateSeparation',
      rho: 'dropDensity',
      n: 'chargeNumber',
      q: 'charge',
      M: 'dropMass',
      diameter: 'dropDiameter',
    },
    answers: [
      { quantity: 'M', unit: 'kg', printed: 6.54e-16, figures: 3 },
      {
        quantity: 'diameter',
        unit: 'm',
        printed: 1.11e-6,
        figures: 3,
        remark: 'the book prints 5.54e-7, which is the radius; this is twice as much',
      },
    ],
  },
  {
    id: 'oil-drop-field',
    source: COLLEGE,
    locator: 'module m42329, exercise fs-id2963260; no answer is printed: recomputed with g = 9.80 m s⁻²',
    script: `a = 1.00 µm
rho = 920 kg/m^3
w = 9.80 m/s^2
W = 4 / 3 * pi * a^3 * rho * w
E = W / e`,
    roles: { a: 'dropRadius', rho: 'dropDensity', W: 'weight', E: 'fieldStrength' },
    answers: [
      { quantity: 'W', unit: 'N', printed: 3.78e-14, figures: 3 },
      { quantity: 'E', unit: 'V m^-1', printed: 2.36e5, figures: 3 },
    ],
  },
  {
    id: 'stokes-viscosity',
    source: UNIVERSITY_1,
    locator: 'module m58306, exercise fs-id1165039396162',
    script: `rho = 7.8e3 kg/m^3
D = 3.0 mm
t = 12 s
x = 0.60 m
w = 9.80 m/s^2
a = D / 2
v = x / t
eta = 2 * a^2 * w * rho / (9 * v)`,
    roles: {
      rho: 'dropDensity',
      D: 'dropDiameter',
      a: 'dropRadius',
      v: 'terminalSpeed',
      eta: 'viscosity',
    },
    answers: [{ quantity: 'eta', unit: 'Pa s', printed: 0.76, figures: 2 }],
  },
  {
    id: 'stopping-pd',
    source: UNIVERSITY_3,
    locator: 'module m58762, exercise fs-id1163713060284',
    script: `lambda = 589 nm
phi = 1.20 eV
Vs = (h * c / lambda - phi) / e
lambda_c = h * c / phi`,
    roles: {
      lambda: 'wavelength',
      phi: 'workFunction',
      Vs: 'stoppingPd',
      lambda_c: 'thresholdWavelength',
    },
    answers: [
      { quantity: 'Vs', unit: 'V', printed: 0.91, figures: 2 },
      {
        quantity: 'lambda_c',
        unit: 'nm',
        printed: 1033,
        figures: 4,
        remark: 'the book prints 1040 nm; hc/φ gives 1033 nm',
      },
    ],
  },
  {
    id: 'work-function',
    source: UNIVERSITY_3,
    locator: 'module m58762, example fs-id1163713489169',
    script: `lambda = 180 nm
Vs = 0.80 V
phi = h * c / lambda - e * Vs
fc = phi / h`,
    roles: {
      lambda: 'wavelength',
      Vs: 'stoppingPd',
      phi: 'workFunction',
      fc: 'thresholdFrequency',
    },
    answers: [
      { quantity: 'phi', unit: 'eV', printed: 6.09, figures: 3 },
      { quantity: 'fc', unit: 'Hz', printed: 1.47e15, figures: 3 },
    ],
  },
  {
    id: 'silver-threshold',
    source: UNIVERSITY_3,
    locator: 'module m58762, example fs-id1163713132219',
    script: `phi = 4.73 eV
lambda_c = h * c / phi`,
    roles: { phi: 'workFunction', lambda_c: 'thresholdWavelength' },
    answers: [{ quantity: 'lambda_c', unit: 'nm', printed: 262, figures: 3 }],
  },
  {
    id: 'planck-from-stopping',
    source: UNIVERSITY_3,
    locator: 'module m58762, exercise fs-id1163713280602',
    script: `fc = 8.0e13 Hz
f = 1.2e14 Hz
Vs = 0.16 V
h_found = e * Vs / (f - fc)`,
    roles: {},
    answers: [{ quantity: 'h_found', unit: 'J s', printed: 6.4e-34, figures: 2 }],
  },
  {
    id: 'photon-rate',
    source: COLLEGE,
    locator: 'module m42563, example fs-id1248719',
    script: `P = 10.0 W
lambda = 580 nm
rate = P * lambda / (h * c)`,
    roles: { P: 'power', lambda: 'wavelength', rate: 'photonRate' },
    answers: [{ quantity: 'rate', unit: 's^-1', printed: 2.92e19, figures: 3 }],
  },
  {
    id: 'xray-limit',
    source: COLLEGE,
    locator: 'module m42563, example fs-id1558291',
    script: `U = 50.0 kV
E = e * U`,
    roles: { U: 'tubePd', E: 'photonEnergy' },
    answers: [{ quantity: 'E', unit: 'keV', printed: 50.0, figures: 3 }],
  },
  {
    id: 'debroglie-1eV',
    source: UNIVERSITY_3,
    locator: 'module m58765, example fs-id1163712438153',
    script: `K = 1.0 eV
lambda = h / sqrt(2 * m_e * K)`,
    roles: { K: 'kineticEnergy', lambda: 'deBroglieWavelength' },
    answers: [{ quantity: 'lambda', unit: 'nm', printed: 1.23, figures: 3 }],
  },
  {
    id: 'davisson',
    source: COLLEGE,
    locator: 'module m42576, example fs-id2621262',
    script: `lambda = 0.167 nm
v = h / (m_e * lambda)
K = m_e * v^2 / 2`,
    roles: { lambda: 'deBroglieWavelength', v: 'speed', K: 'kineticEnergy' },
    answers: [
      { quantity: 'v', unit: 'm s^-1', printed: 4.36e6, figures: 3 },
      {
        quantity: 'K',
        unit: 'eV',
        printed: 54.0,
        figures: 3,
        remark: 'in full 53.9 eV: the printed answer is the route that rounds the speed first',
      },
    ],
  },
  {
    id: 'two-slit',
    source: UNIVERSITY_3,
    locator: 'module m58766, example fs-id1163712332895',
    script: `U = 600 V
d = 272 nm
order = 1
lambda = h / sqrt(2 * m_e * e * U)
angle = asin(order * lambda / d)`,
    roles: {
      U: 'acceleratingPd',
      d: 'slitSeparation',
      order: 'diffractionOrder',
      lambda: 'deBroglieWavelength',
      angle: 'diffractionAngle',
    },
    answers: [
      { quantity: 'lambda', unit: 'nm', printed: 0.05, figures: 2 },
      {
        quantity: 'angle',
        unit: '°',
        printed: 0.01,
        figures: 1,
        remark: 'the book prints 0.010°, where 0.05/272 gives 0.0105°: compared to one figure',
      },
    ],
  },
  {
    id: 'hydrogen-ionise',
    source: UNIVERSITY_3,
    locator: 'module m58764, example fs-id1163713245820',
    script: `lambda = 93.7 nm
R_H = 1.097e7 m^-1
n = round(1 / sqrt(1 - 1 / (R_H * lambda)))
En = -13.6 eV / n^2`,
    roles: { n: 'levelNumber', En: 'upperLevel' },
    answers: [
      { quantity: 'n', unit: '', printed: 6, figures: 1 },
      { quantity: 'En', unit: 'eV', printed: -0.378, figures: 3 },
    ],
  },
];

/** Exercises of the same book on results that cannot be: the assay must stop them. */
export const IMPOSSIBLE_EXAMPLES: readonly (WorkedExample & { stoppedBy: string })[] = [
  {
    id: 'unphysical-speed',
    source: COLLEGE,
    locator: 'module m42576, exercise fs-id2684892, on unreasonable results',
    script: `lambda = 0.100 fm
v = h / (m_e * lambda)`,
    roles: { lambda: 'deBroglieWavelength', v: 'speed' },
    answers: [{ quantity: 'v', unit: 'm s^-1', printed: 7.28e12, figures: 3 }],
    stoppedBy: 'faster-than-light',
  },
  {
    id: 'unphysical-energy',
    source: COLLEGE,
    locator: 'module m42558, exercise fs-id1555510, on unreasonable results',
    script: `lambda = 700 nm
phi = 3.68 eV
K = h * c / lambda - phi`,
    roles: { lambda: 'wavelength', phi: 'workFunction', K: 'greatestKineticEnergy' },
    answers: [
      {
        quantity: 'K',
        unit: 'eV',
        printed: -1.9,
        figures: 2,
        remark: 'printed −1.90 eV; hc/λ − φ gives −1.909 eV',
      },
    ],
    stoppedBy: 'no-emission',
  },
];
