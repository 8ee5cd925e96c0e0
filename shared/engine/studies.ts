import { curveReportOf, secondOpinionReport, type CurveReport } from './curve-report.ts';
import type { EvaluationContext } from './evaluate.ts';
import { scatterOf, type Scatter } from './scatter.ts';
import type { SecondOpinion } from './second-opinion.ts';
import type { SectionInput } from './section.ts';
import { twinOf, type TwinComparison } from './twin.ts';

/** What is looked at of one section beyond its checks: plain JSON. Null where it does not apply, see each. */
export interface Studies {
  readonly curve: CurveReport | null;
  readonly secondOpinion: SecondOpinion | null;
  readonly twin: TwinComparison | null;
  readonly scatter: Scatter;
}

/**
 * The full curve, the same by strips, the singly reinforced twin and what scatter in execution does. Some tens of
 * milliseconds: for one section that was chosen, never for a sweep.
 * @throws InvalidSectionError as `evaluateSection`.
 */
export const studiesOf = (section: SectionInput, context: EvaluationContext): Studies => ({
  curve: curveReportOf(section, context),
  secondOpinion: secondOpinionReport(section, context),
  twin: twinOf(section, context),
  scatter: scatterOf(section, context),
});
