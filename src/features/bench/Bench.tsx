import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';

import type { Item } from '#shared/contracts/items.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { benchCalls, itemQuery, saveFailureOf, storedItemOf, topicsQuery } from './api.ts';
import { keptDraft, forgetDraft } from './autosave/kept-draft.ts';
import { openingOf } from './autosave/opening.ts';
import { useAutosave } from './autosave/use-autosave.ts';
import './bench.css';
import { BenchActions } from './BenchActions.tsx';
import { BenchHeader } from './BenchHeader.tsx';
import { BenchSheet } from './BenchSheet.tsx';
import { BenchWorkings } from './BenchWorkings.tsx';
import { FaceChoice } from './FaceChoice.tsx';
import { useLiveCheck } from './check/use-live-check.ts';
import { ConflictView } from './conflict/ConflictView.tsx';
import { RemovedNotice } from './draft/RemovedNotice.tsx';
import { useDraft } from './draft/use-draft.ts';
import { useDrawKeys } from './draws/use-draw-keys.ts';
import { DrawBar } from './draws/DrawBar.tsx';
import { drawAfter, type DrawMove } from './draws/draw-navigation.ts';
import type { ScriptEditorHandle } from './editor/ScriptEditor.tsx';
import { countSentence, worstDrawOf, type FindingTarget } from './findings/group-findings.ts';
import type { BenchSlots } from './slots.ts';

export interface BenchProps {
  item: Item;
  personId: number;
  /** Draw from the address; null for the first that the script keeps. */
  draw: number | null;
  onDraw: (draw: number) => void;
  slots: BenchSlots;
}

/** Brings a place of the bench into view and gives it the keyboard. */
function goTo(id: string): void {
  requestAnimationFrame(() => {
    const node = document.getElementById(id);
    node?.scrollIntoView({ block: 'center' });
    node?.focus({ preventScroll: true });
  });
}

