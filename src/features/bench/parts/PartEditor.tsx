import { ITEM_LIMITS, type Part } from '#shared/engine/index.ts';
import type { PlacedDiagnostic, QuantityRow } from '#shared/contracts/checking.ts';
import { partAsKind } from '../draft/blank-parts.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';
import { PrintedTextField } from '../inputs/PrintedTextField.tsx';
import { AnswerEditor } from './AnswerEditor.tsx';
import { SchemeLinesEditor } from './SchemeLinesEditor.tsx';

const KINDS: readonly (readonly [Part['kind'], string])[] = [
  ['numeric', 'Numeric: the candidate finds a value'],
  ['showThat', 'Show that: the value is stated and must be reached'],
  ['written', 'Written: marking points, no band'],
];

interface PartEditorProps {
  part: Part;
  letter: string;
  first: boolean;
  rows: readonly QuantityRow[];
  /** Mistakes in this part's text and mark scheme. */
  diagnostics: readonly PlacedDiagnostic[];
  readOnly: boolean;
  /** Changes the part; `field` is null where the change is a step of undo of its own. */
  onChange: (change: (part: Part) => Part, label: string, field: string | null) => void;
}

/** Everything of one part that its writer decides. */
export function PartEditor({ part, letter, first, rows, diagnostics, readOnly, onChange }: PartEditorProps) {
  const set = (change: Partial<Part>, label: string, field: string | null): void =>
    onChange(
      (now) => Object.assign({ ...now }, change),
      label,
      field === null ? null : `${part.id}.${field}`,
    );
  return (
    <div className="grid gap-5">
      <div className="flex flex-wrap items-end gap-3">
        <label>
          <span className="field-label">Kind of part</span>
          <select
            className="field"
            value={part.kind}
            disabled={readOnly}
            onChange={(event) => {
              const kind = KINDS.find(([one]) => one === event.target.value)?.[0];
              if (kind !== undefined)
                onChange((now) => partAsKind(now, kind), `the kind of part (${letter})`, null);
            }}
          >
            {KINDS.map(([kind, name]) => (
              <option key={kind} value={kind}>
                {name}
              </option>
            ))}
          </select>
        </label>
        <NumberInput
          label="Marks"
          value={part.marks}
          least={0}
          most={ITEM_LIMITS.marksPerPart}
          whole
          disabled={readOnly}
          onChange={(marks) => set({ marks }, `the marks of part (${letter})`, 'marks')}
        />
        {part.kind === 'showThat' && (
          <NumberInput
            label="Figures stated"
            value={part.statedFigures}
            least={1}
            most={6}
            whole
            disabled={readOnly}
            onChange={(statedFigures) => set({ statedFigures }, 'the figures stated', 'stated')}
          />
        )}
        {part.kind === 'written' && (
          <NumberInput
            label="Lines to write on"
            value={part.answerLines}
            least={0}
            most={40}
            whole
            disabled={readOnly}
            onChange={(answerLines) => set({ answerLines }, 'the lines to write on', 'lines')}
          />
        )}
      </div>
      <PrintedTextField
        label={`Text of part (${letter})`}
        value={part.text}
        rows={rows}
        diagnostics={diagnostics.filter(
          (one) => one.field.endsWith('.text') && !one.field.includes('.scheme.'),
        )}
        readOnly={readOnly}
        onChange={(text, field) => set({ text }, `the text of part (${letter})`, field ? 'text' : null)}
      />
      {part.kind !== 'written' && (
        <AnswerEditor
          answer={part.answer}
          rows={rows}
          first={first}
          readOnly={readOnly}
          onChange={(change, label, field) =>
            onChange(
              (now) => (now.kind === 'written' ? now : { ...now, answer: { ...now.answer, ...change } }),
              `${label} in part (${letter})`,
              field === null ? null : `${part.id}.answer.${field}`,
            )
          }
        />
      )}
      <SchemeLinesEditor
        part={part}
        readOnly={readOnly}
        onChange={(scheme, label, field) => set({ scheme }, `${label} of part (${letter})`, field)}
      />
      {diagnostics
        .filter((one) => one.field.includes('.scheme.') || one.field.includes('.answer'))
        .map((one) => (
          <p
            key={`${one.field} ${one.message}`}
            role="status"
            className={one.severity === 'error' ? 'text-lead' : 'text-brass'}
          >
            {one.message}
          </p>
        ))}
    </div>
  );
}
