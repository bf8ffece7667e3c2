import { useEffect, useEffectEvent, useState } from 'react';

import type { CheckReply, DrawView } from '#shared/contracts/checking.ts';
import type { AssayReport, ItemContent } from '#shared/engine/index.ts';

/** Stillness before the sheet is asked for again, and before the full check. */
export const SHEET_AFTER_MS = 120;
export const CHECK_AFTER_MS = 400;

interface LiveCheckOptions {
  content: ItemContent;
  /** Null asks for the first draw that the script keeps. */
  draw: number | null;
  /** Whether the full check may be run here; else `stored` is all there is. */
  canCheck: boolean;
  /** Report that is stored with exactly this content, or null. */
  stored: AssayReport | null;
  viewDraw: (content: ItemContent, draw: number | null, signal: AbortSignal) => Promise<DrawView>;
  checkItem: (content: ItemContent, draw: number | null, signal: AbortSignal) => Promise<CheckReply>;
  /** The error in words that can be shown. */
  sentenceOf: (error: unknown) => string;
}

export interface LiveCheck {
  /** What the draw looked like when it was last asked for. */
  view: DrawView | null;
  report: AssayReport | null;
  /** Whether `report` belongs to an older content. */
  checking: boolean;
  problem: string | null;
}

/**
 * Sheet and findings that follow the draft. Each new edit cancels what is still being asked; the sheet comes
 * first, findings and scales a little later.
 */
export function useLiveCheck(options: LiveCheckOptions): LiveCheck {
  const { content, draw, canCheck } = options;
  const [view, setView] = useState<DrawView | null>(null);
  const [checked, setChecked] = useState<{ content: ItemContent; report: AssayReport } | null>(
    options.stored === null ? null : { content, report: options.stored },
  );
  const [problem, setProblem] = useState<string | null>(null);

  const askSheet = useEffectEvent(async (signal: AbortSignal) => {
    try {
      const reply = await options.viewDraw(content, draw, signal);
      if (signal.aborted) return;
      setView(reply);
      setProblem(null);
    } catch (error) {
      if (!signal.aborted) setProblem(options.sentenceOf(error));
    }
  });
  useEffect(() => {
    const controller = new AbortController();
    const timer = setTimeout(() => void askSheet(controller.signal), SHEET_AFTER_MS);
    return () => {
      clearTimeout(timer);
      controller.abort();
    };
  }, [content, draw]);

  const askCheck = useEffectEvent(async (signal: AbortSignal) => {
    if (checked?.content === content) return;
    try {
      const reply = await options.checkItem(content, draw, signal);
      if (signal.aborted) return;
      setChecked({ content, report: reply.report });
      setProblem(null);
    } catch (error) {
      if (!signal.aborted) setProblem(options.sentenceOf(error));
    }
  });
  useEffect(() => {
    if (!canCheck) return undefined;
    const controller = new AbortController();
    const timer = setTimeout(() => void askCheck(controller.signal), CHECK_AFTER_MS);
    return () => {
      clearTimeout(timer);
      controller.abort();
    };
  }, [content, canCheck]);

  return {
    view,
    report: checked?.report ?? null,
    checking: canCheck && checked?.content !== content,
    problem,
  };
}
