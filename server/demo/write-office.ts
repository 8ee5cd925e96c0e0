import type { Role, SheetValue, Snapshot } from '#shared/contract/records.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { studiesOf } from '#shared/engine/studies.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { DEMO_ACCOUNTS } from '../cli/demo-accounts.mjs';
import type { Database } from '../db/client.ts';
import { beams } from '../db/schema/beams.ts';
import { candidateComments } from '../db/schema/candidate-comments.ts';
import { candidateTransitions } from '../db/schema/candidate-transitions.ts';
import { candidates } from '../db/schema/candidates.ts';
import { officeStandards } from '../db/schema/office-standards.ts';
import { people } from '../db/schema/people.ts';
import { projectMembers } from '../db/schema/project-members.ts';
import { projects } from '../db/schema/projects.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';
import { savedViews } from '../db/schema/saved-views.ts';
import { sweeps } from '../db/schema/sweeps.ts';
import { sheetValues } from '../db/schema/sheet-values.ts';
import { labelOf } from '../features/candidates/label.ts';
import { hashSnapshot, takeSnapshot, withStudies } from '../features/candidates/snapshot.ts';
import type { DemoRun } from './office.ts';
import { ownValuesOf } from './own-values.ts';
import { DEMO_PROJECTS } from './projects.ts';
import { DEMO_CANDIDATES, type DemoCandidate } from './shortlist.ts';
import { DEMO_VIEWS } from './saved-views.ts';
import { DEMO_STANDARDS } from './standards.ts';
import { stableId } from './stable-id.ts';

/** The demo's first day. Fixed, so that two demos tell the same story. */
const FIRST_DAY = Date.UTC(2025, 8, 1, 8, 30);
const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;

const dateOf = (day: number, minute = 0) => new Date(FIRST_DAY + day * DAY_MS + minute * MINUTE_MS);
const personId = (role: Role) => stableId(`person/${role}`);
const projectId = (key: string) => stableId(`project/${key}`);
const beamId = (project: string, mark: string) => stableId(`beam/${project}/${mark}`);
const sweepId = (key: string) => stableId(`sweep/${key}`);
const runId = (key: string) => stableId(`run/${key}`);

/** Writes the whole office; the caller's transaction makes it all or nothing. */
export async function writeOffice(
  tx: Database,
  { passwordHash, demoRuns }: { passwordHash: string; demoRuns: readonly DemoRun[] },
): Promise<void> {
  await tx.insert(people).values(
    DEMO_ACCOUNTS.map(({ role, name, email }) => ({
      id: personId(role),
      role,
      name,
      email,
      passwordHash,
      createdAt: dateOf(0),
    })),
  );
  await writeStandards(tx);
  await writeProjects(tx);
  for (const run of demoRuns) await writeRun(tx, run);
  await writeSavedViews(tx);
  const pinned = new Map<string, number>();
  for (const candidate of DEMO_CANDIDATES) {
    const run = demoRuns.find(({ sweep }) => sweep.key === candidate.sweep)!;
    const position = pinned.get(run.sweep.project) ?? 0;
    pinned.set(run.sweep.project, position + 1);
    await writeCandidate(tx, candidate, { run, label: labelOf(position) });
  }
}

async function writeStandards(tx: Database): Promise<void> {
  await tx.insert(officeStandards).values(
    DEMO_STANDARDS.map(({ key, standard: { name, units, barStandard, ...standard } }) => ({
      ...{ name, units, barStandard, standard },
      id: stableId(`standard/${key}`),
      updatedBy: personId('admin'),
      updatedAt: dateOf(0),
    })),
  );
}

async function writeProjects(tx: Database): Promise<void> {
  for (const project of DEMO_PROJECTS) {
    const { key, name, number, day, designBasis, priceBook } = project;
    const id = projectId(key);
    const createdBy = personId(project.hasMembers ? 'engineer' : 'admin');
    await tx
      .insert(projects)
      .values({ id, name, number, designBasis, priceBook, createdBy, createdAt: dateOf(day) });
    const members = DEMO_ACCOUNTS.filter(({ role }) => project.hasMembers || role === 'admin');
    await tx
      .insert(projectMembers)
      .values(members.map(({ role }) => ({ projectId: id, personId: personId(role) })));
    await tx.insert(beams).values(
      project.beams.map((beam, i) => ({
        ...beam,
        id: beamId(key, beam.mark),
        projectId: id,
        createdAt: dateOf(day, 30 + i),
      })),
    );
  }
}

