import { useId, useState } from 'react';

import { readTypedNumber } from './read-number.ts';

interface NumberInputProps {
  /** Visible label, or hidden with `labelHidden`. */
  label: string;
  labelHidden?: boolean;
  value: number | null;
  onChange: (value: number) => void;
  /** Called when the field is emptied; without it an empty field is a mistake. */
  onEmpty?: () => void;
  least?: number;
  most?: number;
  whole?: boolean;
  disabled?: boolean;
  /** Shown while the field is empty. */
  placeholder?: string;
  suffix?: string;
  narrow?: boolean;
  className?: string;
}

/**
 * A number that may stand half-typed: what is typed stays in the field, and is handed on as soon as it is a
 * number within the limits. The sentence under the field says what is wrong until then.
 */
export function NumberInput(props: NumberInputProps) {
  const { label, value, onChange, onEmpty, least, most, whole = false, disabled = false } = props;
  const [typed, setTyped] = useState<string | null>(null);
  const id = useId();
  const shown = typed ?? (value === null ? '' : String(value).replace('-', '−'));

  const judge = (text: string): { value: number } | { wrong: string } | 'empty' => {
    if (text.trim() === '') return onEmpty === undefined ? { wrong: 'Give a number.' } : 'empty';
    const number = readTypedNumber(text);
    if (number === null) return { wrong: 'This is not a number.' };
    if (whole && !Number.isInteger(number)) return { wrong: 'Give a whole number.' };
    if (least !== undefined && number < least) return { wrong: `At least ${least}.` };
    if (most !== undefined && number > most) return { wrong: `At most ${most}.` };
    return { value: number };
  };
  const verdict = typed === null ? null : judge(typed);
  const wrong = verdict !== null && typeof verdict === 'object' && 'wrong' in verdict ? verdict.wrong : null;

  return (
    <span className={props.className ?? 'inline-block'}>
      <label htmlFor={id} className={props.labelHidden === true ? 'sr-only' : 'field-label'}>
        {label}
      </label>
      <span className="inline-flex items-baseline gap-1">
        <input
          id={id}
          inputMode="decimal"
          className={`field font-mono text-sm tabular-nums ${props.narrow === true ? 'w-14' : 'w-20'}`}
          value={shown}
          disabled={disabled}
          placeholder={props.placeholder}
          aria-invalid={wrong !== null}
          aria-describedby={wrong === null ? undefined : `${id}-wrong`}
          onChange={(event) => {
            const text = event.target.value;
            setTyped(text);
            const judged = judge(text);
            if (judged === 'empty') onEmpty?.();
            else if ('value' in judged) onChange(judged.value);
          }}
          onBlur={() => {
            if (wrong === null) setTyped(null);
          }}
        />
        {props.suffix !== undefined && <span className="text-sm">{props.suffix}</span>}
      </span>
      {wrong !== null && (
        <span id={`${id}-wrong`} role="alert" className="block text-sm text-lead">
          {wrong}
        </span>
      )}
    </span>
  );
}
