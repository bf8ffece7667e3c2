import type { DemoItem } from './demo-item.ts';

export const photonItems: DemoItem[] = [
  {
    topic: 'PL',
    life: 'approved',
    content: {
      title: 'Photons from a pointer',
      stem: 'A small laser gives light of wavelength {{lambda}} in a beam of power {{P}}.',
      script: `lambda = draw(520 nm, 660 nm, 5 nm)
P = draw(0.40 mW, 0.95 mW, 0.05 mW)
E = h * c / lambda
R = P / E`,
      quantities: [
        { name: 'lambda', symbol: '\\lambda', unit: 'nm', role: 'wavelength' },
        { name: 'P', symbol: 'P', unit: 'mW', role: 'power' },
        { name: 'E', symbol: 'E', unit: 'J', figures: 3, role: 'photonEnergy' },
        { name: 'R', symbol: 'R', unit: 's^-1', figures: 3, role: 'photonRate' },
      ],
      parts: [
        {
          id: 'energy',
          kind: 'showThat',
          text: 'Show that each photon has an energy of about {{E, 2 sf}}.',
          marks: 2,
          statedFigures: 2,
          scheme: [
            { text: '$E = hc/\\lambda$ used', marks: 1 },
            { text: 'Value to at least three figures', marks: 1 },
          ],
          answer: { quantity: 'E', unit: 'J', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'rate',
          kind: 'numeric',
          text: 'Calculate how many photons leave the laser each second.',
          marks: 2,
          scheme: [
            { text: 'Power divided by the energy of a photon', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'R',
            unit: 's^-1',
            figures: 3,
            band: { kind: 'percent', percent: 3 },
            slips: [
              {
                id: 'milliwatts',
                name: 'milliwatts taken for watts',
                expression: '1000 * R',
                guidance: 'One mark for the relation.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'colour',
          kind: 'written',
          text: 'A second laser has the same power and a shorter wavelength. State and explain whether it gives more or fewer photons each second.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'Each photon carries more energy', marks: 1 },
            { text: 'so fewer photons each second give the same power', marks: 1 },
          ],
        },
      ],
    },
  },
  {
    topic: 'PL',
    life: 'withdrawn',
    remark: 'Replaced by an item with three levels.',
    figures: [
      {
        file: 'level-diagram.svg',
        alternativeText:
          'Two energy levels of an atom below a dashed line for the ionised atom. An arrow leads from the upper level to the lower, and a wavy arrow shows the photon given out.',
      },
    ],
    content: {
      title: 'A line from two levels',
      stem: 'The diagram shows two energy levels of an atom. An electron falls from the upper level, at {{E2}}, to the lower level, at {{E1}}.',
      script: `E1 = draw(-11.0 eV, -9.0 eV, 0.1 eV)
E2 = draw(-6.5 eV, -4.5 eV, 0.1 eV)
dE = E2 - E1
lambda = h * c / dE`,
      quantities: [
        { name: 'E1', symbol: 'E_1', unit: 'eV', role: 'lowerLevel' },
        { name: 'E2', symbol: 'E_2', unit: 'eV', role: 'upperLevel' },
        { name: 'dE', symbol: '\\Delta E', unit: 'J', figures: 3, role: 'photonEnergy' },
        { name: 'lambda', symbol: '\\lambda', unit: 'nm', figures: 3, role: 'wavelength' },
      ],
      parts: [
        {
          id: 'line',
          kind: 'numeric',
          text: 'Calculate the wavelength of the photon given out.',
          marks: 3,
          scheme: [
            { text: 'Difference of the levels in joules', marks: 1 },
            { text: '$\\lambda = hc/\\Delta E$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'lambda', unit: 'nm', figures: 3, band: { kind: 'percent', percent: 2 } },
        },
      ],
    },
  },
];
