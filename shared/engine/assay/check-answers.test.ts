import { describe, expect, it } from 'vitest';
import type { Band } from '../item/content.ts';
import { findingsOf, itemWith, plain, reportOf } from './assay-fixture.ts';

const percent = (size: number): Band => ({ kind: 'percent', percent: size });

describe('rounding routes', () => {
  /** x = 3a − 2b with a near b: rounding on the way is felt three times over. */
  const item = (band: Band) =>
    itemWith(
      `a = draw(1.11, 1.19, 0.01)
p = a * 1.111
q = p * 1.007
x = (5 * q - 4 * p) * 1 m`,
      [{ quantity: 'x', unit: 'm', figures: 3, band }],
    );

  it('that leave the band are stopped, and the worst is told as a candidate would', () => {
    const [found] = findingsOf(item(percent(0.5)), 'route-outside-band');
    expect(found).toMatchObject({ severity: 'blocker', place: { partId: 'p1' } });
    expect(plain(found?.statement)).toMatch(
      /^In part \(a\), on draw \d, rounding “[pq]”( and “q”)? to 3 figures on the way, and rounding the answer to 3 figures gives [\d.]+ m where the model answer is [\d.]+ m and the band goes from [\d.]+ m to [\d.]+ m; \d+ draws? shows? it\.$/,
    );
  });

  it('that stay inside pass', () => {
    expect(findingsOf(item(percent(5)), 'route-outside-band')).toEqual([]);
  });

  it('are all taken: results rounded or not, constants full or as printed', () => {
    const report = reportOf(
      itemWith('Va = 200 V\nU = e * Va\nv = sqrt(2 * U / m_e)', [
        { quantity: 'v', unit: 'm s^-1', band: percent(2) },
      ]),
    );
    const routes = report.scales[0]?.marks.filter(({ kind }) => kind === 'route').map(({ label }) => label);
    expect(routes?.sort()).toEqual([
      'carrying everything in full, and rounding the answer to 3 figures',
      'rounding “U” to 3 figures on the way, and rounding the answer to 3 figures',
      'rounding “U” to 3 figures on the way, using the data sheet’s constants, and rounding the answer to 3 figures',
      'rounding “U” to 4 figures on the way, and rounding the answer to 3 figures',
      'rounding “U” to 4 figures on the way, using the data sheet’s constants, and rounding the answer to 3 figures',
      'using the data sheet’s constants, and rounding the answer to 3 figures',
    ]);
  });

  it('reach the printed answer of a worked example that rounded on the way', () => {
    // OpenStax College Physics 2e, example fs-id2621262: 54.0 eV is printed, 53.9 eV is the answer in full.
    const report = reportOf(
      itemWith('lambda = 0.167 nm\nv = h / (m_e * lambda)\nK = m_e * v^2 / 2', [
        { quantity: 'v', unit: 'm s^-1' },
        { quantity: 'K', unit: 'eV', band: percent(1) },
      ]),
    );
    const spread = report.scales[1]?.routeSpread;
    expect(53.936 * (1 + (spread?.above ?? 0))).toBeCloseTo(54.0, 1);
  });

  it('take an earlier value as its text states it', () => {
    const parts = (band: Band) => [
      { quantity: 'U', unit: 'J', figures: 3, shows: 1 },
      { quantity: 'v', unit: 'm s^-1', figures: 3, band },
    ];
    const stating = (band: Band) =>
      itemWith('Va = draw(150 V, 300 V, 10 V)\nU = e * Va\nv = sqrt(2 * U / m_e)', parts(band));
    const [found] = findingsOf(stating(percent(2)), 'route-outside-band');
    expect(found?.place).toMatchObject({ partId: 'p2' });
    expect(found?.statement).toContain('taking “U” as part (a) states it, to 1 figure');
    expect(findingsOf(stating(percent(15)), 'route-outside-band')).toEqual([]);
  });

  it('of more than eight results are each taken alone and all together', () => {
    const steps = Array.from({ length: 10 }, (_, index) => `s${index + 1} = s${index} * 1.0371`);
    const report = reportOf(
      itemWith(['s0 = draw(1.01 m, 1.09 m, 0.01 m)', ...steps].join('\n'), [
        { quantity: 's10', unit: 'm', band: percent(5) },
      ]),
    );
    const { below = 0, above = 0 } = report.scales[0]?.routeSpread ?? {};
    expect(Math.max(above, -below)).toBeGreaterThan(0.002);
    expect(report.findings.filter(({ check }) => check === 'routes')).toEqual([]);
  });
});

