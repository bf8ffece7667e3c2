const FACES = [
  ['sheet', 'Sheet'],
  ['scheme', 'Mark scheme'],
] as const;

interface FaceChoiceProps {
  face: 'sheet' | 'scheme';
  onFace: (face: 'sheet' | 'scheme') => void;
}

/** Chooses between what the candidate sees and what the marker sees. */
export function FaceChoice({ face, onFace }: FaceChoiceProps) {
  return (
    <div role="group" aria-label="What is shown" className="flex gap-x-4">
      {FACES.map(([value, name]) => (
        <button
          key={value}
          type="button"
          className={value === face ? 'font-semibold' : 'link'}
          aria-pressed={value === face}
          onClick={() => onFace(value)}
        >
          {name}
        </button>
      ))}
    </div>
  );
}
