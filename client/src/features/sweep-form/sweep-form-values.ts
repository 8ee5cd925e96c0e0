import type { MeasureId } from '#shared/engine/measures.ts';
import type { Support } from '#shared/engine/section.ts';
import type { RunMethod } from '#shared/sweep/run-method.ts';
import type { StirrupValues } from '#client/src/section-fields/stirrup-values.ts';
import type { FlangeValues } from '#client/src/section-fields/flange-values.ts';

/** One axis as typed. Numbers are SI; null is an empty field, NaN text that is not a number. */
export interface AxisValues {
  readonly kind: 'range' | 'list';
  readonly from: number | null;
  readonly to: number | null;
  readonly step: number | null;
  /** The list as typed, in the project's units. */
  readonly listText: string;
}

/** Steel of one face as typed. Both ways of giving it are kept, so that switching between them loses nothing. */
export interface SteelValues {
  readonly kind: 'bars' | 'areas';
  readonly sizes: readonly string[];
  /** `2–8, 10`. */
  readonly countsText: string;
  /** Also try this face without bars. */
  readonly none: boolean;
  /** Groups of two sizes, one by one: `2-#8 + 2-#6, 3-#8 + 2-#6`. */
  readonly mixedText: string;
  readonly areasText: string;
  readonly placedBy: 'offset' | 'share';
  readonly offsetMm: number | null;
  readonly shareOfDepth: number | null;
}

export const AXIS_NAMES = ['width', 'depth', 'fc', 'fy', 'cover'] as const;
export type AxisName = (typeof AXIS_NAMES)[number];

export const STEEL_FACES = ['tension', 'compression'] as const;
export type SteelFace = (typeof STEEL_FACES)[number];

/** The whole form, plain data: it is what a draft stores. */
export interface SweepFormValues {
  readonly name: string;
  readonly axes: Readonly<Record<AxisName, AxisValues>>;
  readonly flange: FlangeValues;
  readonly stirrups: readonly StirrupValues[];
  readonly steel: Readonly<Record<SteelFace, SteelValues>>;
  readonly demand: {
    readonly muNmm: number | null;
    readonly ductilityTarget: number | null;
    readonly depthCapMm: number | null;
    readonly vuN?: number | null | undefined;
    readonly spanMm?: number | null | undefined;
    readonly support?: Support | null | undefined;
  };
  readonly rules: {
    readonly minDepthToWidth: number | null;
    readonly maxDepthToWidth: number | null;
    readonly maxLayers: number | null;
    readonly oneSizePerFace: boolean;
    readonly excludedBars: readonly string[];
    readonly columnWidthMm: number | null;
    readonly minCompressionShare: number | null;
    readonly requireHangers: boolean;
  };
  readonly view: { readonly x: MeasureId; readonly y: MeasureId };
  /** How it is run, where somebody chose; else the size decides. */
  readonly method?: RunMethod | undefined;
  /** The preset of the office it was filled from, by name; null for a stored sweep, which does not say. */
  readonly filledFrom: string | null;
}
