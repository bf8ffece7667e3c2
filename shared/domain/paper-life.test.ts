import { describe, expect, it } from 'vitest';

import { PAPER_STATES, type PaperAction, type PaperState, paperTransition } from './paper-life.ts';

/** Each action with everything in order, so that the state alone decides. */
const ACTIONS: Record<PaperAction['kind'], PaperAction> = {
  edit: { kind: 'edit' },
  propose: { kind: 'propose', blockers: 0, places: 3 },
  return: { kind: 'return' },
  seal: { kind: 'seal', blockers: 0 },
  release: { kind: 'release' },
};

/** Next state of each state under each action; '-' is refused. */
const LIFE: Record<PaperAction['kind'], Record<PaperState, string>> = {
  edit: { assembling: 'assembling', proposed: '-', sealed: '-', released: '-' },
  propose: { assembling: 'proposed', proposed: '-', sealed: '-', released: '-' },
  return: { assembling: '-', proposed: 'assembling', sealed: '-', released: '-' },
  seal: { assembling: '-', proposed: 'sealed', sealed: '-', released: '-' },
  release: { assembling: '-', proposed: '-', sealed: 'released', released: '-' },
};

const cells = Object.values(ACTIONS).flatMap((action) =>
  PAPER_STATES.map((state) => ({ state, kind: action.kind, action, next: LIFE[action.kind][state] })),
);

describe('the life of a paper', () => {
  it.each(cells)('$state, $kind: $next', ({ state, action, next }) => {
    const transition = paperTransition(state, action);
    expect(transition.possible ? transition.state : '-').toBe(next);
    if (!transition.possible) expect(transition.reason).toMatch(/^[A-Z].+\.$/);
  });

  it.each([
    ['edit', 'assembling', 'paper.edited'],
    ['propose', 'assembling', 'paper.proposed'],
    ['return', 'proposed', 'paper.returned'],
    ['seal', 'proposed', 'paper.sealed'],
    ['release', 'sealed', 'paper.released'],
  ] as const)('records %s of a paper that is %s as %s', (kind, state, event) => {
    expect(paperTransition(state, ACTIONS[kind])).toMatchObject({ possible: true, event });
  });

  it.each([
    ['an empty paper', { kind: 'propose', blockers: 0, places: 0 }, 'assembling'],
    ['a paper with a blocker', { kind: 'propose', blockers: 1, places: 3 }, 'assembling'],
    ['a proposed paper with a blocker', { kind: 'seal', blockers: 1 }, 'proposed'],
  ] as const)('refuses to take %s further', (_name, action, state) => {
    expect(paperTransition(state, action).possible).toBe(false);
  });
});
