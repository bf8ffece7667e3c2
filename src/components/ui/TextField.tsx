import { useId, type InputHTMLAttributes } from 'react';

interface TextFieldProps extends InputHTMLAttributes<HTMLInputElement> {
  label: string;
  /** What is wrong with it, one sentence. */
  problem?: string | undefined;
}

/** A labelled field with its problem beneath it. */
export function TextField({ label, problem, className = 'w-full', ...input }: TextFieldProps) {
  const id = useId();
  return (
    <div>
      <label className="field-label" htmlFor={id}>
        {label}
      </label>
      <input
        id={id}
        className={`field ${className}`}
        aria-invalid={problem !== undefined}
        aria-describedby={problem === undefined ? undefined : `${id}-problem`}
        {...input}
      />
      {problem !== undefined && (
        <p id={`${id}-problem`} role="alert" className="text-sm text-lead">
          {problem}
        </p>
      )}
    </div>
  );
}
