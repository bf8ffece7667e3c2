import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { errorAt } from '../diagnostics/spans.ts';
import { SCRIPT_LIMITS } from './limits.ts';
import type { Token } from './tokens.ts';

const PARTNER: ReadonlyMap<string, string> = new Map([
  [')', '('],
  [']', '['],
]);

/** Whether a new statement `name =` or `require(` begins at this token, by which a forgotten bracket is noticed. */
function beginsStatement(tokens: readonly Token[], index: number): boolean {
  const first = tokens[index];
  const second = tokens[index + 1];
  if (first?.kind !== 'name') return false;
  return second?.kind === 'assign' || (first.text === 'require' && second?.text === '(');
}

/**
 * Cuts tokens into statements, one a line; a line goes on while a bracket is open. Brackets that do not pair
 * and statements beyond the limits become diagnostics, and such a statement is left out.
 */
export function splitStatements(tokens: readonly Token[]): {
  statements: Token[][];
  diagnostics: Diagnostic[];
} {
  const statements: Token[][] = [];
  const diagnostics: Diagnostic[] = [];
  let current: Token[] = [];
  let open: Token[] = [];
  let broken = false;
  const finish = (): void => {
    const unclosed = open.at(-1);
    if (unclosed !== undefined && !broken) {
      diagnostics.push(
        errorAt(
          unclosed.span,
          'bracket-not-closed',
          `This bracket is not closed: add “${unclosed.text === '(' ? ')' : ']'}”.`,
        ),
      );
      broken = true;
    }
    const first = current[0];
    if (first !== undefined && !broken) {
      const over = current[SCRIPT_LIMITS.tokensPerStatement];
      if (over !== undefined) {
        diagnostics.push(
          errorAt(
            over.span,
            'statement-too-long',
            'This statement is too long: split it into several named steps.',
          ),
        );
      } else statements.push(current);
    }
    current = [];
    open = [];
    broken = false;
  };
  tokens.forEach((token, index) => {
    if (token.kind === 'newline') {
      if (open.length === 0 || beginsStatement(tokens, index + 1)) finish();
      return;
    }
    current.push(token);
    if (broken) return;
    if (token.kind === 'open') {
      open.push(token);
      if (open.length > SCRIPT_LIMITS.nesting) {
        diagnostics.push(
          errorAt(
            token.span,
            'nesting-too-deep',
            `Brackets stand more than ${SCRIPT_LIMITS.nesting} deep: give the inner part a name of its own.`,
          ),
        );
        broken = true;
        open = [];
      }
    } else if (token.kind === 'close') {
      const partner = open.pop();
      if (partner?.text !== PARTNER.get(token.text)) {
        diagnostics.push(
          errorAt(
            token.span,
            'bracket-unmatched',
            `“${token.text}” closes no bracket of its kind: take it out or open one.`,
          ),
        );
        broken = true;
        open = [];
      }
    }
  });
  finish();
  return { statements, diagnostics };
}
