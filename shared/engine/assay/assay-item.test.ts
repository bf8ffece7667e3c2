import { describe, expect, it } from 'vitest';
import { assayedHash, assayItem } from './assay-item.ts';
import { itemWith, reportOf } from './assay-fixture.ts';
import { assayReportSchema } from './report.ts';
import { SEVERITY_TABLE } from './severity.ts';

const SOUND = itemWith(
  'Va = draw(150 V, 300 V, 10 V)\nv = sqrt(2 * e * Va / m_e)',
  [{ quantity: 'v', unit: 'm s^-1' }],
  {
    stem: 'Electrons from rest are accelerated through {{Va}}.',
    roles: { Va: 'acceleratingPd', v: 'speed' },
  },
);

describe('an assay', () => {
  it('has nothing to say of a sound item', () => {
    expect(reportOf(SOUND).findings).toEqual([]);
  });

  it('is plain data of its schema, the same on every run', () => {
    const report = reportOf(SOUND);
    expect(assayReportSchema.parse(JSON.parse(JSON.stringify(report)))).toEqual(report);
    expect(reportOf(structuredClone(SOUND))).toEqual(report);
  });

  it('stops a script that does not compile, at its line', () => {
    const { report, diagnostics } = assayItem({ ...SOUND, script: 'a = 1 m\nv = a + 1 s' });
    expect(diagnostics).toHaveLength(1);
    expect(report.findings).toMatchObject([
      { code: 'script-mistake', severity: 'blocker', place: { span: { line: 2 } } },
    ]);
    expect(report.drawsAssayed).toBe(0);
  });

  it('stops an item without parts', () => {
    expect(reportOf({ ...SOUND, parts: [] }).findings.map(({ code }) => code)).toContain('no-parts');
  });

  it('puts blockers first and tells its progress', () => {
    const shares: number[] = [];
    const item = itemWith(
      'a = draw(-3 m, 3 m, 1 m)\nb = 1 m\nx = sqrt(a * 1 m)',
      [{ quantity: 'x', unit: 'm' }],
      {
        stem: 'A rod of {{b}}.',
      },
    );
    const report = reportOf(item, { onProgress: (share) => shares.push(share) });
    const ranks = report.findings.map(({ severity }) => ['blocker', 'caution', 'note'].indexOf(severity));
    expect(ranks).toEqual([...ranks].sort());
    expect(shares.at(-1)).toBe(1);
  });

  it('says that a large grid was sampled, and how sure that makes', () => {
    const script = Array.from({ length: 7 }, (_, index) => `b${index + 1} = draw(1.0 m, 9.9 m, 0.1 m)`);
    const item = itemWith([...script, 'x = b1 + b2 + b3 + b4 + b5 + b6 + b7'].join('\n'), [
      { quantity: 'x', unit: 'm' },
    ]);
    const report = reportOf(item);
    expect(report).toMatchObject({ exhaustive: false, drawsAssayed: 20_000 });
    // Rule of three (Hanley and Lippman-Hand 1983).
    expect(report.coverage).toMatch(/^20,000 of 4\.8 × 10\^13/);
    expect(report.coverage).toMatch(/rounding routes and wrong workings followed on at least [\d,]+ of them/);
  });
});

describe('the hash of what is assayed', () => {
  it('moves with the content, but not with the reasons for cautions or the order of keys', () => {
    const hash = assayedHash(SOUND);
    expect(assayedHash({ ...SOUND, acceptedCautions: { key: 'a reason' } })).toBe(hash);
    expect(assayedHash({ ...SOUND, stem: `${SOUND.stem} ` })).not.toBe(hash);
    const reversed = Object.fromEntries(Object.entries(SOUND).reverse()) as typeof SOUND;
    expect(assayedHash(reversed)).toBe(hash);
  });
});

describe('the severity table', () => {
  it('gives every finding a check, a severity and a reason', () => {
    for (const [, severity, reason] of Object.values(SEVERITY_TABLE)) {
      expect(['blocker', 'caution', 'note']).toContain(severity);
      expect(reason).toMatch(/^[A-Z].*\.$/);
    }
  });
});
