import type { Severity } from '#shared/engine/index.ts';

const WORDS: Readonly<Record<Severity, { word: string; shape: string; tone: string }>> = {
  blocker: { word: 'Blocker', shape: '■', tone: 'text-lead' },
  caution: { word: 'Caution', shape: '▲', tone: 'text-brass' },
  note: { word: 'Note', shape: '○', tone: 'text-muted' },
};

/** A severity as shape and word, never as colour alone. */
export function SeverityWord({ severity }: { severity: Severity | null }) {
  if (severity === null) return <span className="text-accent">✓ Sound</span>;
  const { word, shape, tone } = WORDS[severity];
  return (
    <span className={tone}>
      <span aria-hidden="true">{shape}</span> {word}
    </span>
  );
}