/** One item being written: sheet, script, quantities, findings, and everything that can be done with it. */
export function Bench({ item, personId, draw, onDraw, slots }: BenchProps) {
  const queries = useQueryClient();
  const [calls] = useState(() => benchCalls(item.id));
  const key = { personId, itemId: item.id };
  const readOnly = !item.abilities.includes('item.edit') || item.state !== 'drafting';
  const server = { content: item.revision.content, topicId: item.topic.id, version: item.revision.version };
  const [opening] = useState(() =>
    readOnly ? ({ kind: 'server' } as const) : openingOf(server, keptDraft(localStorage, key)),
  );
  const begin = opening.kind === 'server' ? server : opening;
  const draft = useDraft(begin.content, begin.topicId);
  const { content, topicId } = draft.state;
  const [theirs, setTheirs] = useState<Item | null>(opening.kind === 'conflict' ? item : null);
  const [base, setBase] = useState(opening.kind === 'conflict' ? null : server.content);
  const [restored, setRestored] = useState(opening.kind === 'restored' ? opening.keptAt : null);
  const [face, setFace] = useState<'sheet' | 'scheme'>('sheet');
  const [editing, setEditing] = useState<string | null>(null);
  const editor = useRef<ScriptEditorHandle>(null);
  const topics = useQuery(topicsQuery).data?.topics ?? [item.topic];

  const autosave = useAutosave({
    key,
    version: server.version,
    unsaved: opening.kind === 'restored',
    draft: { content, topicId },
    enabled: !readOnly && theirs === null,
    storage: localStorage,
    now: () => new Date().toISOString(),
    failureOf: saveFailureOf,
    save: async (saving, version) => {
      try {
        const reply = await calls.save(saving, version);
        setBase(saving.content);
        return reply;
      } catch (error) {
        setTheirs(storedItemOf(error));
        throw error;
      }
    },
  });
  const stored =
    item.assay !== null && !item.assay.stale && opening.kind === 'server' ? item.assay.report : null;
  const check = useLiveCheck({
    content,
    draw,
    canCheck: item.abilities.includes('item.assay'),
    stored,
    viewDraw: calls.viewDraw,
    checkItem: calls.checkItem,
    sentenceOf,
  });
  const report = check.report ?? item.assay?.report ?? null;
  const savedElsewhere =
    !readOnly &&
    theirs === null &&
    autosave.state.phase !== 'saving' &&
    item.revision.version > autosave.state.version;
  const broken = check.view?.diagnostics.some((one) => one.field === '' && one.severity === 'error') ?? false;
  const shownDraw = draw ?? check.view?.draw ?? null;

  const renew = async (next: Item): Promise<void> => {
    forgetDraft(localStorage, key);
    queries.setQueryData(itemQuery(item.id).queryKey, next);
    await queries.invalidateQueries({ queryKey: ['item', item.id, 'revisions'] });
  };
  const move = (step: DrawMove): void => {
    const next = drawAfter(content.script, shownDraw, step, Math.random);
    if (next !== null) onDraw(next);
  };
  useDrawKeys(move);
  const visit = (target: FindingTarget): void => {
    switch (target.kind) {
      case 'script':
        editor.current?.select(target.start, target.end);
        return;
      case 'quantity':
        goTo(`quantity-${target.name}`);
        return;
      case 'stem':
      case 'part': {
        const place = target.kind === 'stem' ? 'stem' : target.partId;
        setFace('sheet');
        if (!readOnly) setEditing(place);
        goTo(`part-${place}`);
      }
    }
  };
  const visitLine = (line: number): void => {
    const lines = content.script.split('\n');
    const start = lines.slice(0, line - 1).reduce((sum, text) => sum + text.length + 1, 0);
    editor.current?.select(start, start + (lines[line - 1]?.length ?? 0));
  };

  return (
    <div className="bench">
      <BenchHeader
        item={item}
        content={content}
        draft={draft}
        autosave={autosave}
        readOnly={readOnly}
        findings={report === null ? null : countSentence(report.findings, content)}
        checking={check.checking}
        onShowFindings={() => goTo('bench-findings')}
        actions={
          <BenchActions
            item={item}
            content={content}
            calls={calls}
            saveNow={autosave.saveNow}
            onChanged={renew}
            onVisit={visit}
            renderChanges={(before) => slots.changes(before, content)}
          />
        }
      />
      {item.returnedBecause !== null && (
        <p className="notice">
          <span className="font-semibold">Returned.</span> {item.returnedBecause}
        </p>
      )}
      {restored !== null && (
        <p className="notice" role="status">
          Changes that this computer kept are restored.{' '}
          <button
            type="button"
            className="link"
            onClick={() => {
              draft.edit(() => server.content, 'dropping restored changes');
              draft.setTopic(server.topicId);
              setRestored(null);
            }}
          >
            Go back to what the server has
          </button>{' '}
          <button type="button" className="link" onClick={() => setRestored(null)}>
            Keep them
          </button>
        </p>
      )}
      {savedElsewhere && (
        <p className="notice" role="status">
          This draft was saved elsewhere since you opened it.{' '}
          <button type="button" className="link" onClick={() => setTheirs(item)}>
            Compare the two versions
          </button>
        </p>
      )}
      {autosave.state.message !== '' && (
        <p className="notice notice-blocker" role="alert">
          {autosave.state.message}
        </p>
      )}
      {check.problem !== null && (
        <p className="notice" role="status">
          The checker could not be asked: {check.problem}
        </p>
      )}
      {theirs !== null ? (
        <ConflictView
          mine={content}
          theirs={theirs.revision.content}
          base={base}
          onMerge={(merged) => {
            draft.merge(theirs.revision.content, merged);
            setBase(theirs.revision.content);
            autosave.resolved(theirs.revision.version);
            setTheirs(null);
          }}
        />
      ) : (
        <div className="bench-columns">
          <div className="bench-workings">
            <BenchWorkings
              draft={draft}
              content={content}
              view={check.view}
              report={report}
              cautions={item.cautions}
              readOnly={readOnly}
              editor={editor}
              onVisit={visit}
              onVisitDraw={onDraw}
              onVisitLine={visitLine}
            />
          </div>
          <div className="bench-sheet">
            <DrawBar
              draw={shownDraw}
              kept={(check.view?.kept ?? true) || broken}
              gridSize={check.view?.gridSize ?? 1}
              open={check.view?.open ?? false}
              worstDraw={report === null ? null : worstDrawOf(report.findings)}
              onMove={move}
              onDraw={onDraw}
            />
            <FaceChoice face={face} onFace={setFace} />
            {face === 'scheme' && check.view !== null ? (
              slots.scheme(check.view.scheme)
            ) : (
              <BenchSheet
                draft={draft}
                content={content}
                topics={topics}
                view={check.view}
                report={report}
                readOnly={readOnly}
                editing={editing}
                onEditing={setEditing}
                onVisitDraw={onDraw}
                onUpload={calls.upload}
                slots={slots}
              />
            )}
          </div>
        </div>
      )}
      {!readOnly && <RemovedNotice draft={draft} />}
    </div>
  );
}
