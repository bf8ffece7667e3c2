import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt, joinSpans } from '../diagnostics/spans.ts';
import { CONSTANTS } from '../physics/constants.ts';
import type { ExpressionTree } from './expression-tree.ts';
import { DRAWING_TABLE, isFunctionName } from './functions.ts';
import { parseExpression } from './parse-expression.ts';
import { nameProblem } from './scope.ts';
import type { Token } from './tokens.ts';

/** A form that stands alone on the right of an assignment. */
export type DrawingForm = 'draw' | 'oneOf' | 'whole' | 'scatter' | 'given';

/** One argument of such a form: its tree, and its tokens, since a unit alone is no expression. */
export interface FormArgument {
  tokens: readonly Token[];
  span: Span;
}

/** A statement as written, before names and dimensions are looked at. */
export type ParsedStatement =
  | { kind: 'require'; span: Span; tree: ExpressionTree }
  | { kind: 'assign'; name: string; nameSpan: Span; span: Span; tree: ExpressionTree }
  | {
      kind: 'form';
      form: DrawingForm;
      name: string;
      nameSpan: Span;
      span: Span;
      formSpan: Span;
      arguments: readonly FormArgument[];
    };

const FORMS: ReadonlySet<string> = new Set<DrawingForm>(['draw', 'oneOf', 'whole', 'scatter', 'given']);
const DECLARATIONS: ReadonlySet<string> = new Set(['let', 'const', 'var']);

function isForm(name: string): name is DrawingForm {
  return FORMS.has(name);
}

/** The tokens between the brackets when `tokens` are one call `name(...)` from end to end; else null. */
function insideCall(tokens: readonly Token[]): readonly Token[] | null {
  if (tokens[0]?.kind !== 'name' || tokens[1]?.text !== '(') return null;
  let depth = 0;
  for (const [index, token] of tokens.entries()) {
    if (token.kind === 'open') depth += 1;
    if (token.kind === 'close') {
      depth -= 1;
      if (depth === 0) return index === tokens.length - 1 ? tokens.slice(2, -1) : null;
    }
  }
  return null;
}

function splitArguments(inside: readonly Token[], whole: Span): FormArgument[] {
  if (inside.length === 0) return [];
  const parts: Token[][] = [[]];
  let depth = 0;
  for (const token of inside) {
    if (token.kind === 'open') depth += 1;
    if (token.kind === 'close') depth -= 1;
    if (token.kind === 'comma' && depth === 0) parts.push([]);
    else parts.at(-1)?.push(token);
  }
  return parts.map((tokens) => {
    const first = tokens[0];
    const last = tokens.at(-1);
    return {
      tokens,
      span: first === undefined || last === undefined ? whole : joinSpans(first.span, last.span),
    };
  });
}

/** Says why a word cannot be given a value here, or null. */
function definitionProblem(name: string): { code: string; message: string } | null {
  const constant = CONSTANTS.get(name);
  if (constant !== undefined) {
    return {
      code: 'constant-redefined',
      message: `\`${name}\` is the ${constant.description} and cannot be given another value: choose another name.`,
    };
  }
  if (isFunctionName(name) || DRAWING_TABLE.has(name)) {
    return {
      code: 'function-redefined',
      message: `\`${name}\` is a function of the script: choose another name.`,
    };
  }
  const problem = nameProblem(name);
  return problem === null ? null : { code: 'name-not-allowed', message: problem };
}

/** Reads one statement: `name = expression`, `name = draw(...)` and its like, or `require(condition)`. */
export function parseStatement(
  tokens: readonly Token[],
  variables: ReadonlySet<string>,
): { statement: ParsedStatement | null; diagnostics: Diagnostic[] } {
  const [first, second] = tokens;
  const last = tokens.at(-1);
  if (first === undefined || last === undefined) return { statement: null, diagnostics: [] };
  const span = joinSpans(first.span, last.span);
  const fail = (at: Span, code: string, message: string): { statement: null; diagnostics: Diagnostic[] } => ({
    statement: null,
    diagnostics: [errorAt(at, code, message)],
  });

  if (first.kind === 'name' && first.text === 'require') {
    const inside = insideCall(tokens);
    if (inside === null)
      return fail(
        span,
        'require-form',
        'Write the condition in brackets, alone on its line: require(r < 8 cm).',
      );
    const { tree, diagnostics } = parseExpression(inside, variables, span);
    return { statement: tree === null ? null : { kind: 'require', span, tree }, diagnostics };
  }
  if (DECLARATIONS.has(first.text) && second?.kind === 'name') {
    return fail(
      first.span,
      'declaration',
      `Leave “${first.text}” out: a value gets its name by ${second.text} = ... alone.`,
    );
  }
  if (first.kind !== 'name' || second?.kind !== 'assign') {
    const assign = tokens.find((token) => token.kind === 'assign');
    if (assign !== undefined) {
      return fail(
        span,
        'assign-to-expression',
        'On the left of the equals sign stands one new name, as r = ....',
      );
    }
    const drawing = DRAWING_TABLE.has(first.text)
      ? `Give the value a name: x = ${first.text}(...).`
      : 'A line is name = expression, or require(condition).';
    return fail(span, 'statement-form', drawing);
  }
  const problem = definitionProblem(first.text);
  if (problem !== null) return fail(first.span, problem.code, problem.message);

  const right = tokens.slice(2);
  const head = right[0];
  const base = { name: first.text, nameSpan: first.span, span };
  if (head?.kind === 'name' && isForm(head.text) && right[1]?.text === '(') {
    const inside = insideCall(right);
    if (inside === null) {
      return fail(
        head.span,
        'drawing-not-alone',
        `${head.text}(...) must stand alone on the right of the equals sign: give it a line of its own and use its name.`,
      );
    }
    const formSpan = joinSpans(head.span, last.span);
    const statement: ParsedStatement = {
      kind: 'form',
      form: head.text,
      ...base,
      formSpan,
      arguments: splitArguments(inside, formSpan),
    };
    return { statement, diagnostics: [] };
  }
  const { tree, diagnostics } = parseExpression(right, variables, second.span);
  return { statement: tree === null ? null : { kind: 'assign', ...base, tree }, diagnostics };
}