describe('wrong workings', () => {
  const rods = (band: Band, expression: string, script = 'a = draw(2.0 m, 4.0 m, 0.1 m)\nx = 3 * a') =>
    itemWith(script, [
      {
        quantity: 'x',
        unit: 'm',
        figures: 2,
        band,
        slips: [{ id: 's', name: 'third left out', expression }],
      },
    ]);

  it('that a writer names are stopped inside the band', () => {
    const [found] = findingsOf(rods(percent(5), '3.1 * a'), 'slip-inside-band');
    expect(found).toMatchObject({ severity: 'blocker', drawCount: 21 });
    expect(plain(found?.statement)).toMatch(
      /a wrong working \(third left out\) gives [\d.]+ m where [\d.]+ m is right on draw \d+, and would earn the mark; 21 draws show it\./,
    );
    expect(findingsOf(rods(percent(2), '3.1 * a'), 'slip-inside-band')).toEqual([]);
  });

  it('that cannot be worked out are stopped with their mistake', () => {
    const [found] = findingsOf(rods(percent(5), '3.1 * b'), 'slip-mistake');
    expect(found).toMatchObject({ severity: 'blocker', place: { partId: 'p1', field: 'slip:s' } });
    expect(found?.statement).toContain('`b`');
  });

  it('that the engine makes up are questioned inside the band', () => {
    // One length taken for the other is right where they are equal.
    const item = (condition: string) =>
      itemWith(
        `L = draw(2.0 cm, 4.0 cm, 0.2 cm)\nd = draw(3.0 cm, 6.0 cm, 0.2 cm)\nx = L^2 / d${condition}`,
        [{ quantity: 'x', unit: 'cm', figures: 2, band: percent(2) }],
      );
    const near = findingsOf(item(''), 'near-miss-inside-band').map(({ statement }) => plain(statement));
    expect(near.some((statement) => statement.includes('(“d” taken for “L”)'))).toBe(true);
    expect(findingsOf(item('\nrequire(abs(L - d) > 0.5 cm)'), 'near-miss-inside-band')).toEqual([]);
  });

  it.each([
    ['the factor 2 left out', 'v = sqrt(2 * e * 200 V / m_e)', 'v', 'm s^-1', ''],
    ['the root left out', 'v = sqrt(2 * e * 200 V / m_e)', 'v', 'm s^-1', ''],
    ['the mass of a proton taken', 'v = sqrt(2 * e * 200 V / m_e)', 'v', 'm s^-1', ''],
    ['the square of “t” left out', 't = 3.0 s\ny = 0.5 * 3.0 m/s^2 * t^2', 'y', 'm', ''],
    ['“P / W” upside down', 'P = 3.0 J\nW = 2.0 J\nx = P / W', 'x', '', ''],
    ['“b” left out', 'a = 3.0 m\nb = 1.0 m\nx = a + b', 'x', 'm', ''],
    ['“b” taken with the wrong sign', 'a = 3.0 m\nb = 1.0 m\nx = a + b', 'x', 'm', ''],
    ['the other root of the equation taken', 'b = 3.0\nx = b + sqrt(b^2 - 4)', 'x', '', ''],
    ['the other angle with the same sine taken', 's = 0.6\nx = asin(s)', 'x', '°', ''],
    ['the angle given in radians', 's = 0.6\nx = asin(s)', 'x', '°', ''],
    ['degrees taken for radians', 'A = 30°\nx = sin(A)', 'x', '', ''],
    ['cos taken for sin', 'A = 30°\nx = sin(A)', 'x', '', ''],
    ['“phi” left in electronvolts', 'phi = 2.30 eV\nf = phi / h', 'f', 'Hz', ''],
    ['the diameter taken for “r”', 'r = 3.0 mm\nx = r^3', 'x', 'mm^3', 'r: dropRadius'],
    ['the radius given for the diameter', 'a = 3.0 mm\nD = 2 * a', 'D', 'mm', 'D: dropDiameter'],
    ['one too many', 'q = 4.8e-19 C\nn = round(q / e)', 'n', '', 'n: chargeNumber'],
  ])('are made up from the working: %s', (label, script, quantity, unit, role) => {
    const [name = '', id = ''] = role.split(': ');
    const item = itemWith(script, [{ quantity, unit }], { roles: role === '' ? {} : { [name]: id } });
    const labels = reportOf(item).scales[0]?.marks.map((mark) => mark.label);
    expect(labels).toContain(label);
  });

  it('are made up through results that no part asks for', () => {
    const item = itemWith('Va = 200 V\nU = 2 * e * Va\nv = sqrt(U / m_e)', [
      { quantity: 'v', unit: 'm s^-1' },
    ]);
    expect(reportOf(item).scales[0]?.marks.map(({ label }) => label)).toContain('the factor 2 left out');
  });

  it('include the published radius for a diameter', () => {
    // OpenStax College Physics 2e, exercise fs-id3188615 asks for the diameter and prints 5.54e-7 m, the radius.
    const item = itemWith(
      `M = 6.54e-16 kg
rho = 920 kg/m^3
D = 2 * cbrt(3 * M / (4 * pi * rho))`,
      [{ quantity: 'D', unit: 'm' }],
      { roles: { M: 'dropMass', rho: 'dropDensity', D: 'dropDiameter' } },
    );
    const miss = reportOf(item).scales[0]?.marks.find(({ label }) => /radius/.test(label));
    expect(miss).toMatchObject({ kind: 'nearMiss', insideBand: false });
    expect(1.1074e-6 * (1 + (miss?.relativeError ?? 0))).toBeCloseTo(5.54e-7, 9);
  });

  it('that give what a named slip gives are told once', () => {
    const item = itemWith('a = draw(2.0 m, 4.0 m, 0.1 m)\nx = 3 * a', [
      { quantity: 'x', unit: 'm', slips: [{ id: 's', name: 'three left out', expression: 'a' }] },
    ]);
    const labels = reportOf(item)
      .scales[0]?.marks.filter(({ kind }) => kind !== 'route')
      .map(({ label }) => label);
    expect(labels).toEqual(['three left out']);
  });

  it('whose units are wrong too are only noted', () => {
    const item = itemWith('U = draw(0.8 V, 1.2 V, 0.1 V)\nR = 1.0 Ω\nI = U / R', [
      { quantity: 'I', unit: 'A' },
    ]);
    const found = reportOf(item).findings.filter(({ check }) => check === 'uniqueness');
    expect(found).toMatchObject([{ code: 'near-miss-by-chance', severity: 'note', drawCount: 1 }]);
  });
});

