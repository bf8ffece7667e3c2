import type { PartScale } from '#shared/engine/index.ts';
import type { Interval } from './geometry.ts';
import { describeBand, kindName, percentText } from './words.ts';

/** The strip as a table for screen readers; it is not seen. */
export function ScaleTable({ scale, name, band }: { scale: PartScale; name: string; band: Interval }) {
  return (
    <div className="sr-only">
      <table>
        <caption>
          {name}: band {describeBand(band)}; rounding routes from {percentText(scale.routeSpread.below, 3)} to{' '}
          {percentText(scale.routeSpread.above, 3)}. Errors are given against the model answer.
        </caption>
        <thead>
          <tr>
            <th scope="col">Working</th>
            <th scope="col">Kind</th>
            <th scope="col">Closest</th>
            <th scope="col">Furthest</th>
            <th scope="col">Band</th>
            <th scope="col">Draw</th>
          </tr>
        </thead>
        <tbody>
          {scale.marks.map((mark, index) => (
            <tr key={index}>
              <th scope="row">{mark.label}</th>
              <td>{kindName(mark)}</td>
              <td>{percentText(mark.relativeError, 3)}</td>
              <td>{percentText(mark.furthest, 3)}</td>
              <td>{mark.insideBand ? 'inside' : 'outside'}</td>
              <td>{mark.draw}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
