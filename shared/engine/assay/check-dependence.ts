import { CONSTANTS } from '../physics/constants.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import { findHoles } from '../holes/find-holes.ts';
import { sameDimension } from '../units/dimension.ts';
import { finding, type CheckStart } from './check.ts';
import type { Finding } from './report.ts';

/** Two answers closer than this, relative, are one. */
const SAME = 1e-9;
/** An answer this close to a printed constant could be quoted. */
const QUOTABLE = 0.002;

interface Spread {
  least: number;
  greatest: number;
  count: number;
  /** Largest distance from each constant of the same dimension, relative. */
  fromConstant: Map<string, number>;
}

/** 5. Every answer depends on its givens, and every given serves an answer. */
export const checkDependence: CheckStart = (context) => {
  const spreads = context.parts.map(({ info }) => ({
    info,
    spread: {
      least: Infinity,
      greatest: -Infinity,
      count: 0,
      fromConstant: new Map<string, number>(),
    } as Spread,
    constants: [...CONSTANTS.values()].filter(
      (constant) =>
        constant.name !== 'pi' && constant.value !== 0 && sameDimension(constant.dimension, info.dimension),
    ),
  }));
  return {
    visit: (block) => {
      for (const { info, spread, constants } of spreads) {
        const column = block.columns.get(info.name);
        if (column === undefined) continue;
        for (let index = 0; index < column.length; index += 1) {
          if (block.kept[index] === 0) continue;
          const value = column[index] ?? NaN;
          spread.count += 1;
          if (value < spread.least) spread.least = value;
          if (value > spread.greatest) spread.greatest = value;
          for (const { name, value: constant } of constants) {
            const off = Math.abs(value / constant - 1);
            spread.fromConstant.set(name, Math.max(off, spread.fromConstant.get(name) ?? 0));
          }
        }
      }
    },
    finish: () => {
      const findings: Finding[] = [];
      context.parts.forEach(({ part, letter, info }, at) => {
        const spread = spreads[at]?.spread;
        if (spread === undefined || spread.count < 2) return;
        const whole = context.content.quantities.find(({ name }) => name === info.name)?.role;
        const same = spread.greatest - spread.least <= SAME * Math.abs(spread.greatest);
        const moving = dependenciesOf(context.script, info.name).names.some((name) => {
          const from = context.script.quantities.find((quantity) => quantity.name === name);
          return from?.kind === 'drawn';
        });
        if (same && moving && whole !== 'chargeNumber') {
          findings.push(
            finding('answer-does-not-vary', {
              about: part.id,
              statement: `The answer to part (${letter}) is ${context.print(info.name, spread.least)} on all ${spread.count.toLocaleString('en-GB')} draws: the given values cancel, so nothing that is measured decides it.`,
              cure: 'Find the value by a second route that does not use the same relation, or ask for something that the givens decide.',
              place: { partId: part.id, quantity: info.name, span: info.span },
            }),
          );
          return;
        }
        for (const [name, off] of spread.fromConstant) {
          if (off > QUOTABLE) continue;
          findings.push(
            finding('answer-on-data-sheet', {
              about: `${part.id}:${name}`,
              statement: `The answer to part (${letter}) is within ${(off * 100).toPrecision(2)} % of ${name} on every draw, and ${name} is on the data sheet.`,
              cure: 'Add scatter to the readings, or ask for the working to be shown.',
              place: { partId: part.id, quantity: info.name },
            }),
          );
        }
      });
      return [...findings, ...unusedGivens(context)];
    },
  };
};

function unusedGivens(context: Parameters<CheckStart>[0]): Finding[] {
  const needed = new Set(
    context.parts.flatMap(({ info }) => [info.name, ...dependenciesOf(context.script, info.name).names]),
  );
  if (context.parts.length === 0) return [];
  const texts = [context.content.stem, ...context.content.parts.map((part) => part.text)];
  const printed = new Set(texts.flatMap((text) => findHoles(text).holes.flatMap((hole) => hole.names)));
  return context.script.quantities
    .filter((info) => info.kind !== 'computed' && printed.has(info.name) && !needed.has(info.name))
    .map((info) =>
      finding('given-unused', {
        about: info.name,
        statement: `“${info.name}” is printed but no answer uses it.`,
        cure: 'Take it out, or leave it in on purpose as a value to be passed over.',
        place: { quantity: info.name, span: info.span },
      }),
    );
}
