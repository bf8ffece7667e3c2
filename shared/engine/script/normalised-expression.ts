import type { Item } from './unit-literals.ts';

/** An expression that mathjs can read: every leaf is written L<n>, every function F<n>, n the index of its item. */
export interface NormalisedExpression {
  text: string;
  items: readonly Item[];
  /** For every character of `text`, the index of the item that it comes from. */
  itemAt: readonly number[];
  /** For the index of each opening bracket, that of its partner. */
  partner: ReadonlyMap<number, number>;
}
