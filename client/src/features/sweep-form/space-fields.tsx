import { useDeferredValue, useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { AxisField } from './axis-field.tsx';
import { type FieldErrors } from '#client/src/lib/field-errors.ts';
import { axisCount, steelCount } from './space-estimate.ts';
import { fitPreview, type FitBasis } from './fit-preview.ts';
import { SlabField } from './slab-field.tsx';
import { SteelField } from './steel-field.tsx';
import { StirrupsField } from '#client/src/section-fields/stirrups-field.tsx';
import {
  AXIS_NAMES,
  STEEL_FACES,
  type SteelFace,
  type SteelValues,
  type SweepFormValues,
} from './sweep-form-values.ts';

interface SpaceFieldsProps {
  readonly units: UnitSystem;
  readonly basis: FitBasis;
  readonly form: SweepFormValues;
  readonly errors: FieldErrors;
  readonly onChange: (form: SweepFormValues) => void;
}

/** Areas and bars do not mix in one section: when the bottom steel changes its way, the top steel follows. */
function withSteel(form: SweepFormValues, face: SteelFace, next: SteelValues): SweepFormValues {
  const steel = { ...form.steel, [face]: next };
  if (face === 'compression' || next.kind === form.steel.tension.kind) return { ...form, steel };
  const top = form.steel.compression;
  const areasText = next.kind === 'areas' && top.areasText === '' ? '0' : top.areasText;
  return { ...form, steel: { ...steel, compression: { ...top, kind: next.kind, areasText } } };
}

/** Every axis of the space with the number of values it makes. */
export function SpaceFields({ units, basis, form, errors, onChange }: SpaceFieldsProps) {
  // Typing goes before the picture of it.
  const drawn = useDeferredValue(form);
  const fits = useMemo(
    () => ({
      tension: fitPreview(drawn, 'tension', basis, units),
      compression: fitPreview(drawn, 'compression', basis, units),
    }),
    [drawn, basis, units],
  );
  return (
    <div>
      {AXIS_NAMES.map((name) => (
        <AxisField
          key={name}
          name={name}
          units={units}
          symbols={codeSymbols(basis.ruleSet)}
          values={form.axes[name]}
          errors={errors}
          valueCount={axisCount(form.axes[name], name, units)}
          onChange={(values) => onChange({ ...form, axes: { ...form.axes, [name]: values } })}
        />
      ))}
      <SlabField units={units} basis={basis} form={form} errors={errors} onChange={onChange} />
      {STEEL_FACES.map((face) => (
        <SteelField
          hogs={form.flange.shape !== 'none' && form.flange.face === 'tension'}
          key={face}
          face={face}
          units={units}
          standard={basis.barStandard}
          values={form.steel[face]}
          errors={errors}
          setCount={steelCount(form.steel[face], units)}
          fit={fits[face]}
          onChange={(values) => onChange(withSteel(form, face, values))}
        />
      ))}
      <StirrupsField
        units={units}
        standard={basis.barStandard}
        values={form.stirrups}
        errors={errors}
        path="space.stirrups"
        mayBeNone
        onChange={(stirrups) => onChange({ ...form, stirrups })}
      />
    </div>
  );
}
