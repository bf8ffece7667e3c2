import { useState, type ReactNode } from 'react';

import type { ItemContent, Part } from '#shared/engine/index.ts';
import { chosen, differences, mergeVersions, type Choice, type Difference } from './merge.ts';

interface ConflictViewProps {
  mine: ItemContent;
  theirs: ItemContent;
  /** What both began from, when it is known. */
  base: ItemContent | null;
  onMerge: (merged: ItemContent) => void;
}

const KINDS: Readonly<Record<Part['kind'], string>> = {
  numeric: 'numeric',
  showThat: 'show that',
  written: 'written',
};

function PartText({ part }: { part: Part | null }) {
  if (part === null) return <p className="text-muted">Not in this version.</p>;
  const marks = part.marks === 1 ? '1 mark' : `${part.marks} marks`;
  return (
    <>
      <p className="text-sm text-muted">
        {KINDS[part.kind]}, {marks}
        {part.kind === 'written' ? '' : `, answer ${part.answer.quantity || 'not chosen'}`}
      </p>
      <p className="whitespace-pre-wrap">{part.text}</p>
      <ul className="text-sm">
        {part.scheme.map((line, index) => (
          <li key={index}>
            {line.text} [{line.marks}]
          </li>
        ))}
      </ul>
      {part.kind !== 'written' &&
        part.answer.slips.map((slip) => (
          <p key={slip.id} className="text-sm">
            Slip: {slip.name} <code>{slip.expression}</code>
          </p>
        ))}
    </>
  );
}

function fieldText(content: ItemContent, difference: Difference): ReactNode {
  if (difference.kind === 'order')
    return content.parts.map((part) => part.text.slice(0, 40) || part.id).join('; ');
  if (difference.kind === 'part') return null;
  const value = content[difference.field];
  if (typeof value === 'string') {
    const mono = difference.field === 'script' ? 'font-mono text-sm' : '';
    return <span className={`whitespace-pre-wrap ${mono}`}>{value === '' ? '(empty)' : value}</span>;
  }
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return (
    <span className="whitespace-pre-wrap break-words font-mono text-xs">
      {JSON.stringify(value, null, 1)}
    </span>
  );
}

/**
 * Two versions of a draft side by side, difference by difference. Nothing is saved before the choice is made,
 * and both versions stay within reach of undo afterwards.
 */
export function ConflictView({ mine, theirs, base, onMerge }: ConflictViewProps) {
  const [choices, setChoices] = useState<Record<string, Choice>>({});
  const found = differences(mine, theirs, base);
  const side = (difference: Difference, which: 'mine' | 'theirs'): ReactNode =>
    difference.kind === 'part' ? (
      <PartText part={difference[which]} />
    ) : (
      fieldText(which === 'mine' ? mine : theirs, difference)
    );
  return (
    <form
      className="grid gap-6 pt-4"
      onSubmit={(event) => {
        event.preventDefault();
        onMerge(mergeVersions(mine, theirs, found, choices));
      }}
    >
      <p>
        This draft was saved elsewhere while you were editing it. Choose, place by place, which version stays.
        Both can be brought back with Undo afterwards.
      </p>
      {found.map((difference) => {
        const choice = chosen(difference, choices);
        const option = (value: Choice, name: string) => (
          <label className="check">
            <input
              type="radio"
              name={difference.key}
              checked={choice === value}
              onChange={() => setChoices({ ...choices, [difference.key]: value })}
            />{' '}
            {name}
          </label>
        );
        const both = difference.kind === 'part' && difference.mine !== null && difference.theirs !== null;
        return (
          <fieldset key={difference.key} className="border-t border-rule pt-3">
            <legend className="font-semibold">{difference.label}</legend>
            <div className="grid gap-4 sm:grid-cols-2">
              <div className={choice === 'theirs' ? 'text-muted' : undefined}>
                {option('mine', 'Mine')}
                {side(difference, 'mine')}
              </div>
              <div className={choice === 'mine' ? 'text-muted' : undefined}>
                {option('theirs', 'The other')}
                {side(difference, 'theirs')}
              </div>
            </div>
            {both && option('both', 'Keep both, the other after mine')}
          </fieldset>
        );
      })}
      <div className="flex flex-wrap gap-3">
        <button type="submit" className="button button-primary">
          Go on with this choice
        </button>
      </div>
    </form>
  );
}
