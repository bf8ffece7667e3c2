import { findHoles } from '../holes/find-holes.ts';
import { holeProblem } from '../holes/fill-hole.ts';
import { isNumericPart, partLetter } from '../item/content.ts';
import { sameDimension } from '../units/dimension.ts';
import { describeDimension } from '../units/quantity-kinds.ts';
import { readUnit } from '../units/read-unit.ts';
import { finding, type CheckStart } from './check.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';

/** Every text of the item that prints, by field name, in words for a sentence. */
function printedTexts({
  content,
  figures,
}: AssayContext): { field: string; text: string; words: string; partId?: string }[] {
  return [
    { field: 'stem', text: content.stem, words: 'the stem' },
    ...content.parts.flatMap((part, index) => [
      {
        field: `parts.${index}.text`,
        text: part.text,
        words: `part (${partLetter(index)})`,
        partId: part.id,
      },
      ...part.scheme.map((line, at) => ({
        field: `parts.${index}.scheme.${at}.text`,
        text: line.text,
        words: `the mark scheme of part (${partLetter(index)})`,
        partId: part.id,
      })),
    ]),
    ...figures.flatMap((figure) =>
      figure.svg === null
        ? []
        : [{ field: `figure.${figure.figureId}`, text: figure.svg, words: 'a figure' }],
    ),
  ];
}

function holeFindings(context: AssayContext): Finding[] {
  const holes = { script: context.script, quantities: context.content.quantities };
  return printedTexts(context).flatMap(({ field, text, words, partId }) => {
    const found = findHoles(text);
    const problems = [
      ...found.mistakes.map(({ message, start, end }) => ({ message, start, end })),
      ...found.holes.flatMap((hole) => {
        const message = holeProblem(holes, hole);
        return message === null ? [] : [{ message, start: hole.start, end: hole.end }];
      }),
    ];
    return problems.map(({ message, start, end }) =>
      finding('hole-mistake', {
        about: `${field}:${text.slice(start, end)}`,
        statement: `In ${words}, ${text.slice(start, end)} cannot print. ${message}`,
        cure: 'Correct the name, the unit or the figures in the hole.',
        place: { field, partId },
      }),
    );
  });
}

function partFindings(context: AssayContext): Finding[] {
  const known = new Map(context.script.quantities.map((info) => [info.name, info]));
  return context.content.parts.flatMap((part, index): Finding[] => {
    const letter = partLetter(index);
    const findings: Finding[] = [];
    const place = { partId: part.id };
    const total = part.scheme.reduce((sum, line) => sum + line.marks, 0);
    if (total !== part.marks) {
      findings.push(
        finding('marks-do-not-add-up', {
          about: part.id,
          statement: `Part (${letter}) carries ${part.marks} ${part.marks === 1 ? 'mark' : 'marks'}, but the lines of its mark scheme add up to ${total}.`,
          cure: 'Change the part’s marks or the lines.',
          place,
        }),
      );
    }
    if (part.text.trim() === '') {
      findings.push(
        finding('text-empty', {
          about: part.id,
          statement: `Part (${letter}) has no text.`,
          cure: 'Write what is asked.',
          place,
        }),
      );
    }
    if (!isNumericPart(part)) return findings;
    const info = known.get(part.answer.quantity);
    if (info === undefined) {
      findings.push(
        finding('answer-missing', {
          about: part.id,
          statement:
            part.answer.quantity === ''
              ? `Part (${letter}) names no quantity as its answer.`
              : `Part (${letter}) asks for “${part.answer.quantity}”, which the script does not have.`,
          cure: 'Choose one of the script’s quantities.',
          place,
        }),
      );
      return findings;
    }
    if (info.shape.kind !== 'scalar') {
      findings.push(
        finding('answer-missing', {
          about: part.id,
          statement: `Part (${letter}) asks for “${info.name}”, which is no single number.`,
          cure: 'Choose a quantity with one value.',
          place,
        }),
      );
    }
    const unit = readUnit(part.answer.unit);
    if (!unit.ok || !sameDimension(unit.unit.dimension, info.dimension)) {
      findings.push(
        finding('unit-mismatch', {
          about: part.id,
          statement: `Part (${letter}) wants its answer in ${part.answer.unit === '' ? 'no unit' : part.answer.unit}, but “${info.name}” is ${describeDimension(info.dimension)}.`,
          cure: 'Give a unit of the same kind.',
          place,
        }),
      );
    }
    if (
      part.kind === 'showThat' &&
      !findHoles(part.text).holes.some((hole) => hole.names.includes(info.name))
    ) {
      findings.push(
        finding('value-not-stated', {
          about: part.id,
          statement: `Part (${letter}) asks to show a value but does not state it.`,
          cure: `Print it in the text, as {{${info.name}, ${part.statedFigures} sf}}.`,
          place,
        }),
      );
    }
    return findings;
  });
}

function figureFindings({ content, figures }: AssayContext): Finding[] {
  const places = new Set(['stem', ...content.parts.map((part) => part.id)]);
  return content.figures.flatMap((figure, index): Finding[] => {
    const findings: Finding[] = [];
    const field = `figures.${index}`;
    if (figure.alternativeText.trim() === '') {
      findings.push(
        finding('alternative-text-missing', {
          about: String(figure.figureId),
          statement: `Figure ${index + 1} has no alternative text.`,
          cure: 'Describe in words what it shows that the question needs.',
          place: { field },
        }),
      );
    }
    if (!places.has(figure.place)) {
      findings.push(
        finding('figure-missing', {
          about: String(figure.figureId),
          statement: `Figure ${index + 1} belongs to a part that is no longer there.`,
          cure: 'Put it under the stem or another part, or take it out.',
          place: { field },
        }),
      );
    }
    if (figures.length > 0 && !figures.some((stored) => stored.figureId === figure.figureId)) {
      findings.push(
        finding('figure-missing', {
          about: `stored:${figure.figureId}`,
          statement: `Figure ${index + 1} is not stored with this item.`,
          cure: 'Add the picture again.',
          place: { field },
        }),
      );
    }
    return findings;
  });
}

/** 10. Everything that prints can be printed, and the mark scheme adds up. */
export const checkPrint: CheckStart = (context) => ({
  finish: () => [...holeFindings(context), ...partFindings(context), ...figureFindings(context)],
});