async function writeRun(tx: Database, { sweep, definition, basis, views }: DemoRun): Promise<void> {
  const createdAt = dateOf(sweep.day, 60);
  const startedBy = personId('engineer');
  await tx.insert(sweeps).values({
    id: sweepId(sweep.key),
    beamId: beamId(sweep.project, sweep.beam),
    name: sweep.name,
    definition,
    createdBy: startedBy,
    createdAt,
    updatedAt: createdAt,
  });
  const id = runId(sweep.key);
  const startedAt = dateOf(sweep.day, 65);
  await tx.insert(runs).values({
    id,
    sweepId: sweepId(sweep.key),
    number: 1,
    definition,
    basis,
    engineVersion: ENGINE_VERSION,
    sectionCount: views[0]!.result.sectionCount,
    state: 'finished',
    startedBy,
    createdAt: startedAt,
    finishedAt: startedAt,
    eventSequence: views.length,
  });
  await tx.insert(runViews).values(
    views.map(({ view, result, elapsedMs }, i) => ({
      id: stableId(`view/${sweep.key}/${view.x}/${view.y}`),
      runId: id,
      x: view.x,
      y: view.y,
      state: 'finished' as const,
      evaluated: result.evaluated,
      merged: result.evaluated,
      feasible: result.feasible,
      elapsedMs,
      result,
      frontCount: result.front.length,
      hash: result.hash,
      sequence: i + 1,
      resultSequence: i + 1,
      createdAt: startedAt,
      startedAt,
      finishedAt: startedAt,
    })),
  );
}

async function writeSavedViews(tx: Database): Promise<void> {
  await tx.insert(savedViews).values(
    DEMO_VIEWS.map(({ sweep, name, by, day, address }) => ({
      ...{ name, address },
      id: stableId(`saved-view/${sweep}/${name}`),
      sweepId: sweepId(sweep),
      runId: runId(sweep),
      createdBy: personId(by),
      createdAt: dateOf(day),
    })),
  );
}

async function writeCandidate(
  tx: Database,
  candidate: DemoCandidate,
  { run, label }: { run: DemoRun; label: string },
): Promise<void> {
  const { sweep, definition, basis, views } = run;
  const { space, demand, rules } = definition;
  const { front } = views[0]!.result;
  const index = front[Math.round(candidate.alongFront * (front.length - 1))]!.index;
  const section = sectionAt(expandSpace(space, basis.barStandard), index);
  const inputs = { section, demand, rules, basis };
  const snapshot = withStudies(takeSnapshot(inputs), studiesOf(section, inputs));
  const id = stableId(`candidate/${sweep.project}/${label}`);
  const pin = { to: 'proposed', by: 'engineer', note: candidate.note, after: 0 } as const;
  const steps = [pin, ...candidate.steps];
  await tx.insert(candidates).values({
    id,
    projectId: projectId(sweep.project),
    beamId: beamId(sweep.project, sweep.beam),
    label,
    state: steps.at(-1)!.to,
    note: candidate.note,
    authorId: personId(pin.by),
    runId: runId(sweep.key),
    sectionIndex: index,
    snapshot,
    hash: hashSnapshot(snapshot),
    createdAt: dateOf(candidate.day),
  });
  const own = checkedValues(candidate, run, snapshot);
  if (own.length > 0)
    await tx.insert(sheetValues).values(
      own.map(({ line, value, by, updatedAt }) => ({
        candidateId: id,
        line,
        personId: by.id,
        value,
        updatedAt: new Date(updatedAt),
      })),
    );
  await tx.insert(candidateTransitions).values(
    steps.map(({ to, by, note, after }, i) => ({
      id: stableId(`transition/${id}/${i}`),
      candidateId: id,
      from: steps[i - 1]?.to ?? null,
      to,
      byId: personId(by),
      note,
      sheetValues: to === 'checked' || to === 'approved' ? own : null,
      createdAt: dateOf(candidate.day + after, i),
    })),
  );
  for (const [i, { by, text, after }] of candidate.comments.entries())
    await tx.insert(candidateComments).values({
      id: stableId(`comment/${id}/${i}`),
      candidateId: id,
      authorId: personId(by),
      text,
      createdAt: dateOf(candidate.day + after, 120 + i),
    });
}

/** What the checker wrote on the sheet before marking it as checked; none where nobody did. */
function checkedValues(candidate: DemoCandidate, { sweep }: DemoRun, snapshot: Snapshot): SheetValue[] {
  const check = candidate.steps.find(({ to }) => to === 'checked');
  if (check === undefined) return [];
  const { designBasis } = DEMO_PROJECTS.find(({ key }) => key === sweep.project)!;
  const { name } = DEMO_ACCOUNTS.find(({ role }) => role === check.by)!;
  const by = { id: personId(check.by), name };
  return ownValuesOf(snapshot, designBasis.units, { by, at: dateOf(candidate.day + check.after, -90) });
}
