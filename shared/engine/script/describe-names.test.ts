import { describe, expect, it } from 'vitest';
import { CONSTANTS } from '../physics/constants.ts';
import { findUnitSymbol } from '../units/unit.ts';
import { describeNames } from './describe-names.ts';

describe('describeNames', () => {
  const names = describeNames();

  it('describes every constant with what it measures and both its values', () => {
    for (const name of CONSTANTS.keys())
      expect(names.some((row) => row.kind === 'constant' && row.name === name)).toBe(true);
    expect(names.find((row) => row.name === 'm_e')).toMatchObject({
      detail: 'mass (kg)',
      description: 'electron mass: 9.1093837139 × 10^−31 kg; on data sheets 9.11 × 10^−31 kg.',
    });
  });

  it('describes only units that can be read', () => {
    for (const row of names) if (row.kind === 'unit') expect(findUnitSymbol(row.name)).not.toBeNull();
  });

  it('describes functions and forms by how they are written', () => {
    expect(names.find((row) => row.name === 'draw')).toMatchObject({
      kind: 'drawing',
      detail: 'draw(from, to, step)',
    });
    expect(names.find((row) => row.name === 'sqrt')).toMatchObject({ kind: 'function', detail: 'sqrt(x)' });
  });
});
