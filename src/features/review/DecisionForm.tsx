import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';

import type { Review } from '#shared/contracts/reviews.ts';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import { approvalHindrances, openCautions } from './review-progress.ts';

const decisionForm = z
  .object({
    decision: z.enum(['approved', 'returned'], { error: 'Choose one.' }),
    reason: z.string().trim().max(4_000, 'At most 4,000 characters.'),
    accepted: z.array(
      z.object({ key: z.string(), reason: z.string().max(1_000, 'At most 1,000 characters.') }),
    ),
  })
  .superRefine((values, context) => {
    if (values.decision === 'returned' && values.reason === '') {
      context.addIssue({ code: 'custom', path: ['reason'], message: 'Tell the writer why it comes back.' });
    }
  });
type DecisionValues = z.infer<typeof decisionForm>;

/** A decision as it is sent. */
export interface Decision {
  decision: 'approved' | 'returned';
  reason: string;
  acceptedCautions: Record<string, string>;
}

interface DecisionFormProps {
  review: Review;
  onDecide: (decision: Decision) => Promise<void>;
}

const reasonsOf = (accepted: DecisionValues['accepted']): Record<string, string> =>
  Object.fromEntries(
    accepted.filter((one) => one.reason.trim() !== '').map((one) => [one.key, one.reason.trim()]),
  );

/** Approve or return, with reasons; what keeps the item from approval is told before it is tried. */
export function DecisionForm({ review, onDecide }: DecisionFormProps) {
  const cautions = openCautions(review, {});
  const { register, handleSubmit, control, setError, formState } = useForm<DecisionValues>({
    resolver: zodResolver(decisionForm),
    defaultValues: { reason: '', accepted: cautions.map(({ key }) => ({ key, reason: '' })) },
  });
  const accepted = useWatch({ control, name: 'accepted' });
  const decision = useWatch({ control, name: 'decision' });
  const hindrances = approvalHindrances(review, reasonsOf(accepted));
  const submit = handleSubmit(async (values) => {
    try {
      await onDecide({
        decision: values.decision,
        reason: values.reason,
        acceptedCautions: values.decision === 'approved' ? reasonsOf(values.accepted) : {},
      });
    } catch (error) {
      setError('root', {
        message: sentenceOf(error),
      });
    }
  });
  const { errors } = formState;
  const problem = errors.root?.message ?? errors.decision?.message;
  return (
    <form {...unsaved(formState.isDirty)} className="grid gap-4" onSubmit={(event) => void submit(event)}>
      {cautions.length > 0 && (
        <fieldset className="grid gap-3">
          <legend className="font-semibold">Cautions that may stand</legend>
          {cautions.map((caution, index) => (
            <label key={caution.key}>
              <span className="block">
                <Sentence text={caution.statement} />
              </span>
              <input
                className="field w-full"
                placeholder="why it may stand"
                {...register(`accepted.${index}.reason`)}
              />
            </label>
          ))}
        </fieldset>
      )}
      <fieldset>
        <legend className="sr-only">Decision</legend>
        <label className="check">
          <input type="radio" value="approved" disabled={hindrances.length > 0} {...register('decision')} />{' '}
          Approve this revision
        </label>
        {hindrances.length > 0 && (
          <ul className="mb-1 ml-6 text-sm text-brass">
            {hindrances.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        )}
        <label className="check">
          <input type="radio" value="returned" {...register('decision')} /> Return it to the writer
        </label>
      </fieldset>
      <label>
        <span className="field-label">
          {decision === 'returned' ? 'Reasons, for the writer' : 'A word to the record'}
        </span>
        <textarea
          className="field autogrow w-full"
          rows={3}
          aria-invalid={errors.reason !== undefined}
          aria-describedby={errors.reason === undefined ? undefined : 'decision-reason'}
          {...register('reason')}
        />
      </label>
      {errors.reason !== undefined && (
        <p id="decision-reason" role="alert" className="text-lead">
          {errors.reason.message}
        </p>
      )}
      {problem !== undefined && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <p>
        <button type="submit" className="button button-primary" disabled={formState.isSubmitting}>
          {decision === 'approved' ? 'Approve' : decision === 'returned' ? 'Return' : 'Decide'}
        </button>
      </p>
    </form>
  );
}
