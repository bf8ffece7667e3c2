import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router';

import { Awaited } from '#src/components/ui/Awaited.tsx';
import { itemQuery } from '#src/features/bench/api.ts';
import { Bench } from '#src/features/bench/Bench.tsx';
import type { BenchSlots } from '#src/features/bench/slots.ts';
import { ChangesView } from '#src/features/changes/ChangesView.tsx';
import { ScaleStrip } from '#src/features/scale-strip/ScaleStrip.tsx';
import { SchemeView } from '#src/features/sheet/SchemeView.tsx';
import { SheetView } from '#src/features/sheet/SheetView.tsx';
import { usePageTitle } from '../layout/use-page-title.ts';
import { usePerson } from '../layout/use-person.ts';

const SLOTS: BenchSlots = {
  sheet: (sheet, inserts) => <SheetView sheet={sheet} {...inserts} />,
  scheme: (scheme) => <SchemeView scheme={scheme} />,
  scale: (request) => <ScaleStrip {...request} />,
  changes: (before, after) => <ChangesView before={before} after={after} />,
};

/** The draw in the address, as `?draw=27`; null where there is none or it is no draw number. */
function drawOf(text: string | null): number | null {
  const draw = Number(text);
  return text !== null && Number.isSafeInteger(draw) && draw >= 1 ? draw : null;
}

/** One item on the bench; the draw on show is in the address. */
export function BenchPage() {
  const person = usePerson();
  const itemId = Number(useParams()['itemId']);
  const [search, setSearch] = useSearchParams();
  const item = useQuery(itemQuery(itemId));
  const title = item.data === undefined ? 'Bench' : `${item.data.code} ${item.data.revision.content.title}`;
  usePageTitle(title);

  return (
    <Awaited query={item} what="the item" whole>
      {(data) => (
        <Bench
          key={`${itemId} ${data.revision.id} ${data.state}`}
          item={data}
          personId={person.id}
          draw={drawOf(search.get('draw'))}
          onDraw={(draw) => setSearch({ draw: String(draw) }, { replace: true, preventScrollReset: true })}
          slots={SLOTS}
        />
      )}
    </Awaited>
  );
}
