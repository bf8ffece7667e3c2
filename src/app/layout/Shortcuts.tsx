import { useEffect } from 'react';
import { useNavigate } from 'react-router';

import type { Action } from '#shared/domain/permissions.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { SECTIONS } from './sections.ts';

const EVERYWHERE: readonly [keys: string, what: string][] = [
  ['?', 'Show this list'],
  ['Ctrl or Cmd + Enter', 'Submit the form that holds the cursor'],
  ['/', 'Go to the search of a list'],
  ['Alt + arrow up, Alt + arrow down', 'Move an item within the running order of a paper'],
  ['Arrow up, arrow down', 'Go from row to row of a table, or from mark to mark of a scale'],
  ['Escape', 'Close a dialog'],
];

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))
  );
}

interface ShortcutsProps {
  abilities: readonly Action[];
  /** Whether the list of keys is on show. */
  shown: boolean;
  onShow: (shown: boolean) => void;
}

/** Keys that work on every screen, and their list behind `?`. */
export function Shortcuts({ abilities, shown, onShow }: ShortcutsProps) {
  const navigate = useNavigate();
  const sections = SECTIONS.filter((section) => abilities.includes(section.ability));
  useEffect(() => {
    let armed = false;
    const onKey = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key === 'Enter') {
        const form = event.target instanceof Element ? event.target.closest('form') : null;
        if (form !== null) form.requestSubmit();
        return;
      }
      if (event.key === '/' && !isTyping(event.target)) {
        const search = document.querySelector<HTMLInputElement>('main input[type="search"]');
        if (search !== null) {
          event.preventDefault();
          search.focus();
        }
      }
      if (isTyping(event.target) || event.ctrlKey || event.metaKey || event.altKey) return;
      if (event.key === '?') onShow(true);
      const section = armed ? sections.find(({ shortcut }) => shortcut === event.key) : undefined;
      if (section !== undefined) void navigate(section.path);
      armed = event.key === 'g';
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [navigate, sections, onShow]);
  return (
    <Dialog title="Keys" open={shown} onClose={() => onShow(false)}>
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-2">
        {[
          ...EVERYWHERE,
          ...sections.map(({ shortcut, name }): [string, string] => [`g, then ${shortcut}`, `Go to ${name}`]),
        ].map(([keys, what]) => (
          <div key={keys} className="contents">
            <dt className="font-mono text-sm">{keys}</dt>
            <dd>{what}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}
