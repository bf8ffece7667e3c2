import { useState } from 'react';

import { EXPORT_KINDS, type ExportKind, type Paper } from '#shared/contracts/papers.ts';
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
  if (!paper.abilities.includes('paper.export') || paper.places.length === 0) return null;
  const run = async (kind: ExportKind) => {
    setRunning(kind);
    setProblem(null);
    try {
      await calls.export(kind);
    } catch (error) {
      setProblem(sentenceOf(error));
    } finally {
      setRunning(null);
    }
  };
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
      <span className="text-muted">{paper.seal === null ? 'Draft as Word file:' : 'Word file:'}</span>
      {EXPORT_KINDS.map((kind) => (
        <button
          key={kind}
          type="button"
          className="link"
          disabled={running !== null}
          onClick={() => void run(kind)}
        >
          {running === kind ? `Writing the ${NAMES[kind].toLowerCase()}…` : NAMES[kind]}
        </button>
      ))}
      <span role="status" className="sr-only">
        {running === null ? '' : `Writing the ${NAMES[running].toLowerCase()}`}
      </span>
      {problem !== null && (
        <p role="alert" className="basis-full text-lead">
          {problem}
        </p>
      )}
    </div>
  );
}
