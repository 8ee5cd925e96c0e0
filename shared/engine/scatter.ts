import { asBuilt } from './as-built.ts';
import { evaluatePlaced, evaluateSection, type EvaluationContext } from './evaluate.ts';
import type { CheckId, Evaluation } from './evaluation.ts';
import { isWithinLength } from './limits.ts';
import { assertNotNegative, assertPositive } from './preconditions.ts';
import type { SectionInput } from './section.ts';
import { placeSteel, type PlacedSteel } from './steel-layout.ts';

/** How far execution may stray from the drawing. */
export interface ScatterChoices {
  /** Cover less and more by this, mm. */
  readonly coverMm: number;
  /** Low and high concrete strength over f′c. */
  readonly lowStrengthShare: number;
  readonly highStrengthShare: number;
  /** Outside of a bar over its nominal diameter, over the deformations. */
  readonly barOversizes: readonly number[];
}

/** ±10 mm of cover, ±10 % of f′c, bars 10 to 18 % larger than their name where they are fitted (common practice, no source). */
export const USUAL_SCATTER: ScatterChoices = {
  coverMm: 10,
  lowStrengthShare: 0.9,
  highStrengthShare: 1.1,
  barOversizes: [1.1, 1.14, 1.18],
};

export const SCATTER_IDS = [
  'cover-less',
  'cover-more',
  'strength-low',
  'strength-high',
  'bar-oversize',
] as const;
export type ScatterId = (typeof SCATTER_IDS)[number];

/** How a section does by its listed checks. */
export interface ScatterOutcome {
  readonly meetsListedChecks: boolean;
  readonly failing: readonly CheckId[];
  /** The check with the largest demand over capacity; null where none has a number. */
  readonly governing: { readonly id: CheckId; readonly ratio: number; readonly clause: string } | null;
  /** φMn, N·mm, and μφ as the basis measures it; null where there is none. */
  readonly designMomentNmm: number | null;
  readonly curvatureDuctility: number | null;
}

/** One departure from the drawing: cover in mm, f′c in MPa, or the oversize as a factor. */
export interface ScatterVariant {
  readonly id: ScatterId;
  readonly from: number;
  readonly to: number;
  /** Null where it cannot be built or drawn, and why. */
  readonly outcome: ScatterOutcome | null;
  /** Checks that the section meets as drawn and fails here. */
  readonly newlyFailing: readonly CheckId[];
  readonly note: string;
}

export interface Scatter {
  readonly asDrawn: ScatterOutcome;
  readonly variants: readonly ScatterVariant[];
  /** As drawn and in every variant it meets its listed checks. */
  readonly holds: boolean;
}

const NOTES: Readonly<Record<ScatterId, string>> = {
  'cover-less': 'bars of both faces nearer their faces, the cage as bent: d grows',
  'cover-more': 'bars of both faces further from their faces, the cage as bent: d shrinks',
  'strength-low': 'concrete weaker than f′c',
  'strength-high':
    'concrete stronger than f′c: least steel and, where the section cracks late, the first crack ask for more',
  'bar-oversize': 'bars fitted with their deformations: gaps shrink, and outer bars move inwards',
};

/**
 * Whether a candidate still meets its listed checks where execution strays: cover, concrete strength, and the size of bars
 * over their deformations. Everything else stays as drawn; stirrups keep their bar and spacing.
 * @throws InvalidSectionError as `evaluateSection`, and for a choice out of range.
 */
