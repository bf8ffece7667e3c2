/** A script without mistakes, and values that it must give on a draw (coherent SI), each with where they come from. */
export interface SoundScript {
  name: string;
  script: string;
  gridSize: number;
  open?: boolean;
  /** Values at draw 1 to the figures given; `source` says where the number stands. */
  values: readonly { name: string; printed: number; figures: number; source: string }[];
}

const UNIVERSITY_PHYSICS = 'OpenStax, University Physics vol. 2 (CC BY 4.0)';
const COLLEGE_PHYSICS = 'OpenStax, College Physics 2e (CC BY 4.0)';

export const SOUND_SCRIPTS: readonly SoundScript[] = [
  {
    name: 'speed of electrons from a gun',
    script: `Va = oneOf(100 V, 150 V, 200 V)
e0 = 1.60e-19 C
m0 = 9.11e-31 kg
v = sqrt(2 * e0 * Va / m0)`,
    gridSize: 3,
    values: [
      { name: 'v', printed: 5.93e6, figures: 3, source: `${UNIVERSITY_PHYSICS}, example fs-id1167584721031` },
    ],
  },
  {
    name: 'field and force between plates',
    script: `W = 25.0 keV
d = 4.00 cm
q = 0.500 µC
U = W / e
E = U / d
F = q * E`,
    gridSize: 1,
    values: [
      { name: 'E', printed: 6.25e5, figures: 3, source: `${UNIVERSITY_PHYSICS}, example fs-id1167585171844` },
      { name: 'F', printed: 0.313, figures: 3, source: `${UNIVERSITY_PHYSICS}, example fs-id1167585171844` },
    ],
  },
  {
    name: 'energy gained in a uniform field',
    script: `E = 2.00e6 V/m
d = 0.400 m
K = given(e * E * d, 3, keV)`,
    gridSize: 1,
    values: [
      {
        name: 'K',
        printed: 800e3 * 1.602176634e-19,
        figures: 3,
        source: `${UNIVERSITY_PHYSICS}, exercise fs-id1167583524789: 800 keV`,
      },
    ],
  },
  {
    name: 'velocity selector, then a circle',
    script: `B0 = 2.0 mT
E = 6.0e3 N/C
q = 1.6e-19 C
me = 9.1e-31 kg
v = E / B0
a = q * v * B0 / me
r = me * v / (q * B0)`,
    gridSize: 1,
    values: [
      { name: 'v', printed: 3e6, figures: 1, source: `${UNIVERSITY_PHYSICS}, example fs-id1171358968547` },
      { name: 'a', printed: 1.1e15, figures: 2, source: `${UNIVERSITY_PHYSICS}, example fs-id1171358968547` },
      { name: 'r', printed: 8.5e-3, figures: 2, source: `${UNIVERSITY_PHYSICS}, example fs-id1171358968547` },
    ],
  },
  {
    name: 'specific charge from a selector',
    script: `E = 1.0e4 N/C
B = 0.250 T
r = 3.33 mm
sc = E / (B^2 * r)`,
    gridSize: 1,
    values: [
      {
        name: 'sc',
        printed: 4.8e7,
        figures: 2,
        source: `${UNIVERSITY_PHYSICS}, exercise fs-id1171360353816`,
      },
    ],
  },
  {
    name: 'period and energy in a cyclotron',
    script: `ma = 6.64e-27 kg
q = 3.2e-19 C
R = 0.50 m
B = 1.8 T
period = 2 * pi * ma / (q * B)
K = (q * B * R)² / (2 * ma)`,
    gridSize: 1,
    values: [
      {
        name: 'K',
        printed: 39e6 * 1.602176634e-19,
        figures: 2,
        source: `${UNIVERSITY_PHYSICS}, example fs-id1171361461865: 39 MeV`,
      },
    ],
  },
  {
    name: 'mass of a hovering drop',
    script: `U = 500 V
d = 2.50 cm
rho = 920 kg/m^3
n = 2
w = 9.80 m/s^2
mass = n * e * U / (d * w)
diameter = 2 * cbrt(3 * mass / (4 * pi * rho))`,
    gridSize: 1,
    values: [
      { name: 'mass', printed: 6.54e-16, figures: 3, source: `${COLLEGE_PHYSICS}, exercise fs-id3188615` },
      {
        name: 'diameter',
        printed: 1.11e-6,
        figures: 3,
        source: `${COLLEGE_PHYSICS}, exercise fs-id3188615 (twice the printed radius)`,
      },
    ],
  },
  {
    name: 'fine-beam tube',
    script: `// fine-beam tube, electrons from rest
Va = draw(150 V, 300 V, 10 V)
B  = draw(0.70 mT, 1.30 mT, 0.05 mT)
r  = given(sqrt(2 * Va * m_e / e) / B, 3)    // read off the scale, printed to 3 s.f.
require(r < 8.0 cm)
sc = 2 * Va / (B^2 * r^2)                     // the answer to (b)`,
    gridSize: 208,
    values: [
      // CODATA 2022 (NIST): electron charge to mass quotient 1.75882000838e11 C kg^-1; two figures survive the rounding of r.
      { name: 'sc', printed: 1.8e11, figures: 2, source: 'CODATA 2022 (NIST)' },
    ],
  },
  {
    name: 'every operator and function',
    script: `a = draw(1, 9, 0.5)
n = whole(-3, 3)
particle = oneOf(m_e, m_p, m_n)
x = sqrt(a) + cbrt(a) - exp(-a) * ln(a + 1) / log10(a + 10)
angle = 30° + 0.1 rad
y = sin(angle) + cos(angle) - tan(angle) + asin(0.5) + acos(0.5) + atan(a)
z = min(a, 3, n) + max(a, 2) + abs(n) + floor(a) + ceil(a) + round(a)
p = a^2 + a^3 + a^-1 + a^-2 + a^0.5 + a^(3/2) + a^4 + 2^n
w = n > 0 and a < 5 or not (a == 5) ? a : -a
chain = 0 < a <= 8 != 1 ? 1 : 0
energy = given(particle * c^2, 4, MeV)
require(1 <= a < 9 and n != 2)`,
    gridSize: 17 * 7 * 3,
    values: [
      // CODATA 2022 (NIST): electron mass energy equivalent 0.51099895069 MeV.
      {
        name: 'energy',
        printed: 0.511 * 1.602176634e-13,
        figures: 4,
        source: 'CODATA 2022 (NIST): 0.51099895069 MeV',
      },
    ],
  },
  {
    name: 'series and a line',
    script: `phi = draw(1.8 eV, 2.4 eV, 0.1 eV)
f = spread(6.0e14 Hz, 1.1e15 Hz, 6)
Vs = given((h * f - phi) / e, 3)
gradient = slope(f, Vs)
h_found = gradient * e
phi_found = -intercept(f, Vs) * e
third = Vs[3]
top = greatest(Vs) - least(Vs)
total = sum(Vs) + mean(Vs)
list = [1 V, 2 V, Vs[1]] * 2
require(Vs > 0 V)`,
    gridSize: 7,
    values: [
      // CODATA 2022 (NIST): h = 6.62607015e-34 J s; two figures survive the rounding of the readings.
      { name: 'h_found', printed: 6.6e-34, figures: 2, source: 'CODATA 2022 (NIST)' },
    ],
  },
  {
    name: 'readings with scatter',
    script: `U = spread(100 V, 500 V, 5)
error = scatter(2 V, 5)
read = given(U + error, 3)
one = scatter(0.1 mm)
L = given(5.00 cm + one, 3)`,
    gridSize: 1,
    open: true,
    values: [],
  },
  {
    name: 'charges of drops and their quantum',
    script: `q0 = given(e, 3)
n = [2, 3, 5, 4, 7, 6]
q = given(n * q0, 3)
quantum_found = quantum(q)`,
    gridSize: 1,
    values: [
      // SI Brochure, 9th edition (2019): e = 1.602176634e-19 C.
      { name: 'quantum_found', printed: 1.6e-19, figures: 3, source: 'SI Brochure, 9th edition (2019)' },
    ],
  },
];
