import { formatNumber, readResponse, type Distribution } from '#shared/engine/index.ts';

const WIDTH = 104;
const HEIGHT = 22;
const MARGIN = 4;

/** The number in a printed value, as 1.25 in “1.25 kV”; null when nothing is printed. */
export function printedNumber(text: string): number | null {
  const reading = readResponse(text);
  return reading.ok ? reading.value : null;
}

const three = (value: number): string => formatNumber(value, { figures: 3 }).text;

/** How a value spreads over the draws: counts as bars, median as a tick, the draw on show as a mark. */
export function DistributionStrip({
  distribution,
  current,
}: {
  distribution: Distribution;
  current: number | null;
}) {
  const { least, median, greatest, bins, name, unit } = distribution;
  const spread = greatest - least;
  const x = (value: number): number =>
    spread > 0 ? MARGIN + ((value - least) / spread) * (WIDTH - 2 * MARGIN) : WIDTH / 2;
  const most = Math.max(1, ...bins);
  const barWidth = bins.length === 0 ? 0 : (WIDTH - 2 * MARGIN) / bins.length;
  const label = `${name} over the draws: least ${three(least)}, median ${three(median)}, greatest ${three(greatest)} ${unit}`;
  return (
    <svg
      width={WIDTH}
      height={HEIGHT}
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={label}
      className="distribution"
    >
      <title>{label}</title>
      {spread > 0 &&
        bins.map((count, index) => (
          <rect
            key={index}
            x={MARGIN + index * barWidth}
            width={Math.max(0.5, barWidth - 0.5)}
            y={16 - (12 * count) / most}
            height={(12 * count) / most}
            className="distribution-bar"
          />
        ))}
      <line x1={MARGIN} x2={WIDTH - MARGIN} y1={16.5} y2={16.5} className="distribution-rule" />
      {[least, median, greatest].map((value, index) => (
        <line key={index} x1={x(value)} x2={x(value)} y1={13} y2={20} className="distribution-rule" />
      ))}
      {current !== null && current >= least && current <= greatest && (
        <path d={`M ${x(current)} 14 l -3.5 -6 h 7 Z`} className="distribution-mark" />
      )}
    </svg>
  );
}
