import { openOffice, type TestOffice } from './office.ts';
import { createTestDatabase } from './test-database.ts';

/** The whole service on a clone of the template database. */
export async function openTestOffice(environment: NodeJS.ProcessEnv = {}): Promise<TestOffice> {
  return openOffice(await createTestDatabase(), environment);
}
