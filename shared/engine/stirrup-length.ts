import type { Bar } from './bars.ts';
import type { RuleSet } from './rules/rule-set.ts';

/** What the cut length of a stirrup depends on besides b and h; lengths mm. */
export interface StirrupShape {
  readonly massKgPerM: number;
  readonly spacingMm: number;
  readonly legs: number;
  readonly coverMm: number;
  /** Added to 2 (B + H) of the closed stirrup: bend deductions and two hooks. */
  readonly closedExtraMm: number;
  /** Added to H of each cross-tie that makes legs beyond two. */
  readonly tieExtraMm: number;
}

/**
 * Constants of a stirrup's cut length (common practice, no source: geometry of the bent bar).
 *
 * The closed stirrup has three 90° corners and two 135° hooks meeting at the fourth. Measured along the bar's centre
 * line with inside radius r and diameter ds: a 90° corner is shorter than its two outside legs by
 * 2 (r + ds) − π/2 (r + ds/2); a hook adds its arc 3π/4 (r + ds/2) and its straight tail, and takes off r + ds where the
 * leg ends. Legs beyond two are cross-ties with a hook at each end.
 */
export function stirrupShape(
  bar: Bar,
  { legs, spacingMm }: { readonly legs: number; readonly spacingMm: number },
  coverMm: number,
  rules: RuleSet,
): StirrupShape {
  const ds = bar.diameterMm;
  const r = rules.bendRadiusMm(ds);
  const cornerDeduction = 2 * (r + ds) - (Math.PI / 2) * (r + ds / 2);
  const hook = ((3 * Math.PI) / 4) * (r + ds / 2) + rules.hookTailMm(ds) - (r + ds);
  return {
    massKgPerM: bar.massKgPerM,
    spacingMm,
    legs,
    coverMm,
    closedExtraMm: 2 * hook - 3 * cornerDeduction,
    tieExtraMm: 2 * hook,
  };
}

/** Cut length of one set of stirrups (closed stirrup and cross-ties), mm. */
export function stirrupSetLengthMm(shape: StirrupShape, widthMm: number, depthMm: number): number {
  const insideWidth = widthMm - 2 * shape.coverMm;
  const insideDepth = depthMm - 2 * shape.coverMm;
  const length =
    2 * (insideWidth + insideDepth) +
    shape.closedExtraMm +
    (shape.legs - 2) * (insideDepth + shape.tieExtraMm);
  // A stirrup that cannot be bent in the section fails bar fit; it is never of negative length.
  return Math.max(0, length);
}

/** Stirrups per metre of beam, kg/m. */
export function stirrupKgPerM(
  shape: StirrupShape,
  widthMm: number,
  depthMm: number,
  spacingMm = shape.spacingMm,
): number {
  return (stirrupSetLengthMm(shape, widthMm, depthMm) / spacingMm) * shape.massKgPerM;
}
