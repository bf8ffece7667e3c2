import { compileExpression } from '../compile/expressions.ts';
import { toSI } from '../units/convert.ts';
import { formatQuantity } from '../units/format.ts';
import { drawsShow, finding, type RunningCheck } from './check.ts';
import type { AssayContext } from './context.ts';
import { measurePart, type PartMeasure } from './measure-part.ts';
import { recommendBand } from './recommend-band.ts';
import type { Finding, PartScale, StripMark } from './report.ts';
import { routeInWords, type Route } from './routes.ts';

/** Marks that a scale strip shows at most, the closest first. */
const MOST_MARKS = 30;

/** An answer (in the answer's unit) as a sentence tells it: a figure or two more than is asked for. */
function inWords({ part: { part, unit } }: PartMeasure, value: number): string {
  return formatQuantity(toSI(value, unit), unit, { figures: part.answer.figures + 1 }).text;
}

/** 6. Every honest way of rounding lands inside the band, on every draw that is followed. */
function tellRoutes(measure: PartMeasure, { percent }: PartScale['recommended']): Finding[] {
  const outside = measure.routes.filter((entry) => entry.outside.count > 0);
  const worst = outside.reduce<(typeof outside)[number] | null>(
    (most, entry) => (most === null || entry.outside.worstBadness > most.outside.worstBadness ? entry : most),
    null,
  );
  if (worst === null) return [];
  const { letter, part } = measure.part;
  const { value, answer, from, to } = worst.worst ?? { value: NaN, answer: NaN, from: NaN, to: NaN };
  return [
    finding('route-outside-band', {
      about: part.id,
      statement: `In part (${letter}), on draw ${worst.outside.worstDraw}, ${routeInWords(worst.route, measure.part)} gives ${inWords(measure, value)} where the model answer is ${inWords(measure, answer)} and the band goes from ${inWords(measure, from)} to ${inWords(measure, to)}; ${drawsShow(worst.outside.count)}.`,
      cure:
        percent === null
          ? 'No tidy band takes every route: ask for fewer steps in one part, or print a value on the way.'
          : `Widen the band to ±${percent} %, or ask for a value on the way to more figures.`,
      place: { partId: part.id },
      tally: worst.outside,
    }),
  ];
}

/** 7. No slip and no near miss earns the mark. */
function tellUniqueness(context: AssayContext, measure: PartMeasure): Finding[] {
  const { letter, part } = measure.part;
  const findings: Finding[] = [];
  for (const slip of part.answer.slips) {
    const { expression, diagnostics } = compileExpression(context.script, slip.expression);
    if (expression !== null && expression.shape.kind === 'scalar') continue;
    findings.push(
      finding('slip-mistake', {
        about: `${part.id}:${slip.id}`,
        statement: `The slip “${slip.name}” of part (${letter}) cannot be worked out. ${diagnostics[0]?.message ?? 'It must give a single number.'}`,
        cure: 'Correct its expression; it may use every name of the script.',
        place: { partId: part.id, field: `slip:${slip.id}` },
      }),
    );
  }
  for (const { kind, label, fits, reach } of measure.workings) {
    if (reach.inside.count === 0) continue;
    // The same value under another name is no wrong answer: both sides of an identity agree everywhere.
    if (kind === 'nearMiss' && Math.abs(reach.furthest) < 1e-9) continue;
    const code =
      kind === 'slip' ? 'slip-inside-band' : fits ? 'near-miss-inside-band' : 'near-miss-by-chance';
    findings.push(
      finding(code, {
        about: `${part.id}:${label}`,
        statement: `In part (${letter}) a wrong working (${label}) gives ${inWords(measure, reach.value)} where ${inWords(measure, reach.answer)} is right on draw ${reach.draw}, and would earn the mark; ${drawsShow(reach.inside.count)}.`,
        cure:
          code === 'near-miss-by-chance'
            ? 'The units betray it; a require can leave such draws out.'
            : 'Narrow the band, change the ranges so that the two answers part, or leave such draws out with a require.',
        place: { partId: part.id },
        tally: reach.inside,
      }),
    );
  }
  return findings;
}

