import { useMemo, type ReactNode } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { curveReportOf, type CurveReport } from '#shared/engine/curve-report.ts';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import { scatterOf } from '#shared/engine/scatter.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { twinOf } from '#shared/engine/twin.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { faceWord } from '#shared/print/face-word.ts';
import type { Space } from '#shared/sweep/problem.ts';
import { CurveView } from './curve-view.tsx';
import { DuctilityRange } from './ductility-range.tsx';
import { NeighbourTable } from './neighbour-table.tsx';
import { neighboursOf } from './neighbours.ts';
import { ScatterTable } from './scatter-table.tsx';
import { TwinTable } from './twin-table.tsx';

export interface SectionStudyProps {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  /** What it was judged by; the same object as long as it is the same. */
  readonly context: EvaluationContext;
  readonly units: UnitSystem;
  readonly isMoneyHidden: boolean;
  /** The run's space, where the section is one of a run. */
  readonly space: Space | null;
  readonly onSelect?: ((index: number) => void) | undefined;
  /** How the page sets each part: a fold in the inspector, a heading on a candidate. */
  readonly part: (part: {
    readonly id: string;
    readonly title: string;
    readonly body: ReactNode;
  }) => ReactNode;
}

/** What lies behind a section's checks: its whole curve, what its numbers depend on, and what lies next to it. */
export default function SectionStudy(props: SectionStudyProps) {
  const { part } = props;
  return (
    <>
      {part({ id: 'curve', title: 'Moment–curvature', body: <Curve {...props} /> })}
      {part({ id: 'ductility', title: 'Ductility by every convention', body: <Conventions {...props} /> })}
      {part({ id: 'twin', title: 'Beside its singly reinforced twin', body: <Twin {...props} /> })}
      {part({ id: 'scatter', title: 'Where execution strays', body: <Scatter {...props} /> })}
      {part({ id: 'steps', title: 'One step away', body: <Steps {...props} /> })}
    </>
  );
}

const NOT_PLACED = <p className="text-muted">The bars cannot be placed: there is nothing to compute.</p>;

const useCurve = ({ section, context }: SectionStudyProps): CurveReport | null =>
  useMemo(() => curveReportOf(section, context), [section, context]);

function Curve(props: SectionStudyProps) {
  const report = useCurve(props);
  if (report === null) return NOT_PLACED;
  const { context } = props;
  const { muNmm } = context.demand;
  const levels =
    muNmm === null ? [] : [{ label: codeSymbols(context.basis.ruleSet).moment, momentNmm: muNmm }];
  return <CurveView report={report} levels={levels} units={props.units} />;
}

function Conventions(props: SectionStudyProps) {
  const report = useCurve(props);
  if (report === null) return NOT_PLACED;
  return <DuctilityRange conventions={report.ductility} target={props.context.demand.ductilityTarget} />;
}

function Twin({ section, context, units }: SectionStudyProps) {
  const comparison = useMemo(() => twinOf(section, context), [section, context]);
  if (comparison === null)
    return (
      <p className="text-muted">
        It has no {faceWord('compression', section)} bars that count, or none can be placed: it is its own
        twin.
      </p>
    );
  return (
    <TwinTable
      comparison={comparison}
      units={units}
      symbols={codeSymbols(context.basis.ruleSet)}
      compressionFace={faceWord('compression', section)}
    />
  );
}

function Scatter({ section, context, units }: SectionStudyProps) {
  const scatter = useMemo(() => scatterOf(section, context), [section, context]);
  return <ScatterTable scatter={scatter} units={units} symbols={codeSymbols(context.basis.ruleSet)} />;
}

function Steps(props: SectionStudyProps) {
  const { section, context, units, space } = props;
  const { barStandard } = context.basis;
  const neighbours = useMemo(
    () => neighboursOf(section, context, { units, standard: barStandard, space }),
    [section, context, units, barStandard, space],
  );
  return <NeighbourTable {...props} neighbours={neighbours} />;
}
