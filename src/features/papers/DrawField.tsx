import { useState, type KeyboardEvent } from 'react';

import type { PaperPlace } from '#shared/contracts/papers.ts';

interface DrawFieldProps {
  place: PaperPlace;
  busy: boolean;
  /** null lets the server choose. */
  onDraw: (draw: number | null) => void;
}

/** The draw of one item: step, type, or let the server choose one that the script keeps. */
export function DrawField({ place, busy, onDraw }: DrawFieldProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const { itemCode, draw, gridSize } = place;
  const take = () => {
    const wanted = Number(typed);
    setTyped(null);
    if (typed !== null && Number.isInteger(wanted) && wanted >= 1 && wanted <= gridSize && wanted !== draw) {
      onDraw(wanted);
    }
  };
  const onKey = (event: KeyboardEvent) => {
    if (event.key !== 'Enter') return;
    event.preventDefault();
    take();
  };
  return (
    <span className="inline-flex items-center gap-x-3 whitespace-nowrap">
      <span className="stepper">
        <button
          type="button"
          disabled={busy || draw <= 1}
          aria-label={`Previous draw of ${itemCode}`}
          onClick={() => onDraw(draw - 1)}
        >
          ‹
        </button>
        <input
          className="field w-16 text-right font-mono text-sm"
          inputMode="numeric"
          aria-label={`Draw of ${itemCode}, 1 to ${gridSize}`}
          value={typed ?? String(draw)}
          disabled={busy}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={take}
          onKeyDown={onKey}
        />
        <button
          type="button"
          disabled={busy || draw >= gridSize}
          aria-label={`Next draw of ${itemCode}`}
          onClick={() => onDraw(draw + 1)}
        >
          ›
        </button>
      </span>
      <span className="text-sm text-muted">of {gridSize.toLocaleString('en-GB')}</span>
      <button
        type="button"
        className="link text-sm"
        disabled={busy}
        aria-label={`Choose a draw of ${itemCode} for me`}
        onClick={() => onDraw(null)}
      >
        choose for me
      </button>
    </span>
  );
}
