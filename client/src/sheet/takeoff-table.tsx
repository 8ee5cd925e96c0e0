import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Takeoff } from '#shared/contract/records.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { positionName } from '#shared/print/position-name.ts';

interface TakeoffTableProps {
  readonly section: Pick<SectionInput, 'flange'>;
  readonly takeoff: Takeoff;
  readonly units: UnitSystem;
  readonly hasMoney: boolean;
}

/** Everything for span × count: steel by bar and position, then concrete, formwork, and money where rates are known. */
export function TakeoffTable({ section, takeoff, units, hasMoney }: TakeoffTableProps) {
  const mass = (tonnes: number) => formatQuantity(tonnes, 'tonnes', units, { hideUnit: true });
  const ton = unitLabel('tonnes', units);
  const rows: readonly (readonly [string, string, string])[] = [
    [
      'Concrete',
      formatQuantity(takeoff.concreteM3, 'volume', units, { hideUnit: true }),
      unitLabel('volume', units),
    ],
    [
      'Formwork',
      formatQuantity(takeoff.formworkM2, 'surface', units, { hideUnit: true }),
      unitLabel('surface', units),
    ],
    ...(hasMoney
      ? ([['Cost', formatMoney(takeoff.cost, null, 'money', units), takeoff.currency ?? '']] as const)
      : []),
    [
      'Carbon, A1–A3',
      formatQuantity(takeoff.co2eKg, 'co2e', units, { hideUnit: true }),
      unitLabel('co2e', units),
    ],
  ];
  return (
    <TableFrame label="Takeoff">
      <caption className="pb-1 text-left text-xs text-muted">
        {formatQuantity(takeoff.spanMm, 'span', units)} × {takeoff.count}
        {takeoff.count === 1 ? ' beam' : ' beams'}, section constant along the span
      </caption>
      <thead>
        <tr>
          <th scope="col">Item</th>
          <th scope="col" className="figure">
            Quantity
          </th>
          <th scope="col">Unit</th>
        </tr>
      </thead>
      <tbody>
        {takeoff.lines.map((line) => (
          <tr key={`${line.position}-${line.bar}`}>
            <th scope="row" className="font-normal">
              <span className="num">{line.bar}</span> {positionName(line.position, section)}
            </th>
            <td className="figure">{mass(line.tonnes)}</td>
            <td>{ton}</td>
          </tr>
        ))}
        <tr>
          <th scope="row" className="font-normal">
            Laps
          </th>
          <td className="figure">{mass(takeoff.lapsTonnes)}</td>
          <td>{ton}</td>
        </tr>
        <tr>
          <th scope="row" className="font-normal">
            Waste
          </th>
          <td className="figure">{mass(takeoff.wasteTonnes)}</td>
          <td>{ton}</td>
        </tr>
        <tr className="font-semibold">
          <th scope="row">Steel in all</th>
          <td className="figure">{mass(takeoff.totalTonnes)}</td>
          <td>{ton}</td>
        </tr>
        {rows.map(([item, quantity, unit]) => (
          <tr key={item}>
            <th scope="row" className="font-normal">
              {item}
            </th>
            <td className="figure">{quantity}</td>
            <td>{quantity === '' ? '' : unit}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
