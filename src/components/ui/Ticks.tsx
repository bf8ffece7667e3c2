interface TicksProps {
  /** How many there are, one tick for each. */
  count: number;
  /** How many there should be; the rest of the scale is drawn faintly. */
  target?: number;
}

/** Width of one division, rem. */
const DIVISION = 0.3;

const widthOf = (count: number) => ({ width: `${count * DIVISION}rem` });

/** A count as divisions of a scale, every fifth one longer; the number itself stands beside it in words. */
export function Ticks({ count, target = count }: TicksProps) {
  const within = Math.min(count, target);
  return (
    <span aria-hidden="true" className="ticks">
      <span className="ticks-part text-accent" style={widthOf(within)} />
      {count > target && <span className="ticks-part text-lead" style={widthOf(count - target)} />}
      {count < target && <span className="ticks-part text-rule" style={widthOf(target - count)} />}
    </span>
  );
}