export function scatterOf(
  given: SectionInput,
  context: EvaluationContext,
  choices: ScatterChoices = USUAL_SCATTER,
): Scatter {
  assertChoices(choices);
  const asDrawn = outcomeOf(evaluateSection(given, context));
  const section = withGivenSpacing(given, context);
  const variant = (
    id: ScatterId,
    from: number,
    to: number,
    evaluation: Evaluation | string,
  ): ScatterVariant => {
    if (typeof evaluation === 'string')
      return { id, from, to, outcome: null, newlyFailing: [], note: evaluation };
    const outcome = outcomeOf(evaluation);
    const newlyFailing = outcome.failing.filter((check) => !asDrawn.failing.includes(check));
    return { id, from, to, outcome, newlyFailing, note: NOTES[id] };
  };
  const withCover = (id: ScatterId, shiftMm: number) =>
    variant(id, section.coverMm, section.coverMm + shiftMm, withCageMoved(section, context, shiftMm));
  const withStrength = (id: ScatterId, share: number) => {
    const fcMPa = share * section.fcMPa;
    return variant(id, section.fcMPa, fcMPa, evaluateSection({ ...section, fcMPa }, context));
  };
  const oversizes = section.reinforcement.kind === 'layers' ? [] : choices.barOversizes;
  const nominal = context.basis.barOversize ?? 1;
  const variants = [
    withCover('cover-less', -choices.coverMm),
    withCover('cover-more', choices.coverMm),
    withStrength('strength-low', choices.lowStrengthShare),
    withStrength('strength-high', choices.highStrengthShare),
    ...oversizes.map((barOversize) =>
      variant(
        'bar-oversize',
        nominal,
        barOversize,
        evaluateSection(section, { ...context, basis: { ...context.basis, barOversize } }),
      ),
    ),
  ];
  const holds = [asDrawn, ...variants.map(({ outcome }) => outcome)].every(
    (outcome) => outcome === null || outcome.meetsListedChecks,
  );
  return { asDrawn, variants, holds };
}

function assertChoices({ coverMm, lowStrengthShare, highStrengthShare, barOversizes }: ScatterChoices): void {
  assertNotNegative(coverMm, 'Change of cover', ['scatter', 'coverMm']);
  assertPositive(lowStrengthShare, 'Low strength over f′c', ['scatter', 'lowStrengthShare']);
  assertPositive(highStrengthShare, 'High strength over f′c', ['scatter', 'highStrengthShare']);
  barOversizes.forEach((factor, i) => assertPositive(factor, 'Bar oversize', ['scatter', 'barOversizes', i]));
}

function outcomeOf({ checks, meetsListedChecks, measures }: Evaluation): ScatterOutcome {
  let governing: ScatterOutcome['governing'] = null;
  for (const { id, ratio, clause } of checks)
    if (ratio !== null && ratio > (governing?.ratio ?? -Infinity)) governing = { id, ratio, clause };
  return {
    meetsListedChecks,
    failing: checks.filter(({ passes }) => !passes).map(({ id }) => id),
    governing,
    designMomentNmm: measures.designStrengthNmm,
    curvatureDuctility: measures.curvatureDuctility,
  };
}

/** Stirrups that were designed are given from now on. */
function withGivenSpacing(given: SectionInput, context: EvaluationContext): SectionInput {
  const section = asBuilt(given, context, placeSteel(given, context.basis, context.rules.maxLayers));
  return section.stirrup ? { ...section, stirrup: { ...section.stirrup, isDesigned: false } } : section;
}

/** The section with every bar of both faces moved inwards (outwards where negative), or why that is not possible. */
function withCageMoved(
  section: SectionInput,
  context: EvaluationContext,
  shiftMm: number,
): Evaluation | string {
  const coverMm = section.coverMm + shiftMm;
  if (coverMm < 0) return 'there is less cover than that';
  const placed = placeSteel(section, context.basis, context.rules.maxLayers);
  const moved = movedInwards(section, placed, shiftMm);
  if (moved.layout?.depths.some((depth) => depth <= 0 || depth >= section.depthMm))
    return 'the bars would leave the section';
  return evaluatePlaced({ ...section, coverMm }, context, moved);
}

function movedInwards({ depthMm }: SectionInput, placed: PlacedSteel, shiftMm: number): PlacedSteel {
  const { layout, arrangement } = placed;
  if (!layout) return placed;
  const neededMm = (arrangement?.depthNeededMm ?? 0) + 2 * shiftMm;
  if (!isWithinLength(neededMm, depthMm))
    return {
      ...placed,
      layout: null,
      fits: false,
      shortfall: { neededMm, availableMm: depthMm },
      reason: 'the two groups no longer clear each other',
    };
  const by = (face: 'tension' | 'compression') => (face === 'tension' ? -shiftMm : shiftMm);
  return {
    ...placed,
    arrangement: arrangement && {
      ...arrangement,
      bars: arrangement.bars.map((bar) => ({ ...bar, yMm: bar.yMm + by(bar.face) })),
    },
    layout: {
      ...layout,
      depths: layout.depths.map((depth, i) => depth + by(layout.faces[i]!)),
      dMm: layout.dMm - shiftMm,
      dtMm: layout.dtMm - shiftMm,
      dPrimeMm: layout.dPrimeMm === null ? null : layout.dPrimeMm + shiftMm,
    },
  };
}
