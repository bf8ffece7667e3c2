import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';

import { createItem } from '#shared/contracts/items.ts';
import { TextField } from '#src/components/ui/TextField.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { beginItem, topicsQuery } from './api.ts';

/** Begins an item: its title and its topic; everything else is written on the bench. */
export function NewItemForm({ onBegun }: { onBegun: (itemId: number) => void }) {
  const topics = useQuery(topicsQuery);
  const [problem, setProblem] = useState<string | null>(null);
  const id = useId();
  const { register, handleSubmit, formState } = useForm({ resolver: zodResolver(createItem.body) });
  const submit = handleSubmit(async (item) => {
    setProblem(null);
    try {
      onBegun((await beginItem(item)).id);
    } catch (error) {
      setProblem(sentenceOf(error));
    }
  });
  return (
    <form className="grid gap-4" onSubmit={(event) => void submit(event)} noValidate>
      <TextField label="Title" autoFocus problem={formState.errors.title?.message} {...register('title')} />
      <div>
        <label className="field-label" htmlFor={id}>
          Topic
        </label>
        <select
          id={id}
          className="field w-full"
          aria-invalid={formState.errors.topicId !== undefined}
          {...register('topicId', {
            setValueAs: (value: string) => (value === '' ? undefined : Number(value)),
          })}
        >
          <option value="">Choose a topic</option>
          {topics.data?.topics.map((topic) => (
            <option key={topic.id} value={topic.id}>
              {topic.name}
            </option>
          ))}
        </select>
        {formState.errors.topicId !== undefined && (
          <p role="alert" className="text-sm text-lead">
            {formState.errors.topicId.message}
          </p>
        )}
      </div>
      {problem !== null && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <button
        type="submit"
        className="button button-primary justify-self-start"
        disabled={formState.isSubmitting}
      >
        Begin the item
      </button>
    </form>
  );
}
