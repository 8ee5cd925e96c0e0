import { CONCRETE_LAW_IDS, STEEL_LAW_IDS } from '#shared/engine/curve-choices.ts';
import { curveModel } from '#shared/engine/curve-model.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { median, report } from './report.ts';

/** Full curves of sections drawn evenly from the office's space, laws made anew for each. Target: 50 µs median a curve. */
const { basis, rules } = OFFICE_PROBLEM;
const { space } = prepareSweep(OFFICE_PROBLEM, { x: 'steelKgPerM', y: 'curvatureDuctility' });
const WANTED = 400;
const sections = Array.from({ length: WANTED }, (_, i) =>
  sectionAt(space, Math.floor(((i + 0.5) * space.size) / WANTED)),
).flatMap((section) => {
  const { layout, arrangement } = placeSteel(section, basis, rules.maxLayers);
  return layout ? [{ section, layout, arrangement, basis }] : [];
});

for (const concreteLaw of CONCRETE_LAW_IDS)
  for (const steelLaw of STEEL_LAW_IDS) {
    const choices = { concreteLaw, steelLaw };
    const curves = median(7, () => {
      for (const section of sections) momentCurvature({ ...section, choices });
      return sections.length;
    });
    const models = median(7, () => {
      for (const section of sections) curveModel({ ...section, choices });
      return sections.length;
    });
    report(`${concreteLaw}, ${steelLaw}`, {
      'µs a curve': curves.nsEach / 1000,
      'of it making laws': models.nsEach / 1000,
    });
  }
