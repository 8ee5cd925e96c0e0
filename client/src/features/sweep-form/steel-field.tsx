import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { ListField } from '#client/src/ui/list-field.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { BarRack } from '#client/src/section-fields/bar-rack.tsx';
import { errorUnder, type FieldErrors } from '#client/src/lib/field-errors.ts';
import type { FitPreview } from './fit-preview.ts';
import { FitTable } from './fit-table.tsx';
import type { SteelFace, SteelValues } from './sweep-form-values.ts';

const FACE_LABEL: Readonly<Record<SteelFace, string>> = {
  tension: 'tension face',
  compression: 'compression face',
};
const PLACE_NAME = { bottom: 'Bottom bars', top: 'Top bars' } as const;

const WAYS = [
  { value: 'bars', label: 'Bars' },
  { value: 'areas', label: 'Areas' },
] as const;

const PLACES = [
  { value: 'offset', label: 'From the face' },
  { value: 'share', label: 'Share of h' },
] as const;

interface SteelFieldProps {
  readonly face: SteelFace;
  /** Tension at the top. */
  readonly hogs: boolean;
  readonly units: UnitSystem;
  readonly standard: BarStandard;
  readonly values: SteelValues;
  readonly errors: FieldErrors;
  readonly setCount: number | null;
  /** What stands at the ends of the widths; null while that cannot be said. */
  readonly fit: FitPreview | null;
  readonly onChange: (values: SteelValues) => void;
}

function PlainAreas({
  face,
  units,
  values,
  errors,
  onChange,
}: Omit<SteelFieldProps, 'setCount' | 'standard' | 'hogs' | 'fit'>) {
  const areasError = errorUnder(errors, `space.${face}.areasMm2`);
  const placeError = errorUnder(errors, `space.${face}.at`);
  return (
    <div className="grid gap-4">
      <ListField
        label={<span className="text-xs font-normal text-muted">areas, parted by commas</span>}
        hint="Steel as printed, without bars: nothing is said about fit."
        unitText={unitLabel('area', units)}
        value={values.areasText}
        error={areasError === undefined ? undefined : quantitiesInText(areasError, units)}
        onChange={(areasText) => onChange({ ...values, areasText })}
      />
      <div className="flex flex-wrap items-start gap-4">
        <SegmentedControl
          className="pt-5"
          legend="Where the layer lies"
          options={PLACES}
          value={values.placedBy}
          onChange={(placedBy) => onChange({ ...values, placedBy })}
        />
        {values.placedBy === 'offset' ? (
          <NumberField
            className="w-36"
            label={<span className="text-xs font-normal text-muted">distance</span>}
            kind="length"
            units={units}
            value={values.offsetMm}
            error={placeError}
            onChange={(offsetMm) => onChange({ ...values, offsetMm })}
          />
        ) : (
          <NumberField
            className="w-36"
            label={<span className="text-xs font-normal text-muted">share of h</span>}
            kind="percent"
            units={units}
            value={values.shareOfDepth}
            error={placeError}
            onChange={(shareOfDepth) => onChange({ ...values, shareOfDepth })}
          />
        )}
      </div>
    </div>
  );
}

/** The choices of steel on one face: sizes times counts, or plain areas of a published problem. */
export function SteelField(props: SteelFieldProps) {
  const { face, hogs, standard, units, values, errors, setCount, fit, onChange } = props;
  const place = (face === 'tension') === hogs ? 'top' : 'bottom';
  const name = PLACE_NAME[place];
  const ownError = errors.get(`space.${face}`);
  return (
    <fieldset className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-x-5 gap-y-2 border-t border-rule py-3 sm:grid-cols-[9.5rem_7.5rem_minmax(0,1fr)_5.5rem] sm:items-start">
      <legend className="sr-only">{name}</legend>
      <div className="sm:pt-1" aria-hidden="true">
        <span className="font-medium">{name}</span>
        <span className="block text-xs text-muted">{FACE_LABEL[face]}</span>
      </div>
      <SegmentedControl
        className="sm:col-span-1"
        legend={`${name}: bars or plain areas`}
        options={WAYS}
        value={values.kind}
        onChange={(kind) => onChange({ ...values, kind })}
      />
      {values.kind === 'bars' ? (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
          <BarRack
            legend={`${name}: sizes`}
            isLegendHidden
            standard={standard}
            chosen={values.sizes}
            error={errorUnder(errors, `space.${face}.sizes`)}
            onChange={(sizes) => onChange({ ...values, sizes })}
          />
          <div className="flex flex-wrap items-start gap-x-6 gap-y-3">
            <ListField
              className="w-48"
              label={
                <span className="text-xs font-normal text-muted">number of bars, as 2–8 or 2, 4, 6</span>
              }
              value={values.countsText}
              error={errorUnder(errors, `space.${face}.counts`)}
              onChange={(countsText) => onChange({ ...values, countsText })}
            />
            <ListField
              className="w-64 max-w-full"
              label={
                <span className="text-xs font-normal text-muted">two sizes together, as 2-#8 + 2-#6</span>
              }
              value={values.mixedText}
              error={errorUnder(errors, `space.${face}.mixed`)}
              onChange={(mixedText) => onChange({ ...values, mixedText })}
            />
            {face === 'compression' && (
              <CheckboxField
                className="sm:pt-5"
                label="also none"
                checked={values.none}
                onChange={(event) => onChange({ ...values, none: event.target.checked })}
              />
            )}
          </div>
          {fit !== null && <FitTable preview={fit} name={name} isAtTop={place === 'top'} units={units} />}
        </div>
      ) : (
        <PlainAreas {...props} />
      )}
      {ownError !== undefined && (
        <p className="text-xs text-fails sm:col-span-2 sm:col-start-3 sm:row-start-2">▲ {ownError}</p>
      )}
      <p className="num text-right text-muted sm:pt-1" aria-live="polite">
        {setCount === null ? '' : `${setCount} ${setCount === 1 ? 'set' : 'sets'}`}
      </p>
    </fieldset>
  );
}
