import { CONSTANTS } from '../physics/constants.ts';
import { PLAUSIBLE_RANGES } from '../physics/limits.ts';
import { AIR_BREAKDOWN_FIELD } from '../physics/models.ts';
import { findRole } from '../physics/roles.ts';
import { sameDimension } from '../units/dimension.ts';
import { readUnit } from '../units/read-unit.ts';
import type { BlockValues } from '../compile/compiled-script.ts';
import { drawsShow, finding, Tally, type CheckStart } from './check.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';
import { WHOLE_ROLES } from './part-roles.ts';
import { bindRoles, type BoundSet } from './roles-bound.ts';
import type { FindingCode } from './severity.ts';

const LIGHT = CONSTANTS.get('c')?.value ?? NaN;

const POSITIVE_KINDS = ['m', 'kg', 'K', 'Hz'].map((unit) => readUnit(unit));
/** Lengths that may point either way. */
const SIGNED_ROLES = new Set(['deflection']);

/** One thing that must hold of a value or of two values on every draw. */
interface Rule {
  code: FindingCode;
  names: string[];
  /** How badly the draw fails, or null when it holds. */
  failure: (values: readonly number[]) => number | null;
  statement: (values: string[], draw: number, draws: string) => string;
  cure: string;
}

function speedRules(context: AssayContext): Rule[] {
  const speed = readUnit('m/s');
  return context.script.quantities
    .filter(
      (info) =>
        info.shape.kind === 'scalar' && speed.ok && sameDimension(info.dimension, speed.unit.dimension),
    )
    .map((info) => ({
      code: 'faster-than-light',
      names: [info.name],
      failure: ([v = 0]) => (Math.abs(v) >= LIGHT ? Math.abs(v) : null),
      statement: ([v], draw, draws) =>
        `On draw ${draw} “${info.name}” is ${v}, which is not below the speed of light; ${draws}.`,
      cure: 'Lower the energy or the field that gives this speed, or mend the working.',
    }));
}

function positiveRules(context: AssayContext): Rule[] {
  const roles = new Map(context.content.quantities.map((quantity) => [quantity.name, quantity.role]));
  const asked = new Set(context.parts.map(({ info }) => info.name));
  return context.script.quantities
    .filter(
      (info) =>
        info.shape.kind === 'scalar' &&
        // A step of the working that stands for nothing may be a difference of either sign.
        (info.kind !== 'computed' || asked.has(info.name) || (roles.get(info.name) ?? null) !== null) &&
        !SIGNED_ROLES.has(roles.get(info.name) ?? '') &&
        POSITIVE_KINDS.some((kind) => kind.ok && sameDimension(info.dimension, kind.unit.dimension)),
    )
    .map((info) => ({
      code: 'not-positive',
      names: [info.name],
      failure: ([x = 0]) => (x <= 0 ? -x : null),
      statement: ([x], draw, draws) =>
        `On draw ${draw} “${info.name}” is ${x}: it must be greater than zero; ${draws}.`,
      cure: 'Tighten the ranges so that it stays positive, or mend the working.',
    }));
}

function roleRules(set: BoundSet): Rule[] {
  const rules: Rule[] = [];
  for (const [role, name] of set.names) {
    if (WHOLE_ROLES.has(role)) {
      rules.push({
        code: 'not-whole',
        names: [name],
        failure: ([n = 0]) =>
          Math.abs(n - Math.round(n)) > 1e-9 || n < 1 ? Math.abs(n - Math.round(n)) + 1 : null,
        statement: ([n], draw, draws) =>
          `On draw ${draw} “${name}” (${findRole(role)?.name ?? role}) is ${n}, which is no whole number of at least 1; ${draws}.`,
        cure: 'Draw it with whole(from, to), or round what the readings give.',
      });
    }
    const range = PLAUSIBLE_RANGES.find((candidate) => candidate.role === role);
    if (range !== undefined) {
      rules.push({
        code: 'implausible-size',
        names: [name],
        failure: ([x = 0]) => {
          const size = Math.abs(x);
          if (size >= range.least && size <= range.greatest) return null;
          return size < range.least ? range.least / size : size / range.greatest;
        },
        statement: ([x], draw, draws) =>
          `On draw ${draw} “${name}” (${findRole(role)?.name ?? role}) is ${x}; ${range.words}; ${draws}.`,
        cure: 'Choose values that such apparatus has, or say in the stem what is special.',
      });
    }
  }
  return rules;
}

