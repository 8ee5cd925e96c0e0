import { useFieldArray, type Control } from 'react-hook-form';
import type { PriceBook, UnitSystem } from '#shared/contract/design-basis.ts';
import { unitLabel } from '#shared/print/units.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';

interface MixTableProps {
  readonly control: Control<PriceBook>;
  readonly units: UnitSystem;
  readonly fcSymbol: string;
  readonly currency: string;
  readonly isReadOnly: boolean;
}

/** One line per concrete mix; a section finds its rate by its f′c. */
export function MixTable({ control, units, fcSymbol, currency, isReadOnly }: MixTableProps) {
  const mixes = useFieldArray({ control, name: 'concrete' });
  const perVolume = `${currency}${unitLabel('money-per-volume', units)}`;
  return (
    <div className="grid gap-3 sm:col-span-2 xl:col-span-3">
      {mixes.fields.length === 0 && (
        <p className="text-muted">
          No mixes yet. Sections are not priced until their {fcSymbol} has a line here.
        </p>
      )}
      {mixes.fields.map((mix, i) => (
        <div
          key={mix.id}
          role="group"
          aria-label={`Mix ${i + 1}`}
          className="grid items-start gap-x-6 gap-y-2 border-b border-rule pb-3 sm:grid-cols-[1fr_1fr_1fr_auto]"
        >
          <FormNumberField
            control={control}
            name={`concrete.${i}.fcMPa`}
            kind="stress"
            units={units}
            label={fcSymbol}
          />
          <FormNumberField
            control={control}
            name={`concrete.${i}.costPerM3`}
            kind="money-per-volume"
            units={units}
            unitText={perVolume}
            label="Concrete, placed"
          />
          <FormNumberField
            control={control}
            name={`concrete.${i}.co2eKgPerM3`}
            kind="co2e-per-volume"
            units={units}
            label="Carbon factor"
          />
          {!isReadOnly && (
            <Button
              look="text"
              className="sm:mt-6"
              onClick={() => mixes.remove(i)}
              aria-label={`Remove mix ${i + 1}`}
            >
              Remove
            </Button>
          )}
        </div>
      ))}
      {!isReadOnly && (
        <div>
          <Button
            onClick={() =>
              // An empty strength is refused beside its field until it is typed.
              mixes.append({ fcMPa: null as unknown as number, costPerM3: null, co2eKgPerM3: null })
            }
          >
            Add a mix
          </Button>
        </div>
      )}
    </div>
  );
}
