import { useEffect, useRef, useState } from 'react';

import { EXPORT_KINDS, type ExportKind, type Paper } from '#shared/contracts/papers.ts';
import { ProgressTicks } from '#src/components/ui/ProgressTicks.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import type { PaperCalls } from './api.ts';

const NAMES: Readonly<Record<ExportKind, string>> = {
  'question-paper': 'Question paper',
  'mark-scheme': 'Mark scheme',
};

/** The Word files of a paper; every export is recorded. */
export function Exports({ paper, calls }: { paper: Paper; calls: PaperCalls }) {
  const [running, setRunning] = useState<ExportKind | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const stop = useRef<AbortController | null>(null);
  useEffect(() => () => stop.current?.abort(), []);
  if (!paper.abilities.includes('paper.export') || paper.places.length === 0) return null;
  const run = async (kind: ExportKind) => {
    const controller = new AbortController();
    stop.current = controller;
    setRunning(kind);
    setProblem(null);
    try {
      await calls.export(kind, controller.signal);
    } catch (error) {
      if (!controller.signal.aborted) setProblem(sentenceOf(error));
    } finally {
      setRunning(null);
    }
  };
  return (
    <section>
      <h2 className="mb-2 border-b border-ink pb-1 text-lg font-semibold">Word files</h2>
      <p className="flex flex-wrap gap-x-5">
        {EXPORT_KINDS.map((kind) => (
          <button
            key={kind}
            type="button"
            className="link"
            disabled={running !== null}
            onClick={() => void run(kind)}
          >
            {NAMES[kind]}
          </button>
        ))}
      </p>
      {running !== null && (
        <p role="status" className="flex flex-wrap items-baseline gap-x-4 pt-1 text-sm">
          <ProgressTicks label={`Writing the ${NAMES[running].toLowerCase()}`} />
          Writing the {NAMES[running].toLowerCase()}
          <button type="button" className="link" onClick={() => stop.current?.abort()}>
            Cancel
          </button>
        </p>
      )}
      {problem !== null && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      {paper.seal === null && (
        <p className="pt-1 text-sm text-muted">A draft: nothing on this paper is sealed yet.</p>
      )}
    </section>
  );
}
