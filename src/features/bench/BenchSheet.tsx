import type { ReactNode } from 'react';

import { partLetter, type AssayReport, type ItemContent } from '#shared/engine/index.ts';
import type { DrawView } from '#shared/contracts/checking.ts';
import type { ItemSheet } from '#shared/sheet/model.ts';
import type { Topic } from '#shared/contracts/topics.ts';
import { BenchStem } from './BenchStem.tsx';
import type { DraftEditor } from './draft/use-draft.ts';
import { EditorPlace } from './EditorPlace.tsx';
import { FiguresEditor } from './figures/FiguresEditor.tsx';
import { AddPart } from './parts/PartTools.tsx';
import { PartPlace } from './parts/PartPlace.tsx';
import type { BenchSlots } from './slots.ts';

interface BenchSheetProps {
  draft: DraftEditor;
  content: ItemContent;
  topics: readonly Topic[];
  view: DrawView | null;
  report: AssayReport | null;
  readOnly: boolean;
  /** Id of the part whose editor is open, or `stem`. */
  editing: string | null;
  onEditing: (place: string | null) => void;
  onVisitDraw: (draw: number) => void;
  onUpload: (file: File) => Promise<number>;
  slots: Pick<BenchSlots, 'sheet' | 'scale'>;
}

/** The sheet with the parts that the draft has now, though the last drawn one may lag behind by a moment. */
function sheetOf(view: DrawView | null, content: ItemContent): ItemSheet {
  const parts = content.parts.map((part, index) => {
    const drawn = view?.sheet.parts.find((one) => one.id === part.id);
    const letter = partLetter(index);
    return drawn === undefined
      ? { id: part.id, letter, kind: part.kind, blocks: [], marks: part.marks, answerUnit: null, lines: 0 }
      : { ...drawn, letter };
  });
  const empty = { title: content.title, blocks: [], marks: 0, cautions: [] };
  return { ...(view?.sheet ?? empty), parts };
}

/** The sheet as the candidate will see it, with scale strips and editors in place. */
export function BenchSheet(props: BenchSheetProps): ReactNode {
  const { draft, content, view, report, readOnly, editing, onEditing } = props;
  const rows = view?.quantities ?? [];
  const diagnostics = view?.diagnostics ?? [];
  const stemOpen = editing === 'stem';

  const afterStem = readOnly ? null : (
    <div className="bench-insert" id="part-stem" tabIndex={-1}>
      <p className="flex flex-wrap gap-x-4 text-sm">
        <button
          type="button"
          className="link"
          aria-expanded={stemOpen}
          onClick={() => onEditing(stemOpen ? null : 'stem')}
        >
          {stemOpen ? 'Close the stem' : 'Edit title, stem and figures'}
        </button>
      </p>
      {stemOpen && (
        <EditorPlace label="Editing title, stem and figures">
          <BenchStem
            draft={draft}
            content={content}
            topics={props.topics}
            rows={rows}
            diagnostics={diagnostics}
          />
          <h3 className="mt-5 font-semibold">Figures</h3>
          <FiguresEditor
            content={content}
            readOnly={false}
            onUpload={props.onUpload}
            onAdd={draft.addFigure}
            onChange={draft.changeFigure}
            onRemove={(index) => draft.changeFigure(index, null, null)}
          />
        </EditorPlace>
      )}
    </div>
  );
  return (
    <div>
      {props.slots.sheet(sheetOf(view, content), {
        afterStem,
        afterPart: (partId) => (
          <PartPlace
            partId={partId}
            letter={partLetter(content.parts.findIndex((part) => part.id === partId))}
            draft={draft}
            rows={rows}
            diagnostics={diagnostics}
            scale={report?.scales.find((scale) => scale.partId === partId)}
            scheme={view?.scheme ?? null}
            readOnly={readOnly}
            editing={editing === partId}
            onEdit={() => onEditing(editing === partId ? null : partId)}
            onVisitDraw={props.onVisitDraw}
            renderScale={props.slots.scale}
          />
        ),
      })}
      {!readOnly && (
        <div className="mt-4 grid gap-2">
          <AddPart
            onAdd={(kind) => {
              onEditing(draft.addPart(kind));
            }}
          />
        </div>
      )}
    </div>
  );
}
