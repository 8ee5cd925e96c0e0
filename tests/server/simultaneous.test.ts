import { eq, sql } from 'drizzle-orm';
import pg from 'pg';
import { beforeAll, describe, expect, it } from 'vitest';
import { projectMembers } from '#server/db/schema/project-members.ts';
import { session } from '#server/db/schema/session.ts';
import { createBeam, createPerson, createProject, evaluateInput } from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();
let engineer: SignedIn;
let project: { id: string };
beforeAll(async () => {
  engineer = await signedIn(service, 'engineer');
  project = await createProject(service.deps, { members: [engineer.person] });
});

/** Somebody else who holds a row, so that what is called meanwhile stops at it. */
async function hold(query: string, id: string) {
  const other = new pg.Client({ connectionString: service.deps.config.databaseUrl });
  await other.connect();
  await other.query('begin');
  await other.query(query, [id]);
  return {
    query: (text: string, values: string[]) => other.query(text, values),
    /** Resolves when that many wait for it. */
    untilWaiting: (count: number) =>
      expect
        .poll(async () => {
          const { rows } = await other.query<{ waiting: number }>(
            `select count(*)::int as waiting from pg_stat_activity
             where datname = current_database() and wait_event_type = 'Lock'`,
          );
          return rows[0]!.waiting;
        })
        .toBe(count),
    release: async () => {
      await other.query('commit');
      await other.end();
    },
  };
}

const holdProject = () => hold('select from projects where id = $1 for update', project.id);

describe('at the same time', () => {
  it('a section is pinned on a beam that is deleted: the pin is told that there is no such beam', async () => {
    const beam = await createBeam(service.deps, project.id);
    const source = { kind: 'section', section: evaluateInput.section };
    const held = await holdProject();
    const pin = engineer
      .post(`/projects/${project.id}/candidates`, { beamId: beam.id, source, note: '' })
      .then((answer) => answer);
    await held.untilWaiting(1);
    await engineer.delete(`/beams/${beam.id}`).expect(200);
    await held.release();
    const { status, body } = await pin;
    expect([status, body.error.message]).toEqual([404, 'Beam was not found']);
  });

  it('two choose the members: one choice stands whole', async () => {
    const [one, two] = [
      await createPerson(service.deps, { role: 'checker' }),
      await createPerson(service.deps, { role: 'checker' }),
    ];
    const choose = (id: string) =>
      engineer
        .put(`/projects/${project.id}/members`, { personIds: [engineer.person.id, id] })
        .then(({ status }) => status);
    const held = await holdProject();
    const choices = [choose(one.id), choose(two.id)];
    await held.untilWaiting(2);
    await held.release();
    expect(await Promise.all(choices)).toEqual([200, 200]);
    const members = await service.deps.db
      .select()
      .from(projectMembers)
      .where(eq(projectMembers.projectId, project.id));
    expect(members).toHaveLength(2);
  });

  it('a session is asked for and ended: it does not come back', async () => {
    const someone = await signedIn(service, 'checker');
    const [row] = await service.deps.db
      .select({ sid: session.sid })
      .from(session)
      .where(eq(sql`${session.sess} ->> 'personId'`, someone.person.id));
    const held = await hold('select from session where sid = $1 for update', row!.sid);
    const asked = someone.get('/session').then(({ status }) => status);
    await held.untilWaiting(1);
    await held.query('delete from session where sid = $1', [row!.sid]);
    await held.release();
    expect(await asked).toBe(200);
    expect(await service.deps.db.$count(session, eq(session.sid, row!.sid))).toBe(0);
    await someone.get('/projects').expect(401);
  });
});
