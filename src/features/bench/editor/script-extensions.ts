import { autocompletion, type CompletionContext, type CompletionResult } from '@codemirror/autocomplete';
import { javascriptLanguage } from '@codemirror/lang-javascript';
import { HighlightStyle, syntaxHighlighting } from '@codemirror/language';
import type { Diagnostic } from '@codemirror/lint';
import type { Extension } from '@codemirror/state';
import { EditorView, hoverTooltip } from '@codemirror/view';
import { tags } from '@lezer/highlight';

import type { QuantityRow } from '#shared/contracts/checking.ts';
import { explain, proposals } from './completions.ts';
import type { Underline } from './script-lint.ts';

const TYPES = {
  variable: 'variable',
  constant: 'constant',
  function: 'function',
  keyword: 'keyword',
  unit: 'type',
} as const;

/** The script in the theme's own inks: remarks quiet, numbers and functions set off a little. */
const INK = HighlightStyle.define([
  { tag: tags.comment, color: 'var(--color-muted)', fontStyle: 'italic' },
  { tag: tags.number, color: 'var(--color-accent)' },
  { tag: [tags.function(tags.variableName), tags.keyword], fontWeight: '600' },
]);

/** Letters of a name or unit, with micro in both code points. */
const WORD = /[A-Za-zµμΩÅ°_][A-Za-z0-9_]*/;

function complete(rows: () => readonly QuantityRow[]) {
  return (context: CompletionContext): CompletionResult | null => {
    const word = context.matchBefore(/[A-Za-zµμΩÅ°_][A-Za-z0-9_]*$/);
    if (word === null && !context.explicit) return null;
    const from = word?.from ?? context.pos;
    const line = context.state.doc.lineAt(context.pos);
    const before = line.text.slice(0, from - line.from);
    if (before.includes('//')) return null;
    return {
      from,
      options: proposals(before, rows()).map((proposal) => ({
        label: proposal.label,
        detail: proposal.detail,
        info: proposal.info,
        type: TYPES[proposal.kind],
        apply: proposal.apply,
        boost: proposal.kind === 'variable' ? 2 : proposal.kind === 'constant' ? 1 : 0,
      })),
      validFor: /^[A-Za-zµμΩÅ°_0-9]*$/,
    };
  };
}

function hover(rows: () => readonly QuantityRow[]): Extension {
  return hoverTooltip((view, position) => {
    const line = view.state.doc.lineAt(position);
    for (const found of line.text.matchAll(new RegExp(WORD, 'g'))) {
      const from = line.from + found.index;
      const to = from + found[0].length;
      if (position < from || position > to) continue;
      const told = explain(found[0], rows());
      if (told === null) return null;
      return {
        pos: from,
        end: to,
        above: true,
        create: () => {
          const dom = document.createElement('div');
          dom.className = 'script-hover';
          for (const text of [told.title, ...told.lines]) {
            const row = dom.appendChild(document.createElement('div'));
            row.textContent = text;
          }
          return { dom };
        },
      };
    }
    return null;
  });
}

/**
 * What the script editor can do beside plain editing. `rows` is read whenever it is needed, so that
 * completion and hover know the latest values.
 */
export function scriptExtensions(rows: () => readonly QuantityRow[], label: string): Extension[] {
  return [
    javascriptLanguage,
    syntaxHighlighting(INK),
    autocompletion({ override: [complete(rows)], icons: false }),
    hover(rows),
    EditorView.lineWrapping,
    EditorView.contentAttributes.of({ 'aria-label': label, spellcheck: 'false' }),
  ];
}

/** A sentence whose names between backticks are set in the script's face. */
function sentenceNode(text: string): HTMLElement {
  const node = document.createElement('span');
  text.split('`').forEach((piece, index) => {
    node.append(
      index % 2 === 1 ? Object.assign(document.createElement('code'), { textContent: piece }) : piece,
    );
  });
  return node;
}

/** Underlines in the editor's own form; a cure becomes a button beside the message. */
export function editorDiagnostics(underlines: readonly Underline[]): Diagnostic[] {
  return underlines.map(({ from, to, severity, message, fix }) => ({
    from,
    to,
    severity,
    message,
    renderMessage: () => sentenceNode(message),
    ...(fix === null
      ? {}
      : {
          actions: [
            {
              name: fix.label,
              apply: (view: EditorView) =>
                view.dispatch({ changes: { from: fix.from, to: fix.to, insert: fix.replacement } }),
            },
          ],
        }),
  }));
}
