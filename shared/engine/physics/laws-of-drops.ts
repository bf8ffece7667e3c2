import {
  ALWAYS,
  COLLEGE,
  DERIVED,
  e,
  g,
  law,
  STEADY_FALL,
  UNIVERSITY_1,
  type LawRow,
  type Refinement,
  type RoleValues,
} from './law-row.ts';
import { slipCorrection } from './models.ts';

const GEOMETRY = 'geometry of the sphere';
const HELD = 'a drop that hangs at rest between level plates';
const volume = (v: RoleValues) => (4 / 3) * Math.PI * v('dropRadius') ** 3;
const drag = (v: RoleValues) => 6 * Math.PI * v('viscosity') * v('dropRadius') * v('terminalSpeed');
const fall = (v: RoleValues, density: number) =>
  (2 * v('dropRadius') ** 2 * density * g) / (9 * v('viscosity'));
const lighter = (v: RoleValues) => v('dropDensity') - v('airDensity');

/** With the upthrust of the fluid where its density is among the quantities; NaN, so never met, where it is not. */
function buoyant(formula: (value: RoleValues) => number): Refinement {
  return { words: 'with the upthrust of the fluid', formula };
}

/** Spheres that fall through a fluid, and charged drops between plates. */
export const LAWS_OF_DROPS: readonly LawRow[] = [
  law(
    'sphereMass',
    'm = (4/3)πr³ρ',
    'dropMass',
    ['dropRadius', 'dropDensity'],
    (v) => volume(v) * v('dropDensity'),
    'a spherical drop',
    GEOMETRY,
  ),
  law(
    'diameter',
    'd = 2r',
    'dropDiameter',
    ['dropRadius'],
    (v) => 2 * v('dropRadius'),
    'a spherical drop',
    GEOMETRY,
  ),
  law(
    'massOfDiameter',
    'm = (π/6)d³ρ',
    'dropMass',
    ['dropDiameter', 'dropDensity'],
    (v) => (Math.PI / 6) * v('dropDiameter') ** 3 * v('dropDensity'),
    'a spherical drop',
    GEOMETRY,
  ),
  law(
    'weight',
    'W = mg',
    'weight',
    ['dropMass'],
    (v) => v('dropMass') * g,
    'near the Earth’s surface',
    `${UNIVERSITY_1}, ch. 5`,
  ),
  law(
    'sphereWeight',
    'W = (4/3)πr³ρg',
    'weight',
    ['dropRadius', 'dropDensity'],
    (v) => volume(v) * v('dropDensity') * g,
    'a spherical drop',
    DERIVED,
    [buoyant((v) => volume(v) * lighter(v) * g)],
  ),
  law(
    'stokesFall',
    'v = 2r²ρg/(9η)',
    'terminalSpeed',
    ['dropRadius', 'dropDensity', 'viscosity'],
    (v) => fall(v, v('dropDensity')),
    STEADY_FALL,
    `${UNIVERSITY_1}, ch. 6 and 14`,
    [
      buoyant((v) => fall(v, lighter(v))),
      {
        words: 'with the slip correction',
        formula: (v) => fall(v, v('dropDensity')) * slipCorrection(v('dropRadius')),
      },
      {
        words: 'with upthrust and slip correction',
        formula: (v) => fall(v, lighter(v)) * slipCorrection(v('dropRadius')),
      },
    ],
  ),
  law(
    'stokesDrag',
    'F = 6πηrv',
    'drag',
    ['viscosity', 'dropRadius', 'terminalSpeed'],
    drag,
    'a sphere at a Reynolds number well below one',
    `${UNIVERSITY_1}, ch. 6`,
    [{ words: 'with the slip correction', formula: (v) => drag(v) / slipCorrection(v('dropRadius')) }],
  ),
  law(
    'steadyFall',
    'F = W',
    'drag',
    ['weight'],
    (v) => v('weight'),
    'a drop that falls steadily',
    `${UNIVERSITY_1}, ch. 6`,
    [buoyant((v) => v('weight') * (1 - v('airDensity') / v('dropDensity')))],
  ),
  law(
    'hoveringMass',
    'q = mgd/V',
    'charge',
    ['dropMass', 'plateSeparation', 'balancePd'],
    (v) => (v('dropMass') * g * v('plateSeparation')) / v('balancePd'),
    HELD,
    `${COLLEGE}, ch. 30`,
    [
      buoyant(
        (v) =>
          (v('dropMass') * g * (1 - v('airDensity') / v('dropDensity')) * v('plateSeparation')) /
          v('balancePd'),
      ),
    ],
  ),
  law(
    'hoveringWeight',
    'q = Wd/V',
    'charge',
    ['weight', 'plateSeparation', 'balancePd'],
    (v) => (v('weight') * v('plateSeparation')) / v('balancePd'),
    HELD,
    `${COLLEGE}, ch. 30`,
  ),
  law(
    'hoveringRadius',
    'q = (4/3)πr³ρgd/V',
    'charge',
    ['dropRadius', 'dropDensity', 'plateSeparation', 'balancePd'],
    (v) => (volume(v) * v('dropDensity') * g * v('plateSeparation')) / v('balancePd'),
    HELD,
    DERIVED,
    [buoyant((v) => (volume(v) * lighter(v) * g * v('plateSeparation')) / v('balancePd'))],
  ),
  law(
    'hoveringField',
    'q = W/E',
    'charge',
    ['weight', 'fieldStrength'],
    (v) => v('weight') / v('fieldStrength'),
    HELD,
    `${COLLEGE}, ch. 18`,
  ),
  law(
    'chargeNumber',
    'q = ne',
    'charge',
    ['chargeNumber'],
    (v) => v('chargeNumber') * e,
    ALWAYS,
    'R. A. Millikan, Phys. Rev. 2, 109 (1913)',
  ),
];
