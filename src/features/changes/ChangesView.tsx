import type { ItemContent } from '#shared/engine/index.ts';
import './changes.css';
import { compareContent, type Change, type Run } from './compare-content.ts';

function Runs({ runs, lines }: { runs: readonly Run[]; lines: boolean }) {
  if (lines) {
    return (
      <pre className="change-lines">
        {runs.flatMap((run, at) =>
          run.text
            .replace(/\n$/, '')
            .split('\n')
            .map((line, index) => (
              <span key={`${at} ${index}`} className={`change-line change-${run.kind}`}>
                <span aria-hidden="true">{{ same: '  ', added: '+ ', removed: '− ' }[run.kind]}</span>
                {run.kind !== 'same' && <span className="sr-only">{run.kind}: </span>}
                {line}
              </span>
            )),
        )}
      </pre>
    );
  }
  return (
    <p className="whitespace-pre-wrap">
      {runs.map((run, at) =>
        run.kind === 'added' ? (
          <ins key={at} className="change-added">
            {run.text}
          </ins>
        ) : run.kind === 'removed' ? (
          <del key={at} className="change-removed">
            {run.text}
          </del>
        ) : (
          <span key={at}>{run.text}</span>
        ),
      )}
    </p>
  );
}

function ChangeEntry({ change }: { change: Change }) {
  switch (change.kind) {
    case 'words':
    case 'lines':
      return <Runs runs={change.runs} lines={change.kind === 'lines'} />;
    case 'value':
      return (
        <p>
          <del className="change-removed">{change.before}</del> <span className="sr-only">became</span>
          <span aria-hidden="true">→</span> <ins className="change-added">{change.after}</ins>
        </p>
      );
    case 'sentence':
      return <p>{change.sentence}</p>;
  }
}

/** What changed from one version to a later one: words in texts, lines in the script, values of bands and settings. */
export function ChangesView({ before, after }: { before: ItemContent; after: ItemContent }) {
  const changes = compareContent(before, after);
  if (changes.length === 0) return <p className="text-muted">Nothing changed.</p>;
  return (
    <dl className="grid gap-3">
      {changes.map((change) => (
        <div key={change.key}>
          <dt className="text-sm font-semibold">{change.label}</dt>
          <dd>
            <ChangeEntry change={change} />
          </dd>
        </div>
      ))}
    </dl>
  );
}
