// `npm test`: everything that must hold, from a clean clone, ending with one line of counts.
import { ensureChromium } from './chromium.mjs';
import { runGates } from './gates.mjs';
import { requireNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { ensurePostgresPrograms } from './postgres-programs.mjs';
import { runTests } from './vitest-run.mjs';

/** @typedef {{ passed: number, failed: number, skipped: number }} Counts */

/** @param {Counts[]} parts */
function report(parts) {
  const total = (/** @type {keyof Counts} */ key) => parts.reduce((sum, part) => sum + part[key], 0);
  const skipped = total('skipped') === 0 ? '' : `, ${total('skipped')} skipped`;
  console.log(`${total('passed')} passed, ${total('failed')} failed${skipped}`);
  return total('failed') === 0 && total('passed') > 0 ? 0 : 1;
}

async function installFromDebian() {
  await ensurePostgresPrograms();
  await ensureChromium();
}

const filters = process.argv.slice(2);

/** A browser's tests wait as much as they compute; everything else fills the other core meanwhile. */
async function runEverything() {
  const inTheBrowser = runTests(['e2e'], filters);
  const gates = await runGates();
  return [gates, await runTests(['unit', 'client', 'server'], filters), await inTheBrowser];
}

try {
  requireNodeVersion();
  await Promise.all([ensurePackages(), installFromDebian()]);
  process.exitCode = report(await runEverything());
} catch (error) {
  console.error(error instanceof Error ? error.message : String(error));
  process.exitCode = report([{ passed: 0, failed: 1, skipped: 0 }]);
}
