import { type PaperAction, type PaperState, paperTransition } from '#shared/domain/paper-life.ts';
import { AppError } from '#shared/errors/app-error.ts';

/** Asks the paper's life for the next state; throws AppError notPossible with the reason why not. */
export function nextPaperState(state: PaperState, action: PaperAction): { state: PaperState; event: string } {
  const transition = paperTransition(state, action);
  if (!transition.possible) throw new AppError('notPossible', transition.reason);
  return transition;
}
