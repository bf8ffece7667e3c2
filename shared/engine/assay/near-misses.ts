import { buildExpression, type CompiledExpression } from '../compile/expressions.ts';
import { workingOf } from '../compile/working.ts';
import { expressionText } from '../script/expression-text.ts';
import type { ExpressionTree } from '../script/expression-tree.ts';
import { sameDimension } from '../units/dimension.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { everywhere, mistakesAt, plainNumber, type Variant } from './mistakes.ts';
import { isWhole, roleOf } from './part-roles.ts';
import { printingOf } from '../holes/fill-hole.ts';

/** A wrong working made from the right one. */
export interface NearMiss {
  label: string;
  expression: CompiledExpression;
  /** Fixed factor on the value, where the mistake is one of units and not of the expression. */
  factor: number;
  /** Whether it still has the dimension of the answer, so that a look at the units does not betray it. */
  fits: boolean;
}

/** More than this would bury the strip. */
const MOST_NEAR_MISSES = 40;

/** Joules in an electronvolt to four figures: what a candidate divides by, or forgets to. */
const ELECTRONVOLT = '1.602e-19';

/** Names of the same dimension, one taken for another. */
function exchanged(context: AssayContext, tree: ExpressionTree): Variant[] {
  return everywhere(tree, (node) => {
    if (node.kind !== 'name') return [];
    const own = context.script.quantities.find((quantity) => quantity.name === node.name);
    if (own === undefined) return [];
    return context.printed
      .filter((other) => other.name !== node.name && sameDimension(other.dimension, own.dimension))
      .map((other) => ({
        label: `“${other.name}” taken for “${node.name}”`,
        tree: { ...node, name: other.name },
      }));
  });
}

/** Radii for diameters and the reverse, and energies that are printed in electronvolts left so. */
function misread(context: AssayContext, tree: ExpressionTree): Variant[] {
  const holes = { script: context.script, quantities: context.content.quantities };
  return everywhere(tree, (node) => {
    if (node.kind !== 'name') return [];
    const role = roleOf(context, node.name);
    const changed = (label: string, operator: '*' | '/', literal: string): Variant => ({
      label,
      tree: { kind: 'binary', operator, left: node, right: plainNumber(literal, node.span), span: node.span },
    });
    const variants: Variant[] = [];
    if (/radius/i.test(role)) variants.push(changed(`the diameter taken for “${node.name}”`, '*', '2'));
    if (/diameter/i.test(role)) variants.push(changed(`the radius taken for “${node.name}”`, '/', '2'));
    const printing = printingOf(holes, node.name);
    if (!('problem' in printing) && /^[a-zA-Zµ]?eV$/.test(printing.unit.text)) {
      variants.push(changed(`“${node.name}” left in electronvolts`, '/', ELECTRONVOLT));
    }
    return variants;
  });
}

/** Mistakes made with the answer itself. */
function mistakenAnswers(
  context: AssayContext,
  part: AssayPart,
  tree: ExpressionTree,
): { label: string; tree: ExpressionTree; factor: number }[] {
  const role = roleOf(context, part.info.name);
  const span = part.info.span;
  const beside = (operator: '+' | '-', label: string) => ({
    label,
    tree: { kind: 'binary', operator, left: tree, right: plainNumber('1', span), span } as const,
    factor: 1,
  });
  const answers: { label: string; tree: ExpressionTree; factor: number }[] = [];
  if (/radius/i.test(role)) answers.push({ label: 'the diameter given for the radius', tree, factor: 2 });
  if (/diameter/i.test(role)) answers.push({ label: 'the radius given for the diameter', tree, factor: 0.5 });
  if (part.unit.text === '°')
    answers.push({ label: 'the angle given in radians', tree, factor: Math.PI / 180 });
  if (part.unit.text === 'rad')
    answers.push({ label: 'the angle given in degrees', tree, factor: 180 / Math.PI });
  if (isWhole(context, part)) {
    answers.push(beside('+', 'one too many'), beside('-', 'one too few'));
  }
  return answers;
}

/** Computed names that no part asks for: a candidate works through them in one go. */
function passedThrough(context: AssayContext, part: AssayPart): ReadonlySet<string> {
  const asked = new Set(context.parts.map(({ info }) => info.name));
  return new Set(part.dependencies.intermediates.filter((name) => !asked.has(name)));
}

/**
 * Wrong workings that an answer's own working invites, down to the printed values and the answers of other
 * parts. Those that give the same expression are one. Dimensions need not fit: candidates do not check them.
 */
export function nearMissesOf(context: AssayContext, part: AssayPart): NearMiss[] {
  const tree = workingOf(context.script, part.info.name, passedThrough(context, part));
  if (tree === null) return [];
  const variants = [
    ...mistakenAnswers(context, part, tree),
    ...[...everywhere(tree, mistakesAt), ...misread(context, tree), ...exchanged(context, tree)].map(
      (variant) => ({ ...variant, factor: 1 }),
    ),
  ];
  const misses: NearMiss[] = [];
  const labels = new Map<string, number>();
  const seen = new Set([`1:${expressionText(tree)}`]);
  for (const { label, tree: wrong, factor } of variants) {
    const key = `${factor}:${expressionText(wrong)}`;
    if (seen.has(key) || misses.length >= MOST_NEAR_MISSES) continue;
    seen.add(key);
    const { expression } = buildExpression(context.script, wrong);
    if (expression?.shape.kind !== 'scalar') continue;
    const fits = sameDimension(expression.dimension, part.info.dimension);
    const times = (labels.get(label) ?? 0) + 1;
    labels.set(label, times);
    misses.push({ label: times === 1 ? label : `${label}, place ${times}`, expression, factor, fits });
  }
  return misses;
}
