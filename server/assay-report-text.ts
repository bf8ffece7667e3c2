import type { AssayReport, Finding, PartScale } from '#shared/engine/index.ts';

const SIGN_WIDTH = 8;

/** A relative error in percent with its sign, as `+0.44 %` or `−1.2 %`. */
function signedPercent(share: number): string {
  const size = Number(Math.abs(share * 100).toPrecision(2));
  if (size < 1e-6) return '0 %';
  return `${share < 0 ? '−' : '+'}${size} %`;
}

function drawsOf({ worstDraw, otherDraws }: Finding): string[] {
  if (worstDraw === null) return [];
  const others = otherDraws.length === 0 ? '' : `; also ${otherDraws.join(', ')}`;
  return [`worst draw ${worstDraw}${others}`];
}

function placeOf({ place }: Finding): string[] {
  const pieces: string[] = [];
  if (place.span !== undefined) pieces.push(`line ${place.span.line}`);
  if (place.partId !== undefined) pieces.push(`part “${place.partId}”`);
  if (place.field !== undefined) pieces.push(`field ${place.field}`);
  return pieces;
}

function findingLines(finding: Finding): string[] {
  const indent = ' '.repeat(SIGN_WIDTH + 2);
  const where = [finding.check, ...placeOf(finding), ...drawsOf(finding)].join(' · ');
  return [
    `${finding.severity.padEnd(SIGN_WIDTH)}  ${finding.statement}`,
    ...(finding.cure === '' ? [] : [`${indent}${finding.cure}`]),
    `${indent}(${where})`,
  ];
}

function scaleLines(scale: PartScale): string[] {
  const { recommended, routeSpread, band } = scale;
  const advice = recommended.percent === null ? 'no tidy band fits' : `±${recommended.percent} % recommended`;
  const moves = (scale.sensitivities ?? []).map(
    ({ name, percent }) => `${name} ${signedPercent(percent / 100)}`,
  );
  const wrong = scale.marks
    .filter(({ kind }) => kind !== 'route')
    .slice(0, 4)
    .map(({ kind, label, relativeError }) => {
      const away = Math.abs(relativeError) > 10 ? 'far off' : signedPercent(relativeError);
      return `    ${away.padStart(9)}  ${kind === 'slip' ? 'slip' : 'near miss'}: ${label}`;
    });
  return [
    `  ${scale.partId}: ${scale.quantity}${scale.unit === '' ? '' : ` in ${scale.unit}`}`,
    `    band ${signedPercent(-band.below)} to ${signedPercent(band.above)}; routes ${signedPercent(routeSpread.below)} to ${signedPercent(routeSpread.above)}; ${advice}, the band is ${VERDICTS[recommended.verdict]}`,
    ...(scale.worstRoute === '' ? [] : [`    worst route: ${scale.worstRoute}`]),
    ...(moves.length === 0 ? [] : [`    for +1 % in each given: ${moves.join(', ')}`]),
    ...wrong,
  ];
}

const VERDICTS: Readonly<Record<PartScale['recommended']['verdict'], string>> = {
  sound: 'sound',
  tooTight: 'too tight',
  wide: 'wider than it needs to be',
  impossible: 'not to be mended by its width',
};

function countOf(findings: readonly Finding[], severity: Finding['severity']): string {
  const count = findings.filter((finding) => finding.severity === severity).length;
  return `${count} ${severity}${count === 1 ? '' : 's'}`;
}

/** An assay's report as plain text for a terminal, under a heading. */
export function assayReportText(heading: string, report: AssayReport): string {
  const { findings, scales } = report;
  const counts = (['blocker', 'caution', 'note'] as const).map((severity) => countOf(findings, severity));
  const discarded =
    report.drawsDiscarded === 0 ? '' : `, ${report.drawsDiscarded.toLocaleString('en-GB')} discarded`;
  return [
    heading,
    `${counts.join(', ')} · ${report.coverage}${discarded} · engine ${report.engineVersion}`,
    '',
    ...findings.flatMap(findingLines),
    ...(findings.length === 0 ? ['Nothing to tell.'] : []),
    ...(scales.length === 0 ? [] : ['', 'Answers', ...scales.flatMap(scaleLines)]),
    '',
  ].join('\n');
}
