import fs from 'node:fs';
import path from 'node:path';
import { PROJECT_ROOT, TEST_FOLDER } from './project-paths.mjs';
import { runProgram } from './run-program.mjs';

/**
 * Runs some of the test projects and counts. A test file that cannot even be loaded counts as one failure, and so does a
 * run that ends red for any other reason (an unhandled error, a crash).
 *
 * @param {readonly string[]} projects
 * @param {readonly string[]} filters handed on to vitest
 */
export async function runTests(projects, filters) {
  fs.mkdirSync(TEST_FOLDER, { recursive: true });
  const report = path.join(TEST_FOLDER, `vitest-${projects.join('-')}.json`);
  fs.rmSync(report, { force: true });
  const vitest = path.join(PROJECT_ROOT, 'node_modules', 'vitest', 'vitest.mjs');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const chosen = projects.map((project) => `--project=${project}`);
  const { code } = await runProgram(process.execPath, [vitest, 'run', ...chosen, ...reporters, ...filters], {
    cwd: PROJECT_ROOT,
    environment: { NODE_ENV: 'test' },
  });
  const counts = fs.existsSync(report) ? countResults(report) : { passed: 0, failed: 0, skipped: 0 };
  if (code !== 0 && counts.failed === 0) counts.failed = 1;
  return counts;
}

/** @param {string} report */
function countResults(report) {
  /** @type {{ testResults: Array<{ status: string, assertionResults: Array<{ status: string }> }> }} */
  const { testResults } = JSON.parse(fs.readFileSync(report, 'utf8'));
  const statuses = testResults.flatMap(({ status, assertionResults }) => {
    const ofTests = assertionResults.map((assertion) => assertion.status);
    return status === 'failed' && !ofTests.includes('failed') ? [...ofTests, 'failed'] : ofTests;
  });
  const passed = statuses.filter((status) => status === 'passed').length;
  const failed = statuses.filter((status) => status === 'failed').length;
  return { passed, failed, skipped: statuses.length - passed - failed };
}
