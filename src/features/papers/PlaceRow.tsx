import type { DragEvent, KeyboardEvent } from 'react';
import { Link } from 'react-router';

import type { PaperPlace } from '#shared/contracts/papers.ts';
import type { Place } from './api.ts';
import { DrawField } from './DrawField.tsx';

interface PlaceRowProps {
  place: PaperPlace;
  isLast: boolean;
  readOnly: boolean;
  busy: boolean;
  /** Where a dragged row would go in beside this one. */
  drop: 'before' | 'after' | null;
  onMove: (by: -1 | 1) => void;
  onKey: (event: KeyboardEvent) => void;
  onDrag: (event: DragEvent, step: 'start' | 'over' | 'drop' | 'end') => void;
  onChange: (part: Partial<Place>) => void;
  onTakeOff: () => void;
}

function Newer({ place, busy, onChange }: Pick<PlaceRowProps, 'place' | 'busy'> & Partial<PlaceRowProps>) {
  return (
    <span className="block text-sm text-muted">
      On the paper: revision {place.revision}. Approved since: revision {place.newerRevision}
      {onChange !== undefined && (
        <>
          {', '}
          <button
            type="button"
            className="link"
            disabled={busy}
            onClick={() => onChange({ takeNewest: true, draw: null })}
          >
            take it
          </button>
        </>
      )}
    </span>
  );
}

/** One item in the running order, with its draw and its moves. */
export function PlaceRow(props: PlaceRowProps) {
  const { place, isLast, readOnly, busy, drop, onMove, onKey, onDrag, onChange, onTakeOff } = props;
  const { itemCode } = place;
  return (
    <tr
      id={`place-${place.id}`}
      tabIndex={-1}
      data-item={place.itemId}
      className={drop === null ? '' : `drop-${drop}`}
      onKeyDown={onKey}
      onDragOver={(event) => onDrag(event, 'over')}
      onDrop={(event) => onDrag(event, 'drop')}
    >
      <td
        className={readOnly ? '' : 'grip'}
        draggable={!readOnly && !busy}
        title={readOnly ? undefined : 'Drag to another place'}
        onDragStart={(event) => onDrag(event, 'start')}
        onDragEnd={(event) => onDrag(event, 'end')}
      >
        {place.position}
      </td>
      <td className="code">
        <Link className="link font-mono text-sm" to={`/items/${place.itemId}?draw=${place.draw}`}>
          {itemCode}
        </Link>
      </td>
      <td className="w-full min-w-44">
        {place.title}
        {place.newerRevision !== null && (
          <Newer place={place} busy={busy} {...(readOnly ? {} : { onChange })} />
        )}
      </td>
      <td className="whitespace-nowrap">{place.topic.name}</td>
      <td className="number">{place.marks}</td>
      <td className="whitespace-nowrap">
        {readOnly ? (
          <>
            <span className="font-mono text-sm">{place.draw}</span>{' '}
            <span className="text-sm text-muted">of {place.gridSize.toLocaleString('en-GB')}</span>
          </>
        ) : (
          <DrawField place={place} busy={busy} onDraw={(draw) => onChange({ draw })} />
        )}
      </td>
      {!readOnly && (
        <td className="space-x-3 whitespace-nowrap text-sm">
          <button
            type="button"
            className="link"
            disabled={busy || place.position === 1}
            aria-label={`Move ${itemCode} up`}
            data-move="up"
            onClick={() => onMove(-1)}
          >
            up
          </button>
          <button
            type="button"
            className="link"
            disabled={busy || isLast}
            aria-label={`Move ${itemCode} down`}
            data-move="down"
            onClick={() => onMove(1)}
          >
            down
          </button>
          <button
            type="button"
            className="link"
            disabled={busy}
            aria-label={`Take ${itemCode} off the paper`}
            onClick={onTakeOff}
          >
            take off
          </button>
        </td>
      )}
    </tr>
  );
}