function pairRules(context: AssayContext, set: BoundSet): Rule[] {
  const rules: Rule[] = [];
  const pair = (a: string, b: string) => {
    const names = [set.names.get(a), set.names.get(b)];
    return names.every((name) => name !== undefined) ? (names as [string, string]) : null;
  };
  const photons = pair('photonEnergy', 'workFunction');
  if (photons !== null && context.content.claims.includes('electronsEmitted')) {
    rules.push({
      code: 'no-emission',
      names: photons,
      failure: ([photon = 0, work = 0]) => (photon <= work ? work / photon : null),
      statement: ([photon, work], draw, draws) =>
        `On draw ${draw} the photons carry ${photon}, which does not exceed the work function of ${work}, so no electron is freed; ${draws}.`,
      cure: 'Shorten the wavelengths or lower the work functions, or require that the photon energy is the greater.',
    });
  }
  if (photons !== null && context.content.claims.includes('noElectronsEmitted')) {
    rules.push({
      code: 'unclaimed-emission',
      names: photons,
      failure: ([photon = 0, work = 0]) => (photon > work ? photon / work : null),
      statement: ([photon, work], draw, draws) =>
        `On draw ${draw} the photons carry ${photon}, more than the work function of ${work}, so electrons are freed; ${draws}.`,
      cure: 'Lengthen the wavelengths or raise the work functions.',
    });
  }
  const claimsNone = context.content.claims.includes('noElectronsEmitted');
  for (const role of ['greatestKineticEnergy', 'stoppingPd']) {
    const name = set.names.get(role);
    // What the photon energy already tells need not be told again.
    const told = photons !== null && context.content.claims.includes('electronsEmitted');
    if (name === undefined || claimsNone || told) continue;
    rules.push({
      code: 'no-emission',
      names: [name],
      failure: ([energy = 0]) => (energy <= 0 ? -energy : null),
      statement: ([energy], draw, draws) =>
        `On draw ${draw} “${name}” (${findRole(role)?.name ?? role}) is ${energy}, so no electron is freed; ${draws}.`,
      cure: 'Shorten the wavelengths or lower the work functions, or require that the photon energy is the greater.',
    });
  }
  const plates = pair('deflection', 'plateSeparation');
  if (plates !== null && context.content.claims.includes('beamClearsPlates')) {
    rules.push({
      code: 'beam-hits-plate',
      names: plates,
      failure: ([y = 0, d = 0]) => (Math.abs(y) >= d / 2 ? Math.abs(y) / d : null),
      statement: ([y, d], draw, draws) =>
        `On draw ${draw} the beam is deflected by ${y} between plates that are ${d} apart, so it hits a plate; ${draws}.`,
      cure: 'Lower the p.d., shorten the plates, or require that the deflection stays below half the separation.',
    });
  }
  const gap = pair('balancePd', 'plateSeparation');
  if (gap !== null) {
    rules.push({
      code: 'air-breaks-down',
      names: gap,
      failure: ([pd = 0, d = 1]) => (pd / d > AIR_BREAKDOWN_FIELD ? pd / d : null),
      statement: ([pd, d], draw, draws) =>
        `On draw ${draw} ${pd} across ${d} is a field above 3 MV m⁻¹, at which air breaks down; ${draws}.`,
      cure: 'Lower the p.d. or widen the gap.',
    });
  }
  return rules;
}

function visitRule(rule: Rule, tally: Tally, worst: number[], block: BlockValues): void {
  const columns = rule.names.map((name) => block.columns.get(name));
  // One array for all draws: a rule reads it and keeps nothing of it.
  const values = columns.map(() => NaN);
  for (let index = 0; index < block.draws.length; index += 1) {
    if (block.kept[index] === 0) continue;
    for (let at = 0; at < columns.length; at += 1) values[at] = columns[at]?.[index] ?? NaN;
    const badness = rule.failure(values);
    if (badness === null) continue;
    if (badness > tally.worstBadness) worst.splice(0, worst.length, ...values);
    tally.add(block.draws[index] ?? 0, badness);
  }
}

/** 2. Values stay within what physics and apparatus allow on every draw. */
export const checkLimits: CheckStart = (context) => {
  const sets = bindRoles(context);
  const rules = [
    ...speedRules(context),
    ...positiveRules(context),
    ...sets.flatMap((set) => [...roleRules(set), ...pairRules(context, set)]),
  ].map((rule) => ({ rule, tally: new Tally(), worst: [] as number[] }));
  return {
    visit: (block) => {
      for (const { rule, tally, worst } of rules) visitRule(rule, tally, worst, block);
    },
    finish: (): Finding[] =>
      rules
        .filter(({ tally }) => tally.count > 0)
        .map(({ rule, tally, worst }) => {
          const name = rule.names[0] ?? '';
          const printed = worst.map((value, index) => context.print(rule.names[index] ?? '', value));
          return finding(rule.code, {
            about: rule.names.join(':'),
            statement: rule.statement(printed, tally.worstDraw ?? 0, drawsShow(tally.count)),
            cure: rule.cure,
            place: {
              quantity: name,
              span: context.script.quantities.find((quantity) => quantity.name === name)?.span,
            },
            tally,
          });
        }),
  };
};
