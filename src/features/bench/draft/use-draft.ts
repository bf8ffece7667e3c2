import { useCallback, useReducer } from 'react';

import {
  ITEM_LIMITS,
  partLetter,
  type ItemContent,
  type ItemFigure,
  type Part,
  type Quantity,
} from '#shared/engine/index.ts';
import { blankPart, freeId } from './blank-parts.ts';
import { openDraft, reduceDraft, type DraftState } from './draft-state.ts';
import { moved, withFigure, withoutPart, withPart, withQuantity } from './edit-content.ts';

/** The draft with everything that its writer can do to it. */
export interface DraftEditor {
  state: DraftState;
  edit: (change: (content: ItemContent) => ItemContent, label: string, field?: string | null) => void;
  setTopic: (topicId: number) => void;
  addPart: (kind: Part['kind']) => string | null;
  changePart: (partId: string, change: (part: Part) => Part, label: string, field: string | null) => void;
  movePart: (partId: string, step: -1 | 1) => void;
  removePart: (partId: string) => void;
  changeQuantity: (name: string, change: Partial<Quantity>, field: string) => void;
  addFigure: (figureId: number) => void;
  changeFigure: (index: number, change: Partial<ItemFigure> | null, field: string | null) => void;
  acceptCaution: (key: string, reason: string) => void;
  merge: (theirs: ItemContent, merged: ItemContent) => void;
  undo: () => void;
  redo: () => void;
}

/** Holds the draft of one item in the browser; `content` and `topicId` are what it begins with. */
export function useDraft(content: ItemContent, topicId: number): DraftEditor {
  const [state, dispatch] = useReducer(reduceDraft, undefined, () => openDraft(content, topicId));

  const edit = useCallback<DraftEditor['edit']>((change, label, field = null) => {
    dispatch({ kind: 'edit', change, label, field });
  }, []);
  const letterOf = (partId: string): string =>
    partLetter(
      Math.max(
        0,
        state.content.parts.findIndex((part) => part.id === partId),
      ),
    );

  return {
    state,
    edit,
    setTopic: (next) => dispatch({ kind: 'topic', topicId: next }),
    addPart: (kind) => {
      const ids = state.content.parts.map((part) => part.id);
      if (ids.length >= ITEM_LIMITS.parts) return null;
      const id = freeId('part', ids);
      edit(
        (now) => ({ ...now, parts: [...now.parts, blankPart(kind, id)] }),
        `new part (${partLetter(ids.length)})`,
      );
      return id;
    },
    changePart: (partId, change, label, field) => edit((now) => withPart(now, partId, change), label, field),
    movePart: (partId, step) =>
      edit(
        (now) => {
          const from = now.parts.findIndex((part) => part.id === partId);
          return { ...now, parts: moved(now.parts, from, from + step) };
        },
        `moving part (${letterOf(partId)})`,
      ),
    removePart: (partId) => edit((now) => withoutPart(now, partId), `removing part (${letterOf(partId)})`),
    changeQuantity: (name, change, field) =>
      edit((now) => withQuantity(now, name, change), `how ${name} is printed`, `quantity.${name}.${field}`),
    addFigure: (figureId) =>
      edit((now) => {
        const figure = { figureId, alternativeText: '', caption: '', widthPercent: 60, place: 'stem' };
        return { ...now, figures: [...now.figures, figure] };
      }, 'a new figure'),
    changeFigure: (index, change, field) =>
      edit(
        (now) => withFigure(now, index, change),
        change === null ? `removing figure ${index + 1}` : `figure ${index + 1}`,
        field,
      ),
    acceptCaution: (key, reason) =>
      edit((now) => {
        const rest = Object.fromEntries(Object.entries(now.acceptedCautions).filter(([one]) => one !== key));
        return { ...now, acceptedCautions: reason === '' ? rest : { ...rest, [key]: reason } };
      }, 'accepting a caution'),
    merge: (theirs, merged) => dispatch({ kind: 'merged', theirs, merged, topicId: state.topicId }),
    undo: () => dispatch({ kind: 'undo' }),
    redo: () => dispatch({ kind: 'redo' }),
  };
}
