import type { CompiledScript, QuantityInfo } from '../compile/compiled-script.ts';
import { dependenciesOf, type Dependencies } from '../compile/dependencies.ts';
import type { DrawPlan } from '../draws/sampling.ts';
import { printingOf } from '../holes/fill-hole.ts';
import { isNumericPart, partLetter, type ItemContent, type NumericPart } from '../item/content.ts';
import { sameDimension } from '../units/dimension.ts';
import { formatQuantity } from '../units/format.ts';
import { readUnit } from '../units/read-unit.ts';
import type { Unit } from '../units/unit.ts';

/** What the print check is told of a stored figure. */
export interface FigureFacts {
  figureId: number;
  /** The SVG text with its holes; null for a bitmap. */
  svg: string | null;
}

/** A numeric or show-that part whose answer can be worked out. */
export interface AssayPart {
  part: NumericPart;
  letter: string;
  index: number;
  info: QuantityInfo;
  unit: Unit;
  dependencies: Dependencies;
}

/** Everything that the checks share. */
export interface AssayContext {
  content: ItemContent;
  script: CompiledScript;
  plan: DrawPlan;
  figures: readonly FigureFacts[];
  parts: readonly AssayPart[];
  /** Single values that stand in the question: drawn, given, or written into the script as they are. */
  printed: readonly QuantityInfo[];
  /** A value (SI) of a named quantity in words: as it prints, in its unit. */
  print: (name: string, value: number) => string;
}

const SENTENCE_FIGURES = 3;

/** Whether a value is written into the script as it is, as `d = 4.00 cm`: the candidate reads it and works nothing out. */
function isFixed(info: QuantityInfo): boolean {
  return info.kind === 'computed' && info.uses.length === 0 && info.constants.length === 0;
}

/** What an answer rests on, with fixed values counted among the givens. */
function restsOn(script: CompiledScript, name: string): Dependencies {
  const found = dependenciesOf(script, name);
  const fixed = new Set(script.quantities.filter(isFixed).map((info) => info.name));
  const given = new Set([...found.givens, ...found.intermediates.filter((inner) => fixed.has(inner))]);
  return {
    ...found,
    givens: found.names.filter((inner) => given.has(inner)),
    intermediates: found.intermediates.filter((inner) => !fixed.has(inner)),
  };
}

/** Prepares what the checks share. Parts whose quantity or unit does not fit are left to the print check. */
export function createAssayContext(
  content: ItemContent,
  script: CompiledScript,
  plan: DrawPlan,
  figures: readonly FigureFacts[],
): AssayContext {
  const holes = { script, quantities: content.quantities };
  const parts = content.parts.flatMap((part, index): AssayPart[] => {
    if (!isNumericPart(part)) return [];
    const info = script.quantities.find((quantity) => quantity.name === part.answer.quantity);
    const reading = readUnit(part.answer.unit);
    if (info?.shape.kind !== 'scalar' || !reading.ok) return [];
    if (!sameDimension(info.dimension, reading.unit.dimension)) return [];
    return [
      {
        part,
        letter: partLetter(index),
        index,
        info,
        unit: reading.unit,
        dependencies: restsOn(script, info.name),
      },
    ];
  });
  return {
    content,
    script,
    plan,
    figures,
    parts,
    printed: script.quantities.filter(
      (info) => info.shape.kind === 'scalar' && (info.kind !== 'computed' || isFixed(info)),
    ),
    print: (name, value) => {
      const printing = printingOf(holes, name);
      if ('problem' in printing) return String(value);
      const precision = printing.info.kind === 'drawn' ? printing.precision : { figures: SENTENCE_FIGURES };
      return formatQuantity(value, printing.unit, precision).text;
    },
  };
}
