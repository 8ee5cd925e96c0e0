import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate, Snapshot } from '#shared/contract/records.ts';
import {
  bendAllowanceLabel,
  displacedConcreteLabel,
  yieldCurvatureLabel,
} from '#shared/print/basis-labels.ts';
import { inputGroups } from '#shared/sheet/inputs.ts';
import type { KeyText } from '#shared/sheet/sheet.ts';
import { KeyValue } from '#client/src/ui/key-value.tsx';

interface FrozenInputsProps {
  readonly snapshot: Snapshot;
  readonly beam: Candidate['beam'];
  readonly units: UnitSystem;
}

/** Everything that went into the numbers, as it was when the candidate was pinned, in the words of its calculation sheet. */
export function FrozenInputs({ snapshot, beam, units }: FrozenInputsProps) {
  const groups = inputGroups(snapshot, beam, units).filter(({ isResult }) => !isResult);
  return (
    <div className="gap-x-10 md:columns-2">
      {[...groups, { title: 'Conventions', items: conventionItems(snapshot) }].map(({ title, items }) => (
        <section key={title} className="break-inside-avoid pb-5">
          <h3 className="pb-1 text-xs text-muted">{title}</h3>
          <KeyValue items={[...items]} />
        </section>
      ))}
    </div>
  );
}

const conventionItems = ({ basis }: Snapshot): KeyText[] => [
  { label: 'Displaced concrete', value: displacedConcreteLabel(basis.displacedConcrete) },
  { label: 'Yield curvature', value: yieldCurvatureLabel(basis.yieldCurvatureAt) },
  { label: 'Bend', value: bendAllowanceLabel(basis.bendAllowance) },
];
