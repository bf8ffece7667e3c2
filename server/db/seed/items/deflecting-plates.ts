import type { DemoItem } from './demo-item.ts';

const platesFigure = {
  file: 'deflecting-plates.svg',
  alternativeText:
    'A beam enters from the left midway between two parallel plates, the upper one positive, curves upwards between them and leaves along a straight line. The deflection at the end of the plates is marked y.',
};

export const deflectingPlateItems: DemoItem[] = [
  {
    topic: 'DP',
    life: 'approved',
    figures: [platesFigure],
    content: {
      title: 'Deflection between plates',
      stem: 'Electrons travelling at {{v}} enter the space midway between two parallel plates. The plates are {{L}} long and {{d}} apart, and the p.d. between them is {{Vp}}. The field between the plates is uniform, and the beam leaves without touching either plate.',
      script: `v = draw(2.0e7 m/s, 2.8e7 m/s, 0.1e7 m/s)
L = draw(40 mm, 60 mm, 5 mm)
d = draw(20 mm, 30 mm, 2 mm)
Vp = draw(80 V, 240 V, 10 V)
t = L / v
a = e * Vp / (m_e * d)
y = a * t^2 / 2
require(y < 0.4 * d)
require(y > 1.0 mm)`,
      quantities: [
        { name: 'v', symbol: 'v', unit: 'm s^-1', role: 'speed' },
        { name: 'L', symbol: 'L', unit: 'mm', role: 'plateLength' },
        { name: 'd', symbol: 'd', unit: 'mm', role: 'plateSeparation' },
        { name: 'Vp', symbol: 'V', unit: 'V', role: 'platePd' },
        { name: 't', symbol: 't', unit: 'ns', figures: 3, role: 'transitTime' },
        { name: 'a', symbol: 'a', unit: 'm s^-2', figures: 3, role: 'acceleration' },
        { name: 'y', symbol: 'y', unit: 'mm', figures: 3, role: 'deflection' },
      ],
      assumptions: ['uniformField', 'nonRelativistic'],
      claims: ['beamClearsPlates'],
      parts: [
        {
          id: 'time',
          kind: 'numeric',
          text: 'Calculate the time that an electron spends between the plates.',
          marks: 2,
          scheme: [
            { text: '$t = L/v$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 't', unit: 'ns', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'acceleration',
          kind: 'numeric',
          text: 'Calculate the acceleration of an electron between the plates.',
          marks: 3,
          scheme: [
            { text: '$E = V/d$ used', marks: 1 },
            { text: '$a = eE/m$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'a',
            unit: 'm s^-2',
            figures: 3,
            band: { kind: 'percent', percent: 1.5 },
            slips: [
              {
                id: 'halfGap',
                name: 'distance to one plate taken for the separation',
                expression: 'e * Vp / (m_e * d / 2)',
                guidance: 'Two marks for a consistent working.',
                marks: 2,
              },
            ],
          },
        },
        {
          id: 'deflection',
          kind: 'numeric',
          text: 'Calculate the deflection $y$ of the beam as it leaves the plates.',
          marks: 2,
          scheme: [
            { text: '$y = \\frac{1}{2} a t^2$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: {
            quantity: 'y',
            unit: 'mm',
            figures: 3,
            band: { kind: 'percent', percent: 3 },
            slips: [
              {
                id: 'half',
                name: 'half left out',
                expression: 'a * t^2',
                guidance: '',
                marks: 0,
              },
            ],
          },
        },
      ],
    },
  },
  {
    topic: 'DP',
    life: 'faulty',
    remark: 'A second way to the specific charge, with the plates alone.',
    figures: [platesFigure],
    content: {
      title: 'Specific charge from a deflected beam',
      stem: 'Electrons are accelerated from rest through {{Va}}. They then pass midway between two parallel plates that are {{L}} long and {{d}} apart with a p.d. of {{Vp}} between them. The deflection of the beam at the end of the plates is $y$.',
      script: `Va = draw(500 V, 1000 V, 50 V)
L = draw(40 mm, 60 mm, 5 mm)
d = draw(20 mm, 30 mm, 2 mm)
Vp = draw(40 V, 120 V, 10 V)
v = sqrt(2 * e * Va / m_e)
t = L / v
y = e * Vp * t^2 / (2 * m_e * d)
require(y < 0.4 * d)
sc = 2 * y * d * v^2 / (Vp * L^2)`,
      quantities: [
        { name: 'Va', symbol: 'V_a', unit: 'V', role: 'acceleratingPd' },
        { name: 'L', symbol: 'L', unit: 'mm', role: 'plateLength' },
        { name: 'd', symbol: 'd', unit: 'mm', role: 'plateSeparation' },
        { name: 'Vp', symbol: 'V', unit: 'V', role: 'platePd' },
        { name: 'v', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
        { name: 't', symbol: 't', unit: 'ns', figures: 3, role: 'transitTime' },
        { name: 'y', symbol: 'y', unit: 'mm', figures: 3, role: 'deflection' },
        { name: 'sc', symbol: 'e/m', unit: 'C kg^-1', figures: 3, role: 'specificCharge' },
      ],
      assumptions: ['uniformField', 'fromRest', 'nonRelativistic'],
      claims: ['beamClearsPlates'],
      parts: [
        {
          id: 'deflection',
          kind: 'numeric',
          text: 'Calculate the deflection $y$.',
          marks: 3,
          scheme: [
            { text: 'Speed from the accelerating p.d.', marks: 1 },
            { text: 'Time and acceleration between the plates', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'y', unit: 'mm', figures: 3, band: { kind: 'percent', percent: 0.1 } },
        },
        {
          id: 'charge',
          kind: 'numeric',
          text: 'Use the deflection to find the specific charge of the electron.',
          marks: 3,
          scheme: [
            { text: '$y = \\frac{1}{2} \\frac{eV}{md} t^2$ used', marks: 1 },
            { text: 'Rearranged for $e/m$', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'sc', unit: 'C kg^-1', figures: 3, band: { kind: 'percent', percent: 3 } },
        },
      ],
    },
  },
];
