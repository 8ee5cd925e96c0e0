import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { RuleSetId, SectionInput } from '#shared/engine/section.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import type { AxisDefinition, SteelSetsDefinition } from '#shared/sweep/problem.ts';
import type { EdgeAxis, ViewResult } from '#shared/sweep/result.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { faceWord } from '#shared/print/face-word.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { givenStirrupText } from '#shared/print/section-text.ts';
import { AxisRuler } from './axis-ruler.tsx';
import { countsText } from '#client/src/lib/counts-text.ts';

const RULERS: readonly {
  readonly axis: EdgeAxis;
  readonly name: string;
  readonly symbol: string;
  readonly kind: 'length' | 'stress';
}[] = [
  { axis: 'width', name: 'Width', symbol: 'b', kind: 'length' },
  { axis: 'depth', name: 'Depth', symbol: 'h', kind: 'length' },
  { axis: 'fc', name: 'Concrete', symbol: 'f′c', kind: 'stress' },
];

function setsText(sets: SteelSetsDefinition): string {
  if (sets.kind === 'areas') return `${sets.areasMm2.length} plain areas`;
  const ends = [sets.sizes[0], sets.sizes.at(-1)].filter((size) => size !== undefined);
  const sizes = ends[0] === ends[1] ? ends[0] : sets.sizes.length === 2 ? ends.join(', ') : ends.join('–');
  const single =
    sets.counts.length === 0 || sizes === undefined ? '' : `${countsText(sets.counts)} × ${sizes}`;
  const mixed = sets.mixed?.length ? `${sets.mixed.length} mixed` : '';
  return [sets.none ? 'none' : '', single, mixed].filter((part) => part !== '').join(', ');
}

function axisText(axis: AxisDefinition, kind: 'length' | 'stress', units: UnitSystem): string {
  const values = expandAxis(axis);
  const print = (value: number | undefined, hideUnit = false) =>
    formatQuantity(value, kind, units, { hideUnit });
  return values.length === 1 ? print(values[0]) : `${print(values[0], true)}–${print(values.at(-1))}`;
}

interface SpaceRailProps {
  readonly definition: SweepDefinition;
  readonly result: ViewResult | null;
  /** Sections within the ranges at each value; null where no range is set or they are not at hand. */
  readonly within: Readonly<Record<EdgeAxis, readonly number[]>> | null;
  readonly units: UnitSystem;
  /** Whose letters the strengths are in. */
  readonly code: RuleSetId;
  readonly selected: SectionInput | null;
}

const VALUE_OF: Readonly<Record<EdgeAxis, (section: SectionInput) => number>> = {
  width: (section) => section.widthMm,
  depth: (section) => section.depthMm,
  fc: (section) => section.fcMPa,
};

const barsLabel = (place: 'bottom' | 'top') => (place === 'top' ? 'Top bars' : 'Bottom bars');

/** The design space beside its result: where on each axis the sections that meet every check lie. */
export function SpaceRail({ definition, result, within, units, code, selected }: SpaceRailProps) {
  const { space } = definition;
  const symbols = codeSymbols(code);
  const rows = [
    [barsLabel(faceWord('tension', space)), setsText(space.tension)],
    [barsLabel(faceWord('compression', space)), setsText(space.compression)],
    ['Stirrups', space.stirrups.map((stirrup) => givenStirrupText(stirrup, units)).join('; ')],
    [`Steel ${symbols.fy}`, axisText(space.fy, 'stress', units)],
    ['Clear cover', axisText(space.cover, 'length', units)],
  ] as const;
  return (
    <section className="grid gap-4">
      <h2 className="text-xs font-semibold text-muted">
        {result?.bounds === undefined ? 'Space, and where it meets every check' : 'Space'}
      </h2>
      {RULERS.map(({ axis, name, symbol, kind }) => {
        const fallback = expandAxis(space[axis]).map((value) => ({ value, feasible: 0, evaluated: 0 }));
        return (
          <AxisRuler
            key={axis}
            name={name}
            symbol={axis === 'fc' ? symbols.fc : symbol}
            kind={kind}
            units={units}
            counts={result?.axisCounts?.[axis] ?? fallback}
            isCounted={result === null || result.axisCounts !== null}
            within={within?.[axis] ?? null}
            selected={selected === null ? null : VALUE_OF[axis](selected)}
            edges={(result?.edges ?? []).filter((edge) => edge.axis === axis)}
          />
        );
      })}
      <dl className="border-t border-rule pt-2 text-sm">
        {rows.map(([label, value]) => (
          <div key={label} className="flex items-baseline justify-between gap-4 py-0.5">
            <dt>{label}</dt>
            <dd className="num text-right">{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
