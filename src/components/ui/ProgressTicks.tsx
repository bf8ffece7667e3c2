/** A scale that runs while something is being made whose end is not known. */
export function ProgressTicks({ label }: { label: string }) {
  return <span role="progressbar" aria-label={label} className="progress-ticks" />;
}
