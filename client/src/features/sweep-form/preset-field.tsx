import { useState } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { Button } from '#client/src/ui/button.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { departuresFrom, presetName, withPreset, type OfficePreset } from './office-preset.ts';
import type { SweepFormValues } from './sweep-form-values.ts';

interface PresetFieldProps {
  readonly presets: readonly OfficePreset[];
  readonly units: UnitSystem;
  readonly form: SweepFormValues;
  readonly onChange: (form: SweepFormValues) => void;
}

/** Fills the ranges from a standard of the office, says so, and says where the form has left it since. */
export function PresetField({ presets, units, form, onChange }: PresetFieldProps) {
  const filled = presets.find((preset) => presetName(preset) === form.filledFrom);
  const [chosenId, setChosen] = useState(filled?.id ?? presets[0]?.id ?? '');
  const [before, setBefore] = useState<SweepFormValues | null>(null);
  const chosen = presets.find(({ id }) => id === chosenId) ?? presets[0];
  if (chosen === undefined)
    return (
      <p className="pb-3 text-xs text-muted">
        The office has no standard for these bars in these units, so a new sweep begins with ranges of common
        practice, no source. An admin sets standards under Office standards.
      </p>
    );
  const departures = departuresFrom(form, (filled ?? chosen).standard, units);
  return (
    <div className="grid gap-2 pb-4">
      <div className="flex flex-wrap items-end gap-x-4 gap-y-2">
        <SelectField
          className="w-80 max-w-full"
          label={<span className="text-xs font-normal text-muted">office standard</span>}
          options={presets.map((preset) => ({ value: preset.id, label: presetName(preset) }))}
          value={chosen.id}
          onChange={(event) => setChosen(event.target.value)}
        />
        <Button
          onClick={() => {
            setBefore(form);
            onChange(withPreset(form, chosen, units));
          }}
        >
          Fill from it
        </Button>
        {before !== null && (
          <Button
            look="text"
            onClick={() => {
              onChange({ ...before, name: form.name });
              setBefore(null);
            }}
          >
            Take that back
          </Button>
        )}
      </div>
      <p className="text-xs text-muted" role="status">
        {filled !== undefined
          ? `Widths, depths, mixes, bars, stirrups and rules were filled from “${presetName(filled)}”; each may be changed.`
          : 'Filling replaces widths, depths, mixes, bars, stirrups and rules; demand, cover, fy and slab stay.'}
      </p>
      {departures.length > 0 && (
        <ul className="grid gap-0.5 border-l-2 border-near-mark py-0.5 pl-3 text-xs text-near">
          {departures.map((words) => (
            <li key={words}>△ {words}.</li>
          ))}
        </ul>
      )}
    </div>
  );
}
