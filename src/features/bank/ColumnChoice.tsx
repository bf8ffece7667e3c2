import { Popover } from 'radix-ui';

import { OPTIONAL_COLUMNS, type OptionalColumn } from './bank-columns.ts';

interface ColumnChoiceProps {
  hidden: readonly OptionalColumn[];
  onHidden: (hidden: OptionalColumn[]) => void;
}

/** Which columns the bank shows, behind one word. */
export function ColumnChoice({ hidden, onHidden }: ColumnChoiceProps) {
  return (
    <Popover.Root>
      <Popover.Trigger className="link">Columns</Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          className="z-30 border border-ink bg-sheet p-4"
          aria-label="Columns of the bank"
        >
          <ul className="grid gap-1">
            {OPTIONAL_COLUMNS.map(({ id, name }) => (
              <li key={id}>
                <label className="flex cursor-pointer items-center gap-2">
                  <input
                    type="checkbox"
                    checked={!hidden.includes(id)}
                    onChange={(event) =>
                      onHidden(event.target.checked ? hidden.filter((each) => each !== id) : [...hidden, id])
                    }
                  />
                  {name}
                </label>
              </li>
            ))}
          </ul>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
