import { ITEM_LIMITS, type Slip } from '#shared/engine/index.ts';
import { blankSlip, freeId } from '../draft/blank-parts.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';

interface SlipsEditorProps {
  slips: readonly Slip[];
  readOnly: boolean;
  onChange: (slips: Slip[], label: string, field: string | null) => void;
}

/** Known wrong workings: a name, an expression over the script's names, guidance, and marks still earned. */
export function SlipsEditor({ slips, readOnly, onChange }: SlipsEditorProps) {
  const change = (id: string, part: Partial<Slip>, field: string): void =>
    onChange(
      slips.map((slip) => (slip.id === id ? { ...slip, ...part } : slip)),
      'a slip',
      `slip.${id}.${field}`,
    );
  return (
    <fieldset>
      <legend className="field-label">Slips</legend>
      {slips.length === 0 && (
        <p className="text-sm text-muted">
          Name the wrong workings that you expect; each must land outside the band on every draw.
        </p>
      )}
      <ul className="grid gap-4">
        {slips.map((slip, index) => {
          const name = slip.name === '' ? `slip ${index + 1}` : slip.name;
          return (
            <li key={slip.id} className="grid gap-2 border-l-2 border-rule pl-3">
              <div className="flex flex-wrap items-end gap-2">
                <label className="min-w-40 flex-1">
                  <span className="field-label">What was done</span>
                  <input
                    className="field w-full"
                    value={slip.name}
                    disabled={readOnly}
                    placeholder="half left out of the kinetic energy"
                    onChange={(event) => change(slip.id, { name: event.target.value }, 'name')}
                  />
                </label>
                <label className="min-w-40 flex-1">
                  <span className="field-label">Expression</span>
                  <input
                    className="field w-full font-mono text-sm"
                    value={slip.expression}
                    disabled={readOnly}
                    placeholder="sqrt(Ek / m_e)"
                    onChange={(event) => change(slip.id, { expression: event.target.value }, 'expression')}
                  />
                </label>
                <NumberInput
                  label="Marks"
                  value={slip.marks}
                  least={0}
                  most={ITEM_LIMITS.marksPerPart}
                  whole
                  disabled={readOnly}
                  onChange={(marks) => change(slip.id, { marks }, 'marks')}
                />
              </div>
              <div className="flex flex-wrap items-end gap-2">
                <label className="min-w-40 flex-1">
                  <span className="field-label">Guidance for the marker</span>
                  <input
                    className="field w-full"
                    value={slip.guidance}
                    disabled={readOnly}
                    onChange={(event) => change(slip.id, { guidance: event.target.value }, 'guidance')}
                  />
                </label>
                {!readOnly && (
                  <button
                    type="button"
                    className="link"
                    aria-label={`Remove the slip: ${name}`}
                    onClick={() =>
                      onChange(
                        slips.filter((one) => one.id !== slip.id),
                        'removing a slip',
                        null,
                      )
                    }
                  >
                    Remove
                  </button>
                )}
              </div>
            </li>
          );
        })}
      </ul>
      {!readOnly && slips.length < ITEM_LIMITS.slips && (
        <button
          type="button"
          className="link mt-1 text-sm"
          onClick={() => {
            const id = freeId(
              'slip',
              slips.map((slip) => slip.id),
            );
            onChange([...slips, blankSlip(id)], 'a new slip', null);
          }}
        >
          Add a slip
        </button>
      )}
    </fieldset>
  );
}
