export const PAPER_STATES = ['assembling', 'proposed', 'sealed', 'released'] as const;
export type PaperState = (typeof PAPER_STATES)[number];

export const PAPER_STATE_NAMES: Readonly<Record<PaperState, string>> = {
  assembling: 'Assembling',
  proposed: 'Proposed',
  sealed: 'Sealed',
  released: 'Released',
};

export type PaperAction =
  | { kind: 'edit' }
  | { kind: 'propose'; blockers: number; places: number }
  | { kind: 'return' }
  | { kind: 'seal'; blockers: number }
  | { kind: 'release' };

export type PaperTransition =
  { possible: true; state: PaperState; event: string } | { possible: false; reason: string };

const refuse = (reason: string): PaperTransition => ({ possible: false, reason });

/** The life of a paper as a pure function: state and action give the next state, or why not. */
export function paperTransition(state: PaperState, action: PaperAction): PaperTransition {
  switch (action.kind) {
    case 'edit':
      if (state === 'assembling') return { possible: true, state, event: 'paper.edited' };
      return refuse(
        state === 'proposed'
          ? 'This paper is proposed for sealing. Return it to assembling before you change it.'
          : 'This paper is sealed, so nothing on it can change.',
      );
    case 'propose':
      if (state !== 'assembling') return refuse('Only a paper that is being assembled can be proposed.');
      if (action.places === 0) return refuse('Put at least one item on the paper before you propose it.');
      if (action.blockers > 0) {
        return refuse('The paper’s own checks found blockers. Cure them before you propose it.');
      }
      return { possible: true, state: 'proposed', event: 'paper.proposed' };
    case 'return':
      return state === 'proposed'
        ? { possible: true, state: 'assembling', event: 'paper.returned' }
        : refuse('Only a proposed paper can be returned to assembling.');
    case 'seal':
      if (state !== 'proposed') return refuse('Only a proposed paper can be sealed.');
      if (action.blockers > 0)
        return refuse('The paper’s own checks found blockers. Return it to assembling.');
      return { possible: true, state: 'sealed', event: 'paper.sealed' };
    case 'release':
      return state === 'sealed'
        ? { possible: true, state: 'released', event: 'paper.released' }
        : refuse('Only a sealed paper can be released.');
  }
}
