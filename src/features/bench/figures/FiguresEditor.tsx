import { useRef, useState, type DragEvent } from 'react';

import { ITEM_LIMITS, partLetter, type ItemContent, type ItemFigure } from '#shared/engine/index.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';
import { fileRefusal, pictureOf } from './check-file.ts';

interface FiguresEditorProps {
  content: ItemContent;
  readOnly: boolean;
  /** Sends the file to the server; gives the stored figure's id, or throws with a sentence. */
  onUpload: (file: File) => Promise<number>;
  onAdd: (figureId: number) => void;
  onChange: (index: number, change: Partial<ItemFigure>, field: string) => void;
  onRemove: (index: number) => void;
}

/** Figures of the item: added by choosing, dropping or pasting a file; each needs words for those who cannot see it. */
export function FiguresEditor(props: FiguresEditorProps) {
  const { content, readOnly, onUpload, onAdd, onChange, onRemove } = props;
  const chooser = useRef<HTMLInputElement>(null);
  const [busy, setBusy] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [over, setOver] = useState(false);
  const full = content.figures.length >= ITEM_LIMITS.figures;

  const take = async (files: Iterable<File>): Promise<void> => {
    const file = pictureOf(files);
    if (file === null || readOnly || busy !== null) return;
    const refused = full ? `An item may have at most ${ITEM_LIMITS.figures} figures.` : fileRefusal(file);
    setRefusal(refused);
    if (refused !== null) return;
    setBusy(file.name);
    try {
      onAdd(await onUpload(file));
    } catch (error) {
      setRefusal(sentenceOf(error));
    } finally {
      setBusy(null);
    }
  };
  const drop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    void take(event.dataTransfer.files);
  };
  return (
    <div
      className="grid gap-4"
      onPaste={(event) => {
        if (event.clipboardData.files.length === 0) return;
        event.preventDefault();
        void take(event.clipboardData.files);
      }}
    >
      {content.figures.map((figure, index) => (
        <FigureEntry
          key={`${figure.figureId} ${index}`}
          figure={figure}
          index={index}
          content={content}
          readOnly={readOnly}
          onChange={(change, field) => onChange(index, change, `figure.${index}.${field}`)}
          onRemove={() => onRemove(index)}
        />
      ))}
      {!readOnly && (
        <div
          className={over ? 'drop-place drop-over' : 'drop-place'}
          onDragOver={(event) => {
            event.preventDefault();
            setOver(true);
          }}
          onDragLeave={() => setOver(false)}
          onDrop={drop}
        >
          <input
            ref={chooser}
            type="file"
            accept="image/png,image/jpeg,image/svg+xml"
            className="sr-only"
            tabIndex={-1}
            aria-label="Choose a figure"
            onChange={(event) => {
              void take(event.target.files ?? []);
              event.target.value = '';
            }}
          />
          <button
            type="button"
            className="button"
            disabled={busy !== null}
            onClick={() => chooser.current?.click()}
          >
            Choose a figure
          </button>{' '}
          <span className="text-sm text-muted">
            {busy === null ? 'or drop or paste one here: PNG, JPEG or SVG, 4 MB at most' : `Sending ${busy}`}
          </span>
          {refusal !== null && (
            <p role="alert" className="text-lead">
              {refusal}
            </p>
          )}
        </div>
      )}
    </div>
  );
}

interface FigureEntryProps {
  figure: ItemFigure;
  index: number;
  content: ItemContent;
  readOnly: boolean;
  onChange: (change: Partial<ItemFigure>, field: string) => void;
  onRemove: () => void;
}

function FigureEntry({ figure, index, content, readOnly, onChange, onRemove }: FigureEntryProps) {
  const name = `Figure ${index + 1}`;
  const silent = figure.alternativeText.trim() === '';
  return (
    <fieldset className="grid grid-cols-[5.5rem_1fr] gap-3">
      <legend className="field-label">{name}</legend>
      <img
        src={`/api/figures/${figure.figureId}/content`}
        alt={silent ? `${name}, without description` : figure.alternativeText}
        className="figure-thumb"
      />
      <div className="grid gap-2">
        <label>
          <span className="field-label">Description for those who cannot see it</span>
          <textarea
            className="field autogrow w-full"
            rows={2}
            value={figure.alternativeText}
            disabled={readOnly}
            required
            aria-invalid={silent}
            aria-describedby={silent ? `figure-${index}-silent` : undefined}
            onChange={(event) => onChange({ alternativeText: event.target.value }, 'alternative')}
          />
        </label>
        {silent && (
          <p id={`figure-${index}-silent`} className="text-sm text-lead">
            Say what the figure shows; without this the item cannot be reviewed.
          </p>
        )}
        <div className="flex flex-wrap items-end gap-3">
          <label className="min-w-40 flex-1">
            <span className="field-label">Caption</span>
            <input
              className="field w-full"
              value={figure.caption}
              disabled={readOnly}
              onChange={(event) => onChange({ caption: event.target.value }, 'caption')}
            />
          </label>
          <NumberInput
            label="Width"
            value={figure.widthPercent}
            least={20}
            most={100}
            whole
            suffix="%"
            disabled={readOnly}
            onChange={(widthPercent) => onChange({ widthPercent }, 'width')}
          />
          <label>
            <span className="field-label">Place</span>
            <select
              className="field"
              value={figure.place}
              disabled={readOnly}
              onChange={(event) => onChange({ place: event.target.value }, 'place')}
            >
              <option value="stem">under the stem</option>
              {content.parts.map((part, at) => (
                <option key={part.id} value={part.id}>
                  under part ({partLetter(at)})
                </option>
              ))}
            </select>
          </label>
          {!readOnly && (
            <button
              type="button"
              className="link"
              aria-label={`Remove ${name} from the item`}
              onClick={onRemove}
            >
              Remove
            </button>
          )}
        </div>
      </div>
    </fieldset>
  );
}
