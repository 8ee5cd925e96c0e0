import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';

const WAYS = [
  { value: 'given', label: 'As given' },
  { value: 'designed', label: 'Designed' },
] as const;

interface SpacingChoiceProps {
  readonly isDesigned: boolean;
  readonly isHintHidden?: boolean;
  readonly onChange: (isDesigned: boolean) => void;
  readonly className?: string;
}

/** Whether the spacing of stirrups is as typed, or found for each section up to what is typed. */
export function SpacingChoice({ isDesigned, isHintHidden = false, onChange, className }: SpacingChoiceProps) {
  return (
    <div className={className}>
      <SegmentedControl
        legend="Spacing of the stirrups"
        options={WAYS}
        value={isDesigned ? 'designed' : 'given'}
        onChange={(way) => onChange(way === 'designed')}
      />
      {isDesigned && !isHintHidden && (
        <p className="pt-1 text-xs text-muted">
          The widest spacing in the project’s steps that meets shear, least stirrups, ties and hoops.
        </p>
      )}
    </div>
  );
}
