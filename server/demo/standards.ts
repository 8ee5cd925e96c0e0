import type { OfficeStandardInput, UsualRanges } from '#shared/contract/office-standard.ts';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';

/** The invented practice's standards. */
export interface DemoStandard {
  readonly key: string;
  readonly standard: OfficeStandardInput;
}

const upTo = (last: number): number[] => Array.from({ length: last - 1 }, (_, i) => i + 2);

type RangeRow = readonly [
  name: string,
  width: readonly [number, number],
  depth: readonly [number, number],
  tension: number,
  compression: number,
];

const rangesIn =
  (mm: number) =>
  ([name, [b0, b1], [h0, h1], tension, compression]: RangeRow): UsualRanges => ({
    name,
    leastWidthMm: b0 * mm,
    mostWidthMm: b1 * mm,
    leastDepthMm: h0 * mm,
    mostDepthMm: h1 * mm,
    tensionCounts: upTo(tension),
    compressionCounts: upTo(compression),
  });

const RULES: OfficeStandardInput['rules'] = {
  minDepthToWidth: 1,
  maxDepthToWidth: 3,
  maxLayers: 2,
  oneSizePerFace: true,
  minCompressionShare: null,
  requireHangers: true,
};

export const DEMO_STANDARDS: readonly DemoStandard[] = [
  {
    key: 'us',
    standard: {
      name: 'US customary, Grade 60',
      units: 'us',
      barStandard: 'astm',
      bars: {
        tension: ['#6', '#7', '#8', '#9', '#10'],
        compression: ['#5', '#6', '#7'],
        stirrups: [{ bar: '#3', legs: 2, spacingMm: 8 * MM_PER_IN }],
      },
      mixesMPa: [4000, 5000, 6000, 7000].map((psi) => psi * MPA_PER_PSI),
      increments: { widthMm: 2 * MM_PER_IN, depthMm: MM_PER_IN },
      rules: RULES,
      ranges: (
        [
          ['Floor beams', [12, 18], [16, 32], 8, 4],
          ['Wide and shallow', [18, 36], [14, 22], 12, 4],
          ['Transfer beams', [18, 30], [30, 60], 12, 6],
        ] as const
      ).map(rangesIn(MM_PER_IN)),
    },
  },
  {
    key: 'si',
    standard: {
      name: 'Metric, B500 and 420',
      units: 'si',
      barStandard: 'iso',
      bars: {
        tension: ['16', '20', '25', '32'],
        compression: ['12', '16', '20'],
        stirrups: [{ bar: '10', legs: 2, spacingMm: 200 }],
      },
      mixesMPa: [25, 30, 35],
      increments: { widthMm: 50, depthMm: 50 },
      rules: RULES,
      ranges: (
        [
          ['Floor beams', [300, 500], [400, 800], 8, 4],
          ['Ground beams', [400, 700], [500, 1000], 10, 4],
        ] as const
      ).map(rangesIn(1)),
    },
  },
];
