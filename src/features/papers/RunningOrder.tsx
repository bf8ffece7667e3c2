import { useState, type KeyboardEvent } from 'react';
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
        <tbody>
          {paper.places.map((place, index) => (
            <tr key={place.itemId} id={`place-${place.id}`}>
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
                    onClick={() => onSave(moved(places, index, index - 1))}
                  >
                    up
                  </button>{' '}
                  <button
                    type="button"
                    className="link"
                    disabled={busy || index === places.length - 1}
                    aria-label={`Move ${place.itemCode} down`}
                    onClick={() => onSave(moved(places, index, index + 1))}
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
      {paper.places.length === 0 && <p className="py-4 text-muted">No item yet.</p>}
    </div>
  );
}
