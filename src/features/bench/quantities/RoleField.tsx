import { Popover } from 'radix-ui';
import { useId, useState, type KeyboardEvent } from 'react';

import { matchingRoles, type RoleOption } from './choose-role.ts';

interface RoleFieldProps {
  /** What the field is for, as “Role of Va”. */
  label: string;
  role: string | null;
  options: readonly RoleOption[];
  disabled: boolean;
  onChange: (role: string | null) => void;
}

const NONE: RoleOption = { id: '', name: 'None', description: 'No law is held against this value.' };

/** A searchable list of what a value can stand for. Type to search, arrows to move, Enter to take, Escape to leave. */
export function RoleField({ label, role, options, disabled, onChange }: RoleFieldProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [at, setAt] = useState(0);
  const list = useId();
  const name = options.find((option) => option.id === role)?.name ?? role ?? '';
  const open = typed !== null;
  const offered = open ? [...(typed === '' ? [NONE] : []), ...matchingRoles(options, typed)] : [];
  const active = offered[Math.min(at, offered.length - 1)];

  const search = (text: string): void => {
    setTyped(text);
    setAt(0);
  };
  const take = (option: RoleOption): void => {
    setTyped(null);
    const chosen = option.id === '' ? null : option.id;
    if (chosen !== role) onChange(chosen);
  };
  const press = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      const step = event.key === 'ArrowDown' ? 1 : -1;
      if (open) setAt(Math.min(offered.length - 1, Math.max(0, at + step)));
      else search('');
    } else if (event.key === 'Enter' && open) {
      event.preventDefault();
      if (active !== undefined) take(active);
    } else if (event.key === 'Escape' && open) {
      event.stopPropagation();
      setTyped(null);
    }
  };
  return (
    <Popover.Root open={open} onOpenChange={(next) => setTyped(next ? '' : null)}>
      <Popover.Anchor asChild>
        <input
          role="combobox"
          aria-label={label}
          aria-expanded={open}
          aria-controls={list}
          aria-autocomplete="list"
          aria-activedescendant={active === undefined ? undefined : `${list}-${active.id}`}
          className="field w-full min-w-36 text-sm"
          value={typed ?? name}
          placeholder={name === '' ? 'none' : name}
          disabled={disabled}
          onChange={(event) => search(event.target.value)}
          onClick={() => (open ? undefined : search(''))}
          onBlur={() => setTyped(null)}
          onKeyDown={press}
        />
      </Popover.Anchor>
      <Popover.Portal>
        <Popover.Content
          align="start"
          sideOffset={4}
          className="popup"
          onOpenAutoFocus={(event) => event.preventDefault()}
          onCloseAutoFocus={(event) => event.preventDefault()}
        >
          <ul id={list} role="listbox" aria-label={label} className="max-h-72 w-80 overflow-y-auto">
            {offered.map((option) => (
              <li
                key={option.id}
                id={`${list}-${option.id}`}
                role="option"
                aria-selected={option === active}
                className="popup-option"
                ref={(node) => {
                  if (option === active) node?.scrollIntoView?.({ block: 'nearest' });
                }}
                onPointerDown={(event) => {
                  event.preventDefault();
                  take(option);
                }}
              >
                {option.name}
                <span className="block text-xs text-muted">{option.description}</span>
              </li>
            ))}
            {offered.length === 0 && (
              <li role="option" aria-selected={false} aria-disabled className="popup-option">
                No role has these words.
              </li>
            )}
          </ul>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
