import type { Statement } from './statement.ts';
import { namesIn } from './walk-tree.ts';

/** Names and constants that a checked statement uses directly. */
export function usesOf(statement: Statement): { names: string[]; constants: string[] } {
  switch (statement.kind) {
    case 'drawn': {
      const levels = statement.levels;
      const constants =
        levels.kind === 'choices' ? levels.choices.flatMap((tree) => namesIn(tree).constants) : [];
      return { names: [], constants: [...new Set(constants)] };
    }
    case 'scatter':
      return namesIn(statement.deviation);
    default:
      return namesIn(statement.tree);
  }
}
