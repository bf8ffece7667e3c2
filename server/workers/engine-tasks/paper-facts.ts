import {
  answerBand,
  type DrawValues,
  findHoles,
  isDimensionless,
  isNumericPart,
  partLetter,
  printingOf,
  printSeries,
} from '#shared/engine/index.ts';
import type { ItemAtDraw } from '#shared/sheet/build-item.ts';

import type { ItemFacts } from '../task-types.ts';

/** Names of the quantities whose values a candidate sees in the texts and drawings of an item. */
function printedNames({ content, figures }: ItemAtDraw): Set<string> {
  const texts = [
    content.stem,
    ...content.parts.map((part) => part.text),
    ...figures.map((figure) => figure.svg ?? ''),
  ];
  return new Set(texts.flatMap((text) => findHoles(text).holes.flatMap((hole) => hole.names)));
}

function printedValues(item: ItemAtDraw, values: DrawValues): ItemFacts['printed'] {
  const { script, content } = item;
  if (script === null) return [];
  return [...printedNames(item)].flatMap((name) => {
    const info = script.quantities.find((quantity) => quantity.name === name);
    const value = values.values[name];
    if (info === undefined || value === undefined || isDimensionless(info.dimension)) return [];
    const printing = printingOf({ script, quantities: content.quantities }, name);
    const texts = 'problem' in printing ? [] : printSeries(printing, values).map((printed) => printed.text);
    const numbers = typeof value === 'number' ? [value] : value;
    return numbers.map((number, index) => ({
      text: texts[index] ?? name,
      valueSI: number,
      dimension: JSON.stringify(info.dimension),
    }));
  });
}

/** What the checks of a paper ask of one item at its draw, as numbers in SI. */
export function itemFacts(item: ItemAtDraw): ItemFacts {
  const { script, values, content } = item;
  if (script === null || values === null) return { answers: [], printed: [], undefinedParts: [] };
  const answers: ItemFacts['answers'] = [];
  const undefinedParts: string[] = [];
  content.parts.forEach((part, index) => {
    if (!isNumericPart(part)) return;
    const band = answerBand(script, part, values);
    const letter = partLetter(index);
    if (band === null || !Number.isFinite(band.answerSI)) {
      undefinedParts.push(letter);
      return;
    }
    answers.push({
      partId: part.id,
      letter,
      text: band.answer.text,
      answerSI: band.answerSI,
      fromSI: band.fromSI,
      toSI: band.toSI,
      dimension: isDimensionless(band.unit.dimension) ? null : JSON.stringify(band.unit.dimension),
    });
  });
  return { answers, printed: printedValues(item, values), undefinedParts };
}
