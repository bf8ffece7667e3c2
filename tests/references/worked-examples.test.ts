import { describe, expect, it } from 'vitest';
import {
  assayItem,
  compileScript,
  evaluateDraw,
  fromSI,
  itemContentSchema,
  readUnit,
  roundToFigures,
  type AssayReport,
  type CompiledScript,
  type ItemContent,
} from '#shared/engine/index.ts';
import { IMPOSSIBLE_EXAMPLES, WORKED_EXAMPLES, type WorkedExample } from './worked-examples.ts';

function mustCompile(source: string): CompiledScript {
  const { script, diagnostics } = compileScript(source);
  if (script === null) throw new Error(diagnostics.map((diagnostic) => diagnostic.message).join('\n'));
  return script;
}

/** The example as an item: one part for each printed answer. */
function itemOf(example: WorkedExample): ItemContent {
  return itemContentSchema.parse({
    title: example.id,
    stem: 'Values as in the book.',
    script: example.script,
    quantities: Object.entries(example.roles).map(([name, role]) => ({ name, role })),
    assumptions: example.assumptions ?? [],
    claims: example.claims ?? [],
    parts: example.answers.map(({ quantity, unit, figures }, index) => ({
      id: `p${index}`,
      kind: 'numeric',
      text: 'Calculate it.',
      marks: 1,
      scheme: [{ text: `{{${quantity}}}`, marks: 1 }],
      answer: { quantity, unit, figures, band: { kind: 'percent', percent: 3 } },
    })),
  });
}

/** Every answer that an honest candidate reaches: results rounded on the way or not, constants in full or printed. */
function answersReached(script: CompiledScript, quantity: string, unit: string, figures: number): number[] {
  const reading = readUnit(unit);
  if (!reading.ok) throw new Error(reading.message);
  // Values that the book prints are not rounded, only what is worked out from them.
  const between = script.quantities
    .filter(({ name, uses, constants }) => name !== quantity && uses.length + constants.length > 0)
    .map(({ name }) => name);
  const answers: number[] = [];
  for (let chosen = 0; chosen < 2 ** between.length; chosen += 1) {
    const rounded = between.filter((_, index) => (chosen & (1 << index)) !== 0);
    for (const constants of ['full', 'dataSheet'] as const) {
      const { values } = evaluateDraw(script, 1, {
        constants,
        roundIntermediates: new Map(rounded.map((name) => [name, figures])),
      });
      const value = values[quantity];
      if (typeof value === 'number') answers.push(roundToFigures(fromSI(value, reading.unit), figures));
    }
  }
  return answers;
}

const blockersOf = (report: AssayReport) =>
  report.findings.filter((finding) => finding.severity === 'blocker');

describe.each(WORKED_EXAMPLES)('$id ($source, $locator)', (example) => {
  const script = mustCompile(example.script);

  it.each(example.answers)('reaches the printed $quantity', ({ quantity, unit, printed, figures }) => {
    expect(answersReached(script, quantity, unit, figures)).toContain(printed);
  });

  it('breaks no law and no limit', () => {
    const { report, diagnostics } = assayItem(itemOf(example));
    expect(diagnostics).toEqual([]);
    expect(blockersOf(report).filter(({ check }) => check !== 'validity' && check !== 'routes')).toEqual([]);
  });
});

describe.each(IMPOSSIBLE_EXAMPLES)('$id ($source, $locator)', (example) => {
  const { report } = assayItem(itemOf(example));

  it.each(example.answers)('reaches the printed $quantity', ({ quantity, unit, printed, figures }) => {
    expect(answersReached(mustCompile(example.script), quantity, unit, figures)).toContain(printed);
  });

  it('is stopped', () => {
    expect(blockersOf(report).map(({ code }) => code)).toContain(example.stoppedBy);
  });
});
