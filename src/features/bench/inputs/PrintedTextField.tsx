import { useId, useRef } from 'react';

import { ITEM_LIMITS } from '#shared/engine/index.ts';
import type { PlacedDiagnostic, QuantityRow } from '#shared/contracts/checking.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import { asMaths, inserted } from './insert-text.ts';

interface PrintedTextFieldProps {
  label: string;
  value: string;
  /** Values that can be put in as a hole. */
  rows: readonly QuantityRow[];
  diagnostics: readonly PlacedDiagnostic[];
  readOnly: boolean;
  /** `typing` is true for typing on, false for something put in by a button. */
  onChange: (text: string, typing: boolean) => void;
}

/** A text in Markdown with maths between dollars and holes in double braces, with buttons to put them in. */
export function PrintedTextField({
  label,
  value,
  rows,
  diagnostics,
  readOnly,
  onChange,
}: PrintedTextFieldProps) {
  const area = useRef<HTMLTextAreaElement>(null);
  const id = useId();
  const put = (change: (from: number, to: number) => { text: string; cursor: number }): void => {
    const node = area.current;
    if (node === null) return;
    const result = change(node.selectionStart, node.selectionEnd);
    onChange(result.text, false);
    requestAnimationFrame(() => {
      node.focus();
      node.setSelectionRange(result.cursor, result.cursor);
    });
  };
  const wrong = diagnostics.some((diagnostic) => diagnostic.severity === 'error');
  return (
    <div>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <label htmlFor={id} className="field-label">
          {label}
        </label>
        {!readOnly && (
          <span className="flex flex-wrap items-baseline gap-x-3 text-sm">
            <button
              type="button"
              className="link"
              onClick={() => put((from, to) => asMaths(value, from, to))}
            >
              Maths
            </button>
            <select
              className="field text-sm"
              aria-label={`Insert a value: ${label}`}
              value=""
              onChange={(event) => {
                const name = event.target.value;
                if (name !== '') put((from, to) => inserted(value, from, to, `{{${name}}}`));
              }}
            >
              <option value="">Value…</option>
              {rows.map((row) => (
                <option key={row.name} value={row.name}>
                  {row.name} {row.value === '' ? '' : `(${row.value})`}
                </option>
              ))}
            </select>
          </span>
        )}
      </div>
      <textarea
        id={id}
        ref={area}
        className="field autogrow w-full"
        rows={3}
        value={value}
        maxLength={ITEM_LIMITS.textLength}
        disabled={readOnly}
        aria-invalid={wrong}
        aria-describedby={`${id}-notes`}
        onChange={(event) => onChange(event.target.value, true)}
      />
      <ul id={`${id}-notes`} className="text-sm">
        {diagnostics.map((diagnostic) => (
          <li
            key={`${diagnostic.span.start} ${diagnostic.message}`}
            className={diagnostic.severity === 'error' ? 'text-lead' : 'text-brass'}
          >
            <Sentence text={diagnostic.message} />{' '}
            {diagnostic.fix !== undefined && !readOnly && (
              <button
                type="button"
                className="link"
                onClick={() => {
                  const { fix } = diagnostic;
                  if (fix === undefined) return;
                  onChange(inserted(value, fix.span.start, fix.span.end, fix.replacement).text, false);
                }}
              >
                {diagnostic.fix.label}
              </button>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
