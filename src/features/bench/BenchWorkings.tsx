import { lazy, Suspense, useMemo, type Ref } from 'react';

import type { AssayReport, ItemContent } from '#shared/engine/index.ts';
import type { DrawView } from '#shared/contracts/checking.ts';
import type { DraftEditor } from './draft/use-draft.ts';
import type { ScriptEditorHandle } from './editor/ScriptEditor.tsx';
import { underlines } from './editor/script-lint.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import { FindingsList } from './findings/FindingsList.tsx';
import type { FindingTarget } from './findings/group-findings.ts';
import { QuantitiesTable } from './quantities/QuantitiesTable.tsx';
import { StatementsEditor } from './statements/StatementsEditor.tsx';

const ScriptEditor = lazy(() =>
  import('./editor/ScriptEditor.tsx').then((module) => ({ default: module.ScriptEditor })),
);

interface BenchWorkingsProps {
  draft: DraftEditor;
  content: ItemContent;
  view: DrawView | null;
  report: AssayReport | null;
  cautions: readonly string[];
  readOnly: boolean;
  editor: Ref<ScriptEditorHandle>;
  onVisit: (target: FindingTarget) => void;
  onVisitDraw: (draw: number) => void;
  onVisitLine: (line: number) => void;
}

const NOTHING: readonly never[] = [];

/** What stands beside the sheet: the script, its quantities, the findings, and what the item states. */
export function BenchWorkings(props: BenchWorkingsProps) {
  const { draft, content, view, report, readOnly } = props;
  const diagnostics = view?.diagnostics ?? NOTHING;
  const findings = report?.findings ?? NOTHING;
  const lines = useMemo(
    () => underlines(diagnostics, findings, content.script.length),
    [diagnostics, findings, content.script.length],
  );
  const mistakes = diagnostics.filter((diagnostic) => diagnostic.field === '');
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <section aria-labelledby="bench-script">
        <h2 id="bench-script" className="section-title">
          Script
        </h2>
        <Suspense fallback={<pre className="script-editor">{content.script}</pre>}>
          <ScriptEditor
            value={content.script}
            onChange={(script) => {
              if (script !== content.script)
                draft.edit((now) => ({ ...now, script }), 'the script', 'script');
            }}
            readOnly={readOnly}
            underlines={lines}
            rows={view?.quantities ?? NOTHING}
            handle={props.editor}
          />
        </Suspense>
        <ul className="mt-1 text-sm" aria-live="polite">
          {mistakes.map((mistake) => (
            <li key={`${mistake.span.start} ${mistake.message}`}>
              <button type="button" className="link" onClick={() => props.onVisitLine(mistake.span.line)}>
                Line {mistake.span.line}
              </button>
              <span className={mistake.severity === 'error' ? 'text-lead' : 'text-brass'}>
                {' '}
                <Sentence text={mistake.message} />
              </span>
            </li>
          ))}
        </ul>
      </section>
      <section aria-labelledby="bench-quantities">
        <h2 id="bench-quantities" className="section-title">
          Quantities
        </h2>
        <QuantitiesTable
          rows={view?.quantities ?? NOTHING}
          content={content}
          distributions={report?.distributions ?? NOTHING}
          readOnly={readOnly}
          onChange={draft.changeQuantity}
          onVisitLine={props.onVisitLine}
        />
      </section>
      <section aria-labelledby="bench-findings">
        <h2 id="bench-findings" className="section-title" tabIndex={-1}>
          Findings
        </h2>
        {report === null ? (
          <p className="text-muted">No check has been made yet.</p>
        ) : (
          <>
            <p className="mb-2 text-sm text-muted">
              Checked over {report.coverage}
              {report.drawsDiscarded > 0 &&
                `; ${report.drawsDiscarded.toLocaleString('en-GB')} discarded by require`}
              .
            </p>
            <FindingsList
              findings={report.findings}
              content={content}
              canAccept={!readOnly}
              onVisit={props.onVisit}
              onVisitDraw={props.onVisitDraw}
              onAccept={draft.acceptCaution}
            />
          </>
        )}
      </section>
      <section aria-labelledby="bench-statements">
        <h2 id="bench-statements" className="section-title">
          What the item states
        </h2>
        <StatementsEditor
          content={content}
          cautions={props.cautions}
          readOnly={readOnly}
          onChange={(change, label) => draft.edit((now) => ({ ...now, ...change }), label)}
        />
      </section>
    </div>
  );
}
