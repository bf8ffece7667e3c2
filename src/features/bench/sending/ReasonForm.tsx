import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { sentenceOf } from '#src/lib/api.ts';

const reasonForm = z.object({
  reason: z.string().trim().min(1, 'Say why, in a few words.').max(2_000, 'At most 2,000 characters.'),
});
type ReasonValues = z.infer<typeof reasonForm>;

interface ReasonFormProps {
  /** What happens, in a sentence or two. */
  explanation: string;
  action: string;
  onSubmit: (reason: string) => Promise<void>;
  onCancel: () => void;
}

/** A reason for something that is recorded: taking an item back, or withdrawing it. */
export function ReasonForm({ explanation, action, onSubmit, onCancel }: ReasonFormProps) {
  const { register, handleSubmit, setError, formState } = useForm<ReasonValues>({
    resolver: zodResolver(reasonForm),
    defaultValues: { reason: '' },
  });
  const problem = formState.errors.reason?.message;
  const submit = handleSubmit(async ({ reason }) => {
    try {
      await onSubmit(reason);
    } catch (error) {
      setError('reason', { message: sentenceOf(error) });
    }
  });
  return (
    <form className="grid gap-4" onSubmit={(event) => void submit(event)}>
      <p>{explanation}</p>
      <label>
        <span className="field-label">Reason</span>
        <textarea
          className="field autogrow w-full"
          rows={3}
          aria-invalid={problem !== undefined}
          aria-describedby={problem === undefined ? undefined : 'reason-problem'}
          {...register('reason')}
        />
      </label>
      {problem !== undefined && (
        <p id="reason-problem" role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <p className="flex flex-wrap gap-3">
        <button type="submit" className="button button-primary" disabled={formState.isSubmitting}>
          {action}
        </button>
        <button type="button" className="button" onClick={onCancel}>
          Cancel
        </button>
      </p>
    </form>
  );
}
