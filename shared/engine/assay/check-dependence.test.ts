import { describe, expect, it } from 'vitest';
import { findingsOf, itemWith, plain, reportOf } from './assay-fixture.ts';

const dependence = (item: ReturnType<typeof itemWith>) =>
  reportOf(item).findings.filter(({ check }) => check === 'dependence');

/** Plates behind a gun: where the speed comes from the same p.d. that the deflection is explained by. */
function plates(specificCharge: string) {
  return itemWith(
    `Va = draw(1.0 kV, 2.0 kV, 0.1 kV)
Vp = draw(100 V, 200 V, 10 V)
d = 2.0 cm
L = 5.0 cm
B = draw(0.50 mT, 0.80 mT, 0.10 mT)
y = Vp * L^2 / (4 * Va * d)
v2 = 4 * y * d / (Vp * L^2) * Va
sc = ${specificCharge}`,
    [{ quantity: 'sc', unit: 'C kg^-1' }],
    {},
  );
}

describe('answers', () => {
  it('whose terms cancel are stopped', () => {
    const [found] = findingsOf(plates('1.76e11 C/kg * v2'), 'answer-does-not-vary');
    expect(found).toMatchObject({ severity: 'blocker', place: { partId: 'p1', quantity: 'sc' } });
    expect(plain(found?.statement)).toContain(
      'The answer to part (a) is 1.76 × 10¹¹ C kg⁻¹ on all 484 draws: the given values cancel',
    );
  });

  it('that their givens decide pass', () => {
    const sound = itemWith(
      'Va = draw(150 V, 300 V, 10 V)\nv = sqrt(2 * e * Va / m_e)',
      [{ quantity: 'v', unit: 'm s^-1' }],
      { stem: 'Electrons are accelerated through {{Va}}.' },
    );
    expect(dependence(sound)).toEqual([]);
  });

  it('that come back to a constant are questioned', () => {
    const item = itemWith(
      `Va = draw(150 V, 300 V, 10 V)
B = draw(0.70 mT, 1.30 mT, 0.10 mT)
r = given(sqrt(2 * Va * m_e / e) / B, 3)
sc = 2 * Va / (B^2 * r^2)`,
      [{ quantity: 'sc', unit: 'C kg^-1' }],
    );
    expect(dependence(item)).toMatchObject([{ code: 'answer-on-data-sheet', severity: 'caution' }]);
    expect(plain(dependence(item)[0]?.statement)).toContain('e/m_e (specific charge of the electron)');
  });

  it('that use the constant they ask for are questioned', () => {
    const item = itemWith(
      `f = draw(6.0e14 Hz, 9.0e14 Hz, 1.0e14 Hz)
E = given(h * f, 4)
found = E / f * (h / h)`,
      [{ quantity: 'found', unit: 'J s' }],
    );
    expect(dependence(item).map(({ code }) => code)).toEqual(['sought-constant-used']);
  });
});

describe('givens', () => {
  it('that cancel are noted', () => {
    const item = itemWith(
      `v = draw(2.0e6 m/s, 4.0e6 m/s, 0.2e6 m/s)
B = draw(1.0 mT, 3.0 mT, 0.1 mT)
r = m_e * v / (e * B)
T = 2 * pi * r / v`,
      [{ quantity: 'T', unit: 'ns' }],
    );
    expect(dependence(item)).toMatchObject([{ code: 'given-cancels', severity: 'note' }]);
    expect(dependence(item)[0]?.statement).toContain('“v”');
  });

  it('that are printed for nothing are noted', () => {
    const item = (stem: string) =>
      itemWith(
        'a = draw(1.0 m, 2.0 m, 0.1 m)\nb = draw(5.0 m, 6.0 m, 0.1 m)\nx = 2 * a',
        [{ quantity: 'x', unit: 'm' }],
        { stem },
      );
    expect(dependence(item('A rod of {{a}} beside one of {{b}}.'))).toMatchObject([
      { code: 'given-unused', place: { quantity: 'b' } },
    ]);
    expect(dependence(item('A rod of {{a}}.'))).toEqual([]);
  });
});

describe('sensitivities', () => {
  it('are the powers of the givens', () => {
    const item = itemWith(
      `Va = draw(150 V, 300 V, 10 V)
B = draw(0.70 mT, 1.30 mT, 0.10 mT)
r = sqrt(2 * Va * m_e / e) / B`,
      [{ quantity: 'r', unit: 'cm' }],
    );
    const sensitivities = reportOf(item).scales[0]?.sensitivities ?? [];
    expect(sensitivities.map(({ name }) => name)).toEqual(['Va', 'B']);
    // 1.01^½ and 1/1.01.
    expect(sensitivities[0]?.percent).toBeCloseTo(0.4988, 3);
    expect(sensitivities[1]?.percent).toBeCloseTo(-0.9901, 3);
  });
});
