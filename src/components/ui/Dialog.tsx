import { Dialog as Primitive } from 'radix-ui';
import { useRef, useState, type ReactNode } from 'react';

import { holdsUnsaved } from './unsaved.ts';

interface DialogProps {
  title: string;
  /** One sentence under the title. */
  description?: string;
  open: boolean;
  onClose: () => void;
  /** Takes more of the page, for lists and comparisons. */
  wide?: boolean;
  children: ReactNode;
}

/**
 * A dialog that holds the keyboard until it is closed; Escape and the word Close end it. When its form holds
 * typed text that is not saved, closing asks once.
 */
export function Dialog({ title, description, open, onClose, wide = false, children }: DialogProps) {
  const content = useRef<HTMLDivElement>(null);
  const [asking, setAsking] = useState(false);
  const close = () => {
    if (!asking && content.current !== null && holdsUnsaved(content.current)) setAsking(true);
    else {
      setAsking(false);
      onClose();
    }
  };
  return (
    <Primitive.Root open={open} onOpenChange={(next) => !next && close()}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[rgb(10_14_18/0.45)]" />
        <Primitive.Content
          ref={content}
          onEscapeKeyDown={(event) => {
            if (!asking) return;
            event.preventDefault();
            setAsking(false);
          }}
          className={`fixed left-1/2 top-[8vh] z-50 max-h-[84vh] w-[calc(100vw-2rem)] -translate-x-1/2 overflow-auto border border-ink bg-sheet p-6 ${wide ? 'max-w-4xl' : 'max-w-xl'}`}
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        >
          <div className="mb-4 flex items-baseline justify-between gap-6">
            <Primitive.Title className="text-xl font-semibold">{title}</Primitive.Title>
            <Primitive.Close className="link text-sm">Close</Primitive.Close>
          </div>
          {description !== undefined && (
            <Primitive.Description className="mb-4 text-muted">{description}</Primitive.Description>
          )}
          {asking && (
            <div role="alert" className="notice mb-4 flex flex-wrap items-baseline gap-x-5 gap-y-1">
              What you typed here is not saved.
              <button type="button" className="link" onClick={close}>
                Close without saving
              </button>
              <button type="button" className="link" autoFocus onClick={() => setAsking(false)}>
                Go on writing
              </button>
            </div>
          )}
          {children}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
