import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { MomentLevel } from '#shared/drawing/curve-plan.ts';
import type { CurveReport, HingeReport, LawText } from '#shared/engine/curve-report.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import { CurvePlot } from '#client/src/drawing/curve-plot.tsx';
import { KeyValue } from '#client/src/ui/key-value.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

interface CurveViewProps {
  readonly report: CurveReport;
  readonly levels: readonly MomentLevel[];
  readonly units: UnitSystem;
}

const cornerOf = ({ bilinear }: CurveReport) =>
  bilinear === null ? null : { curvaturePerMm: bilinear.yieldCurvaturePerMm, momentNmm: bilinear.momentNmm };

/** The full curve with its marks, what each mark means, and the laws it was drawn by. */
export function CurveView({ report, levels, units }: CurveViewProps) {
  return (
    <div className="grid items-start gap-x-10 gap-y-4 @3xl:grid-cols-2">
      <figure className="keep-together min-w-0 @3xl:row-span-2">
        <CurvePlot
          title="Moment over curvature, its marked points in the table below"
          curves={[{ label: '', points: report.points, marks: report.marks, corner: cornerOf(report) }]}
          levels={levels}
          units={units}
        />
        <figcaption className="text-xs text-muted">
          Solid: {(report.core ?? report.concrete).name} concrete, {report.steel.name} steel.
          {report.bilinear !== null && ' Dashed: two lines of the same area under them.'} It ends where{' '}
          {report.causeText}.
        </figcaption>
      </figure>
      {report.failsAtCracking && (
        <p className="border-l-2 border-fails py-1 pl-3 text-sm text-fails">
          The first crack takes more moment than the cracked section can carry: it would fail as it cracks.
        </p>
      )}
      <div className="min-w-0">
        <MarkTable report={report} units={units} />
      </div>
      <div className="grid min-w-0 gap-3">
        <Laws report={report} units={units} />
        {report.hinge !== null && <Hinge hinge={report.hinge} units={units} />}
      </div>
    </div>
  );
}

function MarkTable({ report, units }: { readonly report: CurveReport; readonly units: UnitSystem }) {
  const bare = { hideUnit: true, digits: 4 } as const;
  return (
    <TableFrame label="Marked points of the curve">
      <thead>
        <tr>
          <th scope="col">Point</th>
          <th scope="col" className="figure">
            φ, {unitLabel('curvature', units)}
          </th>
          <th scope="col" className="figure">
            M, {unitLabel('moment', units)}
          </th>
          <th scope="col" className="figure">
            Axis, {unitLabel('length', units)}
          </th>
        </tr>
      </thead>
      <tbody>
        {report.marks.map((mark, i) => (
          <tr key={mark.id}>
            <th scope="row" className="font-normal">
              <span className="num font-semibold">{i + 1}</span> {mark.label}
              <span className="block text-2xs text-muted">{mark.definition}</span>
            </th>
            <td className="figure">{formatQuantity(mark.curvaturePerMm, 'curvature', units, bare)}</td>
            <td className="figure">{formatQuantity(mark.momentNmm, 'moment', units, bare)}</td>
            <td className="figure">{formatQuantity(mark.axisMm, 'length', units, bare)}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}

interface LawProps {
  readonly title: string;
  readonly law: LawText;
  readonly units: UnitSystem;
}

function Law({ title, law, units }: LawProps) {
  return (
    <div className="border-t border-rule py-1.5 text-sm">
      <dt className="font-medium">
        {title}: {law.name}
      </dt>
      <dd className="text-muted">
        {quantitiesInText(law.formula, units)} <span className="text-2xs">{law.source}</span>
      </dd>
    </div>
  );
}

function Laws({ report, units }: { readonly report: CurveReport; readonly units: UnitSystem }) {
  return (
    <dl>
      <Law title={report.core === null ? 'Concrete' : 'Cover'} law={report.concrete} units={units} />
      {report.core !== null && <Law title="Core within the hoops" law={report.core} units={units} />}
      <Law title="Steel" law={report.steel} units={units} />
      {report.confinementNote !== '' && (
        <div className="border-t border-rule py-1.5 text-sm">
          <dt className="font-medium">Confinement</dt>
          <dd className="text-muted">{quantitiesInText(report.confinementNote, units)}</dd>
        </div>
      )}
    </dl>
  );
}

function Hinge({ hinge, units }: { readonly hinge: HingeReport; readonly units: UnitSystem }) {
  return (
    <section>
      <h4 className="pb-1 text-xs font-semibold text-muted">Plastic hinge</h4>
      <KeyValue
        items={[
          { label: `L, ${hinge.lengthIs}`, value: formatQuantity(hinge.lengthMm, 'span', units) },
          { label: 'Lp', value: formatQuantity(hinge.hingeLengthMm, 'length', units, { digits: 3 }) },
          {
            label: 'θp',
            value:
              hinge.plasticRotation === null
                ? 'no bar yields'
                : `${formatQuantity(hinge.plasticRotation, 'ratio', units)} rad`,
          },
          {
            label: 'μΔ',
            value:
              hinge.displacementDuctility === null
                ? 'no bar yields'
                : formatQuantity(hinge.displacementDuctility, 'ratio', units),
          },
        ]}
      />
      <p className="pt-1 text-xs text-muted">{hinge.definition}.</p>
    </section>
  );
}
