import { evaluateBlock } from '../compile/evaluate.ts';
import type { BlockValues } from '../compile/compiled-script.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import { LAWS, suggestForFactor, type LawRow } from '../physics/laws.ts';
import { findRole } from '../physics/roles.ts';
import { formatNumber } from '../units/format.ts';
import { drawsShow, finding, shareInWords, Tally, type CheckStart } from './check.ts';
import { bindRoles, isBound, roleValue, type BoundSet } from './roles-bound.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';

/** Room for constants that a script writes as numbers to two or three figures, as g = 9.81 m s⁻²; relative. */
const FLOOR = 5e-3;
/** Room where readings carry scatter: lost factors still show. */
const SCATTER_ROOM = 0.3;
/** Givens are rounded half a unit at most; a little more is allowed for second-order effects. */
const ROOM = 1.2;

interface BoundLaw {
  law: LawRow;
  set: BoundSet;
  names: string[];
  /** Rounded givens that the bound names rest on, with the figures they print. */
  givens: { name: string; figures: number }[];
  /** Relative miss that is always allowed. */
  floor: number;
  tally: Tally;
  worstRatio: number;
}

function roundedGivens(context: AssayContext, names: readonly string[]): BoundLaw['givens'] {
  const reached = new Set(names.flatMap((name) => [name, ...dependenciesOf(context.script, name).names]));
  return context.script.quantities.flatMap((quantity) =>
    quantity.kind === 'given' && quantity.figures !== null && reached.has(quantity.name)
      ? [{ name: quantity.name, figures: quantity.figures }]
      : [],
  );
}

function hasScatter(context: AssayContext, names: readonly string[]): boolean {
  const reached = new Set(names.flatMap((name) => [name, ...dependenciesOf(context.script, name).names]));
  return context.script.statements.some(
    (statement) => statement.kind === 'scatter' && reached.has(statement.name),
  );
}

/** Subject over what the law gives for it. */
function ratioAt({ law, set }: BoundLaw, columns: ReadonlyMap<string, Float64Array>, index: number): number {
  const value = roleValue(set, columns, index);
  return value(law.subject) / law.formula(value);
}

/** Whether the script follows a finer form of the law, as with special relativity. */
function isRefined(
  { law, set, floor }: BoundLaw,
  columns: ReadonlyMap<string, Float64Array>,
  index: number,
  room: number,
): boolean {
  const value = roleValue(set, columns, index);
  return law.refinements.some(({ formula }) => {
    const ratio = value(law.subject) / formula(value);
    return ratio > 0 && Math.abs(Math.log(ratio)) <= floor + room;
  });
}

/** How far rounding the givens as printed can move the law's ratio, relative, draw by draw. */
function roundingRoom(context: AssayContext, bound: BoundLaw, block: BlockValues): Float64Array {
  const room = new Float64Array(block.draws.length);
  for (const { name, figures } of bound.givens) {
    const column = block.columns.get(name);
    if (column === undefined) continue;
    const halfUnits = column.map((value) => {
      const exponent = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
      return 0.5 * 10 ** (exponent - figures + 1);
    });
    const moved = evaluateBlock(context.script, block.draws, {
      wanted: bound.names,
      conditions: false,
      pinned: new Map([[name, column.map((value, index) => value + (halfUnits[index] ?? 0))]]),
    });
    for (let index = 0; index < room.length; index += 1) {
      const change = Math.log(ratioAt(bound, moved.columns, index) / ratioAt(bound, block.columns, index));
      room[index] = (room[index] ?? 0) + Math.abs(change);
    }
  }
  return room;
}

/** A miss in words: as "2.00 times", or "4.2 % more than" where it is small. */
function missInWords(ratio: number): string {
  if (ratio > 0.9 && ratio < 1.1) {
    return `${shareInWords(ratio - 1)} ${ratio > 1 ? 'more' : 'less'} than`;
  }
  return `${formatNumber(ratio, { figures: 3 }).text} times`;
}

