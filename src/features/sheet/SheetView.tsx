import type { ReactNode } from 'react';

import type { ItemSheet, SheetPart } from '#shared/sheet/model.ts';
import { Blocks } from './Blocks.tsx';
import './sheet.css';

interface SheetViewProps {
  sheet: ItemSheet;
  /** Question number, when the item stands on a paper. */
  number?: number;
  /** Whatever stands under the stem, as the bench puts its editor there. */
  afterStem?: ReactNode;
  /** Whatever stands under a part, as its scale strip. */
  afterPart?: (partId: string) => ReactNode;
}

function Part({ part, after }: { part: SheetPart; after: ReactNode }) {
  return (
    <section className="sheet-part" id={`sheet-${part.id}`} aria-label={`Part ${part.letter}`}>
      <span className="sheet-letter">({part.letter})</span>
      <div className="sheet-text">
        <Blocks blocks={part.blocks} />
        {part.kind === 'written' && part.lines > 0 && (
          <div className="sheet-lines" style={{ height: `${part.lines * 1.9}rem` }} aria-hidden="true" />
        )}
        {part.answerUnit !== null && (
          <p className="sheet-answer">
            Answer <span className="sheet-answer-line" aria-hidden="true" /> {part.answerUnit}
          </p>
        )}
        {after}
      </div>
      <span className="sheet-marks" aria-label={`${part.marks} ${part.marks === 1 ? 'mark' : 'marks'}`}>
        [{part.marks}]
      </span>
    </section>
  );
}

/** An item as a sheet of paper that could be printed. */
export function SheetView({ sheet, number, afterStem, afterPart }: SheetViewProps) {
  return (
    <article className="sheet" aria-label={number === undefined ? sheet.title : `Question ${number}`}>
      {number !== undefined && (
        <header className="sheet-head">
          <h3>Question {number}</h3>
          <span>{sheet.marks} marks</span>
        </header>
      )}
      {sheet.cautions.length > 0 && (
        <aside className="sheet-cautions" aria-label="Cautions">
          {sheet.cautions.map((caution) => (
            <p key={caution}>{caution}</p>
          ))}
        </aside>
      )}
      <div className="sheet-stem">
        <Blocks blocks={sheet.blocks} />
        {afterStem}
      </div>
      {sheet.parts.map((part) => (
        <Part key={part.id} part={part} after={afterPart?.(part.id)} />
      ))}
    </article>
  );
}
