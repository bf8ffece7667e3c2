import { useEffect, useId, useState } from 'react';

import { readDrawNumber, type DrawMove } from './draw-navigation.ts';

interface DrawBarProps {
  draw: number | null;
  /** False while the draw on show is discarded by a `require`. */
  kept: boolean;
  gridSize: number;
  open: boolean;
  /** Draw that shows the most serious finding worst; null when no finding has one. */
  worstDraw: number | null;
  onMove: (move: DrawMove) => void;
  onDraw: (draw: number) => void;
}

/** Goes from draw to draw; the number can be typed. */
export function DrawBar({ draw, kept, gridSize, open, worstDraw, onMove, onDraw }: DrawBarProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const id = useId();
  useEffect(() => setTyped(null), [draw]);
  const reading = typed === null ? null : readDrawNumber(typed, gridSize, open);
  const wrong = reading !== null && !reading.ok && typed !== '' ? reading.reason : null;
  const step = (move: DrawMove, name: string, sign: string, key = '') => (
    <button
      type="button"
      className="step"
      aria-label={`${name} draw`}
      title={`${name} draw${key === '' ? '' : `, key ${key}`}`}
      onClick={() => onMove(move)}
    >
      {sign}
    </button>
  );
  return (
    <div role="group" aria-label="Draw" className="bench-draws flex flex-wrap items-center gap-x-2 gap-y-1">
      {step('first', 'First', '|‹')}
      {step('previous', 'Previous', '‹', '[')}
      <form
        className="inline-flex items-center gap-1"
        onSubmit={(event) => {
          event.preventDefault();
          if (reading?.ok === true) onDraw(reading.draw);
          else setTyped(null);
        }}
      >
        <label htmlFor={id}>Draw</label>
        <input
          id={id}
          className="field w-24 text-right font-mono text-sm tabular-nums"
          inputMode="numeric"
          value={typed ?? (draw === null ? '' : draw.toLocaleString('en-GB'))}
          aria-invalid={wrong !== null}
          aria-describedby={`${id}-note`}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={() => {
            if (reading?.ok === true && reading.draw !== draw) onDraw(reading.draw);
            setTyped(null);
          }}
        />
        <span className="whitespace-nowrap text-sm text-muted">
          {open ? 'without end' : `of ${gridSize.toLocaleString('en-GB')}`}
        </span>
      </form>
      {step('next', 'Next', '›', ']')}
      <button type="button" className="link" onClick={() => onMove('random')}>
        Random
      </button>
      {worstDraw !== null && (
        <button type="button" className="link" onClick={() => onDraw(worstDraw)}>
          Worst
        </button>
      )}
      <span id={`${id}-note`} role="status" className="text-sm">
        {wrong !== null ? (
          <span className="text-lead">{wrong}</span>
        ) : kept ? null : (
          <span className="text-brass">This draw is discarded by a require; no candidate meets it.</span>
        )}
      </span>
    </div>
  );
}
