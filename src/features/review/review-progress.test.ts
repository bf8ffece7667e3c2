import { describe, expect, it } from 'vitest';

import type { Review, Working } from '#shared/contracts/reviews.ts';
import { itemContentSchema, type Finding } from '#shared/engine/index.ts';
import { approvalHindrances, openCautions, partsProgress, revealHindrance } from './review-progress.ts';

const working = (partId: string, attempt: number, agrees: boolean, disputed = false): Working => ({
  partId,
  attempt,
  text: '1 V',
  agrees,
  remark: '',
  disputed,
  settledReason: null,
  createdAt: '2026-03-02T10:00:00.000Z',
});
const finding = (key: string, severity: Finding['severity']): Finding => ({
  key,
  check: 'band',
  code: 'c',
  severity,
  statement: 'S.',
  cure: '',
  place: {},
  worstDraw: null,
  otherDraws: [],
  drawCount: 0,
});
const person = { id: 1, name: 'Reader' };
function review(
  workings: Working[],
  findings: Finding[] = [],
  acceptedCautions: Record<string, string> = {},
): Review {
  return {
    id: 1,
    itemId: 1,
    itemCode: 'EG-1',
    itemTitle: 'Gun',
    topic: { id: 1, code: 'EG', name: 'Guns' },
    revision: 1,
    marks: 3,
    requestedBy: person,
    reviewer: person,
    stage: 'revealed',
    decision: null,
    dueOn: null,
    requestedAt: '2026-03-02T10:00:00.000Z',
    abilities: [],
    note: '',
    draw: 1,
    sheet: null,
    numericParts: [
      { partId: 'p', letter: 'a', unit: 'V' },
      { partId: 'q', letter: 'c', unit: 'J' },
    ],
    workings,
    reveal: {
      content: itemContentSchema.parse({ title: 'Gun', acceptedCautions }),
      scheme: { title: '', marks: 3, parts: [] },
      report: {
        engineVersion: '1',
        contentHash: '',
        gridSize: 1,
        exhaustive: true,
        drawsAssayed: 1,
        drawsDiscarded: 0,
        coverage: '',
        findings,
        distributions: [],
        scales: [],
      },
      assayStale: false,
      previous: null,
    },
    comments: [],
    decisionReason: '',
    decidedAt: null,
  };
}

describe('the reviewer’s own working', () => {
  it('has two tries a part and ends in agreement or without', () => {
    const parts = partsProgress(
      review([working('p', 1, false), working('p', 2, true), working('q', 2, false), working('q', 1, false)]),
    );
    expect(parts.map((part) => [part.letter, part.state, part.triesLeft])).toEqual([
      ['a', 'agrees', 0],
      ['c', 'disagrees', 0],
    ]);
  });

  it('stays open while a try is left, and can be held to', () => {
    expect(partsProgress(review([working('p', 1, false)])).map((part) => part.state)).toEqual([
      'open',
      'open',
    ]);
    expect(partsProgress(review([working('p', 1, false), working('p', 2, false, true)]))[0]?.state).toBe(
      'disputed',
    );
  });

  it('is needed for every numeric part before the answers are shown', () => {
    expect(revealHindrance(partsProgress(review([])))).toBe('Parts (a), (c) have no working yet.');
    expect(revealHindrance(partsProgress(review([working('p', 1, false)])))).toBe(
      'Part (c) has no working yet.',
    );
    expect(revealHindrance(partsProgress(review([working('p', 1, false), working('q', 1, true)])))).toBe(
      'Try (a) once more.',
    );
    expect(
      revealHindrance(
        partsProgress(review([working('p', 1, false), working('p', 2, false), working('q', 1, true)])),
      ),
    ).toBe('Hold to your working of (a) to go on.');
    expect(
      revealHindrance(partsProgress(review([working('p', 1, false, true), working('q', 1, true)]))),
    ).toBeNull();
  });
});

describe('approval', () => {
  it('is possible after a disagreement that the reviewer settled with a reason', () => {
    const settled = { ...working('p', 2, false, true), settledReason: 'I had left out the unit.' };
    const open = review([working('p', 1, false), settled, working('q', 1, true)]);
    expect(partsProgress(open)[0]?.state).toBe('settled');
    expect(approvalHindrances(open, {})).toEqual([]);
  });

  const agreed = [working('p', 1, true), working('q', 1, true)];

  it('waits for every caution to be accepted by writer or reviewer', () => {
    const open = review(agreed, [finding('x', 'caution'), finding('y', 'caution'), finding('z', 'note')], {
      x: 'Meant so.',
    });
    expect(openCautions(open, {}).map((one) => one.key)).toEqual(['y']);
    expect(approvalHindrances(open, { y: '  ' })).toEqual(['One caution has no word of reason yet.']);
    expect(approvalHindrances(open, { y: 'Fine at this level.' })).toEqual([]);
  });

  it('is kept back by blockers, disagreement and missing work, each told', () => {
    const hindered = review(
      [working('p', 1, false), working('p', 2, false, true)],
      [finding('b', 'blocker')],
    );
    expect(approvalHindrances(hindered, {})).toEqual([
      'The assay found a blocker.',
      'There is no working of (c).',
      'Your working of (a) does not agree and is not settled.',
    ]);
  });
});
