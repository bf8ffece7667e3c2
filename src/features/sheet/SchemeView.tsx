import type { ItemScheme, SchemePart } from '#shared/sheet/model.ts';
import { Inlines } from './Inlines.tsx';
import './sheet.css';

function Part({ part }: { part: SchemePart }) {
  return (
    <tr>
      <td>({part.letter})</td>
      <td>
        <ul className="scheme-lines">
          {part.lines.map((line, index) => (
            <li key={index}>
              <span>
                <Inlines inlines={line.children} />
              </span>
              <span className="scheme-mark">{line.marks}</span>
            </li>
          ))}
        </ul>
        {part.answer !== null && (
          <p>
            <b>Answer</b> {part.answer.text}
            {part.figures !== null && <span className="text-muted">, {part.figures}</span>}
          </p>
        )}
        {part.accepted !== null && (
          <p>
            <b>Accept</b> {part.accepted}
          </p>
        )}
        {part.guidance.map((slip) => (
          <p key={slip.name} className="scheme-guidance">
            <b>Guidance</b> {slip.name}
            {slip.value !== '' && ` (${slip.value})`}: {slip.marks} {slip.marks === 1 ? 'mark' : 'marks'}.{' '}
            <Inlines inlines={slip.children} />
          </p>
        ))}
      </td>
      <td className="scheme-total">[{part.marks}]</td>
    </tr>
  );
}

/** The mark scheme of one item. */
export function SchemeView({ scheme, number }: { scheme: ItemScheme; number?: number }) {
  return (
    <table className="scheme">
      <caption className={number === undefined ? 'sr-only' : ''}>
        {number === undefined ? `Mark scheme of ${scheme.title}` : `Question ${number}: ${scheme.title}`}
      </caption>
      <thead>
        <tr>
          <th scope="col">Part</th>
          <th scope="col">What earns the marks</th>
          <th scope="col">Marks</th>
        </tr>
      </thead>
      <tbody>
        {scheme.parts.map((part) => (
          <Part key={part.id} part={part} />
        ))}
      </tbody>
    </table>
  );
}
