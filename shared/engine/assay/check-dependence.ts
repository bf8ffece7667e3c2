import { dependenciesOf } from '../compile/dependencies.ts';
import { findHoles } from '../holes/find-holes.ts';
import { finding, type RunningCheck } from './check.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { isWhole } from './part-roles.ts';
import type { Finding } from './report.ts';
import { sensitivitiesOf, type Sensitivity } from './sensitivities.ts';
import { soughtConstants, type SoughtConstant } from './sought-constants.ts';

/** Two answers closer than this, relative, are one. */
const SAME = 1e-9;
/** An answer this close to a constant on every draw comes back to it; readings carry some rounding. */
const QUOTABLE = 0.05;
/** An answer that moves by less than this, percent, for one percent in a value does not depend on it. */
const STILL = 1e-6;

interface Watched {
  part: AssayPart;
  least: number;
  greatest: number;
  count: number;
  constants: { constant: SoughtConstant; off: number }[];
  sensitivities: Sensitivity[] | null;
}

/** Whether anything that is drawn reaches the answer. */
function restsOnDraws(context: AssayContext, name: string): boolean {
  const names = new Set([name, ...dependenciesOf(context.script, name).names]);
  return context.script.quantities.some((quantity) => quantity.kind === 'drawn' && names.has(quantity.name));
}

function tellPart(context: AssayContext, watched: Watched): Finding[] {
  const { part: entry, count, least, greatest, constants, sensitivities } = watched;
  const { part, letter, info } = entry;
  if (count < 2 || isWhole(context, entry)) return [];
  const place = { partId: part.id, quantity: info.name };
  const draws = count.toLocaleString('en-GB');
  const same = greatest - least <= SAME * Math.max(Math.abs(greatest), Math.abs(least));
  if (same && restsOnDraws(context, info.name)) {
    return [
      finding('answer-does-not-vary', {
        about: part.id,
        statement: `The answer to part (${letter}) is ${context.print(info.name, least)} on all ${draws} draws: the given values cancel, so nothing that is measured decides it.`,
        cure: 'Find the value by a second route that does not use the same relation, or ask for something that the givens decide.',
        place: { ...place, span: info.span },
      }),
    ];
  }
  const findings: Finding[] = [];
  const known = constants.filter(({ off }) => off <= QUOTABLE).sort((a, b) => a.off - b.off)[0];
  if (known !== undefined) {
    const { name, words, from } = known.constant;
    if (from.every((constant) => entry.dependencies.constants.includes(constant))) {
      findings.push(
        finding('sought-constant-used', {
          about: `${part.id}:${name}`,
          statement: `The answer to part (${letter}) is the ${words}, and its own working uses ${from.join(' and ')}.`,
          cure: 'Let the readings alone lead to it.',
          place,
        }),
      );
    } else {
      findings.push(
        finding('answer-on-data-sheet', {
          about: `${part.id}:${name}`,
          statement: `On all ${draws} draws the answer to part (${letter}) comes back to ${name} (${words}) within ${(known.off * 100).toPrecision(2)} %: it could be quoted instead of worked out.`,
          cure: 'Give marks for the working, or add scatter to the readings.',
          place,
        }),
      );
    }
  }
  for (const { name, most } of sensitivities ?? []) {
    if (most > STILL) continue;
    findings.push(
      finding('given-cancels', {
        about: `${part.id}:${name}`,
        statement: `The working of part (${letter}) uses “${name}”, but the answer does not change with it: it cancels out.`,
        cure: 'Leave it out of the working, or ask for something that it decides.',
        place,
      }),
    );
  }
  return findings;
}

/** Printed values that no answer needs. */
function unusedGivens(context: AssayContext): Finding[] {
  if (context.parts.length === 0) return [];
  const needed = new Set(
    context.parts.flatMap(({ info }) => [info.name, ...dependenciesOf(context.script, info.name).names]),
  );
  const texts = [context.content.stem, ...context.content.parts.map((part) => part.text)];
  const printed = new Set(
    texts.flatMap((text) =>
      findHoles(text).holes.flatMap((hole) => hole.names.map((name) => name.replace(/\[.*$/, ''))),
    ),
  );
  const readable = new Set(context.printed.map(({ name }) => name));
  return context.script.quantities
    .filter(({ name, kind }) => kind !== 'computed' || readable.has(name))
    .filter(({ name }) => printed.has(name) && !needed.has(name))
    .map((info) =>
      finding('given-unused', {
        about: info.name,
        statement: `“${info.name}” is printed but no answer uses it.`,
        cure: 'Take it out, or leave it in on purpose as a value to be passed over.',
        place: { quantity: info.name, span: info.span },
      }),
    );
}

/** 5. Every answer depends on its givens, and every given serves an answer. */
export function checkDependence(
  context: AssayContext,
): RunningCheck & { sensitivities: (partId: string) => Sensitivity[] } {
  const watched: Watched[] = context.parts.map((part) => ({
    part,
    least: Infinity,
    greatest: -Infinity,
    count: 0,
    constants: soughtConstants(part.info.dimension).map((constant) => ({ constant, off: 0 })),
    sensitivities: null,
  }));
  return {
    visit: (block) => {
      for (const entry of watched) {
        const column = block.columns.get(entry.part.info.name);
        if (column === undefined) continue;
        for (let index = 0; index < column.length; index += 1) {
          if (block.kept[index] === 0) continue;
          const value = column[index] ?? NaN;
          entry.count += 1;
          if (value < entry.least) entry.least = value;
          if (value > entry.greatest) entry.greatest = value;
          for (const known of entry.constants) {
            known.off = Math.max(known.off, Math.abs(value / known.constant.value - 1));
          }
        }
        if (entry.sensitivities === null && block.kept.includes(1)) {
          entry.sensitivities = sensitivitiesOf(context, entry.part, block);
        }
      }
    },
    finish: () => [...watched.flatMap((entry) => tellPart(context, entry)), ...unusedGivens(context)],
    sensitivities: (partId) => watched.find((entry) => entry.part.part.id === partId)?.sensitivities ?? [],
  };
}
