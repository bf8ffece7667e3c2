import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';

import type { PartProgress } from './review-progress.ts';

const workingForm = z.object({
  text: z.string().trim().min(1, 'Write your answer with its unit.').max(200, 'At most 200 characters.'),
});
type WorkingValues = z.infer<typeof workingForm>;

interface WorkingFormProps {
  part: PartProgress;
  busy: boolean;
  /** Resolves once the try is stored; rejects with a sentence. */
  onTry: (partId: string, text: string) => Promise<void>;
  onDispute: (partId: string) => void;
}

const STATES: Readonly<Record<PartProgress['state'], string>> = {
  open: '',
  agrees: '',
  disagrees: 'Does not agree, and no try is left.',
  disputed: 'You hold to your working; this has to be settled before approval.',
  settled: 'Settled.',
};

/** The reviewer's own answer to one part: two tries, told only whether they agree. */
export function WorkingForm({ part, busy, onTry, onDispute }: WorkingFormProps) {
  const { register, handleSubmit, reset, setError, formState } = useForm<WorkingValues>({
    resolver: zodResolver(workingForm),
    defaultValues: { text: '' },
  });
  const id = `working-${part.partId}`;
  const problem = formState.errors.text?.message;
  const submit = handleSubmit(async ({ text }) => {
    try {
      await onTry(part.partId, text);
      reset();
    } catch (error) {
      setError('text', { message: sentenceOf(error) });
    }
  });
  const open = part.state === 'open' && part.triesLeft > 0;
  return (
    <section aria-labelledby={`${id}-title`} className="border-t border-rule py-3">
      <h3 id={`${id}-title`} className="font-semibold">
        Part ({part.letter})
      </h3>
      <ol className="grid gap-1" aria-live="polite">
        {part.tries.map((working) => (
          <li key={working.attempt} className="flex flex-wrap gap-x-3">
            <span className="text-muted">Try {working.attempt}</span>
            <span className="tabular-nums">{working.text}</span>
            <span className={working.agrees ? 'text-accent' : 'text-brass'}>
              {working.agrees ? '✓ agrees' : '✕ does not agree'}
            </span>
            {!working.agrees && working.remark !== '' && (
              <span className="basis-full text-sm">{working.remark}</span>
            )}
          </li>
        ))}
      </ol>
      {open ? (
        <form
          {...unsaved(formState.isDirty)}
          onSubmit={(event) => void submit(event)}
          className="mt-1 grid gap-1"
        >
          <label htmlFor={id} className="field-label">
            My answer, with its unit
          </label>
          <div className="flex flex-wrap items-center gap-2">
            <input
              id={id}
              className="field min-w-40 flex-1"
              autoComplete="off"
              placeholder={part.unit === '' ? 'number' : `number and unit, as ${part.unit}`}
              aria-invalid={problem !== undefined}
              aria-describedby={`${id}-note`}
              {...register('text')}
            />
            <button type="submit" className="button" disabled={busy}>
              {part.tries.length === 0 ? 'Compare' : 'Compare again'}
            </button>
          </div>
          <p id={`${id}-note`} className="text-sm">
            {problem !== undefined ? (
              <span role="alert" className="text-lead">
                {problem}
              </span>
            ) : (
              <span className="text-muted">
                {part.triesLeft === 1 ? 'One try left.' : `${part.triesLeft} tries.`}
              </span>
            )}
          </p>
        </form>
      ) : (
        STATES[part.state] !== '' && <p>{STATES[part.state]}</p>
      )}
      {part.state === 'disagrees' && (
        <button type="button" className="link" disabled={busy} onClick={() => onDispute(part.partId)}>
          I hold to my working
        </button>
      )}
    </section>
  );
}
