import { compileScript } from '../compile/compile-script.ts';
import type { Compilation, DrawSelection } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { roundToDecimals } from '../units/rounding.ts';
import { coverageStatement } from '../draws/coverage.ts';
import { planDraws } from '../draws/sampling.ts';
import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import type { ItemContent } from '../item/content.ts';
import { finding, type RunningCheck } from './check.ts';
import { checkAnswers } from './check-answers.ts';
import { checkDefined } from './check-defined.ts';
import { checkDependence } from './check-dependence.ts';
import { checkLaws } from './check-laws.ts';
import { checkLimits } from './check-limits.ts';
import { checkPrint } from './check-print.ts';
import { checkValidity } from './check-validity.ts';
import { checkVariety } from './check-variety.ts';
import { contentHash } from './content-hash.ts';
import { createAssayContext, type FigureFacts } from './context.ts';
import { createDistributions } from './distributions.ts';
import { CHECKS, SEVERITIES, type AssayReport, type Finding } from './report.ts';

/** Raise this when reports of unchanged content can change: older assays are then shown as stale. */
export const ENGINE_VERSION = '1.0.0';

export interface AssayOptions {
  figures?: readonly FigureFacts[];
  /** Told the share of the work done, 0 to 1. */
  onProgress?: (share: number) => void;
}

/** Draws that are looked at together. */
const BLOCK = 4_096;

/** The part of the content that an assay reads: a writer's reasons for cautions do not change it. */
export function assayedHash(content: ItemContent): string {
  const { acceptedCautions, ...assayed } = content;
  void acceptedCautions;
  return contentHash(assayed);
}

function slice(draws: DrawSelection, from: number, count: number): DrawSelection {
  return draws instanceof Float64Array
    ? draws.subarray(from, from + count)
    : { from: draws.from + from, count };
}

function inOrder(findings: readonly Finding[]): Finding[] {
  const rank = (one: Finding) => SEVERITIES.indexOf(one.severity) * CHECKS.length + CHECKS.indexOf(one.check);
  return [...findings].sort((a, b) => rank(a) - rank(b));
}

function mistakenReport(content: ItemContent, { diagnostics, grid }: Compilation): AssayReport {
  return {
    engineVersion: ENGINE_VERSION,
    contentHash: assayedHash(content),
    gridSize: grid.size,
    exhaustive: false,
    drawsAssayed: 0,
    drawsDiscarded: 0,
    coverage: 'no draw: the script does not compile',
    findings: diagnostics
      .filter((diagnostic) => diagnostic.severity === 'error')
      .map((diagnostic: Diagnostic) =>
        finding('script-mistake', {
          about: `${diagnostic.span.line}:${diagnostic.span.column}`,
          statement: `Line ${diagnostic.span.line}: ${diagnostic.message}`,
          cure: diagnostic.fix?.label ?? 'Correct this line of the script.',
          place: { span: diagnostic.span },
        }),
      ),
    distributions: [],
    scales: [],
  };
}

/**
 * The full check of one item over its draws. Pure: the same content and engine version give the same report
 * on any machine. Never throws on what a writer wrote; `diagnostics` are the script's own mistakes.
 */
export function assayItem(
  content: ItemContent,
  options: AssayOptions = {},
): { report: AssayReport; diagnostics: Diagnostic[] } {
  const compilation = compileScript(content.script);
  const { script, diagnostics } = compilation;
  if (script === null) return { report: mistakenReport(content, compilation), diagnostics };
  const plan = planDraws(script);
  const context = createAssayContext(content, script, plan, options.figures ?? []);
  const answers = checkAnswers(context);
  const dependence = checkDependence(context);
  const variety = checkVariety(context);
  const distributions = createDistributions(context);
  const running: RunningCheck[] = [
    ...[checkDefined, checkLimits, checkLaws, checkValidity, checkPrint].map((start) => start(context)),
    dependence,
    variety,
    answers,
    distributions,
  ];
  let discarded = 0;
  for (let from = 0; from < plan.count; from += BLOCK) {
    const count = Math.min(BLOCK, plan.count - from);
    const block = evaluateBlock(script, slice(plan.draws, from, count));
    for (const kept of block.kept) discarded += 1 - kept;
    for (const check of running) check.visit?.(block);
    options.onProgress?.((from + count) / plan.count);
  }
  const findings = running.flatMap((check) => check.finish());
  if (content.parts.length === 0) {
    findings.push(
      finding('no-parts', { statement: 'The item has no part.', cure: 'Add a part that asks something.' }),
    );
  }
  const failing = Math.max(0, ...findings.map((one) => (one.severity === 'blocker' ? one.drawCount : 0)));
  return {
    report: {
      engineVersion: ENGINE_VERSION,
      contentHash: assayedHash(content),
      gridSize: plan.gridSize,
      exhaustive: plan.exhaustive,
      drawsAssayed: plan.count,
      drawsDiscarded: discarded,
      coverage: coverageStatement(plan, failing) + answers.coverage(),
      findings: inOrder(findings),
      distributions: distributions.tell(),
      scales: answers.scales().map((scale) => ({
        ...scale,
        sensitivities: dependence
          .sensitivities(scale.partId)
          .map(({ name, percent }) => ({ name, percent: roundToDecimals(percent, 6) })),
        sharedAnswers: variety.sharedAnswers(scale.partId),
      })),
    },
    diagnostics,
  };
}
