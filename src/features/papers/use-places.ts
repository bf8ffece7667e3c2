import { useState } from 'react';

import type { Paper } from '#shared/contracts/papers.ts';
import { tell } from '#src/components/ui/notices.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { type PaperCalls, type Place, placesOf, storedPaperOf } from './api.ts';

/** An item as it is named to the reader. */
export interface NamedItem {
  id: number;
  code: string;
  title: string;
}

interface PlacesInput {
  paper: Paper;
  calls: PaperCalls;
  onSaved: (paper: Paper) => void;
}

const namesIn = (paper: Paper): NamedItem[] =>
  paper.places.map(({ itemId, itemCode, title }) => ({ id: itemId, code: itemCode, title }));

/**
 * Saves the running order of a paper. When somebody else changed the paper meanwhile, the order that could not
 * be saved is kept as `conflicting` until one of the two is chosen.
 */
export function usePlaces({ paper, calls, onSaved }: PlacesInput) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const [conflicting, setConflicting] = useState<Place[] | null>(null);
  const [names, setNames] = useState<ReadonlyMap<number, string>>(new Map());
  const learnNames = (items: readonly NamedItem[]) =>
    setNames(
      (known) =>
        new Map([...known, ...items.map(({ id, code, title }) => [id, `${code} ${title}`] as const)]),
    );

  const send = async (base: Paper, places: Place[]): Promise<Paper | null> => {
    setBusy(true);
    setProblem(null);
    try {
      const next = await calls.savePlaces(base.version, places);
      setConflicting(null);
      onSaved(next);
      return next;
    } catch (error) {
      const stored = storedPaperOf(error);
      if (stored === null) setProblem(sentenceOf(error));
      else {
        learnNames([...namesIn(base), ...namesIn(stored)]);
        setConflicting(places);
        onSaved(stored);
      }
      return null;
    } finally {
      setBusy(false);
    }
  };
  const takeOff = async (itemId: number) => {
    const before = placesOf(paper);
    const code = paper.places.find((place) => place.itemId === itemId)?.itemCode ?? '';
    const after = await send(
      paper,
      before.filter((place) => place.itemId !== itemId),
    );
    if (after === null) return;
    tell(`${code} is off the paper.`, {
      label: 'Put it back',
      run: () => void send(after, before),
    });
  };
  return {
    busy,
    problem,
    conflicting,
    learnNames,
    nameOf: (itemId: number) => names.get(itemId) ?? 'an item that was picked',
    save: (places: Place[]) => void send(paper, places),
    takeOff: (itemId: number) => void takeOff(itemId),
    keepStored: () => setConflicting(null),
    putMine: () => conflicting !== null && void send(paper, conflicting),
  };
}
