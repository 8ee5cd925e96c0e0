import { fullBasisSchema } from '#shared/contract/design-basis.ts';
import type { Person, Run, RunSummary, ViewEvent, ViewProgress } from '#shared/contract/records.ts';
import { viewOf } from '#shared/sweep/problem.ts';
import { canSeeRates } from '../../http/project-access.ts';
import { canSeeView } from './policy.ts';
import type { RunRecord, ViewRow } from './queries.ts';

const COSTS_HIDDEN = 'Your role may not see costs, and this view ranks by them';

type ViewState = Omit<ViewRow, 'result'>;

function presentViewState(view: ViewState, sectionCount: number): Omit<ViewProgress, 'result'> {
  return {
    viewId: view.id,
    sequence: view.sequence,
    view: viewOf(view),
    state: view.state,
    evaluated: view.evaluated,
    feasible: view.feasible,
    sectionCount,
    search: view.search,
    elapsedMs: view.elapsedMs,
    message: view.message,
  };
}

/** For a reader who may not see rates, costs are taken out of the result, or the result where it ranks by them. */
export function presentViewProgress(view: ViewRow, sectionCount: number, person: Person): ViewProgress {
  const state = presentViewState(view, sectionCount);
  if (!canSeeView(person, view)) return { ...state, result: null, message: COSTS_HIDDEN };
  if (view.result === null || canSeeRates(person)) return { ...state, result: view.result };
  const best = view.result.best.filter(({ measure }) => measure !== 'costPerM');
  return { ...state, result: { ...view.result, best } };
}

/** A change for whoever has the view's result already, unless that changed as well. */
export function presentViewEvent(
  { view, isResultNew }: { view: ViewRow; isResultNew: boolean },
  sectionCount: number,
  person: Person,
): ViewEvent {
  return isResultNew ? presentViewProgress(view, sectionCount, person) : presentViewState(view, sectionCount);
}

interface RunParts extends RunRecord {
  readonly summary: RunSummary;
  readonly taken: Run['taken'];
  readonly views: readonly ViewState[];
}

export function presentRun(
  { run, sweep, beam, project, summary, taken, views }: RunParts,
  person: Person,
): Run {
  const { id, mark, location, spanMm, count } = beam;
  return {
    ...summary,
    projectId: project.id,
    beam: { id, mark, location, spanMm, count },
    sweepName: sweep.name,
    definition: run.definition,
    basis: fullBasisSchema.parse(canSeeRates(person) ? run.basis : { ...run.basis, rates: null }),
    taken,
    views: views.map((view) => presentViewState(view, run.sectionCount)),
  };
}
