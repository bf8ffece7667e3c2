import { findHoles } from '../holes/find-holes.ts';
import { printingOf, type HolePrinting } from '../holes/fill-hole.ts';
import { fromSI } from '../units/convert.ts';
import { formatNumber } from '../units/format.ts';
import { unitText } from '../units/unit.ts';
import { drawsShow, finding, Tally, type CheckStart } from './check.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';
import { printedTexts } from './printed-texts.ts';

/** Plainly printed numbers read best in this range; common practice. */
const LEAST = 0.1;
const GREATEST = 1000;

interface Printed {
  name: string;
  printing: HolePrinting;
  awkward: Tally;
  example: string;
  /** Draws on which zeros before the point leave the significant figures open. */
  ambiguous: Tally;
  ambiguousExample: string;
}

/** Each value that candidates see, once for each unit and precision in which it prints. */
function printedValues(context: AssayContext): Printed[] {
  const holes = { script: context.script, quantities: context.content.quantities };
  const seen = new Map<string, Printed>();
  for (const { text, forCandidates } of printedTexts(context)) {
    if (!forCandidates) continue;
    for (const hole of findHoles(text).holes) {
      for (const name of hole.names) {
        const printing = printingOf(holes, name, hole);
        if ('problem' in printing) continue;
        const key = JSON.stringify([name, printing.unit.text, printing.precision]);
        if (seen.has(key)) continue;
        seen.set(key, {
          name,
          printing,
          awkward: new Tally(),
          example: '',
          ambiguous: new Tally(),
          ambiguousExample: '',
        });
      }
    }
  }
  return [...seen.values()];
}

function sizeBeyond(value: number): number {
  const size = Math.abs(value);
  return size < LEAST ? LEAST / size : size / GREATEST;
}

function tell(context: AssayContext, entry: Printed): Finding[] {
  const { name, printing, awkward, example, ambiguous, ambiguousExample } = entry;
  const unit = unitText(printing.unit);
  const place = { quantity: printing.info.name };
  const findings: Finding[] = [];
  if (awkward.count > 0) {
    findings.push(
      finding('awkward-number', {
        about: `${name}:${unit}`,
        statement: `On draw ${awkward.worstDraw} “${name}” prints as ${example}; ${drawsShow(awkward.count)}.`,
        cure: 'A unit with another prefix would keep the number between 0.1 and 1000.',
        place,
        tally: awkward,
      }),
    );
  }
  const enforced = context.parts.some(
    ({ part, dependencies }) =>
      part.answer.enforceFigures && dependencies.givens.includes(printing.info.name),
  );
  if (ambiguous.count > 0 && enforced) {
    findings.push(
      finding('ambiguous-zeros', {
        about: `${name}:${unit}`,
        statement: `On draw ${ambiguous.worstDraw} “${name}” prints as ${ambiguousExample}, whose zeros leave its significant figures open while an answer’s are enforced; ${drawsShow(ambiguous.count)}.`,
        cure: 'Print it in another unit or in standard form, or do not enforce the figures.',
        place,
        tally: ambiguous,
      }),
    );
  }
  return findings;
}

/** 10, of numbers: what candidates read keeps to a readable size. */
export const checkPrintedNumbers: CheckStart = (context) => {
  const printed = printedValues(context);
  return {
    visit: (block) => {
      for (const entry of printed) {
        const { info, element, unit, precision } = entry.printing;
        const series = block.series.get(info.name) ?? [];
        const scalar = block.columns.get(info.name);
        const columns = scalar === undefined ? series : [scalar];
        for (const column of element === null ? columns : columns.slice(element, element + 1)) {
          for (let index = 0; index < column.length; index += 1) {
            const value = fromSI(column[index] ?? NaN, unit);
            if (block.kept[index] === 0 || value === 0 || !Number.isFinite(value)) continue;
            const draw = block.draws[index] ?? 0;
            const beyond = sizeBeyond(value);
            const name = unitText(unit);
            const print = () => `${formatNumber(value, precision).text}${name === '' ? '' : `\u202F${name}`}`;
            if (beyond > 1 && beyond > entry.awkward.worstBadness) {
              const number = formatNumber(value, precision);
              if (number.exponent !== null || isReadable(number.value)) continue;
              entry.example = print();
              entry.awkward.add(draw, beyond);
            } else if (beyond > 1 && formatNumber(value, precision).exponent === null) {
              entry.awkward.add(draw, beyond);
            } else if ('decimals' in precision && precision.decimals <= 0 && Math.round(value) % 10 === 0) {
              if (entry.ambiguous.count === 0) entry.ambiguousExample = print();
              entry.ambiguous.add(draw, 0);
            }
          }
        }
      }
    },
    finish: () => printed.flatMap((entry) => tell(context, entry)),
  };
};

function isReadable(value: number): boolean {
  const size = Math.abs(value);
  return size >= LEAST && size <= GREATEST;
}
