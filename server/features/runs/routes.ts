import { eq } from 'drizzle-orm';
import type { Router } from 'express';
import { RUN_EVENTS_PATH } from '#shared/contract/endpoints.ts';
import { idSchema } from '#shared/contract/numbers.ts';
import type { Person, Run } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { listRunSummaries } from '../../db/run-summaries.ts';
import { runs } from '../../db/schema/runs.ts';
import type { Deps } from '../../deps.ts';
import { notFound } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { findReadableProject, requireRole } from '../../http/project-access.ts';
import { findPersonStillSignedIn, requireSignedInPerson } from '../../http/signed-in-person.ts';
import { readRunningLoad } from '../../jobs/running-load.ts';
import { cancelRun, openView, resumeRun, startRun } from './commands.ts';
import { streamRun } from './event-stream.ts';
import { OpenStreams } from './open-streams.ts';
import { RUNNERS } from './policy.ts';
import { presentRun, presentViewProgress } from './present.ts';
import { getSection, listViews, requireRun, requireView } from './queries.ts';
import { rankRun } from './ranking.ts';
import { findTaken } from './taking.ts';
import { registerSectionsFile } from './sections-file.ts';

export function registerRunRoutes(router: Router, deps: Deps): void {
  const { runningLimits: limits } = deps.config;

  bind(router, deps, 'startRun', async ({ person, params, deps: { db } }) =>
    readRun(db, person, await startRun(db, person, { sweepId: params.id, limits })),
  );

  bind(router, deps, 'getRun', ({ person, params, deps: { db } }) => readRun(db, person, params.id));

  bind(router, deps, 'cancelRun', async ({ person, params, deps: { db } }) => {
    await cancelRun(db, person, await requireRun(db, person, params.id));
    return readRun(db, person, params.id);
  });

  bind(router, deps, 'resumeRun', async ({ person, params, deps: { db } }) => {
    await resumeRun(db, person, { record: await requireRun(db, person, params.id), limits });
    return readRun(db, person, params.id);
  });

  bind(router, deps, 'getRunningLoad', ({ person, deps: { db } }) => {
    requireRole(person, RUNNERS, 'see what is under way');
    return readRunningLoad(db, person.id, limits);
  });

  bind(router, deps, 'openView', async ({ person, params, body, deps: { db } }) => {
    const record = await requireRun(db, person, params.id);
    const view = await openView(db, person, { record, view: body, limits });
    return presentViewProgress(view, record.run.sectionCount, person);
  });

  bind(router, deps, 'rankRun', async ({ person, params, body, deps: { db, ...rest } }) =>
    rankRun(rest, person, { record: await requireRun(db, person, params.id), input: body }),
  );

  bind(router, deps, 'getView', async ({ person, params, deps: { db } }) => {
    const { run } = await requireRun(db, person, params.id);
    const view = await requireView(db, person, { runId: run.id, viewId: params.viewId });
    return presentViewProgress(view, run.sectionCount, person);
  });

  bind(router, deps, 'getSection', async ({ person, params, deps: { db } }) =>
    getSection(await requireRun(db, person, params.id), params.index, person),
  );

  registerRunEvents(router, deps);
  registerSectionsFile(router, deps);
}

function registerRunEvents(router: Router, deps: Deps): void {
  const { db, log, runEvents } = deps;
  const openStreams = new OpenStreams();
  router.get(RUN_EVENTS_PATH, async (req, res) => {
    const person = await requireSignedInPerson(db, req);
    const id = idSchema.safeParse(req.params.id);
    if (!id.success) throw notFound('Run');
    const record = await requireRun(db, person, id.data);
    const header = req.get('last-event-id') ?? '';
    const lastEventId = /^\d{1,15}$/.test(header) ? Number(header) : undefined;
    const findReader = async () => {
      const reader = await findPersonStillSignedIn(deps, req);
      if (reader === undefined) return undefined;
      return (await findReadableProject(db, reader, record.project.id)) && reader;
    };
    // Whoever hung up meanwhile would never be heard to close.
    if (res.destroyed) return;
    res.once('close', openStreams.enter(person.id));
    streamRun({ db, log, runEvents, res, findReader, record, lastEventId });
  });
}

async function readRun(db: Database, person: Person, runId: string): Promise<Run> {
  const record = await requireRun(db, person, runId);
  const [views, taken, [summary]] = await Promise.all([
    listViews(db, runId),
    findTaken(db, runId),
    listRunSummaries(db, eq(runs.id, runId)),
  ]);
  if (summary === undefined) throw notFound('Run');
  return presentRun({ ...record, summary, taken, views }, person);
}
