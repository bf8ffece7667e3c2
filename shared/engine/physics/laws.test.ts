import { describe, expect, it } from 'vitest';
import { CHARGE, LAWS, MASS, suggestForFactor } from './laws.ts';
import { PLAUSIBLE_RANGES } from './limits.ts';
import { findRole, ROLES_OF_QUANTITIES } from './roles.ts';
import { readUnit } from '../units/read-unit.ts';
import { SIMPLIFICATIONS } from './simplifications.ts';

const isRole = (id: string) => findRole(id) !== undefined;

describe('the table of laws', () => {
  it('has more than thirty rows, each with its own id, source and field of validity', () => {
    expect(LAWS.length).toBeGreaterThan(30);
    expect(new Set(LAWS.map(({ id }) => id)).size).toBe(LAWS.length);
    for (const { source, validity, statement } of LAWS) {
      expect([source, validity, statement].every((text) => text.length > 2)).toBe(true);
    }
  });

  it('speaks of roles that exist', () => {
    for (const law of LAWS) expect([law.subject, ...law.others].filter((role) => !isRole(role))).toEqual([]);
  });

  it('reads no role that it does not ask for, but the density of the fluid in a finer form', () => {
    for (const law of LAWS) {
      const read = new Set<string>();
      const value = (role: string) => {
        read.add(role);
        return 1.5;
      };
      law.formula(value);
      expect([law.id, [...read].filter((role) => !law.others.includes(role))]).toEqual([law.id, []]);
      for (const { formula } of law.refinements) formula(value);
      const extra = [...read].filter((role) => !law.others.includes(role));
      expect(extra.every((role) => role === 'airDensity' || role === 'dropDensity')).toBe(true);
    }
  });

  it('gives a number for every law at plain values', () => {
    for (const law of LAWS) {
      const value = (role: string) => (role === 'lowerLevel' ? -3 : role === 'upperLevel' ? -1 : 0.5);
      expect([law.id, Number.isFinite(law.formula(value))]).toEqual([law.id, true]);
    }
  });
});

describe('the other tables', () => {
  it('speak of roles that exist, each with a unit that can be read', () => {
    expect(new Set(ROLES_OF_QUANTITIES.map(({ id }) => id)).size).toBe(ROLES_OF_QUANTITIES.length);
    for (const { unit } of ROLES_OF_QUANTITIES) expect(unit === '' || readUnit(unit).ok).toBe(true);
    expect(PLAUSIBLE_RANGES.filter(({ role }) => !isRole(role))).toEqual([]);
    const roles = SIMPLIFICATIONS.flatMap(({ needs, powers }) => [...needs, ...Object.keys(powers)]);
    expect(roles.filter((role) => !isRole(role))).toEqual([]);
    expect([MASS, CHARGE].every(isRole)).toBe(true);
  });

  it('give a source for every limit and simplification', () => {
    for (const { source } of [...PLAUSIBLE_RANGES, ...SIMPLIFICATIONS]) expect(source).not.toBe('');
  });
});

describe('factors by which a law is missed', () => {
  it.each([
    [2, /half left out/],
    [1e3, /prefix/],
    [1 / 1.602176634e-19, /electronvolts/],
    [1.37, /^$/],
  ])('%d suggests what was done', (factor, words) => {
    expect(suggestForFactor(factor)).toMatch(words);
  });
});
