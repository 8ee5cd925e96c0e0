import { availableParallelism } from 'node:os';
import { amountTables } from '#shared/sweep/amount-tables.ts';
import { framePlaces, decodeFrames } from '#shared/sweep/feasible-frame.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { rankFrames } from '#shared/sweep/rank-frames.ts';
import { rankKept } from '#shared/sweep/rank-kept.ts';
import { changedRates } from '#shared/sweep/rate-changes.ts';
import { openSweep, sweepRange } from '#shared/sweep/sweep-range.ts';
import { startRankDesk } from '#server/compute/rank-desk.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { median, report } from './report.ts';

/** Views and rates from kept sections: about a million that meet every check, of some three million. */
const PROBLEM: SweepProblem = {
  ...OFFICE_PROBLEM,
  demand: { ...OFFICE_PROBLEM.demand, muNmm: 150e6, ductilityTarget: 3 },
  rules: { ...OFFICE_PROBLEM.rules, oneSizePerFace: true, maxDepthToWidth: null },
  space: {
    ...OFFICE_PROBLEM.space,
    width: { kind: 'range', from: 300, to: 600, step: 50 },
    depth: { kind: 'range', from: 400, to: 900, step: 4 },
  },
};
const COST_AND_DUCTILITY: View = { x: 'costPerM', y: 'curvatureDuctility' };
const CHUNK = 2 ** 18;

const prepared = prepareSweep(PROBLEM, COST_AND_DUCTILITY);
const { size } = prepared.space;
const starts = Array.from({ length: Math.ceil(size / CHUNK) }, (_, i) => i * CHUNK);

function sweep(keeping: { readonly hasNumbers: boolean } | null) {
  return starts.map((from) => {
    const steps = openSweep(prepared, { keeping });
    steps.advance(from, Math.min(size, from + CHUNK));
    return { chunk: steps.finish(), kept: steps.kept() };
  });
}

const plain = median(3, () => sweep(null).length && size);
const keeping = median(3, () => sweep({ hasNumbers: true }).length && size);
const pieces = sweep({ hasNumbers: true });
const feasible = pieces.reduce((sum, { chunk }) => sum + chunk.feasible, 0);
const bytes = (kept: typeof pieces) => kept.reduce((sum, piece) => sum + piece.kept!.frame!.length, 0);
report('sweep that keeps its sections', {
  sections: size,
  feasible,
  'times as long as one that does not': keeping.nsEach / plain.nsEach,
  'bytes a section': bytes(pieces) / feasible,
  'of it without numbers': bytes(sweep({ hasNumbers: false })) / feasible,
});

const block = new SharedArrayBuffer(bytes(pieces));
const all = new Uint8Array(block);
let at = 0;
for (const { kept } of pieces) {
  all.set(kept!.frame!, at);
  at += kept!.frame!.length;
}
const frames = decodeFrames(all);
const bare = decodeFrames(
  new Uint8Array(Buffer.concat(sweep({ hasNumbers: false }).map((piece) => piece.kept!.frame!))),
);
const rates = changedRates(PROBLEM.basis.rates!, { steel: 12, formwork: -7 });
const ranking = (view: View) => ({
  ...{ tables: amountTables(PROBLEM), view, rates, muNmm: PROBLEM.demand.muNmm, filter: null, witness: null },
});

for (const view of [COST_AND_DUCTILITY, { x: 'costPerM', y: 'depthMm' } as const]) {
  const fresh = prepareSweep({ ...PROBLEM, basis: { ...PROBLEM.basis, rates } }, view);
  const swept = median(3, () => sweepRange(fresh, 0, size).evaluated);
  const ranked = median(5, () => rankFrames(frames, ranking(view)).front.length && feasible);
  const solved = median(3, () => rankKept(bare, ranking(view), () => fresh).front.length && feasible);
  report(`${view.x} against ${view.y}, other rates`, {
    'ns a kept section': ranked.nsEach,
    'ms a million': ranked.nsEach,
    'times as fast as sweeping': (swept.nsEach * size) / (ranked.nsEach * feasible),
    'without numbers': (swept.nsEach * size) / (solved.nsEach * feasible),
  });
}

const desk = await startRankDesk(availableParallelism());
const kept = { block, frames: framePlaces(all) };
const times: number[] = [];
for (let i = 0; i < 9; i++) {
  const start = performance.now();
  await desk.rank(kept, {
    ...{ problem: PROBLEM, view: COST_AND_DUCTILITY, rates, filters: {}, isCompared: true },
  });
  times.push(performance.now() - start);
}
await desk.close();
const sorted = times.slice(2).sort((a, b) => a - b);
report('rate change at the desk, by the clock', {
  'ms a million, median': (sorted[3]! * 1e6) / feasible,
  best: (sorted[0]! * 1e6) / feasible,
  'share of 150 ms': (sorted[3]! * 1e6) / feasible / 150,
  threads: availableParallelism(),
});
