import type { Inline } from '#shared/sheet/model.ts';
import { Maths } from './Maths.tsx';

/** A line of text with formulas and values. */
export function Inlines({ inlines }: { inlines: readonly Inline[] }) {
  return inlines.map((inline, index) => {
    switch (inline.kind) {
      case 'text':
        return <span key={index}>{inline.text}</span>;
      case 'value':
        return (
          <span key={index} className="sheet-value">
            {inline.text}
          </span>
        );
      case 'maths':
        return <Maths key={index} latex={inline.latex} />;
      case 'strong':
        return (
          <strong key={index}>
            <Inlines inlines={inline.children} />
          </strong>
        );
      case 'emphasis':
        return (
          <em key={index}>
            <Inlines inlines={inline.children} />
          </em>
        );
      case 'break':
        return <br key={index} />;
    }
  });
}
