import { useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { curveReportOf, type CurveMarkId, type CurveReport } from '#shared/engine/curve-report.ts';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { CurvePlot } from '#client/src/drawing/curve-plot.tsx';
import { CURVE_STROKES } from '#client/src/drawing/curve-strokes.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

export interface CurveComparisonProps {
  /** The same array as long as it is the same sections. */
  readonly sections: readonly {
    readonly id: string;
    readonly label: string;
    readonly section: SectionInput;
    readonly context: EvaluationContext;
  }[];
  readonly units: UnitSystem;
}

type Drawn = CurveComparisonProps['sections'][number] & { readonly report: CurveReport };

const markOf = ({ report }: Drawn, id: CurveMarkId) => report.marks.find((mark) => mark.id === id) ?? null;
const ductilityOf = ({ report }: Drawn, id: string) =>
  report.ductility.find((one) => one.id === id)?.value ?? null;

/** Laws and end in one line: curves by different laws are not to be read against each other. */
const lawsOf = ({ report }: Drawn): string =>
  `${(report.core ?? report.concrete).name} concrete, ${report.steel.name} steel`;

/** Curves of several sections over each other, and the table of their marks. */
export default function CurveComparison({ sections, units }: CurveComparisonProps) {
  const drawn = useMemo(
    () =>
      sections.flatMap((one): Drawn[] => {
        const report = curveReportOf(one.section, one.context);
        return report === null ? [] : [{ ...one, report }];
      }),
    [sections],
  );
  if (drawn.length === 0) return <p className="text-muted">None of their bars can be placed.</p>;
  const laws = [...new Set(drawn.map(lawsOf))];
  const bare = { hideUnit: true } as const;
  return (
    <div className="grid items-start gap-x-10 gap-y-4 grid-cols-[minmax(0,1fr)] xl:grid-cols-[32rem_minmax(0,1fr)]">
      <figure>
        <CurvePlot
          title={`Moment over curvature of ${drawn.map(({ label }) => label).join(', ')}`}
          curves={drawn.map((one) => ({
            label: one.label,
            points: one.report.points,
            marks: ['first-yield', 'ultimate'].flatMap((id) => markOf(one, id as CurveMarkId) ?? []),
            corner: null,
          }))}
          levels={[]}
          units={units}
        />
        <figcaption className="text-xs text-muted">
          {laws.join('; ')}. Circles: first yield and ultimate.
          {laws.length > 1 && ' △ Drawn by different laws: what the laws do is not what the sections do.'}
        </figcaption>
      </figure>
      <TableFrame label="Moment–curvature of all">
        <thead>
          <tr>
            <th scope="col">Candidate</th>
            <th scope="col" className="figure">
              φy, {unitLabel('curvature', units)}
            </th>
            <th scope="col" className="figure">
              My, {unitLabel('moment', units)}
            </th>
            <th scope="col" className="figure">
              φu
            </th>
            <th scope="col" className="figure">
              M at φu
            </th>
            <th scope="col" className="figure">
              μφ first yield
            </th>
            <th scope="col" className="figure">
              μφ bilinear
            </th>
          </tr>
        </thead>
        <tbody>
          {drawn.map((one, i) => {
            const [first, last] = [markOf(one, 'first-yield'), markOf(one, 'ultimate')];
            return (
              <tr key={one.id}>
                <th scope="row">
                  <span className="inline-flex items-center gap-2">
                    {one.label} <StrokeSample at={i} />
                  </span>
                  <span className="block text-2xs font-normal text-muted">
                    ends where {one.report.causeText}
                  </span>
                </th>
                <td className="figure">{formatQuantity(first?.curvaturePerMm, 'curvature', units, bare)}</td>
                <td className="figure">{formatQuantity(first?.momentNmm, 'moment', units, bare)}</td>
                <td className="figure">{formatQuantity(last?.curvaturePerMm, 'curvature', units, bare)}</td>
                <td className="figure">{formatQuantity(last?.momentNmm, 'moment', units, bare)}</td>
                <td className="figure">{ratioText(ductilityOf(one, 'curve-first-yield'))}</td>
                <td className="figure">{ratioText(ductilityOf(one, 'curve-bilinear'))}</td>
              </tr>
            );
          })}
        </tbody>
      </TableFrame>
    </div>
  );
}

const ratioText = (value: number | null): string => (value === null ? 'no yield' : formatNumber(value));

function StrokeSample({ at }: { readonly at: number }) {
  const stroke = CURVE_STROKES[at % CURVE_STROKES.length]!;
  return (
    <svg width={34} height={6} aria-hidden="true">
      <path d="M 0 3 H 34" className={stroke.className} strokeWidth={2} strokeDasharray={stroke.dash} />
    </svg>
  );
}
