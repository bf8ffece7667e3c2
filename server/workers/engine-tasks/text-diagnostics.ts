import type { PlacedDiagnostic } from '#shared/contracts/checking.ts';
import {
  type CompiledScript,
  compileExpression,
  findHoles,
  holeProblem,
  isNumericPart,
  type ItemContent,
  type NumericPart,
  readUnit,
} from '#shared/engine/index.ts';

/** Where a stretch of a text lies: offsets, and the line and column where it begins. */
function spanIn(text: string, start: number, end: number) {
  const before = text.slice(0, start);
  return {
    start,
    end,
    line: before.split('\n').length,
    column: start - before.lastIndexOf('\n'),
  };
}

function holeDiagnostics(
  field: string,
  text: string,
  content: ItemContent,
  script: CompiledScript | null,
): PlacedDiagnostic[] {
  const { holes, mistakes } = findHoles(text);
  const place = (code: string, piece: { start: number; end: number }, message: string): PlacedDiagnostic => ({
    code,
    severity: 'error',
    span: spanIn(text, piece.start, piece.end),
    message,
    field,
  });
  const problems = mistakes.map((mistake) => place('unreadableHole', mistake, mistake.message));
  if (script === null) return problems;
  const context = { script, quantities: content.quantities };
  for (const hole of holes) {
    const problem = holeProblem(context, hole);
    if (problem !== null) problems.push(place('unknownHole', hole, problem));
  }
  return problems;
}

function answerDiagnostics(field: string, part: NumericPart, script: CompiledScript): PlacedDiagnostic[] {
  const { answer } = part;
  const whole = (text: string) => spanIn(text, 0, text.length);
  const problems: PlacedDiagnostic[] = [];
  const info = script.quantities.find((quantity) => quantity.name === answer.quantity);
  if (info === undefined) {
    problems.push({
      code: 'unknownAnswer',
      severity: 'error',
      span: whole(answer.quantity),
      message:
        answer.quantity === ''
          ? 'Choose the quantity of the script that answers this part.'
          : `The script has no quantity “${answer.quantity}”: choose one that it has.`,
      field: `${field}.quantity`,
    });
  }
  if (!readUnit(answer.unit).ok) {
    problems.push({
      code: 'unknownUnit',
      severity: 'error',
      span: whole(answer.unit),
      message: `“${answer.unit}” is no unit: write one such as kV or m s^-1.`,
      field: `${field}.unit`,
    });
  }
  for (const [index, slip] of answer.slips.entries()) {
    const { diagnostics } = compileExpression(script, slip.expression, info?.dimension);
    problems.push(
      ...diagnostics.map((diagnostic) => ({
        ...diagnostic,
        field: `${field}.slips.${index}.expression`,
      })),
    );
  }
  return problems;
}

/**
 * Mistakes in an item's texts, answers and slips, each with the field it stands in. What needs the script is
 * only told when the script compiles.
 */
export function textDiagnostics(content: ItemContent, script: CompiledScript | null): PlacedDiagnostic[] {
  const holes = (field: string, text: string) => holeDiagnostics(field, text, content, script);
  return [
    ...holes('stem', content.stem),
    ...content.parts.flatMap((part, index) => [
      ...holes(`parts.${index}.text`, part.text),
      ...part.scheme.flatMap((line, at) => holes(`parts.${index}.scheme.${at}.text`, line.text)),
      ...(script !== null && isNumericPart(part)
        ? answerDiagnostics(`parts.${index}.answer`, part, script)
        : []),
    ]),
  ];
}
