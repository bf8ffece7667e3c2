import type { Answer } from '#shared/engine/index.ts';
import type { QuantityRow } from '#shared/contracts/checking.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';
import { BandEditor } from './BandEditor.tsx';
import { SlipsEditor } from './SlipsEditor.tsx';

interface AnswerEditorProps {
  answer: Answer;
  /** Names that can be the answer. */
  rows: readonly QuantityRow[];
  /** True for the first part, into which nothing can be carried. */
  first: boolean;
  readOnly: boolean;
  onChange: (change: Partial<Answer>, label: string, field: string | null) => void;
}

/** The answer of a numeric or show-that part: which value, in what unit, to how many figures, within what band. */
export function AnswerEditor({ answer, rows, first, readOnly, onChange }: AnswerEditorProps) {
  const known = rows.some((row) => row.name === answer.quantity);
  const unit = rows.find((row) => row.name === answer.quantity)?.unit ?? '';
  return (
    <div className="grid gap-4">
      <div className="flex flex-wrap items-end gap-3">
        <label>
          <span className="field-label">Answer</span>
          <select
            className="field font-mono text-sm"
            value={answer.quantity}
            disabled={readOnly}
            onChange={(event) => onChange({ quantity: event.target.value }, 'the answer', null)}
          >
            <option value="">choose a quantity</option>
            {!known && answer.quantity !== '' && (
              <option value={answer.quantity}>{answer.quantity} (not in the script)</option>
            )}
            {rows.map((row) => (
              <option key={row.name} value={row.name}>
                {row.name}
              </option>
            ))}
          </select>
        </label>
        <label>
          <span className="field-label">Unit</span>
          <input
            className="field w-28 font-mono text-sm"
            value={answer.unit}
            placeholder={unit}
            disabled={readOnly}
            onChange={(event) => onChange({ unit: event.target.value }, 'the unit of the answer', 'unit')}
          />
        </label>
        <NumberInput
          label="Significant figures"
          value={answer.figures}
          least={1}
          most={12}
          whole
          disabled={readOnly}
          onChange={(figures) => onChange({ figures }, 'the figures of the answer', 'figures')}
        />
        <label className="check">
          <input
            type="checkbox"
            checked={answer.enforceFigures}
            disabled={readOnly}
            onChange={(event) =>
              onChange({ enforceFigures: event.target.checked }, 'enforcing the figures', null)
            }
          />{' '}
          Other figures lose the mark
        </label>
        {!first && (
          <label className="check">
            <input
              type="checkbox"
              checked={answer.carryForward}
              disabled={readOnly}
              onChange={(event) =>
                onChange({ carryForward: event.target.checked }, 'carrying errors forward', null)
              }
            />{' '}
            Errors from earlier parts are carried forward
          </label>
        )}
      </div>
      <BandEditor
        answer={answer}
        readOnly={readOnly}
        onChange={(band, field) => onChange({ band }, 'the band', field)}
      />
      <SlipsEditor
        slips={answer.slips}
        readOnly={readOnly}
        onChange={(slips, label, field) => onChange({ slips }, label, field)}
      />
    </div>
  );
}
