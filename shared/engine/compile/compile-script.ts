import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { errorAt, hasError } from '../diagnostics/spans.ts';
import { checkStatement, type CheckedStatement } from '../script/check-statement.ts';
import { usesOf } from '../script/statement-uses.ts';
import { SCRIPT_LIMITS } from '../script/limits.ts';
import { parseStatement } from '../script/parse-statement.ts';
import type { ScopeEntry } from '../script/scope.ts';
import { splitStatements } from '../script/split-statements.ts';
import type { Statement } from '../script/statement.ts';
import { tokenise, type Token } from '../script/tokens.ts';
import type { Compilation, GridInfo, QuantityInfo } from './compiled-script.ts';

/** Names that are given a value anywhere: what a unit must not be mistaken for. */
function assignedNames(statements: readonly Token[][]): Set<string> {
  const names = new Set<string>();
  for (const [first, second] of statements) {
    if (first?.kind === 'name' && second?.kind === 'assign') names.add(first.text);
  }
  return names;
}

const UNREAD: ReturnType<typeof parseStatement> = { statement: null, diagnostics: [] };

/** Whether one of the mistakes lies on the lines of a statement. */
function holdsAny(tokens: readonly Token[], mistakes: readonly Diagnostic[]): boolean {
  const from = tokens[0]?.span.line ?? 0;
  const to = tokens.at(-1)?.span.line ?? 0;
  return mistakes.some((mistake) => mistake.span.line >= from && mistake.span.line <= to);
}

function quantityOf(
  statement: Exclude<Statement, { kind: 'require' }>,
  checked: CheckedStatement,
): QuantityInfo | null {
  if (checked.type === null) return null;
  const uses = usesOf(statement);
  const kind = statement.kind === 'drawn' || statement.kind === 'given' ? statement.kind : 'computed';
  return {
    name: statement.name,
    kind,
    shape: checked.type.shape,
    dimension: checked.type.dimension,
    scriptUnit: checked.unit?.text ?? '',
    figures: checked.figures,
    decimals: checked.decimals,
    span: statement.nameSpan,
    uses: uses.names,
    constants: uses.constants,
  };
}

/** Counts the grid; a product beyond exact whole numbers is an error at the draw that passes it. */
function gridOf(statements: readonly Statement[], diagnostics: Diagnostic[]): GridInfo {
  let size = 1;
  let open = false;
  for (const statement of statements) {
    if (statement.kind === 'scatter') open = true;
    if (statement.kind !== 'drawn') continue;
    const { levels } = statement;
    const next = size * (levels.kind === 'steps' ? levels.count : levels.choices.length);
    if (next > Number.MAX_SAFE_INTEGER) {
      diagnostics.push(
        errorAt(
          statement.span,
          'grid-too-large',
          'All draws together have more than 9 × 10^15 combinations: take wider steps or fewer drawn values.',
        ),
      );
      break;
    }
    size = next;
  }
  return { size, open };
}

/**
 * Reads and checks a variable script. Never throws and always ends, in time proportional to the length;
 * every mistake is a positioned diagnostic.
 */
export function compileScript(source: string): Compilation {
  const start = { start: 0, end: 0, line: 1, column: 1 };
  if (source.length > SCRIPT_LIMITS.characters) {
    const message = `A script may have at most ${SCRIPT_LIMITS.characters.toLocaleString('en-GB')} characters; this one has ${source.length.toLocaleString('en-GB')}.`;
    return {
      script: null,
      diagnostics: [errorAt(start, 'script-too-long', message)],
      quantities: [],
      grid: { size: 1, open: false },
    };
  }
  const lexed = tokenise(source);
  const split = splitStatements(lexed.tokens);
  const diagnostics = [...lexed.diagnostics, ...split.diagnostics];
  const tooMany = split.statements[SCRIPT_LIMITS.statements]?.[0];
  if (tooMany !== undefined) {
    diagnostics.push(
      errorAt(
        tooMany.span,
        'too-many-statements',
        `A script may have at most ${SCRIPT_LIMITS.statements} statements.`,
      ),
    );
  }
  const all = assignedNames(split.statements);
  const defined = new Map<string, ScopeEntry>();
  const scope = { defined, all };
  const statements: Statement[] = [];
  const quantities: QuantityInfo[] = [];

  for (const tokens of split.statements.slice(0, SCRIPT_LIMITS.statements)) {
    // One mistake is told once: a statement with a sign that has no meaning is not read any further.
    const parsed = holdsAny(tokens, lexed.diagnostics) ? UNREAD : parseStatement(tokens, all);
    diagnostics.push(...parsed.diagnostics);
    const name = tokens[1]?.kind === 'assign' ? (tokens[0]?.text ?? null) : null;
    const earlier = name === null ? undefined : quantities.find((quantity) => quantity.name === name);
    if (name !== null && defined.has(name)) {
      const where = earlier === undefined ? 'above' : `on line ${earlier.span.line}`;
      diagnostics.push(
        errorAt(
          tokens[0]?.span ?? start,
          'defined-twice',
          `\`${name}\` already has a value ${where}: each name is given one once. Choose another name.`,
        ),
      );
      continue;
    }
    if (parsed.statement === null) {
      if (name !== null) defined.set(name, { type: null, unit: null });
      continue;
    }
    const checked = checkStatement(parsed.statement, scope);
    diagnostics.push(...checked.diagnostics);
    if (name !== null) defined.set(name, { type: checked.type, unit: checked.unit });
    if (checked.statement === null) continue;
    statements.push(checked.statement);
    const quantity = checked.statement.kind === 'require' ? null : quantityOf(checked.statement, checked);
    if (quantity !== null) quantities.push(quantity);
  }
  const grid = gridOf(statements, diagnostics);
  diagnostics.sort((a, b) => a.span.start - b.span.start);
  const told = diagnostics.slice(0, SCRIPT_LIMITS.diagnostics);
  const script = hasError(diagnostics) ? null : { source, statements, quantities, grid };
  return { script, diagnostics: told, quantities, grid };
}
