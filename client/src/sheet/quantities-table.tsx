import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Quantities } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { positionName } from '#shared/print/position-name.ts';

interface QuantitiesTableProps {
  readonly section: Pick<SectionInput, 'flange'>;
  readonly quantities: Quantities;
  readonly units: UnitSystem;
  /** For readers who may not see rates. */
  readonly isMoneyHidden?: boolean;
}

/** Per length of beam: steel by bar and position with laps and waste in the open, concrete, formwork, cost, carbon. */
export function QuantitiesTable({ section, quantities, units, isMoneyHidden = false }: QuantitiesTableProps) {
  const perLength = unitLabel('mass-per-length', units);
  const mass = (kgPerM: number) => formatQuantity(kgPerM, 'mass-per-length', units, { hideUnit: true });
  const { cost } = quantities;
  const money = (value: number | null | undefined) =>
    formatMoney(value, cost?.currency, 'money-per-length', units);
  return (
    <div className="grid gap-5">
      <TableFrame label="Steel per length of beam">
        <thead>
          <tr>
            <th scope="col">Bar</th>
            <th scope="col">Position</th>
            <th scope="col" className="figure">
              Count
            </th>
            <th scope="col" className="figure">
              Bar length, {unitLabel('length-per-length', units)}
            </th>
            <th scope="col" className="figure">
              {perLength}
            </th>
          </tr>
        </thead>
        <tbody>
          {quantities.steel.map((line) => (
            <tr key={`${line.position}-${line.bar}`}>
              <th scope="row" className="font-mono font-normal">
                {line.bar}
              </th>
              <td>{positionName(line.position, section)}</td>
              <td className="figure">{line.position === 'stirrups' ? '' : line.count}</td>
              <td className="figure">
                {formatQuantity(line.lengthPerM, 'length-per-length', units, { hideUnit: true })}
              </td>
              <td className="figure">{mass(line.kgPerM)}</td>
            </tr>
          ))}
          <SumRow label="Laps" value={mass(quantities.lapsKgPerM)} />
          <SumRow label="Waste" value={mass(quantities.wasteKgPerM)} />
        </tbody>
        <tfoot>
          <SumRow label="Steel in all" value={mass(quantities.totalSteelKgPerM)} />
        </tfoot>
      </TableFrame>
      <KeyValue
        items={[
          { label: 'Concrete', value: formatQuantity(quantities.concreteM3PerM, 'volume-per-length', units) },
          {
            label: 'Formwork',
            value: formatQuantity(quantities.formworkM2PerM, 'surface-per-length', units),
          },
          ...(isMoneyHidden
            ? []
            : [
                { label: 'Cost of longitudinal bars', value: money(cost?.steel) },
                { label: 'Cost of stirrups', value: money(cost?.stirrups) },
                { label: 'Cost of concrete', value: money(cost?.concrete) },
                { label: 'Cost of formwork', value: money(cost?.formwork) },
                { label: 'Cost in all', value: money(cost?.total) },
              ]),
          { label: 'Carbon, A1–A3', value: formatQuantity(quantities.co2eKgPerM, 'co2e-per-length', units) },
        ]}
      />
    </div>
  );
}

function SumRow({ label, value }: { readonly label: string; readonly value: string }) {
  return (
    <tr>
      <th scope="row" colSpan={4} className="font-normal">
        {label}
      </th>
      <td className="figure">{value}</td>
    </tr>
  );
}
