import { DropdownMenu } from 'radix-ui';
import { NavLink } from 'react-router';

import type { SignedInPerson } from '#shared/contracts/session.ts';
import { SECTIONS } from './sections.ts';
import { LAMPS, useLamp } from './use-lamp.ts';

interface TopLineProps {
  person: SignedInPerson;
  onKeys: () => void;
  onLeave: () => void;
}

function PersonMenu({ person, onKeys, onLeave }: TopLineProps) {
  const [lamp, setLamp] = useLamp();
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger className="ml-auto cursor-pointer text-muted underline decoration-rule decoration-1 underline-offset-4 hover:text-ink">
        {person.name}
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align="end" sideOffset={8} className="menu">
          <DropdownMenu.Label className="menu-label">
            {person.roles.join(', ') || 'no role yet'}
            <span className="block">{person.email}</span>
          </DropdownMenu.Label>
          <DropdownMenu.Separator className="menu-rule" />
          <DropdownMenu.Label className="menu-label">Lamp</DropdownMenu.Label>
          <DropdownMenu.RadioGroup value={lamp} onValueChange={setLamp}>
            {LAMPS.map(({ lamp: value, name }) => (
              <DropdownMenu.RadioItem
                key={value}
                value={value}
                className="menu-choice"
                onSelect={(event) => event.preventDefault()}
              >
                <span className="menu-tick" aria-hidden="true">
                  <DropdownMenu.ItemIndicator>✓</DropdownMenu.ItemIndicator>
                </span>
                {name}
              </DropdownMenu.RadioItem>
            ))}
          </DropdownMenu.RadioGroup>
          <DropdownMenu.Separator className="menu-rule" />
          <DropdownMenu.Item className="menu-choice" onSelect={onKeys}>
            Keys <kbd className="ml-auto">?</kbd>
          </DropdownMenu.Item>
          <DropdownMenu.Item className="menu-choice" onSelect={onLeave}>
            Sign out
          </DropdownMenu.Item>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

/** Wordmark, sections as words, and the person; graduations stand under the section in use. */
export function TopLine(props: TopLineProps) {
  return (
    <header className="border-b border-ink">
      <div className="mx-auto flex w-full max-w-[100rem] flex-wrap items-baseline gap-x-10 px-4 pt-3 sm:px-8">
        <NavLink to="/desk" className="wordmark text-xl">
          Graticule
        </NavLink>
        <nav
          aria-label="Sections"
          className="order-last flex basis-full flex-wrap gap-x-7 sm:order-none sm:basis-auto"
        >
          {SECTIONS.filter(({ ability }) => props.person.abilities.includes(ability)).map(
            ({ path, name }) => (
              <NavLink
                key={path}
                to={path}
                className={({ isActive }) => `section-link ${isActive ? 'section-here' : ''}`}
              >
                {name}
              </NavLink>
            ),
          )}
        </nav>
        <PersonMenu {...props} />
      </div>
    </header>
  );
}
