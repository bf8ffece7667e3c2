import type { DemoItem } from './demo-item.ts';

const gunFigure = {
  file: 'electron-gun.svg',
  alternativeText:
    'A glass tube with a heated cathode at the left and an anode with a hole. A battery joins cathode and anode. A dashed line shows the beam passing through the hole.',
};

export const electronGunItems: DemoItem[] = [
  {
    topic: 'EG',
    life: 'approved',
    figures: [gunFigure],
    content: {
      title: 'Electrons leaving a small gun',
      stem: 'Electrons are released from rest at the heated cathode of an electron gun. The p.d. between cathode and anode is {{Va}}, and the gap between them is {{d}} wide. Take the field in the gap to be uniform.',
      script: `// electron gun, electrons from rest
Va = draw(400 V, 900 V, 20 V)
d = draw(8.0 mm, 16.0 mm, 0.5 mm)
E = Va / d
Ek = e * Va
v = sqrt(2 * Ek / m_e)`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'V', role: 'acceleratingPd' },
        { name: 'd', symbol: 'd', unit: 'mm' },
        { name: 'E', symbol: 'E', unit: 'V m^-1', figures: 3 },
        { name: 'Ek', symbol: 'E_k', unit: 'J', figures: 3, role: 'kineticEnergy' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
      ],
      assumptions: ['uniformField', 'fromRest'],
      parts: [
        {
          id: 'field',
          kind: 'numeric',
          text: 'Calculate the electric field strength in the gap.',
          marks: 2,
          scheme: [
            { text: '$E = V_a / d$ used with the gap in metres', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'E',
            unit: 'V m^-1',
            figures: 3,
            band: { kind: 'percent', percent: 1 },
            slips: [
              {
                id: 'millimetres',
                name: 'gap left in millimetres',
                expression: 'E / 1000',
                guidance: 'The substitution earns nothing without the conversion.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'energy',
          kind: 'showThat',
          text: 'Show that each electron passes through the anode with a kinetic energy of about {{Ek, 2 sf}}.',
          marks: 2,
          statedFigures: 2,
          scheme: [
            { text: '$E_k = eV_a$ stated or used', marks: 1 },
            { text: 'Value to at least three figures', marks: 1 },
          ],
          answer: { quantity: 'Ek', unit: 'J', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'speed',
          kind: 'numeric',
          text: 'Calculate the speed of the electrons as they pass through the anode.',
          marks: 3,
          scheme: [
            { text: '$E_k = \\frac{1}{2} m v^2$ rearranged for the speed', marks: 1 },
            { text: 'Kinetic energy and electron mass substituted', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'v',
            unit: 'm s^-1',
            figures: 3,
            band: { kind: 'percent', percent: 4 },
            slips: [
              {
                id: 'half',
                name: 'half left out of the kinetic energy',
                expression: 'sqrt(Ek / m_e)',
                guidance: 'One mark for a correct substitution into the wrong relation.',
                marks: 1,
              },
              {
                id: 'proton',
                name: 'mass of a proton taken',
                expression: 'sqrt(2 * Ek / m_p)',
                guidance: 'One mark for the rearranged relation.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'vacuum',
          kind: 'written',
          text: 'Explain why the tube must be evacuated.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'Electrons would collide with molecules of the air', marks: 1 },
            { text: 'and would lose energy or be scattered out of the beam', marks: 1 },
          ],
        },
      ],
    },
  },
  {
    topic: 'EG',
    life: 'drafting',
    content: {
      title: 'Force on an electron in the gap',
      stem: 'The anode of an electron gun is {{d}} from the cathode. The p.d. between them is {{Va}}.',
      script: `Va = draw(1.0 kV, 2.4 kV, 0.1 kV)
d = draw(10 mm, 24 mm, 1 mm)
F = e * Va / d
a = F / m_e`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'kV', role: 'acceleratingPd' },
        { name: 'd', symbol: 'd', unit: 'mm' },
        { name: 'F', symbol: 'F', unit: 'N', figures: 3 },
        { name: 'a', symbol: 'a', unit: 'm s^-2', figures: 3 },
      ],
      assumptions: ['uniformField'],
      parts: [
        {
          id: 'force',
          kind: 'numeric',
          text: 'Calculate the force on an electron in the gap.',
          marks: 2,
          scheme: [
            { text: '$F = eV_a/d$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'F', unit: 'N', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'acceleration',
          kind: 'numeric',
          text: 'Calculate the acceleration of the electron.',
          marks: 2,
          scheme: [
            { text: '$a = F/m$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'a', unit: 'm s^-2', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
      ],
    },
  },
];
