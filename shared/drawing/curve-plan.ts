import type { UnitSystem } from '../contract/design-basis.ts';
import { formatNumber } from '../print/format-quantity.ts';
import { displayUnit, toDisplay } from '../print/units.ts';

/** A state of a section's curve: curvature 1/mm, moment N·mm. */
export interface CurveState {
  readonly curvaturePerMm: number;
  readonly momentNmm: number;
}

/** One section's moment–curvature as it is to be drawn. */
export interface PlottedCurve {
  /** Written at the curve's end; empty for none. */
  readonly label: string;
  readonly points: readonly CurveState[];
  /** Numbered along the curve in this order, from 1. */
  readonly marks: readonly CurveState[];
  /** Corner of the two straight lines that stand for the curve. */
  readonly corner: CurveState | null;
}

/** A moment the curves are held against: Mu, φMn. */
export interface MomentLevel {
  readonly label: string;
  readonly momentNmm: number;
}

export interface CurvePlanInput {
  readonly curves: readonly PlottedCurve[];
  readonly levels: readonly MomentLevel[];
  readonly units: UnitSystem;
}

interface Tick {
  readonly atPx: number;
  readonly text: string;
}
interface PlacedText {
  readonly xPx: number;
  readonly yPx: number;
  readonly text: string;
}

/** Lines, marks and words of a plot, in the sheet's own pixels; page and paper scale the whole of it. */
export interface CurvePlan {
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly levels: readonly { readonly yPx: number; readonly text: string }[];
  readonly curves: readonly {
    readonly path: string;
    /** Bilinear idealisation; null where there is none. */
    readonly twoLines: string | null;
    readonly end: PlacedText;
    readonly dots: readonly { readonly xPx: number; readonly yPx: number }[];
    readonly numbers: readonly PlacedText[];
  }[];
}

export const CURVE_SHEET = { width: 440, height: 270, left: 54, right: 30, top: 30, bottom: 42 } as const;
const FRAME = {
  right: CURVE_SHEET.width - CURVE_SHEET.right,
  bottom: CURVE_SHEET.height - CURVE_SHEET.bottom,
} as const;
const MOST_TICKS = 6;
/** Room above the highest moment, so that its number does not touch the frame. */
const HEADROOM = 1.06;
/** Marks nearer than this are numbered together. */
const SAME_PLACE_PX = 20;
/** Numbers stand off the highest of their marks, clear of the axis and of the curve that rises to the left of it. */
const NUMBER_OFF_PX = { x: 4, y: -7 } as const;

/** A step of 1, 2, 2.5 or 5 times a power of ten that takes `most` steps at most. */
function niceStep(most: number, steps: number): number {
  const rough = most / steps;
  const power = 10 ** Math.floor(Math.log10(rough));
  const lead = [1, 2, 2.5, 5, 10].find((one) => one * power >= rough * (1 - 1e-9)) ?? 10;
  return lead * power;
}

function ticksTo(most: number): number[] {
  if (!(most > 0)) return [0];
  const step = niceStep(most, MOST_TICKS);
  return Array.from({ length: Math.floor(most / step + 1e-9) + 1 }, (_, i) => i * step);
}

/** Moment over curvature of one section or of several, from a common origin. */
export function curvePlan({ curves, levels, units }: CurvePlanInput): CurvePlan {
  const states = curves.flatMap(({ points, corner }) => (corner === null ? points : [...points, corner]));
  const most = {
    x: toDisplay(Math.max(0, ...states.map((state) => state.curvaturePerMm)), 'curvature', units),
    y: toDisplay(
      HEADROOM *
        Math.max(0, ...states.map((state) => state.momentNmm), ...levels.map((level) => level.momentNmm)),
      'moment',
      units,
    ),
  };
  const xOf = (curvature: number) =>
    CURVE_SHEET.left +
    ((FRAME.right - CURVE_SHEET.left) * toDisplay(curvature, 'curvature', units)) / (most.x || 1);
  const yOf = (moment: number) =>
    FRAME.bottom - ((FRAME.bottom - CURVE_SHEET.top) * toDisplay(moment, 'moment', units)) / (most.y || 1);
  const place = ({ curvaturePerMm, momentNmm }: CurveState) => ({
    xPx: round(xOf(curvaturePerMm)),
    yPx: round(yOf(momentNmm)),
  });
  const tick = (value: number, atPx: number): Tick => ({
    atPx: round(atPx),
    text: formatNumber(value, 4, true),
  });
  return {
    xTicks: ticksTo(most.x).map((value) => tick(value, xOf(value * displayUnit('curvature', units).perUnit))),
    yTicks: ticksTo(most.y).map((value) => tick(value, yOf(value * displayUnit('moment', units).perUnit))),
    xTitle: `Curvature φ, ${displayUnit('curvature', units).label}`,
    yTitle: `Moment M, ${displayUnit('moment', units).label}`,
    levels: levels.map(({ label, momentNmm }) => ({ yPx: round(yOf(momentNmm)), text: label })),
    curves: curves.map(({ label, points, marks, corner }) => {
      const line = points.map(place);
      const last = line.at(-1) ?? { xPx: CURVE_SHEET.left, yPx: FRAME.bottom };
      const dots = marks.map(place);
      return {
        path: pathOf(line),
        twoLines:
          corner === null
            ? null
            : pathOf([
                place({ curvaturePerMm: 0, momentNmm: 0 }),
                place(corner),
                { xPx: last.xPx, yPx: place(corner).yPx },
              ]),
        end: { ...last, text: label },
        dots,
        numbers: numbersOf(dots),
      };
    }),
  };
}

/** A tenth of a pixel is finer than any screen or printer draws. */
const round = (px: number): number => Math.round(px * 10) / 10;

const pathOf = (points: readonly { readonly xPx: number; readonly yPx: number }[]): string =>
  `M ${points.map(({ xPx, yPx }) => `${xPx} ${yPx}`).join(' L ')}`;

/** Marks that lie together are numbered together: `3, 4`. */
function numbersOf(dots: readonly { readonly xPx: number; readonly yPx: number }[]): PlacedText[] {
  const groups: { xPx: number; yPx: number; numbers: number[] }[] = [];
  dots.forEach(({ xPx, yPx }, i) => {
    const near = groups.find((group) => Math.hypot(group.xPx - xPx, group.yPx - yPx) < SAME_PLACE_PX);
    if (near === undefined) groups.push({ xPx, yPx, numbers: [i + 1] });
    else {
      near.numbers.push(i + 1);
      near.yPx = Math.min(near.yPx, yPx);
    }
  });
  return groups.map(({ xPx, yPx, numbers }) => ({
    xPx: round(xPx + NUMBER_OFF_PX.x),
    yPx: round(yPx + NUMBER_OFF_PX.y),
    text: numbers.join(', '),
  }));
}
