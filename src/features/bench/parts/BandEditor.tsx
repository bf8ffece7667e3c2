import type { Answer, Band } from '#shared/engine/index.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';

const KINDS: Readonly<Record<Band['kind'], string>> = {
  percent: 'per cent of the answer',
  absolute: 'plus or minus a fixed amount',
  lastFigure: 'units in the last figure',
  limits: 'between two limits',
};
const ORDER: readonly Band['kind'][] = ['percent', 'absolute', 'lastFigure', 'limits'];

/** A band of another kind to begin from, in the unit of the answer. */
export function bandAsKind(kind: Band['kind'], answer: Answer): Band {
  if (answer.band.kind === kind) return answer.band;
  switch (kind) {
    case 'percent':
      return { kind, percent: 2 };
    case 'absolute':
      return { kind, plusMinus: 0, unit: answer.unit };
    case 'lastFigure':
      return { kind, units: 2 };
    case 'limits':
      return { kind, from: 0, to: 0, unit: answer.unit };
  }
}

interface BandEditorProps {
  answer: Answer;
  readOnly: boolean;
  onChange: (band: Band, field: string | null) => void;
}

/** The interval of answers that earn the mark, in one of four forms. */
export function BandEditor({ answer, readOnly, onChange }: BandEditorProps) {
  const { band } = answer;
  const unitField = (unit: string, set: (unit: string) => Band) => (
    <label>
      <span className="field-label">Unit of the band</span>
      <input
        className="field w-24 font-mono text-sm"
        value={unit}
        disabled={readOnly}
        onChange={(event) => onChange(set(event.target.value), 'band.unit')}
      />
    </label>
  );
  return (
    <fieldset className="flex flex-wrap items-end gap-3">
      <legend className="sr-only">Accepted band</legend>
      <label>
        <span className="field-label">Band</span>
        <select
          className="field"
          value={band.kind}
          disabled={readOnly}
          onChange={(event) => {
            const kind = ORDER.find((one) => one === event.target.value);
            if (kind !== undefined) onChange(bandAsKind(kind, answer), null);
          }}
        >
          {ORDER.map((kind) => (
            <option key={kind} value={kind}>
              {KINDS[kind]}
            </option>
          ))}
        </select>
      </label>
      {band.kind === 'percent' && (
        <NumberInput
          label="Plus or minus"
          value={band.percent}
          least={0}
          most={100}
          suffix="%"
          disabled={readOnly}
          onChange={(percent) => onChange({ ...band, percent }, 'band.percent')}
        />
      )}
      {band.kind === 'absolute' && (
        <>
          <NumberInput
            label="Plus or minus"
            value={band.plusMinus}
            least={0}
            disabled={readOnly}
            onChange={(plusMinus) => onChange({ ...band, plusMinus }, 'band.plusMinus')}
          />
          {unitField(band.unit, (unit) => ({ ...band, unit }))}
        </>
      )}
      {band.kind === 'lastFigure' && (
        <NumberInput
          label="Plus or minus"
          value={band.units}
          least={0}
          most={50}
          disabled={readOnly}
          onChange={(units) => onChange({ ...band, units }, 'band.units')}
        />
      )}
      {band.kind === 'limits' && (
        <>
          <NumberInput
            label="From"
            value={band.from}
            disabled={readOnly}
            onChange={(from) => onChange({ ...band, from }, 'band.from')}
          />
          <NumberInput
            label="To"
            value={band.to}
            disabled={readOnly}
            onChange={(to) => onChange({ ...band, to }, 'band.to')}
          />
          {unitField(band.unit, (unit) => ({ ...band, unit }))}
        </>
      )}
    </fieldset>
  );
}
