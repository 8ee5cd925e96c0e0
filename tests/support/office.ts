import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { buildApp } from '#server/app.ts';
import { readConfig } from '#server/config.ts';
import type { Database } from '#server/db/client.ts';
import { people } from '#server/db/schema/people.ts';
import { startServices } from '#server/services.ts';
import type { Deps } from '#server/deps.ts';
import { ROLES, type Role } from '#shared/contract/records.ts';
import { PASSWORD } from './factories.ts';
import { signInAs, type SignedIn } from './signed-in.ts';
import type { TestDatabase } from './test-database.ts';
import { testEnvironment } from './test-environment.ts';

/** One person per role, and an engineer who is on nobody's project. */
const ACCOUNTS = [...ROLES, 'outsider'] as const;
export type Account = (typeof ACCOUNTS)[number];
const roleOf = (account: Account): Role => (account === 'outsider' ? 'engineer' : account);

const emailOf = (account: Account) => `${account}@office.example`;

/** The whole service on a database of its own: real queue, real threads, a real port. */
export interface TestOffice {
  readonly deps: Deps;
  readonly databaseUrl: string;
  readonly origin: string;
  readonly idOf: (account: Account) => string;
  /** Signed in once per account, then shared. */
  readonly as: (account: Account) => Promise<SignedIn>;
  readonly signIn: (email: string, password: string) => Promise<SignedIn>;
  close(): Promise<void>;
}

/** Takes the database over: closing the office drops it. */
export async function openOffice(
  database: TestDatabase,
  environment: NodeJS.ProcessEnv = {},
): Promise<TestOffice> {
  const services = await startServices(readConfig({ ...testEnvironment(database.url), ...environment }));
  const server = buildApp(services.deps).listen(0, '127.0.0.1');
  await once(server, 'listening');
  const origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const ids = await insertPeople(services.deps.db, await services.deps.passwords.hash(PASSWORD));
  const sessions = new Map<Account, Promise<SignedIn>>();
  return {
    deps: services.deps,
    databaseUrl: database.url,
    origin,
    idOf: (account) => ids.get(account)!,
    signIn: (email, password) => signInAs(origin, { email, password }),
    as: (account) => {
      const session = sessions.get(account) ?? signInAs(origin, { email: emailOf(account) });
      sessions.set(account, session);
      return session;
    },
    close: async () => {
      services.endStreams();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await services.stop();
      await database.drop();
    },
  };
}

export async function insertPeople(db: Database, passwordHash: string): Promise<Map<Account, string>> {
  const rows = await db
    .insert(people)
    .values(
      ACCOUNTS.map((account) => ({
        name: `The ${account}`,
        email: emailOf(account),
        role: roleOf(account),
        passwordHash,
      })),
    )
    .returning({ id: people.id });
  return new Map(ACCOUNTS.map((account, i) => [account, rows[i]!.id]));
}
