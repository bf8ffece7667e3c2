import { useEffect, useRef, useState, type KeyboardEvent } from 'react';
import { Link } from 'react-router';

import type { Paper, PaperPlace } from '#shared/contracts/papers.ts';
import { type Place, placesOf } from './api.ts';

interface RunningOrderProps {
  paper: Paper;
  readOnly: boolean;
  busy: boolean;
  onSave: (places: Place[]) => void;
}

function moved<T>(list: readonly T[], from: number, to: number): T[] {
  const next = [...list];
  const [taken] = next.splice(from, 1);
  if (taken !== undefined) next.splice(to, 0, taken);
  return next;
}

interface DrawFieldProps {
  place: PaperPlace;
  disabled: boolean;
  onDraw: (draw: number | null) => void;
}

function DrawField({ place, disabled, onDraw }: DrawFieldProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const take = () => {
    const draw = Number(typed);
    setTyped(null);
    if (
      typed !== null &&
      Number.isInteger(draw) &&
      draw >= 1 &&
      draw <= place.gridSize &&
      draw !== place.draw
    ) {
      onDraw(draw);
    }
  };
  const onKey = (event: KeyboardEvent) => {
    if (event.key !== 'Enter') return;
    event.preventDefault();
    take();
  };
  return (
    <span className="inline-flex items-center gap-1 whitespace-nowrap">
      <input
        className="field w-20 text-right font-mono text-sm"
        inputMode="numeric"
        aria-label={`Draw of ${place.itemCode}, 1 to ${place.gridSize}`}
        value={typed ?? String(place.draw)}
        disabled={disabled}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={take}
        onKeyDown={onKey}
      />
      <span className="text-sm text-muted">of {place.gridSize.toLocaleString('en-GB')}</span>
      {!disabled && (
        <button type="button" className="link text-sm" onClick={() => onDraw(null)}>
          another
        </button>
      )}
    </span>
  );
}

/** The items in their order, each with its draw; moved by keys or buttons. */
export function RunningOrder({ paper, readOnly, busy, onSave }: RunningOrderProps) {
  const places = placesOf(paper);
  const change = (index: number, part: Partial<Place>) =>
    onSave(places.map((place, at) => (at === index ? { ...place, ...part } : place)));
  const disabled = readOnly || busy;
  const body = useRef<HTMLTableSectionElement>(null);
  /** The button that moved a row: the page loses the focus of a row that changes its place. */
  const moving = useRef<string | null>(null);
  const [told, setTold] = useState('');
  useEffect(() => {
    if (busy || moving.current === null) return;
    const [row, name] = moving.current.split(' ');
    moving.current = null;
    const buttons = body.current?.querySelectorAll<HTMLButtonElement>(
      `[data-item="${row}"] button[data-move]`,
    );
    const usable = Array.from(buttons ?? []).filter((button) => !button.disabled);
    (usable.find((button) => button.dataset['move'] === name) ?? usable[0])?.focus();
  }, [busy, paper]);
  const move = (index: number, by: -1 | 1) => {
    const place = paper.places[index];
    const to = index + by;
    if (busy || readOnly || place === undefined || to < 0 || to >= places.length) return;
    moving.current = `${place.itemId} ${by < 0 ? 'up' : 'down'}`;
    setTold(`${place.itemCode} moves to place ${to + 1} of ${places.length}.`);
    onSave(moved(places, index, to));
  };
  const moveByKey = (event: KeyboardEvent, index: number) => {
    if (!event.altKey || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    move(index, event.key === 'ArrowUp' ? -1 : 1);
  };
  return (
    <div className="overflow-x-auto">
      <table className="list-table">
        <thead>
          <tr>
            <th scope="col">No.</th>
            <th scope="col">Item</th>
            <th scope="col">Topic</th>
            <th scope="col" className="number">
              Marks
            </th>
            <th scope="col">Draw</th>
            {!readOnly && <th scope="col">Place</th>}
          </tr>
        </thead>
        <tbody ref={body}>
          {paper.places.map((place, index) => (
            <tr
              key={place.itemId}
              id={`place-${place.id}`}
              data-item={place.itemId}
              onKeyDown={(event) => moveByKey(event, index)}
            >
              <td>{place.position}</td>
              <td className="w-full min-w-48">
                <Link className="link font-mono text-sm" to={`/items/${place.itemId}`}>
                  {place.itemCode}
                </Link>{' '}
                {place.title}
                <span className="block text-sm text-muted">
                  revision {place.revision}
                  {place.newerRevision !== null && (
                    <>
                      , {place.newerRevision} is approved{' '}
                      {!readOnly && (
                        <button
                          type="button"
                          className="link"
                          disabled={busy}
                          onClick={() => change(index, { takeNewest: true, draw: null })}
                        >
                          take it
                        </button>
                      )}
                    </>
                  )}
                </span>
              </td>
              <td className="whitespace-nowrap">{place.topic.name}</td>
              <td className="number">{place.marks}</td>
              <td>
                <DrawField place={place} disabled={disabled} onDraw={(draw) => change(index, { draw })} />
              </td>
              {!readOnly && (
                <td className="whitespace-nowrap text-sm">
                  <button
                    type="button"
                    className="link"
                    disabled={busy || index === 0}
                    aria-label={`Move ${place.itemCode} up`}
                    data-move="up"
                    onClick={() => move(index, -1)}
                  >
                    up
                  </button>{' '}
                  <button
                    type="button"
                    className="link"
                    disabled={busy || index === places.length - 1}
                    aria-label={`Move ${place.itemCode} down`}
                    data-move="down"
                    onClick={() => move(index, 1)}
                  >
                    down
                  </button>{' '}
                  <button
                    type="button"
                    className="link"
                    disabled={busy}
                    aria-label={`Take ${place.itemCode} off the paper`}
                    onClick={() => onSave(places.filter((_place, at) => at !== index))}
                  >
                    take off
                  </button>
                </td>
              )}
            </tr>
          ))}
        </tbody>
      </table>
      <p role="status" className="sr-only">
        {told}
      </p>
      {!readOnly && places.length > 1 && (
        <p className="pt-2 text-sm text-muted">Alt with an arrow key moves the row that holds the cursor.</p>
      )}
      {paper.places.length === 0 && <p className="py-4 text-muted">No item yet.</p>}
    </div>
  );
}
