import { useMemo, useState } from 'react';

import type { PartScale } from '#shared/engine/index.ts';
import { RELATIVE_AXIS, unitAxis, printedUnit } from './axis.ts';
import { BandFields } from './BandFields.tsx';
import { bandInterval, scaleRange, stripGeometry, type Interval } from './geometry.ts';
import './scale-strip.css';
import { ScaleTable } from './ScaleTable.tsx';
import { StripPicture } from './StripPicture.tsx';
import { movedEnd, takesAllRoutes, withTrialBand } from './trial.ts';
import { useWidth } from './use-width.ts';
import { bandVerdict, describeMark, describeScale, unbroken } from './words.ts';

export interface ScaleStripProps {
  scale: PartScale;
  /** What the strip belongs to, as “Part (b)”. */
  name: string;
  /** Model answer in the scale's unit at the draw on show; with it the axis can be read in that unit. */
  answer?: number | null;
  /** Called with a band that was dragged or typed; without it the band stands still. */
  onTryBand?: ((band: Interval) => void) | undefined;
  /** Whether both ends move together, as for a band of plus or minus so much. */
  symmetric?: boolean;
  /** Called with the draw at which a mark comes closest. */
  onVisitDraw?: ((draw: number) => void) | undefined;
}

/**
 * The scale of one answer: ticks centred on the model answer, the accepted band, rounding routes as hairlines,
 * slips and near misses with their direction. Every mark can be reached by keyboard and read; a table says the
 * same for screen readers.
 */
export function ScaleStrip({
  scale,
  name,
  answer = null,
  onTryBand,
  symmetric = false,
  onVisitDraw,
}: ScaleStripProps) {
  const [container, width] = useWidth<HTMLDivElement>();
  const [trial, setTrial] = useState<Interval | null>(null);
  const [inUnit, setInUnit] = useState(false);
  const [active, setActive] = useState<number | null>(null);

  const own = bandInterval(scale.band);
  const band = trial ?? own;
  const range = useMemo(() => scaleRange(scale, bandInterval(scale.band)), [scale]);
  const shown = useMemo(() => (trial === null ? scale : withTrialBand(scale, trial)), [scale, trial]);
  const geometry = useMemo(() => stripGeometry(shown, width, band, range), [shown, width, band, range]);
  const canUseUnit = answer !== null && Number.isFinite(answer) && answer !== 0;
  const axis = canUseUnit && inUnit ? unitAxis(answer, scale.unit, range) : RELATIVE_AXIS;

  const move = (end: 'low' | 'high', to: number): void => {
    const next = movedEnd(band, end, to);
    const both = end === 'low' ? { low: next.low, high: -next.low } : { low: -next.high, high: next.high };
    setTrial(symmetric ? both : next);
  };
  const settle = (): void => {
    if (trial !== null && onTryBand !== undefined) onTryBand(trial);
    setTrial(null);
  };
  const activeMark = active === null ? undefined : shown.marks[active];
  const routesFit = takesAllRoutes(scale, band);

  return (
    <section aria-label={`Scale of ${name}`} className="scale-strip grid gap-1" ref={container}>
      <StripPicture
        geometry={geometry}
        axis={axis}
        band={band}
        summary={describeScale(shown, band)}
        active={active}
        onActive={setActive}
        onMove={onTryBand === undefined ? undefined : move}
        onSettle={settle}
        onVisitDraw={onVisitDraw}
        routesFit={routesFit}
        onTrial={trial !== null}
      />
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1 text-sm">
        <p className="min-h-10 flex-1 basis-80 text-muted" aria-hidden="true">
          {activeMark === undefined
            ? trial === null
              ? unbroken(`${bandVerdict(scale)} ${scale.recommended.reason}`)
              : `Trying ${axis.valueText(band.low)} to ${axis.valueText(band.high)}. ${routesFit ? 'Every rounding route lies inside.' : 'Some rounding routes lie outside.'}`
            : describeMark(activeMark)}
        </p>
        <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
          <span className="text-muted">{axis.caption}</span>
          {canUseUnit && scale.unit !== '' && (
            <button type="button" className="link" aria-pressed={inUnit} onClick={() => setInUnit(!inUnit)}>
              {inUnit ? 'Show in %' : `Show in ${printedUnit(scale.unit)}`}
            </button>
          )}
          {onTryBand !== undefined && (
            <BandFields
              key={`${axis.kind} ${own.low} ${own.high}`}
              band={own}
              axis={axis}
              symmetric={symmetric}
              onTry={onTryBand}
            />
          )}
        </div>
      </div>
      <ScaleTable scale={shown} name={name} band={band} />
    </section>
  );
}
