import type { DemoItem } from './demo-item.ts';

export const matterWaveItems: DemoItem[] = [
  {
    topic: 'MW',
    life: 'approved',
    figures: [
      {
        file: 'diffraction-tube.svg',
        alternativeText:
          'Electrons pass through thin graphite in an evacuated bulb and form a ring of diameter D on the curved screen.',
      },
    ],
    content: {
      title: 'Electrons through graphite',
      stem: 'Electrons are accelerated from rest through {{Va}} and pass through thin graphite in an evacuated tube. The planes of atoms that form the inner ring are {{s}} apart. The screen is {{L}} from the graphite. For small angles the diameter of the ring is $D = 2L\\lambda/s$.',
      script: `Va = draw(2.5 kV, 4.5 kV, 0.1 kV)
s = given(0.213 nm, 3)
L = draw(12.0 cm, 15.0 cm, 0.5 cm)
p = sqrt(2 * m_e * e * Va)
lambda = h / p
D = 2 * L * lambda / s`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'kV', role: 'acceleratingPd' },
        { name: 's', symbol: 's', unit: 'nm', figures: 3, role: 'planeSpacing' },
        { name: 'L', symbol: 'L', unit: 'cm', role: 'screenDistance' },
        { name: 'p', symbol: 'p', unit: 'kg m s^-1', figures: 3, role: 'momentum' },
        { name: 'lambda', symbol: '\\lambda', unit: 'pm', figures: 3, role: 'deBroglieWavelength' },
        { name: 'D', symbol: 'D', unit: 'mm', figures: 3, role: 'ringDiameter' },
      ],
      assumptions: ['fromRest', 'nonRelativistic'],
      parts: [
        {
          id: 'momentum',
          kind: 'numeric',
          text: 'Calculate the momentum of an electron as it reaches the graphite.',
          marks: 2,
          scheme: [
            { text: '$p = \\sqrt{2 m e V_a}$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'p', unit: 'kg m s^-1', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'wavelength',
          kind: 'numeric',
          text: 'Calculate the wavelength of the electrons.',
          marks: 2,
          scheme: [
            { text: '$\\lambda = h/p$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'lambda', unit: 'pm', figures: 3, band: { kind: 'percent', percent: 2 } },
        },
        {
          id: 'ring',
          kind: 'numeric',
          text: 'Calculate the diameter of the ring.',
          marks: 2,
          scheme: [
            { text: '$D = 2L\\lambda/s$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'D',
            unit: 'mm',
            figures: 3,
            band: { kind: 'percent', percent: 2.5 },
            slips: [
              {
                id: 'radius',
                name: 'radius of the ring given',
                expression: 'L * lambda / s',
                guidance: 'One mark.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'change',
          kind: 'written',
          text: 'State and explain how the ring changes when the accelerating p.d. is raised.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'The momentum is greater, so the wavelength is shorter', marks: 1 },
            { text: 'and the ring becomes smaller', marks: 1 },
          ],
        },
      ],
    },
  },
  {
    topic: 'MW',
    life: 'working',
    remark: 'Please look at the wording of the second part.',
    content: {
      title: 'Slow neutrons',
      stem: 'Neutrons that leave a block of graphite have a kinetic energy of {{Ek}}.',
      script: `Ek = draw(0.020 eV, 0.080 eV, 0.002 eV)
v = sqrt(2 * Ek / m_n)
lambda = h / (m_n * v)`,
      quantities: [
        { name: 'Ek', symbol: 'E_k', unit: 'eV', role: 'kineticEnergy', set: 'neutron' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed', set: 'neutron' },
        {
          name: 'lambda',
          symbol: '\\lambda',
          unit: 'nm',
          figures: 3,
          role: 'deBroglieWavelength',
          set: 'neutron',
        },
      ],
      parts: [
        {
          id: 'speed',
          kind: 'numeric',
          text: 'Calculate the speed of these neutrons.',
          marks: 3,
          scheme: [
            { text: 'Kinetic energy in joules', marks: 1 },
            { text: '$v = \\sqrt{2E_k/m}$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'v', unit: 'm s^-1', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'wavelength',
          kind: 'numeric',
          text: 'Calculate their wavelength.',
          marks: 2,
          scheme: [
            { text: '$\\lambda = h/(mv)$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'lambda', unit: 'nm', figures: 3, band: { kind: 'percent', percent: 2 } },
        },
        {
          id: 'use',
          kind: 'written',
          text: 'Explain why such neutrons are diffracted by crystals.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'Their wavelength is close to the spacing of atoms', marks: 1 },
            { text: 'so the waves scattered by neighbouring atoms interfere', marks: 1 },
          ],
        },
      ],
    },
  },
];
