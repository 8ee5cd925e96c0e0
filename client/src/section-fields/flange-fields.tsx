import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import type { DesignBasis, Demand } from '#shared/engine/section.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import type { FieldErrors } from '#client/src/lib/field-errors.ts';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { effectiveWidthsMm, type FlangeValues } from './flange-values.ts';

const SHAPES = [
  { value: 'none', label: 'Rectangle' },
  { value: 't', label: 'T' },
  { value: 'l', label: 'L' },
] as const;
const SENSES = [
  { value: 'compression', label: 'Sagging' },
  { value: 'tension', label: 'Hogging' },
] as const;
const WIDTHS = [
  { value: 'effective', label: 'Effective' },
  { value: 'given', label: 'As given' },
] as const;

interface FlangeFieldsProps {
  readonly units: UnitSystem;
  readonly values: FlangeValues;
  readonly demand: Pick<Demand, 'spanMm' | 'support'>;
  readonly basis: Pick<DesignBasis, 'ruleSet'>;
  /** Narrowest and widest web it goes with; empty while they cannot be read. */
  readonly websMm: readonly number[];
  readonly errors: FieldErrors;
  /** Path of the slab in the contract, `section.flange`. */
  readonly path: string;
  readonly onChange: (values: FlangeValues) => void;
}

/** The slab that works with the beam: on both sides or on one, in compression or in tension, and how wide it counts. */
export function FlangeFields(props: FlangeFieldsProps) {
  const { units, values, errors, path, demand, onChange } = props;
  const change = (part: Partial<FlangeValues>) => onChange({ ...values, ...part });
  const length = (
    key: 'thicknessMm' | 'widthMm' | 'clearToNextWebMm',
    label: string,
    hint: string,
    at: string,
  ) => (
    <NumberField
      label={label}
      hint={hint}
      kind="length"
      units={units}
      value={values[key]}
      error={errors.get(`${path}.${at}`)}
      onChange={(stored) => change({ [key]: stored })}
    />
  );
  return (
    <div className="grid gap-4">
      <div className="flex flex-wrap gap-x-6 gap-y-3">
        <SegmentedControl
          legend="Shape of the section"
          options={SHAPES}
          value={values.shape}
          onChange={(shape) => change({ shape })}
        />
        {values.shape !== 'none' && (
          <SegmentedControl
            legend="Sense of the moment"
            options={SENSES}
            value={values.face}
            onChange={(face) => change({ face })}
          />
        )}
        {values.shape !== 'none' && (
          <SegmentedControl
            legend="Width of the slab that counts"
            options={WIDTHS}
            value={values.widthKind}
            onChange={(widthKind) => change({ widthKind })}
          />
        )}
      </div>
      {values.shape !== 'none' && (
        <>
          <div className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
            {length('thicknessMm', 'Thickness hf', 'of the slab', 'thicknessMm')}
            {values.widthKind === 'given' ? (
              length('widthMm', 'Width bf', 'in all, the web in it', 'width.widthMm')
            ) : (
              <>
                {length('clearToNextWebMm', 'Clear to next web', 'face to face', 'width.clearToNextWebMm')}
                <NumberField
                  label="Clear span"
                  hint={
                    demand.spanMm == null
                      ? 'face to face of the supports'
                      : `empty: ${formatQuantity(demand.spanMm, 'span', units)}, as above`
                  }
                  kind="span"
                  units={units}
                  value={values.spanMm}
                  error={errors.get(`${path}.width.spanMm`)}
                  onChange={(spanMm) => change({ spanMm })}
                />
              </>
            )}
          </div>
          <p className="text-sm text-muted" aria-live="polite">
            <Sentence {...props} />
          </p>
        </>
      )}
    </div>
  );
}

/** What the slab does in this sense of the moment, with bf as it comes out. */
function Sentence({ units, values, demand, basis, websMm }: FlangeFieldsProps) {
  const rules = ruleSetOf(basis);
  const widths = effectiveWidthsMm(values, demand, websMm, rules);
  const place =
    values.face === 'compression'
      ? 'The slab is in compression, the tension bars are at the bottom.'
      : 'The slab is in tension and cracked, the tension bars are at the top.';
  if (widths === null || widths.length === 0) return place;
  const [low, high] = [Math.min(...widths), Math.max(...widths)];
  const bare = (mm: number) => formatQuantity(mm, 'length', units, { hideUnit: true });
  const ends = low === high ? bare(low) : `${bare(low)} to ${bare(high)}`;
  return (
    <>
      {place} It counts{' '}
      <span className="num font-medium text-ink">
        bf {ends} {unitLabel('length', units)}
      </span>
      {values.widthKind === 'effective' && ` (${rules.clauses.flangeWidth})`}
      {low !== high && ' from the narrowest to the widest web'}.
    </>
  );
}
