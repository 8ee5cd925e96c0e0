import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Quantities, SteelLine } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { positionName } from '#shared/print/position-name.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

interface QuantitiesListProps {
  readonly section: Pick<SectionInput, 'flange'>;
  readonly quantities: Quantities;
  readonly units: UnitSystem;
  readonly digits: number;
}

function lineName({ bar, count, position }: SteelLine, section: Pick<SectionInput, 'flange'>): string {
  if (position === 'stirrups') return `Stirrups ${bar}`;
  return `${count}-${bar} ${positionName(position, section)}`;
}

/** What a metre or a foot of the beam takes: steel line by line, allowances apart, concrete, formwork, cost. */
export function QuantitiesList({ section, quantities, units, digits }: QuantitiesListProps) {
  const mass = (kgPerM: number) => formatQuantity(kgPerM, 'mass-per-length', units, { digits });
  const { cost, co2eKgPerM } = quantities;
  const costItems =
    cost === null
      ? [{ label: 'Cost', value: 'no rates' }]
      : (
          [
            ['Steel bars, cost', cost.steel],
            ['Stirrups, cost', cost.stirrups],
            ['Concrete, cost', cost.concrete],
            ['Formwork, cost', cost.formwork],
            ['Cost', cost.total],
          ] as const
        ).map(([label, value]) => ({
          label: label === 'Cost' ? <strong className="font-semibold text-ink">{label}</strong> : label,
          value:
            value === null ? 'rate missing' : formatMoney(value, cost.currency, 'money-per-length', units),
        }));
  return (
    <KeyValue
      items={[
        ...quantities.steel.map((line) => ({ label: lineName(line, section), value: mass(line.kgPerM) })),
        {
          label: <strong className="font-semibold text-ink">Steel, net</strong>,
          value: mass(quantities.netSteelKgPerM),
        },
        { label: 'Laps', value: mass(quantities.lapsKgPerM) },
        { label: 'Waste', value: mass(quantities.wasteKgPerM) },
        { label: 'Steel to buy', value: mass(quantities.totalSteelKgPerM) },
        {
          label: 'Concrete',
          value: formatQuantity(quantities.concreteM3PerM, 'volume-per-length', units, { digits }),
        },
        {
          label: 'Formwork',
          value: formatQuantity(quantities.formworkM2PerM, 'surface-per-length', units, { digits }),
        },
        ...costItems,
        {
          label: 'Carbon',
          value:
            co2eKgPerM === null
              ? 'factor missing'
              : formatQuantity(co2eKgPerM, 'co2e-per-length', units, { digits }),
        },
      ]}
    />
  );
}
