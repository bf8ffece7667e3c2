import { ITEM_LIMITS, type Part, type SchemeLine } from '#shared/engine/index.ts';
import { blankSchemeLine } from '../draft/blank-parts.ts';
import { moved, schemeBalance } from '../draft/edit-content.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';
import { moveOfKeys } from './move-key.ts';

interface SchemeLinesEditorProps {
  part: Part;
  readOnly: boolean;
  /** `field` names what is typed in, so that typing on is one step of undo; null for adding and removing. */
  onChange: (scheme: SchemeLine[], label: string, field: string | null) => void;
}

/** The lines of a part's mark scheme with their marks, and whether these add up. */
export function SchemeLinesEditor({ part, readOnly, onChange }: SchemeLinesEditorProps) {
  const { scheme } = part;
  const balance = schemeBalance(part);
  const change = (index: number, line: Partial<SchemeLine>, field: string): void =>
    onChange(
      scheme.map((one, at) => (at === index ? { ...one, ...line } : one)),
      'the mark scheme',
      `scheme.${index}.${field}`,
    );
  return (
    <fieldset>
      <legend className="field-label">Mark scheme</legend>
      <ol className="grid gap-2">
        {scheme.map((line, index) => (
          <li key={index} className="flex items-start gap-2">
            <textarea
              className="field min-w-0 flex-1"
              rows={1}
              aria-label={`Mark scheme line ${index + 1}`}
              value={line.text}
              disabled={readOnly}
              onChange={(event) => change(index, { text: event.target.value }, 'text')}
              onKeyDown={(event) => {
                const step = moveOfKeys(event);
                if (step === null) return;
                event.preventDefault();
                onChange(moved(scheme, index, index + step), 'the order of the mark scheme', null);
              }}
            />
            <NumberInput
              label={`Marks of line ${index + 1}`}
              labelHidden
              value={line.marks}
              least={0}
              most={ITEM_LIMITS.marksPerPart}
              whole
              disabled={readOnly}
              onChange={(marks) => change(index, { marks }, 'marks')}
            />
            {!readOnly && (
              <button
                type="button"
                className="link"
                aria-label={`Remove mark scheme line ${index + 1}`}
                onClick={() =>
                  onChange(
                    scheme.filter((_, at) => at !== index),
                    'removing a line of the mark scheme',
                    null,
                  )
                }
              >
                Remove
              </button>
            )}
          </li>
        ))}
      </ol>
      <p className="mt-2 flex flex-wrap items-baseline gap-x-4 text-sm">
        {!readOnly && scheme.length < ITEM_LIMITS.schemeLines && (
          <button
            type="button"
            className="link"
            onClick={() => onChange([...scheme, blankSchemeLine()], 'a new line of the mark scheme', null)}
          >
            Add a line
          </button>
        )}
        <span className={balance.balanced ? 'text-muted' : 'text-brass'}>{balance.sentence}</span>
      </p>
    </fieldset>
  );
}
