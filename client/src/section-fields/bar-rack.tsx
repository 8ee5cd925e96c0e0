import { BARS } from '#shared/engine/bars.ts';
import type { BarStandard } from '#shared/engine/section.ts';

/** The largest bar of a standard is drawn this wide; the others to the same scale. */
const LARGEST_PX = 34;

interface BarRackProps {
  readonly legend: string;
  readonly standard: BarStandard;
  readonly chosen: readonly string[];
  readonly onChange: (chosen: readonly string[]) => void;
  readonly error?: string | undefined;
  readonly isLegendHidden?: boolean;
}

/** The sizes of a standard as bars cut across, to scale; a chosen one is filled and its number underlined. */
export function BarRack({ legend, standard, chosen, onChange, error, isLegendHidden = false }: BarRackProps) {
  const bars = BARS[standard];
  const largest = Math.max(...bars.map((bar) => bar.diameterMm));
  const toggle = (designation: string) => {
    const isOn = chosen.includes(designation);
    const next = isOn ? chosen.filter((one) => one !== designation) : [...chosen, designation];
    onChange(bars.map((bar) => bar.designation).filter((one) => next.includes(one)));
  };
  return (
    <fieldset className="min-w-0" aria-invalid={error !== undefined || undefined}>
      <legend className={isLegendHidden ? 'sr-only' : 'text-xs text-muted'}>{legend}</legend>
      <div className="flex flex-wrap items-end gap-x-1 gap-y-2">
        {bars.map((bar) => {
          const radius = ((bar.diameterMm / largest) * LARGEST_PX) / 2;
          return (
            <label
              key={bar.designation}
              className="group relative flex min-w-9 cursor-pointer flex-col items-center justify-end gap-1 px-1 pt-1 has-focus-visible:outline-2 has-focus-visible:outline-ink"
            >
              <input
                type="checkbox"
                className="absolute inset-0 cursor-pointer appearance-none opacity-0"
                checked={chosen.includes(bar.designation)}
                onChange={() => toggle(bar.designation)}
              />
              <svg
                width={2 * radius + 2}
                height={2 * radius + 2}
                viewBox={`${-radius - 1} ${-radius - 1} ${2 * radius + 2} ${2 * radius + 2}`}
                aria-hidden="true"
                className="group-hover:opacity-80"
              >
                <circle
                  r={radius}
                  className="fill-none stroke-concrete-edge group-has-checked:fill-steel group-has-checked:stroke-steel"
                />
              </svg>
              <span className="num border-b-2 border-transparent text-xs text-muted group-has-checked:border-steel group-has-checked:font-semibold group-has-checked:text-ink">
                {bar.designation}
              </span>
            </label>
          );
        })}
      </div>
      {error !== undefined && (
        <p className="mt-1 flex gap-1.5 text-xs text-fails">
          <span aria-hidden="true">▲</span>
          <span>{error}</span>
        </p>
      )}
    </fieldset>
  );
}
