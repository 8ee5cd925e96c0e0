import type { Run, Sweep } from '#shared/contract/records.ts';
import type { Visit } from '../support/browser.ts';
import { beamId, CLINIC, LIBRARY, runPath, sweepId } from '../support/browser-demo.ts';
import { scaledSweep } from '../support/office-project.ts';

const COUNTS = Array.from({ length: 11 }, (_, i) => i + 2);

/** A run far too large to wait for, just begun. */
export async function openHugeRun(visit: Visit): Promise<Run> {
  const sweep = await visit.call<Sweep>('post', `/beams/${beamId('clinic', 'G3')}/sweeps`, {
    name: 'Every millimetre',
    definition: scaledSweep(1001, 1801),
  });
  const run = await visit.call<Run>('post', `/sweeps/${sweep.id}/runs`);
  await visit.open(`${CLINIC}/runs/${run.id}`);
  await visit.page.getByRole('slider', { name: /^Section along the front/ }).waitFor();
  return run;
}

/** A run by bounds of half a billion sections, ended or stopped on the way. */
export async function openRunByBounds(visit: Visit, { isStopped = false, query = '' } = {}): Promise<void> {
  const { page } = visit;
  const definition = scaledSweep(1001, 1801);
  const tension = { kind: 'bars' as const, sizes: ['20', '25', '28'], counts: COUNTS, none: false };
  const sweep = await visit.call<Sweep>('post', `/beams/${beamId('clinic', 'G3')}/sweeps`, {
    name: 'Every millimetre and bar',
    definition: { ...definition, space: { ...definition.space, tension } },
  });
  const run = await visit.call<Run>('post', `/sweeps/${sweep.id}/runs`);
  if (isStopped) await visit.call('post', `/runs/${run.id}/cancel`);
  await visit.open(`${CLINIC}/runs/${run.id}${query}`);
  await page
    .getByText(isStopped ? /front is not proven/ : /proven unnecessary/)
    .first()
    .waitFor();
}

/** A run of a sweep with further widths, which takes over the sections of the run before. */
export async function openWidenedRun(visit: Visit): Promise<void> {
  const definition = scaledSweep(20, 30);
  const sweep = await visit.call<Sweep>('post', `/beams/${beamId('clinic', 'G1')}/sweeps`, {
    name: 'A few more widths',
    definition,
  });
  const start = () => visit.call<Run>('post', `/sweeps/${sweep.id}/runs`);
  const waitFor = async (run: Run) => {
    await visit.open(`${CLINIC}/runs/${run.id}`);
    await visit.page.getByText(/none better than the front|none meets every check/).waitFor();
  };
  await waitFor(await start());
  const width = { kind: 'range' as const, from: 300, to: 450, step: 100 / 19 };
  await visit.call('put', `/sweeps/${sweep.id}`, {
    name: sweep.name,
    definition: { ...definition, space: { ...definition.space, width } },
  });
  await waitFor(await start());
}

/** Two runs of one sweep: the second wider, and stricter about ductility. */
export async function openDifference(visit: Visit): Promise<void> {
  const sweep = await visit.call<Sweep>('get', `/sweeps/${sweepId('roof')}`);
  const { space, demand } = sweep.definition;
  const wider = { ...space, width: { kind: 'range' as const, from: 254, to: 457.2, step: 50.8 } };
  const definition = { ...sweep.definition, space: wider, demand: { ...demand, ductilityTarget: 6 } };
  await visit.call('put', `/sweeps/${sweep.id}`, { name: sweep.name, definition });
  const run = await visit.call<Run>('post', `/sweeps/${sweep.id}/runs`);
  await visit.open(`${LIBRARY}/runs/${run.id}/against/${sweep.runs.at(-1)!.id}`);
  await visit.page.getByRole('table', { name: 'How many sections' }).waitFor();
}

/** A view saved under a name, and the menu that lists it. */
export async function openSavedViews(visit: Visit): Promise<void> {
  const { page } = visit;
  await visit.open(`${runPath('reading-room')}?x=costPerM&y=depthMm&f=depthMm:~584.2&by=barCount`);
  const menu = page.getByRole('button', { name: /^Views/ });
  await menu.click();
  await page.getByRole('menuitem', { name: 'Save this view' }).click();
  await page.getByLabel('Name of the view').fill('Under the ceiling');
  await page.getByRole('button', { name: 'Save view' }).click();
  await page.getByRole('dialog').waitFor({ state: 'detached' });
  await menu.click();
  await page.getByRole('menuitem', { name: /^Under the ceiling/ }).waitFor();
}
