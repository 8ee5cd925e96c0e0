import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { FieldErrors } from '#client/src/lib/field-errors.ts';
import { Button } from '#client/src/ui/button.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import type { LayerValues } from './section-form-values.ts';

const faceOptions = (hogs: boolean) =>
  [
    { value: 'tension', label: hogs ? 'top' : 'bottom' },
    { value: 'compression', label: hogs ? 'bottom' : 'top' },
  ] as const;

interface LayersFieldProps {
  readonly units: UnitSystem;
  /** Tension at the top. */
  readonly hogs: boolean;
  readonly layers: readonly LayerValues[];
  readonly errors: FieldErrors;
  readonly onChange: (layers: readonly LayerValues[]) => void;
}

/** Rows left empty are not sent, so the contract's numbers count only the filled ones. */
const isFilled = (layer: LayerValues): boolean => layer.depthMm !== null || layer.areaMm2 !== null;

/** Layers of steel exactly as printed: depth from the compression face, area, and the face they belong to. */
export function LayersField({ units, hogs, layers, errors, onChange }: LayersFieldProps) {
  const change = (place: number, part: Partial<LayerValues>) =>
    onChange(layers.map((layer, k) => (k === place ? { ...layer, ...part } : layer)));
  const sentPlace = (place: number) => layers.slice(0, place).filter(isFilled).length;
  const own = errors.get('section.reinforcement.layers');
  return (
    <div className="grid gap-3">
      {layers.map((layer, k) => {
        const path = `section.reinforcement.layers.${sentPlace(k)}`;
        return (
          <div key={k} className="grid grid-cols-[1fr_1fr_5.5rem_auto] items-start gap-4">
            <NumberField
              label={hogs ? 'Depth from the bottom' : 'Depth from the top'}
              kind="length"
              units={units}
              value={layer.depthMm}
              error={isFilled(layer) ? errors.get(`${path}.depthMm`) : undefined}
              onChange={(depthMm) => change(k, { depthMm })}
            />
            <NumberField
              label="Area"
              kind="area"
              units={units}
              value={layer.areaMm2}
              error={isFilled(layer) ? errors.get(`${path}.areaMm2`) : undefined}
              onChange={(areaMm2) => change(k, { areaMm2 })}
            />
            <SelectField
              label="Face"
              options={faceOptions(hogs)}
              value={layer.face}
              onChange={(event) =>
                change(k, { face: event.target.value === 'tension' ? 'tension' : 'compression' })
              }
            />
            <Button
              look="text"
              className="mt-6 text-sm"
              aria-label={`Remove layer ${k + 1}`}
              disabled={layers.length === 1}
              onClick={() => onChange(layers.filter((_, other) => other !== k))}
            >
              Remove
            </Button>
          </div>
        );
      })}
      {own !== undefined && <p className="text-xs text-fails">▲ {own}</p>}
      <div>
        <Button
          look="text"
          className="text-sm"
          onClick={() => onChange([...layers, { depthMm: null, areaMm2: null, face: 'tension' }])}
        >
          Add a layer
        </Button>
      </div>
    </div>
  );
}
