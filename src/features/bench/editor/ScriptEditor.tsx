import { setDiagnostics } from '@codemirror/lint';
import CodeMirror, { EditorView, type ReactCodeMirrorRef } from '@uiw/react-codemirror';
import { useEffect, useImperativeHandle, useMemo, useRef, type Ref } from 'react';

import type { QuantityRow } from '#shared/contracts/checking.ts';
import { editorDiagnostics, scriptExtensions } from './script-extensions.ts';
import type { Underline } from './script-lint.ts';

/** What other parts of the bench can ask of the editor. */
export interface ScriptEditorHandle {
  /** Selects a stretch of the script, brings it into view and takes the keyboard there. */
  select: (start: number, end: number) => void;
}

interface ScriptEditorProps {
  value: string;
  onChange: (script: string) => void;
  readOnly: boolean;
  underlines: readonly Underline[];
  rows: readonly QuantityRow[];
  handle: Ref<ScriptEditorHandle>;
}

/**
 * The variable script in an editor: mistakes underlined with their cure, completion of names, constants,
 * functions and units, and what a name means under the pointer. Escape and then Tab leaves it.
 */
export function ScriptEditor(props: ScriptEditorProps) {
  const { value, onChange, readOnly, underlines, rows, handle } = props;
  const editor = useRef<ReactCodeMirrorRef>(null);
  const latestRows = useRef(rows);
  useEffect(() => {
    latestRows.current = rows;
  }, [rows]);
  const extensions = useMemo(() => scriptExtensions(() => latestRows.current, 'Variable script'), []);

  useEffect(() => {
    const view = editor.current?.view;
    if (view === undefined) return;
    const length = view.state.doc.length;
    const fitting = underlines.filter((underline) => underline.to <= length);
    view.dispatch(setDiagnostics(view.state, editorDiagnostics(fitting)));
  }, [underlines]);

  useImperativeHandle(handle, () => ({
    select: (start, end) => {
      const view = editor.current?.view;
      if (view === undefined) return;
      const length = view.state.doc.length;
      const anchor = Math.min(start, length);
      view.dispatch({
        selection: { anchor, head: Math.min(end, length) },
        effects: EditorView.scrollIntoView(anchor, { y: 'center' }),
      });
      view.focus();
    },
  }));

  return (
    <CodeMirror
      ref={editor}
      value={value}
      onChange={onChange}
      readOnly={readOnly}
      theme="none"
      indentWithTab={false}
      basicSetup={{
        foldGutter: false,
        highlightActiveLine: !readOnly,
        autocompletion: false,
        searchKeymap: false,
        lintKeymap: true,
        syntaxHighlighting: false,
      }}
      extensions={extensions}
      className="script-editor"
    />
  );
}
