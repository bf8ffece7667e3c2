import type { DemoItem } from './demo-item.ts';

export const circularPathItems: DemoItem[] = [
  {
    topic: 'CP',
    life: 'approved',
    figures: [
      {
        file: 'coils-and-tube.svg',
        alternativeText:
          'A spherical tube between two vertical coils. A gun below sends electrons up into the tube, where a dashed circle of radius r shows the glowing ring.',
      },
    ],
    content: {
      title: 'A glowing ring',
      stem: 'Electrons accelerated from rest through {{Va}} enter a tube of gas at low pressure, where a uniform magnetic field of flux density {{B}} bends them into a ring. The radius of the ring, read off a scale, is {{r}}.',
      script: `// ring in a gas-filled tube, electrons from rest
Va = draw(160 V, 300 V, 10 V)
B = draw(0.70 mT, 1.30 mT, 0.05 mT)
r = given(sqrt(2 * Va * m_e / e) / B, 3)
require(r < 8.0 cm)
require(r > 3.0 cm)
sc = 2 * Va / (B^2 * r^2)
v = 2 * Va / (B * r)`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'V', role: 'acceleratingPd' },
        { name: 'B', symbol: 'B', unit: 'mT', role: 'fluxDensity' },
        { name: 'r', symbol: 'r', unit: 'cm', figures: 3, role: 'orbitRadius' },
        { name: 'sc', symbol: 'e/m', unit: 'C kg^-1', figures: 3, role: 'specificCharge' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
      ],
      assumptions: ['uniformField', 'fromRest'],
      acceptedCautions: {
        'answer-on-data-sheet:charge:e/m_e':
          'The item asks for a constant, so the answers stay together; the givens and the working differ on every draw.',
      },
      parts: [
        {
          id: 'circle',
          kind: 'written',
          text: 'Explain why the path of the electrons is a circle.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'The magnetic force is always at right angles to the velocity', marks: 1 },
            { text: 'so the speed stays the same and the force acts as a centripetal force', marks: 1 },
          ],
        },
        {
          id: 'derive',
          kind: 'written',
          text: 'Show that the specific charge of the electron is given by\n\n$$\n\\frac{e}{m} = \\frac{2V_a}{B^2 r^2}\n$$',
          marks: 3,
          answerLines: 5,
          scheme: [
            { text: '$eV_a = \\frac{1}{2} m v^2$', marks: 1 },
            { text: '$Bev = \\frac{m v^2}{r}$', marks: 1 },
            { text: 'The speed eliminated between the two', marks: 1 },
          ],
        },
        {
          id: 'charge',
          kind: 'numeric',
          text: 'Calculate the specific charge that these readings give.',
          marks: 2,
          scheme: [
            { text: 'Flux density in tesla and radius in metres substituted', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'sc',
            unit: 'C kg^-1',
            figures: 3,
            band: { kind: 'percent', percent: 2 },
            slips: [
              {
                id: 'diameter',
                name: 'diameter taken for radius',
                expression: '2 * Va / (B^2 * (2 * r)^2)',
                guidance: 'One mark for a substitution in coherent units.',
                marks: 1,
              },
              {
                id: 'half',
                name: 'factor of two left out',
                expression: 'Va / (B^2 * r^2)',
                guidance: '',
                marks: 1,
              },
            ],
          },
        },
      ],
    },
  },
  {
    topic: 'CP',
    life: 'approved',
    figures: [
      {
        file: 'bending-magnet.svg',
        alternativeText:
          'Protons enter a square region of magnetic field out of the page and leave it after a quarter circle of radius r, travelling down the page.',
      },
    ],
    content: {
      title: 'Protons in a bending magnet',
      stem: 'Protons travelling at {{v}} enter a uniform magnetic field of flux density {{B}}, at right angles to the field. They leave it after a quarter of a circle.',
      script: `v = draw(4.0e6 m/s, 9.0e6 m/s, 0.2e6 m/s)
B = draw(0.25 T, 0.60 T, 0.05 T)
r = m_p * v / (e * B)
require(r < 0.35 m)
require(r > 0.09 m)
t = pi * r / (2 * v)`,
      quantities: [
        { name: 'v', symbol: 'v', unit: 'm s^-1', role: 'speed', set: 'proton' },
        { name: 'B', symbol: 'B', unit: 'T', role: 'fluxDensity', set: 'proton' },
        { name: 'r', symbol: 'r', unit: 'm', figures: 3, role: 'orbitRadius', set: 'proton' },
        { name: 't', symbol: 't', unit: 'ns', figures: 3 },
      ],
      assumptions: ['uniformField', 'nonRelativistic'],
      parts: [
        {
          id: 'radius',
          kind: 'numeric',
          text: 'Calculate the radius of the path of the protons in the field.',
          marks: 3,
          scheme: [
            { text: '$Bev = m v^2 / r$', marks: 1 },
            { text: 'Proton mass and charge substituted', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'r',
            unit: 'm',
            figures: 3,
            band: { kind: 'percent', percent: 1.5 },
            slips: [
              {
                id: 'electron',
                name: 'mass of an electron taken',
                expression: 'm_e * v / (e * B)',
                guidance: 'One mark for equating the forces.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'time',
          kind: 'numeric',
          text: 'Calculate how long a proton spends in the field.',
          marks: 2,
          scheme: [
            { text: 'A quarter of the circumference divided by the speed', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 't',
            unit: 'ns',
            figures: 3,
            band: { kind: 'percent', percent: 2 },
            slips: [
              {
                id: 'whole',
                name: 'time for the whole circle',
                expression: '2 * pi * r / v',
                guidance: 'One mark for distance over speed.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'energy',
          kind: 'written',
          text: 'State and explain whether the kinetic energy of a proton changes in the field.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'It stays the same', marks: 1 },
            { text: 'because the force is at right angles to the motion and does no work', marks: 1 },
          ],
        },
      ],
    },
  },
];
