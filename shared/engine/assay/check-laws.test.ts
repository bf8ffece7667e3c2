import { describe, expect, it } from 'vitest';
import { findingsOf, itemWith, plain } from './assay-fixture.ts';

/** Electrons from rest, then in a magnetic field, with a factor planted in one line. */
function tube(speed: string, radius = 'm_e * v / (e * B)', given = '') {
  return itemWith(
    `Va = draw(150 V, 300 V, 10 V)
B = draw(0.70 mT, 1.30 mT, 0.10 mT)
v = ${speed}
r = ${given === '' ? radius : `given(${radius}, ${given})`}
sc = 2 * Va / (B^2 * r^2)`,
    [{ quantity: 'v', unit: 'm s^-1' }],
    {
      roles: {
        Va: 'acceleratingPd',
        B: 'fluxDensity',
        v: 'speed',
        r: 'orbitRadius',
        sc: 'specificCharge',
      },
    },
  );
}

const SPEED = 'sqrt(2 * e * Va / m_e)';
const idsOf = (item: ReturnType<typeof tube>) =>
  findingsOf(item, 'law-broken').map(({ key }) => key.split(':')[1]);

describe('laws whose roles are bound', () => {
  it('hold on a sound item', () => {
    expect(idsOf(tube(SPEED))).toEqual([]);
  });

  it('hold to the rounding of the givens', () => {
    expect(idsOf(tube(SPEED, undefined, '2'))).toEqual([]);
    expect(idsOf(tube(SPEED, undefined, '3'))).toEqual([]);
  });

  it('tell the factor by which they are missed, and what it suggests', () => {
    const [found] = findingsOf(tube('sqrt(e * Va / m_e)'), 'law-broken');
    expect(found).toMatchObject({ severity: 'blocker', key: 'law-broken:gunSpeed:', drawCount: 112 });
    expect(plain(found?.statement)).toMatch(
      /^The script’s “v” \(speed\) is 0\.707 times what qV = ½mv² gives, on draw \d+; 112 draws show it\. A root of a half: a two left out under the root\.$/,
    );
    expect(found?.place).toMatchObject({ quantity: 'v', span: { line: 3 } });
  });

  it.each([
    [
      'a diameter for a radius',
      tube(SPEED, '2 * m_e * v / (e * B)'),
      '2.00 times',
      'A factor of two too many',
    ],
    ['a lost prefix', tube(SPEED, 'm_e * v / (e * B * 1000)'), '0.00100 times', 'a prefix'],
    [
      'the proton’s mass',
      tube(SPEED, 'm_p * v / (e * B)'),
      // CODATA 2022 (NIST): proton to electron mass ratio 1836.152673426.
      '1.84 × 10³ times',
      '',
    ],
  ])('catch %s', (_name, item, times, suggestion) => {
    const found = findingsOf(item, 'law-broken').find(({ key }) => key.includes('circularPath'));
    expect(plain(found?.statement)).toContain(times);
    expect(found?.statement).toContain(suggestion);
  });

  it('allow constants that are written to three figures', () => {
    const item = itemWith(
      'm1 = draw(2.0e-15 kg, 4.0e-15 kg, 0.1e-15 kg)\nW = m1 * 9.81 N/kg',
      [{ quantity: 'W', unit: 'N' }],
      { roles: { m1: 'dropMass', W: 'weight' } },
    );
    expect(findingsOf(item, 'law-broken')).toEqual([]);
  });

  it('allow the finer form of special relativity', () => {
    const script = (speed: string) =>
      itemWith(
        `Va = draw(20 kV, 60 kV, 5 kV)\ngamma = 1 + e * Va / (m_e * c^2)\nv = ${speed}`,
        [{ quantity: 'v', unit: 'm s^-1' }],
        { roles: { Va: 'acceleratingPd', v: 'speed' } },
      );
    expect(findingsOf(script('c * sqrt(1 - 1 / gamma^2)'), 'law-broken')).toEqual([]);
    expect(findingsOf(script('c * sqrt(1 - 1 / gamma)'), 'law-broken')).toHaveLength(1);
  });

  it('bind only within one set', () => {
    const item = (set: string) => {
      const content = itemWith(
        'V1 = draw(100 V, 200 V, 10 V)\nV2 = 3 * V1\nv2 = sqrt(2 * e * V2 / m_e)',
        [{ quantity: 'v2', unit: 'm s^-1' }],
        { roles: { V1: 'acceleratingPd', v2: 'speed' } },
      );
      return {
        ...content,
        quantities: content.quantities.map((quantity) =>
          quantity.name === 'v2' ? { ...quantity, set } : quantity,
        ),
      };
    };
    expect(findingsOf(item(''), 'law-broken')).toHaveLength(1);
    expect(findingsOf(item('second gun'), 'law-broken')).toEqual([]);
  });

  it('allow scatter its room, and still see a lost factor', () => {
    const item = (factor: string) =>
      itemWith(
        `Va = draw(150 V, 300 V, 50 V)
B = 0.90 mT
error = scatter(0.05 cm)
r = given(${factor} * sqrt(2 * Va * m_e / e) / B + error, 3)
sc = 2 * Va / (B^2 * r^2)
v = ${SPEED}`,
        [{ quantity: 'sc', unit: 'C kg^-1' }],
        { roles: { Va: 'acceleratingPd', B: 'fluxDensity', r: 'orbitRadius', v: 'speed' } },
      );
    expect(findingsOf(item('1'), 'law-broken')).toEqual([]);
    expect(findingsOf(item('2'), 'law-broken').length).toBeGreaterThan(0);
  });
});
