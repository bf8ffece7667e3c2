import type { DemoItem } from './demo-item.ts';

const crossedFigure = {
  file: 'crossed-fields.svg',
  alternativeText:
    'Two horizontal plates, the upper one positive. Crosses between them show a magnetic field into the page. A dashed line shows a beam that passes straight through.',
};

export const crossedFieldItems: DemoItem[] = [
  {
    topic: 'CF',
    life: 'approved',
    figures: [crossedFigure],
    content: {
      title: 'Straight through two fields',
      stem: 'A beam of electrons passes undeflected between two parallel plates that are {{d}} apart with a p.d. of {{Vp}} between them. A magnetic field of flux density {{B}} fills the space between the plates, at right angles to the beam and to the electric field. Take both fields to be uniform.',
      script: `Vp = draw(600 V, 1500 V, 20 V)
d = draw(30 mm, 60 mm, 2 mm)
B = draw(1.20 mT, 2.40 mT, 0.05 mT)
E = Vp / d
v = E / B
require(v > 5.0e6 m/s)
require(v < 2.5e7 m/s)
Bdouble = 2 * B`,
      quantities: [
        { name: 'Vp', symbol: 'V', unit: 'V', role: 'platePd' },
        { name: 'd', symbol: 'd', unit: 'mm', role: 'plateSeparation' },
        { name: 'B', symbol: 'B', unit: 'mT', role: 'fluxDensity' },
        { name: 'E', symbol: 'E', unit: 'V m^-1', figures: 3, role: 'fieldStrength' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
        { name: 'Bdouble', symbol: 'B_2', unit: 'mT', figures: 3 },
      ],
      assumptions: ['uniformField', 'nonRelativistic'],
      parts: [
        {
          id: 'field',
          kind: 'numeric',
          text: 'Calculate the electric field strength between the plates.',
          marks: 2,
          scheme: [
            { text: '$E = V/d$ used with the separation in metres', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'E', unit: 'V m^-1', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'speed',
          kind: 'numeric',
          text: 'Calculate the speed of the electrons.',
          marks: 2,
          scheme: [
            { text: '$eE = Bev$ or $v = E/B$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'v',
            unit: 'm s^-1',
            figures: 3,
            band: { kind: 'percent', percent: 2 },
            slips: [
              {
                id: 'separation',
                name: 'half the separation taken for the field strength',
                expression: '2 * Vp / (d * B)',
                guidance: 'One mark for balancing the two forces.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'change',
          kind: 'written',
          text: 'The magnetic field is now doubled and nothing else is changed. State and explain what happens to the path of the electrons between the plates.',
          marks: 3,
          answerLines: 4,
          scheme: [
            { text: 'The magnetic force is now greater than the electric force', marks: 1 },
            { text: 'so there is a resultant force at right angles to the motion', marks: 1 },
            { text: 'and the beam curves in the direction of the magnetic force', marks: 1 },
          ],
        },
      ],
    },
  },
  {
    topic: 'CF',
    life: 'waiting',
    remark: 'Values chosen so that the speed stays below a tenth of the speed of light.',
    content: {
      title: 'Specific charge from a balanced beam',
      stem: 'Electrons are accelerated from rest through a p.d. of {{Va}}. The beam then passes undeflected through crossed fields: an electric field of strength {{E}} and a magnetic field of flux density {{B}}.',
      script: `Va = draw(500 V, 1200 V, 50 V)
E = draw(18.0 kV/m, 36.0 kV/m, 0.5 kV/m)
B = given(E / sqrt(2 * Va * e / m_e), 3)
v = E / B
sc = v^2 / (2 * Va)`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'V', role: 'acceleratingPd' },
        { name: 'E', symbol: 'E', unit: 'kV m^-1', role: 'fieldStrength' },
        { name: 'B', symbol: 'B', unit: 'mT', figures: 3, role: 'fluxDensity' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
        { name: 'sc', symbol: 'e/m', unit: 'C kg^-1', figures: 3, role: 'specificCharge' },
      ],
      assumptions: ['uniformField', 'fromRest', 'nonRelativistic'],
      parts: [
        {
          id: 'speed',
          kind: 'numeric',
          text: 'Calculate the speed of the electrons.',
          marks: 2,
          scheme: [
            { text: '$v = E/B$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'v', unit: 'm s^-1', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'charge',
          kind: 'numeric',
          text: 'Use your answer to calculate the specific charge of the electron.',
          marks: 3,
          scheme: [
            { text: '$eV_a = \\frac{1}{2} m v^2$ used', marks: 1 },
            { text: 'Rearranged to $e/m = v^2/(2V_a)$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'sc',
            unit: 'C kg^-1',
            figures: 3,
            band: { kind: 'percent', percent: 3 },
            slips: [
              {
                id: 'half',
                name: 'half left out of the kinetic energy',
                expression: 'v^2 / Va',
                guidance: 'One mark for the energy relation.',
                marks: 1,
              },
            ],
          },
        },
      ],
    },
  },
];
