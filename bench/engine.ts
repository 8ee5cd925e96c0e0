import { evaluateSection } from '#shared/engine/evaluate.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { median, report } from './report.ts';

/** What explaining a section costs against sweeping it, in one run: the explaining layer over the hot loop. */
const prepared = prepareSweep(OFFICE_PROBLEM, { x: 'steelKgPerM', y: 'curvatureDuctility' });
const { size } = prepared.space;
const step = 97;
const indices = Array.from({ length: Math.floor(size / step) }, (_, i) => i * step);

const explained = median(7, () => {
  for (const index of indices) evaluateSection(sectionAt(prepared.space, index), OFFICE_PROBLEM);
  return indices.length;
});
const swept = median(7, () => {
  sweepRange(prepared, 0, size);
  return size;
});

report('evaluateSection', { 'ns a section': explained.nsEach });
report('hot loop', { 'ns a section': swept.nsEach });
report('ratio', { 'explaining / sweeping': explained.nsEach / swept.nsEach });
