import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Quantities, SteelLine } from '#shared/engine/evaluation.ts';
import { formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

const POSITION: Readonly<Record<SteelLine['position'], string>> = {
  tension: 'bottom',
  compression: 'top',
  skin: 'skin',
  stirrups: 'stirrups',
};

interface QuantitiesListProps {
  readonly quantities: Quantities;
  readonly units: UnitSystem;
  readonly digits: number;
}

const lineName = (line: SteelLine): string =>
  line.position === 'stirrups'
    ? `Stirrups ${line.bar}`
    : `${line.count}-${line.bar} ${POSITION[line.position]}`;

/** What a metre or a foot of the beam takes: steel line by line, allowances apart, concrete, formwork, cost. */
export function QuantitiesList({ quantities, units, digits }: QuantitiesListProps) {
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
        ...quantities.steel.map((line) => ({ label: lineName(line), value: mass(line.kgPerM) })),
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
