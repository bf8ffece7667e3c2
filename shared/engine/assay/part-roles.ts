import type { AssayContext, AssayPart } from './context.ts';

/** Roles whose values are counted in whole numbers. */
export const WHOLE_ROLES: ReadonlySet<string> = new Set(['chargeNumber', 'levelNumber', 'diffractionOrder']);

/** The role of a name, or an empty text. */
export function roleOf(context: AssayContext, name: string): string {
  return context.content.quantities.find((quantity) => quantity.name === name)?.role ?? '';
}

/** Whether a part's answer is a whole number: by its role, or because only the exact number earns the mark. */
export function isWhole(context: AssayContext, { part, info }: AssayPart): boolean {
  const { band } = part.answer;
  const exact = band.kind === 'absolute' && band.plusMinus === 0;
  return WHOLE_ROLES.has(roleOf(context, info.name)) || exact;
}
