import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Snapshot } from '#shared/contract/records.ts';
import {
  barStandardLabel,
  bendAllowanceLabel,
  displacedConcreteLabel,
  yieldCurvatureLabel,
} from '#shared/print/basis-labels.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { givenStirrupText, sizeText, steelText } from '#shared/print/section-text.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

/** Everything that went into the numbers, as it was when the candidate was pinned. */
export function FrozenInputs({
  snapshot,
  units,
}: {
  readonly snapshot: Snapshot;
  readonly units: UnitSystem;
}) {
  const { section, demand, basis, rules, evaluation } = snapshot;
  const symbols = codeSymbols(basis.ruleSet);
  const print = (value: number | null, kind: DisplayKind) => formatQuantity(value, kind, units);
  const asked = (value: number | null, kind: DisplayKind) =>
    value === null ? 'not asked' : print(value, kind);
  return (
    <div className="grid gap-x-10 md:grid-cols-2">
      <KeyValue
        items={[
          { label: 'b × h', value: sizeText(section, units) },
          { label: 'Steel', value: steelText(section, units) },
          { label: 'Stirrups', value: givenStirrupText(section.stirrup, units) },
          { label: symbols.fc, value: print(section.fcMPa, 'stress') },
          { label: symbols.fy, value: print(section.fyMPa, 'stress') },
          { label: 'Clear cover', value: print(section.coverMm, 'length') },
          { label: symbols.moment, value: asked(demand.muNmm, 'moment') },
          { label: 'μφ at least', value: asked(demand.ductilityTarget, 'count') },
          { label: 'h at most', value: asked(demand.depthCapMm, 'length') },
          { label: symbols.shear, value: asked(demand.vuN ?? null, 'force') },
        ]}
      />
      <KeyValue
        items={[
          { label: 'Code', value: evaluation.ruleSet.title, isNumber: false },
          { label: 'Bars', value: barStandardLabel(basis.barStandard), isNumber: false },
          { label: 'Es', value: print(basis.esMPa, 'stress') },
          { label: 'Largest aggregate', value: print(basis.maxAggregateMm, 'length') },
          { label: 'Slab thickness', value: print(basis.slabMm, 'length') },
          { label: 'Layers at most', value: rules.maxLayers },
          {
            label: 'Displaced concrete',
            value: displacedConcreteLabel(basis.displacedConcrete),
            isNumber: false,
          },
          { label: 'Yield curvature', value: yieldCurvatureLabel(basis.yieldCurvatureAt), isNumber: false },
          { label: 'Bend', value: bendAllowanceLabel(basis.bendAllowance), isNumber: false },
        ]}
      />
    </div>
  );
}
