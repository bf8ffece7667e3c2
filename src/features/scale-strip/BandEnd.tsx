import type { KeyboardEvent, PointerEvent } from 'react';

interface BandEndProps {
  end: 'low' | 'high';
  x: number;
  y: number;
  /** Relative error at this end. */
  value: number;
  valueText: string;
  limit: number;
  step: number;
  errorAt: (clientX: number) => number;
  /** Absent when the band stands still. */
  onMove: ((to: number) => void) | undefined;
  onSettle: () => void;
}

const KEY_STEPS: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 10,
  PageDown: -10,
};

/** One end of the band: a bracket that can be dragged, or moved with the arrow keys and taken over with Enter. */
export function BandEnd({
  end,
  x,
  y,
  value,
  valueText,
  limit,
  step,
  errorAt,
  onMove,
  onSettle,
}: BandEndProps) {
  const hook = end === 'low' ? 4 : -4;
  const bracket = (
    <path d={`M ${x + hook} ${y - 18} H ${x} V ${y} H ${x + hook}`} fill="none" className="strip-bracket" />
  );
  if (onMove === undefined) return <g aria-hidden="true">{bracket}</g>;

  const press = (event: KeyboardEvent): void => {
    const steps = KEY_STEPS[event.key];
    if (steps !== undefined) {
      event.preventDefault();
      onMove(value + steps * step);
    } else if (event.key === 'Enter') {
      event.preventDefault();
      onSettle();
    }
  };
  const drag = (event: PointerEvent<SVGGElement>): void => {
    if (event.currentTarget.hasPointerCapture(event.pointerId)) onMove(errorAt(event.clientX));
  };
  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={end === 'low' ? 'Lower end of the band' : 'Upper end of the band'}
      aria-orientation="horizontal"
      aria-valuemin={end === 'low' ? -limit * 100 : 0}
      aria-valuemax={end === 'low' ? 0 : limit * 100}
      aria-valuenow={value * 100}
      aria-valuetext={valueText}
      className="strip-handle"
      onKeyDown={press}
      onBlur={onSettle}
      onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)}
      onPointerMove={drag}
      onPointerUp={(event) => {
        event.currentTarget.releasePointerCapture(event.pointerId);
        onSettle();
      }}
    >
      <rect x={x - 9} y={y - 22} width={18} height={26} fill="transparent" />
      {bracket}
      <rect x={x - 2} y={y - 12} width={4} height={7} className="strip-grip" />
    </g>
  );
}
