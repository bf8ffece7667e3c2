// @vitest-environment jsdom
import { act, renderHook } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { CheckReply, DrawView } from '#shared/contracts/checking.ts';
import { itemContentSchema, type AssayReport, type ItemContent } from '#shared/engine/index.ts';
import { CHECK_AFTER_MS, SHEET_AFTER_MS, useLiveCheck } from './use-live-check.ts';

const content = (stem: string): ItemContent => itemContentSchema.parse({ title: 'Gun', stem });
const viewOf = (title: string, draw: number | null): DrawView => ({
  draw: draw ?? 1,
  kept: true,
  gridSize: 9,
  open: false,
  diagnostics: [],
  quantities: [],
  sheet: { title, blocks: [], parts: [], marks: 0, cautions: [] },
  scheme: { title, marks: 0, parts: [] },
});
const reportOf = (contentHash: string): AssayReport => ({
  engineVersion: '1',
  contentHash,
  gridSize: 9,
  exhaustive: true,
  drawsAssayed: 9,
  drawsDiscarded: 0,
  coverage: 'all 9 draws',
  findings: [],
  distributions: [],
  scales: [],
});

function mount(
  viewDraw: (content: ItemContent, draw: number | null, signal: AbortSignal) => Promise<DrawView>,
) {
  const checkItem = vi.fn((asked: ItemContent, draw: number | null): Promise<CheckReply> =>
    Promise.resolve({ view: viewOf(asked.stem, draw), report: reportOf(asked.stem) }),
  );
  const first: { stem: ItemContent; draw: number | null } = { stem: content('One'), draw: null };
  const hook = renderHook(
    ({ stem, draw }) =>
      useLiveCheck({
        content: stem,
        draw,
        canCheck: true,
        stored: null,
        viewDraw,
        checkItem,
        sentenceOf: (error) => (error instanceof Error ? error.message : 'unknown'),
      }),
    { initialProps: first },
  );
  return { hook, checkItem, first };
}
const pass = (ms: number): Promise<void> =>
  act(async () => {
    await vi.advanceTimersByTimeAsync(ms);
  });

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

describe('the live check', () => {
  it('shows the sheet first and the findings a little later', async () => {
    const viewDraw = vi.fn((asked: ItemContent, draw: number | null) =>
      Promise.resolve(viewOf(asked.stem, draw)),
    );
    const { hook, checkItem } = mount(viewDraw);
    await pass(SHEET_AFTER_MS);
    expect(hook.result.current.view?.sheet.title).toBe('One');
    expect(checkItem).not.toHaveBeenCalled();
    expect(hook.result.current.checking).toBe(true);
    await pass(CHECK_AFTER_MS);
    expect(hook.result.current.report?.contentHash).toBe('One');
    expect(hook.result.current.checking).toBe(false);
  });

  it('cancels what an older text asked for, so that a late answer never overwrites a newer one', async () => {
    const answers = new Map<string, (view: DrawView) => void>();
    const signals: AbortSignal[] = [];
    const viewDraw = (asked: ItemContent, _draw: number | null, signal: AbortSignal): Promise<DrawView> => {
      signals.push(signal);
      return new Promise((resolve) => void answers.set(asked.stem, resolve));
    };
    const { hook } = mount(viewDraw);
    await pass(SHEET_AFTER_MS);
    hook.rerender({ stem: content('Two'), draw: null });
    await pass(SHEET_AFTER_MS);
    expect(signals.map((signal) => signal.aborted)).toEqual([true, false]);
    await act(async () => answers.get('Two')?.(viewOf('Two', null)));
    await act(async () => answers.get('One')?.(viewOf('One', null)));
    expect(hook.result.current.view?.sheet.title).toBe('Two');
  });

  it('asks for another draw without running the whole check again', async () => {
    const viewDraw = vi.fn((asked: ItemContent, draw: number | null) =>
      Promise.resolve(viewOf(asked.stem, draw)),
    );
    const { hook, checkItem, first } = mount(viewDraw);
    await pass(CHECK_AFTER_MS);
    hook.rerender({ ...first, draw: 5 });
    await pass(CHECK_AFTER_MS);
    expect(hook.result.current.view?.draw).toBe(5);
    expect(checkItem).toHaveBeenCalledTimes(1);
  });

  it('keeps the last sheet and says what happened when the server cannot be reached', async () => {
    const viewDraw = vi
      .fn<() => Promise<DrawView>>()
      .mockResolvedValueOnce(viewOf('One', 1))
      .mockRejectedValue(new Error('No connection.'));
    const { hook } = mount(viewDraw);
    await pass(CHECK_AFTER_MS);
    hook.rerender({ stem: content('Two'), draw: null });
    await pass(SHEET_AFTER_MS);
    expect(hook.result.current).toMatchObject({
      problem: 'No connection.',
      view: { sheet: { title: 'One' } },
    });
  });
});