describe('the recommended band', () => {
  const item = (band: Band, expression = '2 * x') =>
    itemWith('Va = draw(150 V, 300 V, 10 V)\nU = 2 * e * Va\nx = sqrt(U / m_e)', [
      { quantity: 'x', unit: 'm s^-1', figures: 2, band, slips: [{ id: 's', name: 'slip', expression }] },
    ]);
  const recommended = (content: ReturnType<typeof itemWith>) => reportOf(content).scales[0]?.recommended;

  it('is the narrowest tidy one that takes every route', () => {
    // Two figures of a number from 7.3 to 10.3: the last place is worth up to half of 1 in 7.3 … 1 in 10.
    const sound = recommended(item(percent(4)));
    expect(sound).toMatchObject({ verdict: 'sound' });
    expect(sound?.percent).toBeLessThanOrEqual(8);
  });

  it('calls a band that a route leaves too tight', () => {
    expect(recommended(item(percent(0.2)))).toMatchObject({ verdict: 'tooTight' });
  });

  it('notes a band that is far wider than it needs to be', () => {
    const wide = itemWith('a = draw(101 m, 199 m, 1 m)\nx = 3 * a', [
      { quantity: 'x', unit: 'm', figures: 3, band: percent(20) },
    ]);
    expect(findingsOf(wide, 'band-too-wide')).toMatchObject([{ severity: 'note' }]);
    expect(recommended(wide)).toMatchObject({ percent: 0.5, verdict: 'wide' });
  });

  it('says where none fits', () => {
    const [found] = findingsOf(item(percent(8), '1.01 * x'), 'no-band-fits');
    expect(found).toMatchObject({ severity: 'caution' });
    expect(recommended(item(percent(8), '1.01 * x'))).toMatchObject({ percent: null, verdict: 'impossible' });
  });

  it('stops a band whose unit does not fit', () => {
    const band: Band = { kind: 'absolute', plusMinus: 2, unit: 's' };
    expect(findingsOf(item(band), 'band-mistake')).toMatchObject([{ severity: 'blocker' }]);
  });
});
