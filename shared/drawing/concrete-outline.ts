import type { Flange } from '../engine/section.ts';
import type { Placement } from './placement.ts';

/** A corner of the concrete, mm: x from the left side of the web, y downwards from the top as drawn. */
export interface OutlinePoint {
  readonly xMm: number;
  readonly yMm: number;
}

/** The slab as it is drawn, always on top. */
export interface DrawnFlange {
  readonly leftMm: number;
  readonly rightMm: number;
  readonly thicknessMm: number;
  /** Width that counts, which the drawing may cut short. */
  readonly widthMm: number;
  /** The slab goes on beyond its drawn ends. */
  readonly isCutLeft: boolean;
  readonly isCutRight: boolean;
}

/**
 * A slab may be ten webs wide. Drawn whole, the web with its bars would be a few pixels; so it is cut by a break line,
 * as the trade does, at this share of the web's width or of the slab's thickness, whichever is more.
 */
const DRAWN_OVERHANG_OF_WEB = 0.45;
const DRAWN_OVERHANG_OF_THICKNESS = 1.3;
/** Half of the break line's zigzag, as a share of the slab's thickness. */
const BREAK_SHARE = 0.11;

/** Both overhangs of a T, or the one of an L, which is drawn to the right. */
export function drawnFlange(
  flange: Pick<Flange, 'shape' | 'thicknessMm'>,
  webMm: number,
  widthMm: number,
): DrawnFlange {
  const { shape, thicknessMm } = flange;
  const sides = shape === 't' ? 2 : 1;
  const overhangMm = Math.max(0, (widthMm - webMm) / sides);
  const most = Math.max(DRAWN_OVERHANG_OF_WEB * webMm, DRAWN_OVERHANG_OF_THICKNESS * thicknessMm);
  const drawnMm = Math.min(overhangMm, most);
  const isCut = overhangMm > most;
  return {
    leftMm: shape === 't' ? -drawnMm : 0,
    rightMm: webMm + drawnMm,
    thicknessMm,
    widthMm,
    isCutLeft: isCut && shape === 't',
    isCutRight: isCut,
  };
}

/** The concrete's corners in order: a rectangle, or slab and web in one line, with break lines where the slab goes on. */
export function concreteOutline(webMm: number, depthMm: number, flange: DrawnFlange | null): OutlinePoint[] {
  const at = (xMm: number, yMm: number): OutlinePoint => ({ xMm, yMm });
  if (flange === null || flange.rightMm - flange.leftMm <= webMm)
    return [at(0, 0), at(webMm, 0), at(webMm, depthMm), at(0, depthMm)];
  const { leftMm, rightMm, thicknessMm: hf } = flange;
  const edge = (xMm: number, isCut: boolean): OutlinePoint[] =>
    isCut ? breakLine(xMm, hf) : [at(xMm, 0), at(xMm, hf)];
  const right = edge(rightMm, flange.isCutRight);
  const web = [at(webMm, hf), at(webMm, depthMm), at(0, depthMm)];
  if (leftMm === 0) return [at(0, 0), ...right, ...web];
  return [...right, ...web, at(0, hf), ...edge(leftMm, flange.isCutLeft).toReversed()];
}

/** From the top of the slab to its soffit at one place, with the zigzag of a break in the middle. */
function breakLine(xMm: number, thicknessMm: number): OutlinePoint[] {
  const half = BREAK_SHARE * thicknessMm;
  const middle = thicknessMm / 2;
  return [
    { xMm, yMm: 0 },
    { xMm, yMm: middle - half },
    { xMm: xMm + half, yMm: middle - half / 2 },
    { xMm: xMm - half, yMm: middle + half / 2 },
    { xMm, yMm: middle + half },
    { xMm, yMm: thicknessMm },
  ];
}

/** The outline as an SVG path, which paper draws too. */
export function outlinePath(outline: readonly OutlinePoint[], at: Placement): string {
  const points = outline.map(({ xMm, yMm }) => `${at.xPx + xMm * at.pxPerMm} ${at.yPx + yMm * at.pxPerMm}`);
  return `M ${points.join(' L ')} Z`;
}
