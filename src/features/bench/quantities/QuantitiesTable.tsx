import type { Distribution, ItemContent, Quantity } from '#shared/engine/index.ts';
import type { QuantityRow } from '#shared/contracts/checking.ts';
import { quantityOf } from '../draft/edit-content.ts';
import { NumberInput } from '../inputs/NumberInput.tsx';
import { DistributionStrip, printedNumber } from './DistributionStrip.tsx';
import { RoleField } from './RoleField.tsx';
import { rolesFor } from './roles-for.ts';

interface QuantitiesTableProps {
  rows: readonly QuantityRow[];
  content: ItemContent;
  distributions: readonly Distribution[];
  readOnly: boolean;
  onChange: (name: string, change: Partial<Quantity>, field: string) => void;
  /** Called with the line on which a name gets its value. */
  onVisitLine: (line: number) => void;
}

const KINDS: Readonly<Record<QuantityRow['kind'], string>> = {
  drawn: 'drawn',
  given: 'given',
  computed: 'computed',
};

/** Every named value of the script: how it prints, what it stands for, its value now and its spread. */
export function QuantitiesTable(props: QuantitiesTableProps) {
  const { rows, content, distributions, readOnly, onChange, onVisitLine } = props;
  if (rows.length === 0) {
    return <p className="text-muted">The values appear here as soon as the script gives one a name.</p>;
  }
  const textField = (
    row: QuantityRow,
    key: 'symbol' | 'unit' | 'set',
    label: string,
    placeholder: string,
  ) => (
    <input
      className={`field w-full font-mono text-sm ${key === 'unit' ? 'min-w-24' : key === 'set' ? 'min-w-10' : 'min-w-16'}`}
      aria-label={`${label} of ${row.name}`}
      value={quantityOf(content, row.name)[key]}
      placeholder={placeholder}
      disabled={readOnly}
      onChange={(event) => onChange(row.name, { [key]: event.target.value }, key)}
    />
  );
  return (
    <div className="table-scroll" tabIndex={0} role="region" aria-label="Quantities of the script">
      <table className="table quantities">
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">Symbol</th>
            <th scope="col">Unit</th>
            <th scope="col">Figures</th>
            <th scope="col">Stands for</th>
            <th scope="col">Set</th>
            <th scope="col">At this draw</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => {
            const distribution = distributions.find((one) => one.name === row.name);
            const quantity = quantityOf(content, row.name);
            return (
              <tr key={row.name} id={`quantity-${row.name}`} tabIndex={-1}>
                <th scope="row">
                  <button
                    type="button"
                    className="link font-mono"
                    title={`${row.dimension}; line ${row.line}`}
                    onClick={() => onVisitLine(row.line)}
                  >
                    {row.name}
                  </button>
                  <span className="block text-xs font-normal text-muted">{KINDS[row.kind]}</span>
                </th>
                <td>{textField(row, 'symbol', 'Symbol', row.name)}</td>
                <td>{textField(row, 'unit', 'Unit', row.unit)}</td>
                <td>
                  <NumberInput
                    label={`Significant figures of ${row.name}`}
                    labelHidden
                    narrow
                    value={quantity.figures}
                    placeholder="auto"
                    least={1}
                    most={12}
                    whole
                    disabled={readOnly}
                    onChange={(figures) => onChange(row.name, { figures }, 'figures')}
                    onEmpty={() => onChange(row.name, { figures: null }, 'figures')}
                  />
                </td>
                <td>
                  <RoleField
                    label={`What ${row.name} stands for`}
                    role={quantity.role}
                    options={rolesFor(row.unit)}
                    disabled={readOnly}
                    onChange={(role) => onChange(row.name, { role }, 'role')}
                  />
                </td>
                <td>{textField(row, 'set', 'Set', '–')}</td>
                <td className="whitespace-nowrap tabular-nums">
                  {row.value === '' ? <span className="text-muted">undefined</span> : row.value}
                  {distribution !== undefined && (
                    <DistributionStrip distribution={distribution} current={printedNumber(row.value)} />
                  )}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}
