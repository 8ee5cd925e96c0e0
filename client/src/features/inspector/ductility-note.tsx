import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

const BEND = {
  'corner-in-bend': 'corner bars set in the stirrup’s bend',
  none: 'no allowance for the stirrup’s bend',
} as const;

/** The ductility with the convention that makes the number, never one without the other. */
export function DuctilityNote({
  evaluation,
  units,
  digits,
}: {
  readonly evaluation: Evaluation;
  readonly units: UnitSystem;
  readonly digits: number;
}) {
  const { ductility, elastic, conventions } = evaluation;
  if (ductility === null)
    return <p className="text-muted">The bars cannot be placed: there is no curvature.</p>;
  const share = elastic?.concreteStressShareAtYield ?? null;
  return (
    <div className="grid gap-2">
      <KeyValue
        items={[
          {
            label: 'φy',
            value: formatQuantity(ductility.curvatureYieldPerMm, 'curvature', units, { digits }),
          },
          {
            label: 'φu',
            value: formatQuantity(ductility.curvatureUltimatePerMm, 'curvature', units, { digits }),
          },
          {
            label: 'μφ = φu/φy',
            value: formatQuantity(ductility.curvatureDuctility, 'ratio', units, { digits }),
          },
        ]}
      />
      <p className="text-sm text-muted">
        {ductility.definition}
        {evaluation.arrangement !== null && `; ${BEND[conventions.bendAllowance]}`}.
      </p>
      {elastic?.isElasticPictureDoubtful === true && (
        <p className="border-l-2 border-near-mark pl-3 text-sm text-near">
          At first yield the concrete carries {formatQuantity(share, 'percent', units, { digits: 2 })} of{' '}
          {codeSymbols(evaluation.ruleSet.id).fc}. Above 70 % it is no longer elastic, and φy is only an
          estimate.
        </p>
      )}
    </div>
  );
}
