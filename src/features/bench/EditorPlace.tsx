import { useEffect, useRef, type ReactNode } from 'react';

/** An editor that opens in place: its first text takes the keyboard, and it comes into view. */
export function EditorPlace({ label, children }: { label: string; children: ReactNode }) {
  const place = useRef<HTMLElement>(null);
  useEffect(() => {
    place.current?.querySelector('textarea')?.focus({ preventScroll: true });
    place.current?.scrollIntoView?.({ block: 'nearest' });
  }, []);
  return (
    <section ref={place} aria-label={label} className="bench-editor">
      {children}
    </section>
  );
}
