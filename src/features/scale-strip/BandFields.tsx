import { useId, useState } from 'react';

import type { Axis } from './axis.ts';
import type { Interval } from './geometry.ts';
import { movedEnd } from './trial.ts';

interface BandFieldsProps {
  band: Interval;
  axis: Axis;
  symmetric: boolean;
  onTry: (band: Interval) => void;
}

/** The band's ends as typed numbers; Enter or leaving the field takes them over. */
export function BandFields({ band, axis, symmetric, onTry }: BandFieldsProps) {
  const asSize = symmetric && axis.kind === 'relative';
  const [low, setLow] = useState(() => axis.toTyped(band.low));
  const [high, setHigh] = useState(() => axis.toTyped(band.high));
  const problem = useId();
  const lowError = asSize ? -(axis.fromTyped(high) ?? Number.NaN) : axis.fromTyped(low);
  const highError = axis.fromTyped(high);
  const wrong =
    lowError === null || highError === null || !(lowError <= 0 && highError >= 0)
      ? asSize
        ? 'Give a number of at least 0.'
        : 'Give two numbers with the model answer between them.'
      : null;

  const take = (): void => {
    if (wrong !== null || lowError === null || highError === null) return;
    const typed = movedEnd(movedEnd(band, 'low', lowError), 'high', highError);
    if (Math.abs(typed.low - band.low) > 1e-6 || Math.abs(typed.high - band.high) > 1e-6) onTry(typed);
  };
  const field = (label: string, value: string, set: (text: string) => void) => (
    <label className="inline-flex items-baseline gap-1">
      <span className={asSize ? '' : 'sr-only'}>{label}</span>
      <input
        className="field w-20 font-mono text-sm tabular-nums"
        inputMode="decimal"
        value={value}
        aria-invalid={wrong !== null}
        aria-describedby={wrong === null ? undefined : problem}
        onChange={(event) => set(event.target.value)}
        onBlur={take}
        onKeyDown={(event) => {
          if (event.key !== 'Enter') return;
          event.preventDefault();
          take();
        }}
      />
    </label>
  );
  return (
    <span className="inline-flex flex-wrap items-baseline gap-1">
      {asSize ? (
        field('Band ±', high, setHigh)
      ) : (
        <>
          <span>Band</span> {field('Lower end of the band', low, setLow)} <span>to</span>{' '}
          {field('Upper end of the band', high, setHigh)}
        </>
      )}
      <span>{axis.kind === 'relative' ? '%' : axis.caption}</span>
      {wrong !== null && (
        <span id={problem} role="alert" className="text-lead">
          {wrong}
        </span>
      )}
    </span>
  );
}
