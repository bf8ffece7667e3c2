import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';

import type { PartProgress } from './review-progress.ts';

const settlementForm = z.object({
  reason: z.string().trim().min(1, 'Say what settled it.').max(2_000, 'At most 2,000 characters.'),
});
type SettlementValues = z.infer<typeof settlementForm>;

interface SettlementFormProps {
  part: PartProgress;
  onSettle: (partId: string, reason: string) => Promise<void>;
}

/** After the reveal: the reviewer now agrees with a part that came out differently, and says why. */
export function SettlementForm({ part, onSettle }: SettlementFormProps) {
  const { register, handleSubmit, setError, formState } = useForm<SettlementValues>({
    resolver: zodResolver(settlementForm),
    defaultValues: { reason: '' },
  });
  const problem = formState.errors.reason?.message;
  const id = `settle-${part.partId}`;
  const submit = handleSubmit(async ({ reason }) => {
    try {
      await onSettle(part.partId, reason);
    } catch (error) {
      setError('reason', { message: sentenceOf(error) });
    }
  });
  return (
    <form {...unsaved(formState.isDirty)} className="grid gap-1" onSubmit={(event) => void submit(event)}>
      <label htmlFor={id}>
        Your working of ({part.letter}) did not agree. If you now agree with the answer, say what settled it;
        otherwise return the item.
      </label>
      <div className="flex flex-wrap gap-2">
        <input
          id={id}
          className="field min-w-40 flex-1"
          aria-invalid={problem !== undefined}
          aria-describedby={problem === undefined ? undefined : `${id}-problem`}
          {...register('reason')}
        />
        <button type="submit" className="button" disabled={formState.isSubmitting}>
          Settle
        </button>
      </div>
      {problem !== undefined && (
        <p id={`${id}-problem`} role="alert" className="text-lead">
          {problem}
        </p>
      )}
    </form>
  );
}
