import type { DemoItem } from './demo-item.ts';

const chamberFigure = {
  file: 'drop-chamber.svg',
  alternativeText:
    'Two horizontal plates, the upper one positive with a small hole. A charged drop hangs midway between them with equal arrows up and down. A microscope looks in from the right.',
};

export const oilDropItems: DemoItem[] = [
  {
    topic: 'OD',
    life: 'approved',
    figures: [chamberFigure],
    content: {
      title: 'A drop held still',
      stem: 'A negatively charged drop of oil hangs at rest between two horizontal plates that are {{d}} apart. The p.d. between the plates is then {{Vb}}. The drop is a sphere of radius {{a}}, and the density of the oil is {{rho}}. The upthrust of the air can be left out.',
      script: `// drop in balance between horizontal plates
n = whole(2, 6)
a = draw(0.70 um, 1.00 um, 0.02 um)
rho = draw(860 kg/m^3, 920 kg/m^3, 10 kg/m^3)
d = draw(5.0 mm, 8.0 mm, 0.5 mm)
M = 4 / 3 * pi * a^3 * rho
Vb = given(M * g * d / (n * e), 3)
require(Vb > 100 V)
require(Vb < 700 V)
q = M * g * d / Vb
N = round(q / e)`,
      quantities: [
        { name: 'a', symbol: 'a', unit: 'µm', role: 'dropRadius' },
        { name: 'rho', symbol: '\\rho', unit: 'kg m^-3', role: 'dropDensity' },
        { name: 'd', symbol: 'd', unit: 'mm', role: 'plateSeparation' },
        { name: 'Vb', symbol: 'V', unit: 'V', figures: 3, role: 'balancePd' },
        { name: 'M', symbol: 'm', unit: 'kg', figures: 3, role: 'dropMass' },
        { name: 'q', symbol: 'q', unit: 'C', figures: 3, role: 'charge' },
        { name: 'N', symbol: 'n', unit: '', figures: 1, role: 'chargeNumber' },
      ],
      assumptions: ['uniformField', 'noUpthrust'],
      parts: [
        {
          id: 'mass',
          kind: 'showThat',
          text: 'Show that the mass of the drop is about {{M, 2 sf}}.',
          marks: 2,
          statedFigures: 2,
          scheme: [
            { text: '$m = \\frac{4}{3} \\pi a^3 \\rho$ used', marks: 1 },
            { text: 'Value to at least three figures', marks: 1 },
          ],
          answer: { quantity: 'M', unit: 'kg', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'charge',
          kind: 'numeric',
          text: 'Calculate the charge on the drop.',
          marks: 3,
          scheme: [
            { text: 'Electric force equals weight', marks: 1 },
            { text: '$q = mgd/V$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'q',
            unit: 'C',
            figures: 3,
            band: { kind: 'percent', percent: 6 },
            slips: [
              {
                id: 'noWeight',
                name: 'distance to the middle taken for the separation',
                expression: 'M * g * d / (2 * Vb)',
                guidance: 'Two marks for the balance of forces and the substitution.',
                marks: 2,
              },
            ],
          },
        },
        {
          id: 'number',
          kind: 'numeric',
          text: 'How many electrons has the drop gained?',
          marks: 2,
          scheme: [
            { text: 'Charge divided by $e$', marks: 1 },
            { text: 'Whole number', marks: 1 },
          ],
          answer: {
            quantity: 'N',
            unit: '',
            figures: 1,
            band: { kind: 'absolute', plusMinus: 0, unit: '' },
          },
        },
      ],
    },
  },
  {
    topic: 'OD',
    life: 'returned',
    remark:
      'At this size the drop slips between the molecules of the air, and Stokes’ law is several per cent out. The item says that the stem states this simplification, but the stem does not. Add a sentence there, or take larger drops.',
    content: {
      title: 'A drop falling through air',
      stem: 'With the field switched off, a drop of oil of density {{rho}} falls through air at a steady {{v}}. The viscosity of the air is {{eta}}. The upthrust of the air can be left out.',
      script: `v = draw(0.060 mm/s, 0.140 mm/s, 0.002 mm/s)
rho = draw(860 kg/m^3, 920 kg/m^3, 10 kg/m^3)
eta = given(1.82e-5 Pa s, 3)
a = sqrt(9 * eta * v / (2 * rho * g))
W = 4 / 3 * pi * a^3 * rho * g`,
      quantities: [
        { name: 'v', symbol: 'v', unit: 'mm s^-1', role: 'terminalSpeed' },
        { name: 'rho', symbol: '\\rho', unit: 'kg m^-3', role: 'dropDensity' },
        { name: 'eta', symbol: '\\eta', unit: 'Pa s', figures: 3, role: 'viscosity' },
        { name: 'a', symbol: 'a', unit: 'µm', figures: 3, role: 'dropRadius' },
        { name: 'W', symbol: 'W', unit: 'N', figures: 3 },
      ],
      assumptions: ['noUpthrust', 'noSlipCorrection'],
      parts: [
        {
          id: 'radius',
          kind: 'numeric',
          text: 'Calculate the radius of the drop.',
          marks: 3,
          scheme: [
            { text: 'Weight equals drag: $\\frac{4}{3}\\pi a^3 \\rho g = 6\\pi\\eta a v$', marks: 1 },
            { text: 'Rearranged for the radius', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'a', unit: 'µm', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'weight',
          kind: 'numeric',
          text: 'Calculate the weight of the drop.',
          marks: 2,
          scheme: [
            { text: '$W = 6\\pi\\eta a v$ or mass times $g$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'W', unit: 'N', figures: 3, band: { kind: 'percent', percent: 2.5 } },
        },
      ],
    },
  },
];
