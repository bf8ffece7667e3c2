import { itemContentSchema, type ItemContent } from '#shared/engine/index.ts';

/** A typical item of three numeric parts over 5,000 draws, whose full assay is timed. */
export function benchItem(): ItemContent {
  return itemContentSchema.parse({
    title: 'Electrons in a fine-beam tube',
    stem: 'Electrons from rest are accelerated through {{Va}} and enter a uniform field of flux density {{B}} at right angles to it.',
    script: `Va = draw(150 V, 249 V, 1 V)
B = draw(0.70 mT, 1.19 mT, 0.01 mT)
v = sqrt(2 * e * Va / m_e)
r = m_e * v / (e * B)
turn = 2 * pi * r / v
require(r < 8.0 cm)`,
    quantities: [
      { name: 'Va', symbol: 'V_a', role: 'acceleratingPd' },
      { name: 'B', symbol: 'B', role: 'fluxDensity' },
      { name: 'v', symbol: 'v', role: 'speed' },
      { name: 'r', symbol: 'r', unit: 'cm', role: 'orbitRadius' },
    ],
    parts: [
      {
        id: 'a',
        kind: 'numeric',
        text: 'Calculate the speed of the electrons.',
        marks: 2,
        scheme: [
          { text: 'Energy conserved', marks: 1 },
          { text: '{{v}}', marks: 1 },
        ],
        answer: {
          quantity: 'v',
          unit: 'm s^-1',
          slips: [{ id: 'half', name: 'The half is left out', expression: 'sqrt(e * Va / m_e)', marks: 1 }],
        },
      },
      {
        id: 'b',
        kind: 'numeric',
        text: 'Calculate the radius of the path.',
        marks: 2,
        scheme: [
          { text: 'Magnetic force turns the beam', marks: 1 },
          { text: '{{r}}', marks: 1 },
        ],
        answer: {
          quantity: 'r',
          unit: 'cm',
          slips: [{ id: 'diameter', name: 'The diameter is given', expression: '2 * r', marks: 1 }],
        },
      },
      {
        id: 'c',
        kind: 'numeric',
        text: 'Calculate the time for one turn.',
        marks: 1,
        scheme: [{ text: '{{turn}}', marks: 1 }],
        answer: { quantity: 'turn', unit: 'ns' },
      },
    ],
    assumptions: ['fromRest'],
  });
}
