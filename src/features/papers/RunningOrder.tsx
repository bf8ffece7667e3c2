import { useState, type DragEvent } from 'react';

import type { Paper } from '#shared/contracts/papers.ts';
import { Empty } from '#src/components/ui/states.tsx';
import { type Place, placesOf } from './api.ts';
import { PlaceRow } from './PlaceRow.tsx';
import { useMoves } from './use-moves.ts';

interface RunningOrderProps {
  paper: Paper;
  readOnly: boolean;
  busy: boolean;
  onSave: (places: Place[]) => void;
  /** An item is to leave the paper. */
  onTakeOff: (itemId: number) => void;
}

/** The items in their order, each with its draw; moved by keys, buttons or drag. */
export function RunningOrder({ paper, readOnly, busy, onSave, onTakeOff }: RunningOrderProps) {
  const { body, told, moveTo, moveByKey } = useMoves({ paper, movable: !readOnly, busy, onSave });
  const [dragged, setDragged] = useState<number | null>(null);
  const [over, setOver] = useState<number | null>(null);
  const endDrag = () => {
    setDragged(null);
    setOver(null);
  };
  const drag = (event: DragEvent, step: 'start' | 'over' | 'drop' | 'end', index: number) => {
    if (step === 'end') endDrag();
    if (step === 'start') {
      event.dataTransfer.effectAllowed = 'move';
      setDragged(index);
    }
    if (dragged === null || (step !== 'over' && step !== 'drop')) return;
    event.preventDefault();
    if (step === 'over') setOver(index);
    else {
      moveTo(dragged, index);
      endDrag();
    }
  };
  const change = (index: number, part: Partial<Place>) =>
    onSave(placesOf(paper).map((place, at) => (at === index ? { ...place, ...part } : place)));
  const dropAt = (index: number) => {
    if (dragged === null || over !== index || over === dragged) return null;
    return over < dragged ? 'before' : 'after';
  };

  if (paper.places.length === 0) {
    return (
      <Empty>{readOnly ? 'There is no item on this paper.' : 'No item yet. Pick some from the bank.'}</Empty>
    );
  }
  return (
    <>
      <div className="table-place">
        <table className="list-table">
          <caption className="sr-only">Running order of {paper.code}</caption>
          <thead>
            <tr>
              <th scope="col">No.</th>
              <th scope="col" colSpan={2}>
                Item
              </th>
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
              <PlaceRow
                key={place.itemId}
                place={place}
                isLast={index === paper.places.length - 1}
                readOnly={readOnly}
                busy={busy}
                drop={dropAt(index)}
                onMove={(by) => moveTo(index, index + by)}
                onKey={(event) => moveByKey(event, index)}
                onDrag={(event, step) => drag(event, step, index)}
                onChange={(part) => change(index, part)}
                onTakeOff={() => onTakeOff(place.itemId)}
              />
            ))}
          </tbody>
        </table>
      </div>
      <p role="status" className="sr-only">
        {told}
      </p>
      {!readOnly && paper.places.length > 1 && (
        <p className="pt-2 text-sm text-muted">
          Drag a row by its number, or press Alt with an arrow key while the cursor is in it.
        </p>
      )}
    </>
  );
}
