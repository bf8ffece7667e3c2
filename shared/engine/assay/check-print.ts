import { findHoles } from '../holes/find-holes.ts';
import { holeProblem } from '../holes/fill-hole.ts';
import { isNumericPart, partLetter } from '../item/content.ts';
import { sameDimension } from '../units/dimension.ts';
import { describeDimension } from '../units/quantity-kinds.ts';
import { readUnit } from '../units/read-unit.ts';
import { finding, type CheckStart } from './check.ts';
import { checkPrintedNumbers } from './check-printed-numbers.ts';
import { mathsMistakes } from './maths-mistakes.ts';
import { printedTexts } from './printed-texts.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';

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

function mathsFindings(context: AssayContext): Finding[] {
  return printedTexts(context)
    .filter(({ markdown }) => markdown)
    .flatMap(({ field, text, words, partId }) =>
      mathsMistakes(text).map(({ message, start, end }) =>
        finding('maths-mistake', {
          about: `${field}:${start}`,
          statement: `In ${words} the formula ${text.slice(start, Math.min(end, start + 40))} cannot print. ${message}`,
          cure: 'Correct the formula.',
          place: { field, partId },
        }),
      ),
    );
}

/** Answers that the candidate can read off the paper. */
function answerPrinted(context: AssayContext): Finding[] {
  const texts = printedTexts(context).filter(({ forCandidates }) => forCandidates);
  return context.parts.flatMap(({ part, letter, info }) => {
    if (part.kind !== 'numeric') return [];
    const where = texts.find(({ text }) =>
      findHoles(text).holes.some((hole) => hole.names.includes(info.name)),
    );
    if (where === undefined) return [];
    return [
      finding('answer-printed', {
        about: part.id,
        statement: `The answer to part (${letter}) is printed in ${where.words}.`,
        cure: 'Take it out there, or make the part one that shows the value.',
        place: { partId: part.id, field: where.field },
      }),
    ];
  });
}

/** Results that are printed rounded although the working goes on with them in full. */
function printedInFull(context: AssayContext): Finding[] {
  const readable = new Set(context.printed.map(({ name }) => name));
  const shown = new Set(context.parts.map(({ info }) => info.name));
  const used = new Set(context.parts.flatMap(({ dependencies }) => dependencies.intermediates));
  const texts = printedTexts(context).filter(({ forCandidates }) => forCandidates);
  return context.script.quantities
    .filter(({ name, kind }) => kind === 'computed' && used.has(name))
    .filter(({ name }) => !readable.has(name) && !shown.has(name))
    .flatMap((info) => {
      const where = texts.find(({ text }) =>
        findHoles(text).holes.some((hole) =>
          hole.names.some((name) => name.replace(/\[.*$/, '') === info.name),
        ),
      );
      if (where === undefined) return [];
      return [
        finding('printed-in-full', {
          about: info.name,
          statement: `“${info.name}” is printed rounded in ${where.words}, but the script goes on with it in full, which the candidate cannot.`,
          cure: `Write ${info.name} = given(…, figures), so that the answers follow from what is printed.`,
          place: { quantity: info.name, span: info.span, field: where.field },
        }),
      ];
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
    if (part.kind === 'showThat' && part.answer.figures <= part.statedFigures) {
      findings.push(
        finding('show-that-figures', {
          about: part.id,
          statement: `Part (${letter}) states its value to ${part.statedFigures} figures and wants it shown to ${part.answer.figures}: it cannot be told from one copied down.`,
          cure: 'Ask for at least one figure more than the text states.',
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
export const checkPrint: CheckStart = (context) => {
  const numbers = checkPrintedNumbers(context);
  return {
    visit: numbers.visit,
    finish: () => [
      ...holeFindings(context),
      ...mathsFindings(context),
      ...answerPrinted(context),
      ...printedInFull(context),
      ...partFindings(context),
      ...figureFindings(context),
      ...numbers.finish(),
    ],
  };
};
