import katex from 'katex';
import 'katex/dist/katex.min.css';
import { useMemo } from 'react';

interface MathsProps {
  latex: string;
  display?: boolean;
}

/** A formula. What KaTeX cannot set is shown as it was written, in the colour of mistakes. */
export function Maths({ latex, display = false }: MathsProps) {
  const html = useMemo(
    () => katex.renderToString(latex, { displayMode: display, throwOnError: false, output: 'htmlAndMathml' }),
    [latex, display],
  );
  // KaTeX builds this markup from a formula alone and trusts no HTML in it (its option `trust` is off).
  return <span dangerouslySetInnerHTML={{ __html: html }} />;
}
