import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run } from '#shared/contract/records.ts';
import type { View } from '#shared/sweep/problem.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';

/** Every section of every run has these two. */
const ALWAYS: View = { x: 'steelKgPerM', y: 'depthMm' };

/**
 * The view asked for; where one of its measures has no values for this reader, who may not see costs or has no rates, the
 * first of the run's own that has.
 */
export function readableView(run: Run, asked: View, units: UnitSystem): View {
  const { space, demand } = run.definition;
  const isReadable = ({ x, y, z }: View) =>
    [x, y, z ?? x].every(
      (measure) => unavailableReason(measure, { space, demand, basis: run.basis, units }) === null,
    );
  const inTwo = { x: asked.x, y: asked.y };
  const others = run.views.map(({ view }) => ({ x: view.x, y: view.y }));
  return [asked, inTwo, ...others].find(isReadable) ?? ALWAYS;
}