/** 8. How the writer's band compares with the narrowest tidy one. */
function tellBand(measure: PartMeasure, recommended: PartScale['recommended']): Finding[] {
  const { letter, part } = measure.part;
  const about = part.id;
  const place = { partId: part.id };
  if (measure.bandMistake) {
    return [
      finding('band-mistake', {
        about,
        statement: `The band of part (${letter}) is given in a unit that does not fit the answer.`,
        cure: 'Give it in the answer’s unit, or as a percentage.',
        place,
      }),
    ];
  }
  if (recommended.verdict === 'impossible') {
    return [
      finding('no-band-fits', {
        about,
        statement: `No tidy band suits part (${letter}). ${recommended.reason}`,
        cure: 'Ask for fewer steps in one part, or change the ranges so that the wrong working lies further off.',
        place,
      }),
    ];
  }
  if (recommended.verdict === 'wide') {
    return [
      finding('band-too-wide', {
        about,
        statement: `The band of part (${letter}) is wider than it needs to be. ${recommended.reason}`,
        cure: `±${recommended.percent} % would do.`,
        place,
      }),
    ];
  }
  return [];
}

function marksOf(measure: PartMeasure): StripMark[] {
  const routes = measure.routes.map(({ route, reach, outside }): StripMark => ({
    kind: 'route',
    label: routeInWords(route, measure.part),
    relativeError: reach.closest,
    furthest: reach.furthest,
    draw: outside.worstDraw ?? reach.draw,
    insideBand: outside.count === 0,
  }));
  const wrong = measure.workings.map(({ kind, label, reach }): StripMark => ({
    kind,
    label,
    relativeError: reach.closest,
    furthest: reach.furthest,
    draw: reach.draw,
    insideBand: reach.inside.count > 0,
  }));
  const close = (a: StripMark, b: StripMark) => Math.abs(a.relativeError) - Math.abs(b.relativeError);
  const far = (a: StripMark, b: StripMark) => Math.abs(b.furthest) - Math.abs(a.furthest);
  return [...routes.sort(far).slice(0, 12), ...wrong.sort(close)]
    .filter((mark) => Number.isFinite(mark.relativeError))
    .slice(0, MOST_MARKS);
}

function scaleOf(measure: PartMeasure): PartScale {
  const { part, info } = measure.part;
  const distances = measure.workings
    .filter(({ fits, reach }) => fits && Math.abs(reach.furthest) >= 1e-9)
    .map(({ reach }) => Math.abs(reach.closest));
  const worst: Route | null = measure.worstRoute;
  return {
    partId: part.id,
    quantity: info.name,
    unit: part.answer.unit,
    band: {
      below: Number.isFinite(measure.bandBelow) ? measure.bandBelow : 0,
      above: Number.isFinite(measure.bandAbove) ? measure.bandAbove : 0,
    },
    routeSpread: { below: measure.below, above: measure.above },
    worstRoute: worst === null ? '' : routeInWords(worst, measure.part),
    worstRouteDraw: measure.worstRouteDraw,
    marks: marksOf(measure),
    recommended: recommendBand({
      below: measure.below,
      above: measure.above,
      nearestWrong: Math.min(Infinity, ...distances),
      bandBelow: measure.bandBelow,
      bandAbove: measure.bandAbove,
      exact: measure.bandBelow === 0 && measure.bandAbove === 0,
    }),
  };
}

/** Checks 6, 7 and 8 together, since they look at the same answers; gives the scale strips as well. */
export function checkAnswers(context: AssayContext): RunningCheck & {
  scales: () => PartScale[];
  coverage: () => string;
} {
  const measures = context.parts.map((part) => measurePart(context, part));
  return {
    visit: (block) => {
      for (const measure of measures) measure.visit(block);
    },
    finish: () =>
      measures.flatMap((measure) => {
        const { recommended } = scaleOf(measure);
        return [
          ...tellRoutes(measure, recommended),
          ...tellUniqueness(context, measure),
          ...tellBand(measure, recommended),
        ];
      }),
    scales: () => measures.map(scaleOf),
    coverage: () => {
      const fewest = Math.min(...measures.map((measure) => measure.drawsFollowed));
      const sampled = measures.some((measure) => measure.stride > 1);
      return sampled
        ? `; rounding routes and wrong workings followed on at least ${fewest.toLocaleString('en-GB')} of them, evenly spaced`
        : '';
    },
  };
}
