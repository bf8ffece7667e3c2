import type { Part } from '#shared/engine/index.ts';

interface PartToolsProps {
  letter: string;
  index: number;
  count: number;
  editing: boolean;
  onEdit: () => void;
  onMove: (step: -1 | 1) => void;
  onRemove: () => void;
}

/** What can be done with one part, in a line under it. */
export function PartTools({ letter, index, count, editing, onEdit, onMove, onRemove }: PartToolsProps) {
  return (
    <p className="flex flex-wrap gap-x-4 text-sm" data-part-tools={letter}>
      <button type="button" className="link" aria-expanded={editing} onClick={onEdit}>
        {editing ? `Close part (${letter})` : `Edit part (${letter})`}
      </button>
      {index > 0 && (
        <button
          type="button"
          className="link"
          aria-label={`Move part (${letter}) up`}
          onClick={() => onMove(-1)}
        >
          Move up
        </button>
      )}
      {index < count - 1 && (
        <button
          type="button"
          className="link"
          aria-label={`Move part (${letter}) down`}
          onClick={() => onMove(1)}
        >
          Move down
        </button>
      )}
      <button type="button" className="link" aria-label={`Remove part (${letter})`} onClick={onRemove}>
        Remove
      </button>
    </p>
  );
}

const KINDS: readonly (readonly [Part['kind'], string])[] = [
  ['numeric', 'numeric'],
  ['showThat', 'show that'],
  ['written', 'written'],
];

/** Adds a part of one of the three kinds at the end. */
export function AddPart({ onAdd }: { onAdd: (kind: Part['kind']) => void }) {
  return (
    <p className="flex flex-wrap items-baseline gap-x-4">
      <span>Add a part:</span>
      {KINDS.map(([kind, name]) => (
        <button key={kind} type="button" className="link" onClick={() => onAdd(kind)}>
          {name}
        </button>
      ))}
    </p>
  );
}
