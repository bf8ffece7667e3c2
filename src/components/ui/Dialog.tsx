import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

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

/** A dialog that holds the keyboard until it is closed; Escape and the word Close end it. */
export function Dialog({ title, description, open, onClose, wide = false, children }: DialogProps) {
  return (
    <Primitive.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[rgb(10_14_18/0.45)]" />
        <Primitive.Content
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
          {children}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
