import { readResponse, type PartScale } from '#shared/engine/index.ts';
import type { PlacedDiagnostic, QuantityRow } from '#shared/contracts/checking.ts';
import type { ItemScheme } from '#shared/sheet/model.ts';
import type { DraftEditor } from '../draft/use-draft.ts';
import type { BenchSlots } from '../slots.ts';
import { EditorPlace } from '../EditorPlace.tsx';
import { bandFromStrip } from './band-from-strip.ts';
import { PartEditor } from './PartEditor.tsx';
import { PartTools } from './PartTools.tsx';

interface PartPlaceProps {
  partId: string;
  letter: string;
  draft: DraftEditor;
  rows: readonly QuantityRow[];
  diagnostics: readonly PlacedDiagnostic[];
  scale: PartScale | undefined;
  scheme: ItemScheme | null;
  readOnly: boolean;
  editing: boolean;
  onEdit: () => void;
  onVisitDraw: (draw: number) => void;
  renderScale: BenchSlots['scale'];
}

/** The model answer of a part at the draw on show, in the unit of the answer; null when there is none. */
function modelAnswer(scheme: ItemScheme | null, partId: string): number | null {
  const text = scheme?.parts.find((part) => part.id === partId)?.answer?.text;
  const reading = text === undefined ? null : readResponse(text);
  return reading?.ok === true ? reading.value : null;
}

/** What the bench puts under one part of the sheet: its scale strip, its tools and, when open, its editor. */
export function PartPlace(props: PartPlaceProps) {
  const { partId, letter, draft, rows, diagnostics, scale, readOnly, editing } = props;
  const { parts } = draft.state.content;
  const index = parts.findIndex((part) => part.id === partId);
  const part = parts[index];
  if (part === undefined) return null;
  const model = modelAnswer(props.scheme, partId);
  const answer = part.kind === 'written' ? null : part.answer;
  const tryBand =
    readOnly || answer === null
      ? undefined
      : (stretch: { low: number; high: number }): void => {
          const band = bandFromStrip(answer, stretch, model);
          if (band === null) return;
          draft.changePart(
            partId,
            (now) => (now.kind === 'written' ? now : { ...now, answer: { ...now.answer, band } }),
            `the band of part (${letter})`,
            null,
          );
        };
  return (
    <div className="bench-insert" id={`part-${partId}`} tabIndex={-1}>
      {scale !== undefined &&
        answer !== null &&
        props.renderScale({
          scale,
          name: `Part (${letter})`,
          answer: model,
          symmetric: answer.band.kind !== 'limits',
          onTryBand: tryBand,
          onVisitDraw: props.onVisitDraw,
        })}
      {!readOnly && (
        <PartTools
          letter={letter}
          index={index}
          count={parts.length}
          editing={editing}
          onEdit={props.onEdit}
          onMove={(step) => draft.movePart(partId, step)}
          onRemove={() => draft.removePart(partId)}
        />
      )}
      {editing && (
        <EditorPlace label={`Editing part (${letter})`}>
          <PartEditor
            part={part}
            letter={letter}
            first={index === 0}
            rows={rows}
            diagnostics={diagnostics.filter((one) => one.field.startsWith(`parts.${index}.`))}
            readOnly={readOnly}
            onChange={(change, label, field) => draft.changePart(partId, change, label, field)}
          />
        </EditorPlace>
      )}
    </div>
  );
}
