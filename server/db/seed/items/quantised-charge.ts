import type { DemoItem } from './demo-item.ts';

export const quantisedChargeItems: DemoItem[] = [
  {
    topic: 'QC',
    life: 'approved',
    content: {
      title: 'A drop that gains charge',
      stem: 'A charged drop of weight {{W}} is held at rest between horizontal plates that are {{d}} apart by a p.d. of {{V1}}. A weak radioactive source nearby ionises the air. The drop suddenly gains charge, and a p.d. of {{V2}} is now needed to hold it still.',
      script: `W = draw(1.50e-14 N, 3.00e-14 N, 0.05e-14 N)
d = draw(5.0 mm, 8.0 mm, 0.5 mm)
n = whole(2, 5)
k = whole(2, 4)
V1 = given(W * d / (n * e), 3)
V2 = given(W * d / ((n + k) * e), 3)
require(V2 > 50 V)
q1 = W * d / V1
q2 = W * d / V2
gained = round((q2 - q1) / e)`,
      quantities: [
        { name: 'W', symbol: 'W', unit: 'N', figures: 3, role: 'weight' },
        { name: 'd', symbol: 'd', unit: 'mm', role: 'plateSeparation' },
        { name: 'V1', symbol: 'V_1', unit: 'V', figures: 3, role: 'balancePd', set: 'before' },
        { name: 'V2', symbol: 'V_2', unit: 'V', figures: 3, role: 'balancePd', set: 'after' },
        { name: 'q1', symbol: 'q_1', unit: 'C', figures: 3, role: 'charge', set: 'before' },
        { name: 'q2', symbol: 'q_2', unit: 'C', figures: 3, role: 'charge', set: 'after' },
        { name: 'gained', symbol: 'N', unit: '', figures: 1, role: 'chargeNumber', set: 'gained' },
      ],
      assumptions: ['uniformField', 'noUpthrust'],
      parts: [
        {
          id: 'before',
          kind: 'numeric',
          text: 'Calculate the charge on the drop before it gains charge.',
          marks: 2,
          scheme: [
            { text: '$q = Wd/V$ used', marks: 1 },
            { text: 'Answer with unit', marks: 1 },
          ],
          answer: { quantity: 'q1', unit: 'C', figures: 3, band: { kind: 'percent', percent: 1.5 } },
        },
        {
          id: 'gained',
          kind: 'numeric',
          text: 'How many elementary charges did the drop gain?',
          marks: 3,
          scheme: [
            { text: 'New charge found in the same way', marks: 1 },
            { text: 'Difference divided by $e$', marks: 1 },
            { text: 'Whole number', marks: 1 },
          ],
          answer: {
            quantity: 'gained',
            unit: '',
            figures: 1,
            band: { kind: 'absolute', plusMinus: 0, unit: '' },
          },
        },
        {
          id: 'meaning',
          kind: 'written',
          text: 'Many such changes are measured. State what they have in common and what this tells us about charge.',
          marks: 2,
          answerLines: 3,
          scheme: [
            { text: 'Every change is a whole multiple of the same smallest amount', marks: 1 },
            { text: 'so charge comes in whole units of that size', marks: 1 },
          ],
        },
      ],
    },
  },
];
