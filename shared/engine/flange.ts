import { assertPositive, InvalidSectionError } from './preconditions.ts';
import type { Face, Flange, FlangeShape, SectionInput, Support } from './section.ts';

/** The slab that works with a web, its effective width found or given. Lengths mm. */
export interface ResolvedFlange {
  readonly shape: FlangeShape;
  /** Effective width in all, the web in it. */
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly face: Face;
}

/** What an effective flange width follows from. Lengths mm. */
export interface FlangeSetting {
  readonly shape: FlangeShape;
  readonly face: Face;
  readonly webMm: number;
  readonly thicknessMm: number;
  readonly clearToNextWebMm: number;
  readonly spanMm: number;
  /** Null where it was not said. */
  readonly support: Support | null;
}

/**
 * Effective flange of a section by the rule set, or as given; null for a rectangle. An L counts its slab on one side and
 * bends about the level axis all the same, since the slab holds it (common practice, no source).
 */
export function flangeOf(
  { widthMm, flange }: Pick<SectionInput, 'widthMm' | 'flange'>,
  rules: { effectiveFlangeMm(of: FlangeSetting): number },
): ResolvedFlange | null {
  if (!flange) return null;
  const { shape, thicknessMm, face, width } = flange;
  if (width.kind === 'given') return { shape, widthMm: width.widthMm, thicknessMm, face };
  const { clearToNextWebMm, spanMm, support = null } = width;
  const effectiveMm = rules.effectiveFlangeMm({
    shape,
    face,
    webMm: widthMm,
    thicknessMm,
    clearToNextWebMm,
    spanMm,
    support,
  });
  return { shape, widthMm: effectiveMm, thicknessMm, face };
}

/** What a flange adds to its web in compression: overhang bf − bw in all and its thickness, mm; zero where it adds nothing. */
export interface Overhang {
  readonly overhangMm: number;
  readonly overhangDepthMm: number;
}

const NO_OVERHANG: Overhang = { overhangMm: 0, overhangDepthMm: 0 };

/**
 * Overhang in compression. A flange at the tension face is cracked through and adds nothing: should an over-reinforced
 * section's axis reach into it, its compression is left out, which gives the lower strength and ductility.
 */
export function compressedOverhang(webMm: number, flange: ResolvedFlange | null): Overhang {
  if (flange?.face !== 'compression') return NO_OVERHANG;
  return { overhangMm: flange.widthMm - webMm, overhangDepthMm: flange.thicknessMm };
}

/** Overhang of a flange at either face and the depth of its middle below the compression face, mm, for uncracked sections. */
export function grossOverhang(
  { widthMm, depthMm }: Pick<SectionInput, 'widthMm' | 'depthMm'>,
  flange: ResolvedFlange | null,
): Overhang & { readonly middleMm: number } {
  if (!flange) return { ...NO_OVERHANG, middleMm: 0 };
  const half = flange.thicknessMm / 2;
  return {
    overhangMm: flange.widthMm - widthMm,
    overhangDepthMm: flange.thicknessMm,
    middleMm: flange.face === 'compression' ? half : depthMm - half,
  };
}

/**
 * Preconditions of a flange on webs to `widestWebMm` in sections from `leastDepthMm` on.
 * @throws InvalidSectionError naming the value, with the path below `path`.
 */
export function assertFlange(
  flange: Flange,
  { widestWebMm, leastDepthMm }: { readonly widestWebMm: number; readonly leastDepthMm: number },
  path: readonly (string | number)[] = ['flange'],
): void {
  const { thicknessMm, width } = flange;
  assertPositive(thicknessMm, 'Flange thickness', [...path, 'thicknessMm']);
  if (!(thicknessMm < leastDepthMm))
    throw new InvalidSectionError(
      `Flange thickness ${thicknessMm} mm must be less than the depth h = ${leastDepthMm} mm`,
      [...path, 'thicknessMm'],
    );
  if (width.kind === 'effective') {
    assertPositive(width.clearToNextWebMm, 'Clear distance to the next web', [
      ...path,
      'width',
      'clearToNextWebMm',
    ]);
    assertPositive(width.spanMm, 'Span', [...path, 'width', 'spanMm']);
    return;
  }
  assertPositive(width.widthMm, 'Flange width', [...path, 'width', 'widthMm']);
  if (!(width.widthMm >= widestWebMm))
    throw new InvalidSectionError(
      `Flange width ${width.widthMm} mm is less than the web's width b = ${widestWebMm} mm`,
      [...path, 'width', 'widthMm'],
    );
}
