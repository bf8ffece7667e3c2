import { describe, expect, it } from 'vitest';
import { findingsOf, itemWith, plain } from './assay-fixture.ts';

describe('speeds', () => {
  const gun = (least: string, most: string) =>
    itemWith(`Va = draw(${least}, ${most}, 1 kV)\nv = sqrt(2 * e * Va / m_e)`, [
      { quantity: 'v', unit: 'm s^-1' },
    ]);

  it('of light and above are stopped, at the fastest draw', () => {
    // ½mc² of an electron is 255.5 keV (CODATA 2022: mc² is 0.51099895069 MeV).
    const [found] = findingsOf(gun('250 kV', '260 kV'), 'faster-than-light');
    expect(found).toMatchObject({
      severity: 'blocker',
      worstDraw: 11,
      drawCount: 5,
      place: { quantity: 'v' },
    });
    expect(plain(found?.statement)).toBe(
      'On draw 11 “v” is 3.02 × 10⁸ m s⁻¹, which is not below the speed of light; 5 draws show it.',
    );
  });

  it('below that pass', () => {
    expect(findingsOf(gun('250 kV', '255 kV'), 'faster-than-light')).toEqual([]);
  });
});

describe('sizes that must be positive', () => {
  it('are stopped where they are not', () => {
    const item = itemWith('a = draw(1 mm, 5 mm, 1 mm)\nx = 3 mm - a', [{ quantity: 'x', unit: 'mm' }]);
    expect(findingsOf(item, 'not-positive')).toMatchObject([{ severity: 'blocker', drawCount: 3 }]);
  });

  it('may be negative where they are steps of a working that stand for nothing', () => {
    const item = itemWith('a = draw(1 mm, 5 mm, 1 mm)\ndx = a - 9 mm\nx = abs(dx)', [
      { quantity: 'x', unit: 'mm' },
    ]);
    expect(findingsOf(item, 'not-positive')).toEqual([]);
  });

  it('may be negative where they point the other way', () => {
    const item = itemWith('a = draw(1 mm, 5 mm, 1 mm)\ny = a - 9 mm', [{ quantity: 'y', unit: 'mm' }], {
      roles: { y: 'deflection' },
    });
    expect(findingsOf(item, 'not-positive')).toEqual([]);
  });
});

describe('whole numbers', () => {
  it('of charges must be whole', () => {
    const item = (script: string) =>
      itemWith(script, [{ quantity: 'n' }], { roles: { n: 'chargeNumber', q: 'charge' } });
    const [found] = findingsOf(item('q = draw(4.8e-19 C, 5.6e-19 C, 0.1e-19 C)\nn = q / e'), 'not-whole');
    expect(found).toMatchObject({ severity: 'blocker', drawCount: 9 });
    expect(found?.statement).toMatch(/no whole number of at least 1/);
    expect(findingsOf(item('n = whole(2, 6)\nq = n * e'), 'not-whole')).toEqual([]);
  });
});

describe('photoelectrons', () => {
  const item = (from: string, to: string, rest: Parameters<typeof itemWith>[2]) =>
    itemWith(
      `lambda = draw(${from}, ${to}, 10 nm)\nphi = 2.30 eV\nE = h * c / lambda\nK = E - phi`,
      [{ quantity: 'K', unit: 'eV', figures: 2, band: { kind: 'absolute', plusMinus: 0.05, unit: 'eV' } }],
      { roles: { E: 'photonEnergy', phi: 'workFunction', K: 'greatestKineticEnergy' }, ...rest },
    );

  // hc is 1240 eV nm, so that 2.30 eV belongs to 539 nm.
  it('that photons cannot free are stopped', () => {
    const [found] = findingsOf(item('400 nm', '580 nm', { claims: ['electronsEmitted'] }), 'no-emission');
    expect(found).toMatchObject({ severity: 'blocker', drawCount: 5, worstDraw: 19 });
    expect(findingsOf(item('400 nm', '580 nm', {}), 'no-emission')).toHaveLength(1);
  });

  it('that photons free pass', () => {
    expect(findingsOf(item('400 nm', '530 nm', { claims: ['electronsEmitted'] }), 'no-emission')).toEqual([]);
  });

  it('that the text denies are stopped', () => {
    const denied = (from: string, to: string) =>
      findingsOf(item(from, to, { claims: ['noElectronsEmitted'] }), 'unclaimed-emission');
    expect(denied('500 nm', '580 nm')).toMatchObject([{ severity: 'blocker', drawCount: 4 }]);
    expect(denied('550 nm', '580 nm')).toEqual([]);
  });
});

describe('beams between plates', () => {
  const item = (most: string, claims: ['beamClearsPlates'] | []) =>
    itemWith(
      `Vp = draw(50 V, ${most}, 10 V)
Va = 1.0 kV
d = 2.0 cm
L = 5.0 cm
y = Vp * L^2 / (4 * Va * d)`,
      [{ quantity: 'y', unit: 'mm' }],
      {
        roles: {
          Vp: 'platePd',
          Va: 'acceleratingPd',
          d: 'plateSeparation',
          L: 'plateLength',
          y: 'deflection',
        },
        claims,
      },
    );

  it('that the text says leave the plates must clear them', () => {
    // y = d/2 at V = 2 V_a d²/L² = 320 V.
    const [found] = findingsOf(item('400 V', ['beamClearsPlates']), 'beam-hits-plate');
    expect(found).toMatchObject({ severity: 'blocker', drawCount: 9, worstDraw: 36 });
    expect(findingsOf(item('310 V', ['beamClearsPlates']), 'beam-hits-plate')).toEqual([]);
    expect(findingsOf(item('400 V', []), 'beam-hits-plate')).toEqual([]);
  });
});

describe('apparatus', () => {
  it('in air keeps below the breakdown of air', () => {
    const item = (gap: string) =>
      itemWith(`Vb = 4.0 kV\nd = ${gap}\nE = Vb / d`, [{ quantity: 'E', unit: 'kV m^-1' }], {
        roles: { Vb: 'balancePd', d: 'plateSeparation', E: 'fieldStrength' },
      });
    expect(findingsOf(item('1.0 mm'), 'air-breaks-down')).toMatchObject([{ severity: 'caution' }]);
    expect(findingsOf(item('5.0 mm'), 'air-breaks-down')).toEqual([]);
  });

  it('of no school or laboratory is questioned', () => {
    const item = (field: string) =>
      itemWith(`B = draw(1 ${field}, 3 ${field}, 1 ${field})\nx = B * 2`, [{ quantity: 'x', unit: 'T' }], {
        roles: { B: 'fluxDensity' },
      });
    expect(findingsOf(item('kT'), 'implausible-size')).toMatchObject([{ severity: 'caution', drawCount: 3 }]);
    expect(findingsOf(item('mT'), 'implausible-size')).toEqual([]);
  });
});
