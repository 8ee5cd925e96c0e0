import type { BarGroup } from '#shared/engine/section.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { OFFICE_PROBLEM } from './office-problem.ts';

const SIZES = ['12', '14', '16', '18', '20', '25', '28', '32'];
const COUNTS = Array.from({ length: 20 }, (_, i) => i + 2);
const STRENGTHS = [25, 28, 30, 32, 35, 38, 40, 45, 50, 55];
/** Groups of two sizes, as many as a definition takes. */
const MIXED: BarGroup[] = SIZES.flatMap((bar, i) =>
  SIZES.slice(i + 1).flatMap((other) =>
    [2, 3, 4].flatMap((count) =>
      [2, 3, 4].map((more) => [
        { bar, count },
        { bar: other, count: more },
      ]),
    ),
  ),
).slice(0, 200);

/** 40 widths × 121 depths × 10 strengths × 360 × 360 bar sets. */
const SECTIONS_A_STIRRUP = 40 * 121 * 10 * 360 * 360;

/** The office sweep with every axis as fine as anybody would ask, in about as many sections as asked. */
export function vastProblem(sections: number): SweepProblem {
  const { space, rules, basis } = OFFICE_PROBLEM;
  const bars = { kind: 'bars', sizes: SIZES, counts: COUNTS, none: false, mixed: MIXED } as const;
  const share = Math.max(1, Math.round(sections / SECTIONS_A_STIRRUP));
  const isPart = sections < SECTIONS_A_STIRRUP;
  const widths = isPart ? Math.max(1, Math.round((40 * sections) / SECTIONS_A_STIRRUP)) : 40;
  return {
    ...OFFICE_PROBLEM,
    space: {
      ...space,
      width: { kind: 'range', from: 250, to: 250 + 10 * (widths - 1), step: 10 },
      depth: { kind: 'range', from: 400, to: 1000, step: 5 },
      fc: { kind: 'list', values: STRENGTHS },
      stirrups: Array.from({ length: share }, (_, i) => ({
        bar: i % 2 === 0 ? '10' : '12',
        legs: 2,
        spacingMm: 150 + 10 * Math.floor(i / 2),
      })),
      tension: bars,
      compression: bars,
    },
    rules: { ...rules, oneSizePerFace: false },
    basis: {
      ...basis,
      rates: {
        ...basis.rates!,
        concrete: STRENGTHS.map((fcMPa) => ({
          fcMPa,
          costPerM3: 78 + fcMPa,
          co2eKgPerM3: 150 + 4 * fcMPa,
        })),
      },
    },
  };
}