/** 3. Every law whose roles are all bound holds on every draw, to the rounding of the givens. */
export const checkLaws: CheckStart = (context) => {
  const bound = bindRoles(context).flatMap((set) =>
    LAWS.filter((law) => set.names.has(law.subject) && law.others.every((role) => isBound(set, role))).map(
      (law): BoundLaw => {
        const names = [law.subject, ...law.others].flatMap((role) => set.names.get(role) ?? []);
        return {
          law,
          set,
          names,
          givens: roundedGivens(context, names),
          floor: hasScatter(context, names) ? SCATTER_ROOM : FLOOR,
          tally: new Tally(),
          worstRatio: 1,
        };
      },
    ),
  );
  return {
    visit: (block) => {
      for (const entry of bound) {
        let room: Float64Array | null = null;
        for (let index = 0; index < block.draws.length; index += 1) {
          if (block.kept[index] === 0) continue;
          const ratio = ratioAt(entry, block.columns, index);
          const miss = Math.abs(Math.log(ratio));
          if (miss <= entry.floor || Number.isNaN(ratio)) continue;
          room ??= roundingRoom(context, entry, block);
          const allowed = ROOM * (room[index] ?? 0);
          if (ratio > 0 && miss <= entry.floor + allowed) continue;
          if (isRefined(entry, block.columns, index, allowed)) continue;
          const badness = ratio > 0 ? miss : Infinity;
          if (badness > entry.tally.worstBadness) entry.worstRatio = ratio;
          entry.tally.add(block.draws[index] ?? 0, badness);
        }
      }
    },
    finish: () => byCulprit(context, bound).map((entries) => tell(context, entries)),
  };
};

/** The name that is worked out last among those that a law binds: the line to look at. */
function culpritOf(context: AssayContext, { names, set, law }: BoundLaw): string {
  const computed = context.script.quantities.filter(
    ({ name, kind }) => kind === 'computed' && names.includes(name),
  );
  return computed.at(-1)?.name ?? set.names.get(law.subject) ?? law.subject;
}

/** Broken laws, those that one line breaks together, the law that binds fewest first. */
function byCulprit(context: AssayContext, bound: readonly BoundLaw[]): [BoundLaw, ...BoundLaw[]][] {
  const groups = new Map<string, [BoundLaw, ...BoundLaw[]]>();
  const broken = bound.filter(({ tally }) => tally.count > 0);
  for (const entry of broken.sort((a, b) => a.names.length - b.names.length)) {
    const key = `${entry.set.set}:${culpritOf(context, entry)}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [entry]);
    else group.push(entry);
  }
  return [...groups.values()];
}

function tell(context: AssayContext, [first, ...others]: [BoundLaw, ...BoundLaw[]]): Finding {
  const { law, set, tally, worstRatio } = first;
  const subject = set.names.get(law.subject) ?? law.subject;
  const role = findRole(law.subject)?.name ?? law.subject;
  const suggestion = worstRatio > 0 ? suggestForFactor(worstRatio) : 'The sign is the other way round.';
  const culprit = culpritOf(context, first);
  const also = [...new Set(others.map((other) => other.law.statement))].filter(
    (statement) => statement !== law.statement,
  );
  const pieces = [
    `The script’s “${subject}” (${role}) is ${missInWords(worstRatio)} what ${law.statement} gives, on draw ${tally.worstDraw}; ${drawsShow(tally.count)}.`,
    ...(suggestion === '' ? [] : [suggestion]),
    ...(also.length === 0 ? [] : [`The same line breaks ${also.join('; ')}.`]),
  ];
  return finding('law-broken', {
    about: `${law.id}:${set.set}`,
    statement: pieces.join(' '),
    cure: `Mend the line that works out “${culprit}”, or correct what the quantities stand for.`,
    place: {
      quantity: culprit,
      span: context.script.quantities.find((quantity) => quantity.name === culprit)?.span,
    },
    tally,
  });
}
