import type { Placement } from './placement.ts';
import type { StirrupOutline } from './section-geometry.ts';

/** ACI 25.3.2: the straight end of a 135° hook is six diameters, and 3 in at least. */
const HOOK_DIAMETERS = 6;
const LEAST_HOOK_MM = 75;

/** The 135° hook of a closed stirrup, turned into the core at the top left corner, as an SVG path of its centre line. */
export function hookPath(stirrup: StirrupOutline, at: Placement): string {
  const lengthMm = Math.max(HOOK_DIAMETERS * stirrup.legThicknessMm, LEAST_HOOK_MM);
  const reach = (Math.min(lengthMm, stirrup.widthMm / 2, stirrup.heightMm / 2) * at.pxPerMm) / Math.SQRT2;
  const bend = stirrup.cornerRadiusMm * at.pxPerMm;
  const x = at.xPx + stirrup.xMm * at.pxPerMm;
  const y = at.yPx + stirrup.yMm * at.pxPerMm;
  /** The two ends leave the bend where it has turned by 135°, on either side of the diagonal. */
  const near = bend * (1 - Math.SQRT1_2);
  const far = bend * (1 + Math.SQRT1_2);
  return `M ${x + near} ${y + far} l ${reach} ${reach} M ${x + far} ${y + near} l ${reach} ${reach}`;
}
