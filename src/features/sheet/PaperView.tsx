import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';
import { Maths } from './Maths.tsx';
import { SchemeView } from './SchemeView.tsx';
import { SheetView } from './SheetView.tsx';
import './sheet.css';

/** A whole question paper as it prints: cover, data, questions in order. */
export function PaperView({ paper }: { paper: PaperSheet }) {
  return (
    <div className="paper-view">
      <section className="sheet">
        <p className="text-muted">{paper.organisation}</p>
        <h2 className="mt-8 text-3xl">{paper.title}</h2>
        {paper.subtitle !== '' && <p className="text-muted">{paper.subtitle}</p>}
        <p className="my-6 flex justify-between gap-6">
          <span>Time: {paper.durationMinutes} minutes</span>
          <span>Total: {paper.marks} marks</span>
        </p>
        {paper.instructions.length > 0 && (
          <ul className="list-['–__'] pl-4">
            {paper.instructions.map((instruction) => (
              <li key={instruction}>{instruction}</li>
            ))}
          </ul>
        )}
        <table className="sheet-table mt-8 w-full">
          <caption className="pb-2 text-left font-semibold">Data</caption>
          <thead>
            <tr>
              <th scope="col">Quantity</th>
              <th scope="col">Symbol</th>
              <th scope="col">Value</th>
            </tr>
          </thead>
          <tbody>
            {paper.dataSheet.map((row) => (
              <tr key={row.name}>
                <td>{row.name}</td>
                <td>
                  <Maths latex={row.symbolLatex} />
                </td>
                <td>{row.valueText}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </section>
      {paper.items.map((item) => (
        <SheetView key={item.number} sheet={item.sheet} number={item.number} />
      ))}
    </div>
  );
}

/** The mark scheme of a whole paper. */
export function PaperSchemeView({ paper }: { paper: PaperScheme }) {
  return (
    <div className="paper-view">
      {paper.items.map((item) => (
        <section key={item.number} className="sheet">
          <SchemeView scheme={item.scheme} number={item.number} />
        </section>
      ))}
    </div>
  );
}
