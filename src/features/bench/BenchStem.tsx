import type { ItemContent } from '#shared/engine/index.ts';
import type { PlacedDiagnostic, QuantityRow } from '#shared/contracts/checking.ts';
import type { Topic } from '#shared/contracts/topics.ts';
import type { DraftEditor } from './draft/use-draft.ts';
import { PrintedTextField } from './inputs/PrintedTextField.tsx';

interface BenchStemProps {
  draft: DraftEditor;
  content: ItemContent;
  topics: readonly Topic[];
  rows: readonly QuantityRow[];
  diagnostics: readonly PlacedDiagnostic[];
}

/** Title, topic and stem of the item. */
export function BenchStem({ draft, content, topics, rows, diagnostics }: BenchStemProps) {
  return (
    <div className="grid gap-3">
      <div className="flex flex-wrap gap-3">
        <label className="min-w-56 flex-1">
          <span className="field-label">Title, for the team only</span>
          <input
            className="field w-full"
            value={content.title}
            maxLength={160}
            aria-invalid={content.title.trim() === ''}
            onChange={(event) => {
              const title = event.target.value;
              draft.edit((now) => ({ ...now, title }), 'the title', 'title');
            }}
          />
        </label>
        <label>
          <span className="field-label">Topic</span>
          <select
            className="field"
            value={draft.state.topicId}
            onChange={(event) => draft.setTopic(Number(event.target.value))}
          >
            {topics.map((topic) => (
              <option key={topic.id} value={topic.id}>
                {topic.name}
              </option>
            ))}
          </select>
        </label>
      </div>
      <PrintedTextField
        label="Stem"
        value={content.stem}
        rows={rows}
        diagnostics={diagnostics.filter((diagnostic) => diagnostic.field === 'stem')}
        readOnly={false}
        onChange={(stem, typing) =>
          draft.edit((now) => ({ ...now, stem }), 'the stem', typing ? 'stem' : null)
        }
      />
    </div>
  );
}
