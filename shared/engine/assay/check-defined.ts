import { finding, drawsInWords, drawsShow, Tally, type CheckStart } from './check.ts';
import type { Finding } from './report.ts';
import { whyUndefined } from './why-undefined.ts';

/** Share of discarded draws above which the writer is told. */
const MANY_DISCARDED = 0.9;

/** 1. Every value is a finite number on every kept draw, and some draws are kept. */
export const checkDefined: CheckStart = (context) => {
  const tallies = new Map<string, Tally>();
  let seen = 0;
  let kept = 0;
  return {
    visit: (block) => {
      seen += block.draws.length;
      for (const value of block.kept) kept += value;
      const columns = [
        ...block.columns,
        ...[...block.series].flatMap(([name, elements]) =>
          elements.map((column): [string, Float64Array] => [name, column]),
        ),
      ];
      for (const [name, column] of columns) {
        for (let i = 0; i < column.length; i += 1) {
          if (block.kept[i] === 0 || Number.isFinite(column[i])) continue;
          let tally = tallies.get(name);
          if (tally === undefined) tallies.set(name, (tally = new Tally()));
          tally.add(block.draws[i] ?? 0, 0);
        }
      }
    },
    finish: () => {
      const findings: Finding[] = [];
      // What follows from an undefined value is undefined too: only the first name of the chain is told.
      for (const quantity of context.script.quantities) {
        const tally = tallies.get(quantity.name);
        if (tally === undefined || quantity.uses.some((name) => tallies.has(name))) continue;
        const draw = tally.worstDraw ?? 1;
        const cause = whyUndefined(context, quantity.name, draw);
        findings.push(
          finding('undefined-value', {
            about: quantity.name,
            statement: `On draw ${draw} “${quantity.name}” has no value: ${cause}; ${drawsShow(tally.count)}.`,
            cure: 'Tighten the ranges, or add a require that leaves such draws out.',
            place: { span: quantity.span, quantity: quantity.name },
            tally,
          }),
        );
      }
      if (seen > 0 && kept === 0) {
        findings.push(
          finding('no-draw-kept', {
            statement:
              seen === 1
                ? 'The only draw does not fulfil every require.'
                : `None of the ${drawsInWords(seen)} fulfils every require.`,
            cure: 'Widen the ranges or loosen a condition.',
          }),
        );
      } else if (seen > 0 && kept / seen < 1 - MANY_DISCARDED) {
        findings.push(
          finding('most-draws-discarded', {
            statement: `The conditions discard ${((1 - kept / seen) * 100).toPrecision(3)} % of the draws; ${kept.toLocaleString('en-GB')} are left.`,
            cure: 'Narrower ranges would leave fewer draws out.',
          }),
        );
      }
      return findings;
    },
  };
};
