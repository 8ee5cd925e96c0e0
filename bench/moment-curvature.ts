import { CONCRETE_LAW_IDS, STEEL_LAW_IDS } from '#shared/engine/curve-choices.ts';
import { curveEnds } from '#shared/engine/curve-ductility.ts';
import { curveMaterials, curveModel, curveModelOf } from '#shared/engine/curve-model.ts';
import { fibreCurve } from '#shared/engine/fibre.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { bestOfEach, costs, report } from './report.ts';

/**
 * Curves of sections drawn evenly from the office's space: with all marks and words, laws made anew for each, and as a sweep
 * draws them, for the ductility alone with the laws of its materials shared. Target: 50 µs the median curve, each in the best
 * of its rounds by the clock; means are by processor time, in the best round. The second algorithm, which integrates strips, is timed on a few of the same sections.
 */
const { basis, rules } = OFFICE_PROBLEM;
const { space } = prepareSweep(OFFICE_PROBLEM, { x: 'steelKgPerM', y: 'curvatureDuctility' });
const WANTED = 400;
const ROUNDS = 15;
const STRIP_ROUNDS = 3;
const STRIP_SECTIONS = 20;
const sections = Array.from({ length: WANTED }, (_, i) =>
  sectionAt(space, Math.floor(((i + 0.5) * space.size) / WANTED)),
).flatMap((section) => {
  const { layout, arrangement } = placeSteel(section, basis, rules.maxLayers);
  return layout ? [{ section, layout, arrangement, basis }] : [];
});

for (const concreteLaw of CONCRETE_LAW_IDS)
  for (const steelLaw of STEEL_LAW_IDS) {
    const choices = { concreteLaw, steelLaw };
    const shared = new Map(
      space.fcMPa.map((fcMPa) => [fcMPa, curveMaterials({ fcMPa, fyMPa: 420 }, basis, choices)]),
    );
    const whole = costs(ROUNDS, () => {
      for (const section of sections) momentCurvature({ ...section, choices });
      return sections.length;
    });
    const models = costs(ROUNDS, () => {
      for (const section of sections) curveModel({ ...section, choices });
      return sections.length;
    });
    const lean = costs(ROUNDS, () => {
      for (const one of sections)
        curveEnds(curveModelOf({ ...one, choices }, shared.get(one.section.fcMPa)!));
      return sections.length;
    });
    const one = bestOfEach(ROUNDS, sections, (section) => momentCurvature({ ...section, choices }));
    const some = sections.slice(0, STRIP_SECTIONS).map((section) => curveModel({ ...section, choices }));
    const strips = bestOfEach(STRIP_ROUNDS, some, (model) => fibreCurve(model));
    report(`${concreteLaw}, ${steelLaw}`, {
      'µs the median curve': one.median,
      'the slowest tenth': one.slowTenth,
      'the mean': whole.best / 1000,
      'of it making laws': models.best / 1000,
      'for the ductility of a sweep': lean.best / 1000,
      'by strips, times the median curve': strips.median / one.median,
    });
  }
