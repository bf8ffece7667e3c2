import type { DemoItem } from './demo-item.ts';

const photocellFigure = {
  file: 'photocell.svg',
  alternativeText:
    'An evacuated cell with a curved metal surface, on which light falls, and a collector. A microammeter and a variable retarding p.d. are in series with the cell.',
};

export const photoelectricItems: DemoItem[] = [
  {
    topic: 'PE',
    life: 'approved',
    figures: [photocellFigure],
    content: {
      title: 'Stopping the fastest electrons',
      stem: 'Ultraviolet radiation of wavelength {{lambda}} falls on a metal surface in an evacuated cell. The work function of the metal is {{phi}}.',
      script: `lambda = draw(210 nm, 300 nm, 5 nm)
phi = draw(2.10 eV, 2.90 eV, 0.05 eV)
E = h * c / lambda
Ek = E - phi
Vs = Ek / e
f0 = phi / h
require(Ek > 1.2 eV)
require(abs(Ek / phi - 1) > 0.05)`,
      quantities: [
        { name: 'lambda', symbol: '\\lambda', unit: 'nm', role: 'wavelength' },
        { name: 'phi', symbol: '\\phi', unit: 'eV', role: 'workFunction' },
        { name: 'E', symbol: 'E', unit: 'J', figures: 3, role: 'photonEnergy' },
        { name: 'Ek', symbol: 'E_k', unit: 'J', figures: 3, role: 'greatestKineticEnergy' },
        { name: 'Vs', symbol: 'V_s', unit: 'V', figures: 3, role: 'stoppingPd' },
        { name: 'f0', symbol: 'f_0', unit: 'Hz', figures: 3, role: 'thresholdFrequency' },
      ],
      claims: ['electronsEmitted'],
      parts: [
        {
          id: 'photon',
          kind: 'numeric',
          text: 'Calculate the energy of one photon of this radiation.',
          marks: 2,
          scheme: [
            { text: '$E = hc/\\lambda$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'E', unit: 'J', figures: 3, band: { kind: 'percent', percent: 1 } },
        },
        {
          id: 'stopping',
          kind: 'numeric',
          text: 'Calculate the p.d. that just stops the fastest electrons.',
          marks: 3,
          scheme: [
            { text: '$E_k = hf - \\phi$ with both in the same unit', marks: 1 },
            { text: '$eV_s = E_k$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'Vs',
            unit: 'V',
            figures: 3,
            band: { kind: 'percent', percent: 3 },
            slips: [
              {
                id: 'noWorkFunction',
                name: 'work function left out',
                expression: 'E / e',
                guidance: 'One mark for $eV_s = E_k$.',
                marks: 1,
              },
            ],
          },
        },
        {
          id: 'threshold',
          kind: 'numeric',
          text: 'Calculate the threshold frequency of the metal.',
          marks: 2,
          scheme: [
            { text: '$\\phi = hf_0$ with the work function in joules', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'f0', unit: 'Hz', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'intensity',
          kind: 'written',
          text: 'The intensity of the radiation is doubled. State what happens to the stopping p.d.',
          marks: 1,
          answerLines: 1,
          scheme: [{ text: 'It stays the same', marks: 1 }],
        },
      ],
    },
  },
  {
    topic: 'PE',
    life: 'faulty',
    remark: 'Visible light this time, so that the lamp can be bought anywhere.',
    figures: [photocellFigure],
    content: {
      title: 'Electrons freed by visible light',
      stem: 'Light of wavelength {{lambda}} frees electrons from a metal whose work function is {{phi}}.',
      script: `lambda = draw(400 nm, 640 nm, 20 nm)
phi = draw(1.90 eV, 2.40 eV, 0.05 eV)
E = h * c / lambda
Ek = E - phi
Vs = Ek / e`,
      quantities: [
        { name: 'lambda', symbol: '\\lambda', unit: 'nm', role: 'wavelength' },
        { name: 'phi', symbol: '\\phi', unit: 'eV', role: 'workFunction' },
        { name: 'E', symbol: 'E', unit: 'J', figures: 3, role: 'photonEnergy' },
        { name: 'Ek', symbol: 'E_k', unit: 'J', figures: 3, role: 'greatestKineticEnergy' },
        { name: 'Vs', symbol: 'V_s', unit: 'V', figures: 2, role: 'stoppingPd' },
      ],
      claims: ['electronsEmitted'],
      parts: [
        {
          id: 'energy',
          kind: 'numeric',
          text: 'Calculate the greatest kinetic energy of the electrons.',
          marks: 3,
          scheme: [
            { text: '$hf = \\phi + E_k$ with $f = c/\\lambda$', marks: 1 },
            { text: 'Work function in joules', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'Ek', unit: 'J', figures: 3, band: { kind: 'percent', percent: 0.2 } },
        },
        {
          id: 'stopping',
          kind: 'numeric',
          text: 'Calculate the stopping p.d.',
          marks: 2,
          scheme: [
            { text: '$eV_s = E_k$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'Vs', unit: 'V', figures: 2, band: { kind: 'percent', percent: 2 } },
        },
      ],
    },
  },
];
