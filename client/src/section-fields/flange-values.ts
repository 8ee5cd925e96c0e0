import { flangeSchema } from '#shared/contract/section-input.ts';
import { flangeOf } from '#shared/engine/flange.ts';
import type { RuleSet } from '#shared/engine/rules/rule-set.ts';
import type { Demand, Face, Flange, FlangeShape } from '#shared/engine/section.ts';

/** The slab as typed. Both ways of giving its width are kept, so that switching between them loses nothing. */
export interface FlangeValues {
  readonly shape: 'none' | FlangeShape;
  readonly face: Face;
  readonly thicknessMm: number | null;
  readonly widthKind: Flange['width']['kind'];
  readonly widthMm: number | null;
  readonly clearToNextWebMm: number | null;
  /** Empty: the span of the demand. */
  readonly spanMm: number | null;
}

export const NO_FLANGE: FlangeValues = {
  shape: 'none',
  face: 'compression',
  thicknessMm: null,
  widthKind: 'effective',
  widthMm: null,
  clearToNextWebMm: null,
  spanMm: null,
};

type Span = Pick<Demand, 'spanMm' | 'support'>;

/** What is typed, as the contract takes it; what is missing is null there, for the contract to name. */
export function typedFlange(values: FlangeValues, demand: Span) {
  if (values.shape === 'none') return null;
  const { shape, face, thicknessMm } = values;
  const spanMm = values.spanMm ?? demand.spanMm ?? null;
  const width =
    values.widthKind === 'given'
      ? { kind: 'given', widthMm: values.widthMm }
      : {
          kind: 'effective',
          clearToNextWebMm: values.clearToNextWebMm,
          spanMm,
          ...(demand.support ? { support: demand.support } : {}),
        };
  return { shape, face, thicknessMm, width };
}

/** A stored slab as a form. A span that is the demand's own is left to the demand. */
export function flangeValues(flange: Flange | null | undefined, demand: Span): FlangeValues {
  if (!flange) return NO_FLANGE;
  const { shape, face, thicknessMm, width } = flange;
  const isGiven = width.kind === 'given';
  return {
    ...NO_FLANGE,
    shape,
    face,
    thicknessMm,
    widthKind: width.kind,
    widthMm: isGiven ? width.widthMm : null,
    clearToNextWebMm: isGiven ? null : width.clearToNextWebMm,
    spanMm: isGiven || width.spanMm === demand.spanMm ? null : width.spanMm,
  };
}

/** Effective width bf of the slab on each of these webs, mm; null while it cannot be told. */
export function effectiveWidthsMm(
  values: FlangeValues,
  demand: Span,
  websMm: readonly number[],
  rules: RuleSet,
): readonly number[] | null {
  const flange = flangeSchema.nullable().safeParse(typedFlange(values, demand));
  if (!flange.success || flange.data === null) return null;
  const { data } = flange;
  return websMm.map((widthMm) => flangeOf({ widthMm, flange: data }, rules)?.widthMm ?? widthMm);
}
