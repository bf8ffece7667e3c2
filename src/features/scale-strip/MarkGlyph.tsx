import type { PlacedMark } from './geometry.ts';

/**
 * A slip (solid) or near miss (open): a flag on a stem that points the way the wrong working reads, with a
 * thin line to the furthest that it gets. Inside the band it is crossed, so that colour is not alone.
 */
export function MarkGlyph({ placed, y, active }: { placed: PlacedMark; y: number; active: boolean }) {
  const { x, direction, mark, reach } = placed;
  const flag = `M ${x} ${y - 12} l ${direction * 8} 4 l ${-direction * 8} 4 Z`;
  const kind = mark.kind === 'slip' ? 'strip-slip' : 'strip-miss';
  const tone = mark.insideBand ? `${kind} strip-bad` : kind;
  return (
    <g className={active ? `${tone} strip-active` : tone}>
      <rect x={x - 6} y={y - 20} width={12} height={24} fill="transparent" stroke="none" />
      {Math.abs(reach - x) > 2 && (
        <line x1={x} x2={reach} y1={y - 1.5} y2={y - 1.5} className="strip-reach" />
      )}
      <line x1={x} x2={x} y1={y - 12} y2={y + 3} />
      <path d={flag} />
      {mark.insideBand && <path d={`M ${x - 4} ${y - 18} l 8 -8 m 0 8 l -8 -8`} fill="none" />}
    </g>
  );
}
