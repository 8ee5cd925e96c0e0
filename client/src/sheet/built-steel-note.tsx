import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { isHogging } from '#shared/print/face-word.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';

interface BuiltSteelNoteProps {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  readonly units: UnitSystem;
}

/** What was found for this section and not typed: the slab that counts, the spacing of its stirrups, its side bars. */
export function BuiltSteelNote({ section, evaluation, units }: BuiltSteelNoteProps) {
  const length = (mm: number | null, digits = 3) => formatQuantity(mm, 'length', units, { digits });
  const { flange, stirrups, skin } = evaluation;
  const lines = [
    flange
      ? `Slab ${length(flange.thicknessMm, 4)}, bf ${length(flange.widthMm, 4)}, in ${isHogging(section) ? 'tension: hogging' : 'compression: sagging'}.`
      : '',
    stirrups?.isDesigned === true
      ? `Spacing designed${stirrups.neededMm === null ? '' : ` for ${length(stirrups.neededMm)} at most`}: ${quantitiesInText(stirrups.reason, units)}.`
      : '',
    skin && skin.perSide > 0
      ? `Skin bars ${skin.perSide}-${skin.bar} each side at ${length(skin.spacingMm)}, ${length(skin.allowedMm)} allowed; not counted in strength.`
      : '',
  ].filter((line) => line !== '');
  return lines.map((line) => (
    <p key={line} className="w-full text-sm text-muted">
      {line}
    </p>
  ));
}
