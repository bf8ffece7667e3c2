import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import type { PersonName } from '#shared/contracts/people.ts';
import { sentenceOf } from '#src/lib/api.ts';

const sendForm = z.object({
  note: z.string().trim().max(2_000, 'At most 2,000 characters.'),
  reviewer: z.string(),
  dueOn: z.union([z.literal(''), z.iso.date('Give the date as year-month-day.')]),
});
type SendValues = z.infer<typeof sendForm>;

/** What goes with an item to its review; a null reviewer leaves it in the queue for any. */
export interface Sending {
  note: string;
  reviewerId: number | null;
  dueOn: string | null;
}

interface SendFormProps {
  reviewers: readonly PersonName[];
  onSend: (sending: Sending) => Promise<void>;
  onCancel: () => void;
}

/** A note, a reviewer or the queue, and a date, for sending an item to review. */
export function SendForm({ reviewers, onSend, onCancel }: SendFormProps) {
  const { register, handleSubmit, setError, formState } = useForm<SendValues>({
    resolver: zodResolver(sendForm),
    defaultValues: { note: '', reviewer: '', dueOn: '' },
  });
  const { errors } = formState;
  const problem = errors.root?.message ?? errors.note?.message ?? errors.dueOn?.message;
  const submit = handleSubmit(async ({ note, reviewer, dueOn }) => {
    try {
      await onSend({
        note,
        reviewerId: reviewer === '' ? null : Number(reviewer),
        dueOn: dueOn === '' ? null : dueOn,
      });
    } catch (error) {
      setError('root', { message: sentenceOf(error) });
    }
  });
  return (
    <form className="grid gap-4" onSubmit={(event) => void submit(event)}>
      <label>
        <span className="field-label">Reviewer</span>
        <select className="field w-full" {...register('reviewer')}>
          <option value="">Any reviewer, from the queue</option>
          {reviewers.map((person) => (
            <option key={person.id} value={person.id}>
              {person.name}
            </option>
          ))}
        </select>
      </label>
      <label>
        <span className="field-label">Wanted by</span>
        <input type="date" className="field" {...register('dueOn')} />
      </label>
      <label>
        <span className="field-label">Note for the reviewer</span>
        <textarea className="field autogrow w-full" rows={3} {...register('note')} />
      </label>
      {problem !== undefined && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <p className="flex flex-wrap gap-3">
        <button type="submit" className="button button-primary" disabled={formState.isSubmitting}>
          Send to review
        </button>
        <button type="button" className="button" onClick={onCancel}>
          Cancel
        </button>
      </p>
    </form>
  );
}
