import { compressedOverhang, flangeOf } from './flange.ts';
import type { WorkingStep } from './evaluation.ts';
import type { WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

type Source = Pick<WorkingSource, 'section' | 'ruleSet'>;

/** The width that compressed concrete of some depth has: the web's, the flange's, or the one below the other. */
export type CompressedWidth = 'web' | 'flange' | 'both';

/** Which width holds for compressed concrete to a depth (block a, or elastic axis kd), mm. */
export function compressedWidth({ section, ruleSet }: Source, depthMm: number): CompressedWidth {
  const { overhangMm, overhangDepthMm } = compressedOverhang(section.widthMm, flangeOf(section, ruleSet));
  if (overhangMm === 0) return 'web';
  return depthMm <= overhangDepthMm ? 'flange' : 'both';
}

/** The numbers that go with it: b, or bf, or b, bf and hf. */
export function widthInputs({ section, ruleSet }: Source, width: CompressedWidth): Input[] {
  const flange = flangeOf(section, ruleSet);
  const b: Input = ['b', section.widthMm, 'length'];
  if (width === 'web' || !flange) return [b];
  const bf: Input = ['bf', flange.widthMm, 'length'];
  return width === 'flange' ? [bf] : [b, bf, ['hf', flange.thicknessMm, 'length']];
}

/** b, and bf and hf where there is a flange at either face, for the uncracked section. */
export const grossInputs = (source: Source): Input[] =>
  widthInputs(source, flangeOf(source.section, source.ruleSet) ? 'both' : 'web');

/** Parts of the uncracked section's sums that a flange adds; empty for a rectangle. */
export function grossFlangeTerms(source: Source): { area: string; moment: string; inertia: string } {
  const flange = flangeOf(source.section, source.ruleSet);
  if (!flange) return { area: '', moment: '', inertia: '' };
  const middle = flange.face === 'compression' ? 'hf/2' : '(h − hf/2)';
  const lever = flange.face === 'compression' ? '(hf/2 − y)²' : '(h − hf/2 − y)²';
  return {
    area: ' + (bf − b) hf',
    moment: flange.face === 'compression' ? ' + (bf − b) hf²/2' : ` + (bf − b) hf ${middle}`,
    inertia: ` + (bf − b) hf³/12 + (bf − b) hf ${lever}`,
  };
}

/** Effective width of the flange with the numbers it follows from; as given where it was. */
export function flangeSteps({ section, ruleSet }: Source): WorkingStep[] {
  const { flange, widthMm } = section;
  const resolved = flangeOf(section, ruleSet);
  if (!flange || !resolved) return [];
  const { width, thicknessMm } = flange;
  const isGiven = width.kind === 'given';
  const formula = isGiven
    ? 'as given by the engineer'
    : ruleSet.formulas.effectiveFlange({ ...flange, support: width.support ?? null });
  const inputs: readonly Input[] = isGiven
    ? []
    : [
        ['b', widthMm, 'length'],
        ['hf', thicknessMm, 'length'],
        ['sw', width.clearToNextWebMm, 'length'],
        ['ln', width.spanMm, 'length'],
      ];
  return [
    step(
      'flange-width',
      'ultimate',
      ['bf', formula, resolved.widthMm, 'length'],
      inputs,
      isGiven ? 'as given' : ruleSet.clauses.flangeWidth,
    ),
  ];
}
