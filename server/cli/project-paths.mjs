import path from 'node:path';

export const PROJECT_ROOT = path.resolve(import.meta.dirname, '../..');

/** Everything a running service keeps: the database, its password, the session secret. Never under version control. */
export function dataFolder() {
  return path.resolve(process.env.FAIRWEIGHT_DATA ?? path.join(PROJECT_ROOT, '.data'));
}

/** The tests' own cluster and reports, apart from the data of a running service. */
export const TEST_FOLDER = path.join(PROJECT_ROOT, '.data', 'test');
