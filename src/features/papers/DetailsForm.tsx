import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';

import { type Paper, type PaperDetails, paperDetailsSchema } from '#shared/contracts/papers.ts';
import { TextField } from '#src/components/ui/TextField.tsx';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { storedPaperOf } from './api.ts';

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

/** What somebody else stored in a field meanwhile, and how to take it. */
function Stored({ value, onTake }: { value: string | number; onTake: () => void }) {
  return (
    <p className="mt-1 border-l-[3px] border-brass pl-3 text-sm">
      Stored meanwhile: <span className="whitespace-pre-line">{value === '' ? 'nothing' : value}</span>{' '}
      <button type="button" className="link" onClick={onTake}>
        Take this
      </button>
    </p>
  );
}

/**
 * Title, total, time and instructions of a paper. When somebody else changed them meanwhile, both versions stand
 * in the form until it is saved again.
 */
export function DetailsForm({ details, action, onSave }: DetailsFormProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const [stored, setStored] = useState<Paper | null>(null);
  const { register, handleSubmit, formState, watch, setValue } = useForm({
    resolver: zodResolver(paperDetailsSchema),
    defaultValues: details,
  });
  const { errors, isSubmitting, isDirty } = formState;
  const submit = handleSubmit(async (values) => {
    setProblem(null);
    try {
      await onSave(values);
    } catch (error) {
      const theirs = storedPaperOf(error);
      setStored(theirs);
      setProblem(
        theirs === null
          ? sentenceOf(error)
          : 'Somebody else changed these details meanwhile. Where the two differ, theirs stands under yours; choose, then save again.',
      );
    }
  });
  const theirs = (field: keyof PaperDetails) =>
    stored !== null &&
    stored[field] !== watch(field) && (
      <Stored
        value={stored[field]}
        onTake={() => setValue(field, stored[field], { shouldDirty: true, shouldValidate: true })}
      />
    );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => void submit(event)}
      noValidate
      {...unsaved(isDirty && !isSubmitting)}
    >
      <div>
        <TextField label="Title" problem={errors.title?.message} {...register('title')} />
        {theirs('title')}
      </div>
      <div>
        <TextField label="Subtitle" problem={errors.subtitle?.message} {...register('subtitle')} />
        {theirs('subtitle')}
      </div>
      <div className="grid grid-cols-2 gap-4">
        <div>
          <TextField
            label="Total marks"
            type="number"
            problem={errors.targetMarks?.message}
            {...register('targetMarks', { valueAsNumber: true })}
          />
          {theirs('targetMarks')}
        </div>
        <div>
          <TextField
            label="Time, minutes"
            type="number"
            problem={errors.durationMinutes?.message}
            {...register('durationMinutes', { valueAsNumber: true })}
          />
          {theirs('durationMinutes')}
        </div>
      </div>
      <div>
        <label>
          <span className="field-label">Instructions, one a line</span>
          <textarea className="field autogrow w-full" rows={4} {...register('instructions')} />
        </label>
        {theirs('instructions')}
      </div>
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
