import type { Paper } from '#shared/contracts/papers.ts';
import type { Place } from './api.ts';

interface PlacesConflictProps {
  /** The paper as it stands on the server now. */
  paper: Paper;
  /** The running order that could not be saved. */
  mine: readonly Place[];
  /** Names an item for the reader. */
  nameOf: (itemId: number) => string;
  busy: boolean;
  onKeepStored: () => void;
  onPutMine: () => void;
}

const drawOf = (draw: number | null) => (draw === null ? 'a draw chosen for you' : `draw ${draw}`);

/** Two running orders of one paper side by side: one is chosen, and neither is lost before that. */
export function PlacesConflict(props: PlacesConflictProps) {
  const { paper, mine, nameOf, busy, onKeepStored, onPutMine } = props;
  const stored: readonly Place[] = paper.places;
  const list = (title: string, places: readonly Place[]) => (
    <section>
      <h3 className="font-semibold">{title}</h3>
      <ol className="list-decimal pl-6">
        {places.map((place) => (
          <li key={place.itemId}>
            {nameOf(place.itemId)}, <span className="text-muted">{drawOf(place.draw)}</span>
          </li>
        ))}
      </ol>
      {places.length === 0 && <p className="text-muted">No item.</p>}
    </section>
  );
  return (
    <div role="alert" className="notice grid gap-4">
      <p>
        Somebody else changed this paper while you did. Your change is not saved yet; choose one of the two.
      </p>
      <div className="grid gap-6 md:grid-cols-2">
        {list('As it stands now', stored)}
        {list('Yours', mine)}
      </div>
      <p className="flex flex-wrap gap-3">
        <button type="button" className="button" disabled={busy} onClick={onKeepStored}>
          Keep it as it stands
        </button>
        <button type="button" className="button" disabled={busy} onClick={onPutMine}>
          Put mine in its place
        </button>
      </p>
    </div>
  );
}
