import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';

import { type PaperDetails, paperDetailsSchema } from '#shared/contracts/papers.ts';
import { TextField } from '#src/components/ui/TextField.tsx';
import { sentenceOf } from '#src/lib/api.ts';

interface DetailsFormProps {
  details: PaperDetails;
  action: string;
  onSave: (details: PaperDetails) => Promise<void>;
}

export const NEW_PAPER: PaperDetails = {
  title: '',
  subtitle: '',
  targetMarks: 60,
  durationMinutes: 75,
  instructions:
    'Answer all questions in the spaces given.\nShow your working.\nGive each answer with its unit.\nUse the values on the data page.',
};

/** Title, total, time and instructions of a paper. */
export function DetailsForm({ details, action, onSave }: DetailsFormProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(paperDetailsSchema),
    defaultValues: details,
  });
  const { errors, isSubmitting } = formState;
  const submit = handleSubmit(async (values) => {
    setProblem(null);
    try {
      await onSave(values);
    } catch (error) {
      setProblem(sentenceOf(error));
    }
  });
  return (
    <form className="grid gap-4" onSubmit={(event) => void submit(event)} noValidate>
      <TextField label="Title" problem={errors.title?.message} {...register('title')} />
      <TextField label="Subtitle" problem={errors.subtitle?.message} {...register('subtitle')} />
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="Total marks"
          type="number"
          problem={errors.targetMarks?.message}
          {...register('targetMarks', { valueAsNumber: true })}
        />
        <TextField
          label="Time, minutes"
          type="number"
          problem={errors.durationMinutes?.message}
          {...register('durationMinutes', { valueAsNumber: true })}
        />
      </div>
      <label>
        <span className="field-label">Instructions, one a line</span>
        <textarea className="field autogrow w-full" rows={4} {...register('instructions')} />
      </label>
      {problem !== null && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <button type="submit" className="button button-primary justify-self-start" disabled={isSubmitting}>
        {action}
      </button>
    </form>
  );
}
