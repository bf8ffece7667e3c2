import { readUnit, ROLES_OF_QUANTITIES, sameDimension, type RoleRow } from '#shared/engine/index.ts';

/**
 * The roles that a value in `unit` can have, by its dimension; all of them where the unit cannot be read.
 * A role of another dimension would be refused by the checker.
 */
export function rolesFor(unit: string): readonly RoleRow[] {
  const reading = readUnit(unit);
  if (!reading.ok) return ROLES_OF_QUANTITIES;
  return ROLES_OF_QUANTITIES.filter((role) => {
    const own = readUnit(role.unit);
    return own.ok && sameDimension(own.unit.dimension, reading.unit.dimension);
  });
}
