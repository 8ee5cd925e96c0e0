import type { BarStandard } from '#shared/engine/section.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { cutColumns, nearestSection, type Cut, type CutQuery, type PickQuery } from './cut.ts';
import { FeasibleColumns } from './feasible-columns.ts';

export type FeasibleRequest =
  | {
      readonly kind: 'open';
      readonly problem: SweepProblem;
      readonly view: View;
      readonly standard: BarStandard;
      readonly mostFeasible: number;
    }
  | { readonly kind: 'cut'; readonly id: number; readonly query: CutQuery }
  | { readonly kind: 'pick'; readonly id: number; readonly query: PickQuery };

export type FeasibleAnswer =
  | { readonly kind: 'opened'; readonly count: number }
  /** More sections meet every check than are held in a browser. */
  | { readonly kind: 'too-many' }
  | { readonly kind: 'cut'; readonly id: number; readonly cut: Cut }
  | { readonly kind: 'pick'; readonly id: number; readonly index: number | null };

let columns: FeasibleColumns | null = null;

const answer = (message: FeasibleAnswer): void => postMessage(message);

function open({ problem, view, standard, mostFeasible }: FeasibleRequest & { readonly kind: 'open' }): void {
  const opened = new FeasibleColumns(problem, view, standard);
  for (let from = 0; from < opened.space.size; from = opened.advance(from))
    if (opened.count > mostFeasible) return answer({ kind: 'too-many' });
  columns = opened;
  answer({ kind: 'opened', count: opened.count });
}

addEventListener('message', ({ data }: MessageEvent<FeasibleRequest>) => {
  if (data.kind === 'open') open(data);
  else if (columns === null) return;
  else if (data.kind === 'cut') answer({ kind: 'cut', id: data.id, cut: cutColumns(columns, data.query) });
  else answer({ kind: 'pick', id: data.id, index: nearestSection(columns, data.query) });
});
