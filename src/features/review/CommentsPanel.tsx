import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import type { ReviewComment } from '#shared/contracts/reviews.ts';
import { formatDayAndTime } from '#src/lib/format.ts';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';

const commentForm = z.object({
  anchor: z.string(),
  text: z.string().trim().min(1, 'Write the comment first.').max(4_000, 'At most 4,000 characters.'),
});
type CommentValues = z.infer<typeof commentForm>;

/** A place that a comment can be about. */
export interface Anchor {
  value: string;
  name: string;
}

interface CommentsPanelProps {
  comments: readonly ReviewComment[];
  anchors: readonly Anchor[];
  canComment: boolean;
  onComment: (anchor: string, text: string) => Promise<void>;
}

/** Comments by place, in the order they were written, and a form for the next. */
export function CommentsPanel({ comments, anchors, canComment, onComment }: CommentsPanelProps) {
  const { register, handleSubmit, reset, setError, formState } = useForm<CommentValues>({
    resolver: zodResolver(commentForm),
    defaultValues: { anchor: '', text: '' },
  });
  const problem = formState.errors.text?.message;
  const submit = handleSubmit(async ({ anchor, text }) => {
    try {
      await onComment(anchor, text);
      reset({ anchor, text: '' });
    } catch (error) {
      setError('text', { message: sentenceOf(error) });
    }
  });
  const placed = anchors.filter((anchor) => comments.some((comment) => comment.anchor === anchor.value));
  const lost = comments.filter((comment) => !anchors.some((anchor) => anchor.value === comment.anchor));
  const group = (name: string, list: readonly ReviewComment[]) => (
    <section key={name} aria-label={`Comments on ${name}`}>
      <h3 className="text-sm font-semibold">On {name}</h3>
      <ul className="grid gap-2">
        {list.map((comment) => (
          <li key={comment.id}>
            <p className="whitespace-pre-wrap">{comment.text}</p>
            <p className="text-sm text-muted">
              {comment.author.name},{' '}
              <time dateTime={comment.createdAt}>{formatDayAndTime(comment.createdAt)}</time>
            </p>
          </li>
        ))}
      </ul>
    </section>
  );
  return (
    <div className="grid gap-4">
      {comments.length === 0 && <p className="text-muted">No comments yet.</p>}
      {placed.map((anchor) =>
        group(
          anchor.name,
          comments.filter((comment) => comment.anchor === anchor.value),
        ),
      )}
      {lost.length > 0 && group('a part that is no longer there', lost)}
      {canComment && (
        <form {...unsaved(formState.isDirty)} className="grid gap-2" onSubmit={(event) => void submit(event)}>
          <label>
            <span className="field-label">About</span>
            <select className="field" {...register('anchor')}>
              {anchors.map((anchor) => (
                <option key={anchor.value} value={anchor.value}>
                  {anchor.name}
                </option>
              ))}
            </select>
          </label>
          <label>
            <span className="field-label">Comment</span>
            <textarea
              className="field autogrow w-full"
              rows={3}
              aria-invalid={problem !== undefined}
              aria-describedby={problem === undefined ? undefined : 'comment-problem'}
              {...register('text')}
            />
          </label>
          {problem !== undefined && (
            <p id="comment-problem" role="alert" className="text-lead">
              {problem}
            </p>
          )}
          <p>
            <button type="submit" className="button" disabled={formState.isSubmitting}>
              Add comment
            </button>
          </p>
        </form>
      )}
    </div>
  );
}
