/**
 * The run page as Lighthouse scores it, of 100, for an engineer who is signed in, on a desktop. Lighthouse is fetched into
 * .data/tools the first time: two hundred packages that no test needs.
 */
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { chromium } from 'playwright-core';
import { findChromium } from '#server/cli/chromium.mjs';
import { findFreePort } from '#server/cli/free-port.mjs';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { PROJECT_ROOT, TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { requireProgram } from '#server/cli/run-program.mjs';
import { CHROMIUM_FLAGS, furnish, Visit } from '../tests/support/browser.ts';
import { runPath } from '../tests/support/browser-demo.ts';
import { startDemoService } from '../tests/support/browser-service.ts';

/** The last that runs on Node 20. */
const LIGHTHOUSE = 'lighthouse@12.8.2';
const TOOLS = path.join(PROJECT_ROOT, '.data', 'tools');
const AIMS = { performance: 90, accessibility: 95, 'best-practices': 95 } as const;
const WORST_AUDITS = 12;

interface Audit {
  readonly id: string;
  readonly score: number | null;
  readonly scoreDisplayMode: string;
  readonly displayValue?: string;
}
interface Outcome {
  readonly lhr: {
    readonly categories: Readonly<Record<string, { readonly score: number | null }>>;
    readonly audits: Readonly<Record<string, Audit>>;
  };
}
interface Lighthouse {
  readonly default: (url: string, flags: object, config: object) => Promise<Outcome>;
  readonly desktopConfig: object;
}

async function loadLighthouse(): Promise<Lighthouse> {
  mkdirSync(TOOLS, { recursive: true });
  // A folder without a manifest would hand the packages to the project above it.
  writeFileSync(path.join(TOOLS, 'package.json'), '{ "private": true }');
  const options = ['--no-audit', '--no-fund', '--ignore-scripts', '--prefer-offline', '--loglevel=error'];
  await requireProgram('npm', ['install', LIGHTHOUSE, ...options], { cwd: TOOLS });
  return (await import(path.join(TOOLS, 'node_modules/lighthouse/core/index.js'))) as Lighthouse;
}

const lighthouse = await loadLighthouse();
const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
const service = await startDemoService(maintenanceUrl);
const profile = mkdtempSync(path.join(TEST_FOLDER, 'lighthouse-'));
const port = await findFreePort();
const context = await chromium.launchPersistentContext(profile, {
  executablePath: findChromium()!,
  args: [...CHROMIUM_FLAGS, `--remote-debugging-port=${port}`],
});
try {
  await furnish(context);
  const visit = await Visit.begin(context, service.origin);
  await visit.signIn('engineer');
  await visit.page.goto(`${service.origin}/projects`);
  await visit.page.close();
  const flags = { port, output: 'json', disableStorageReset: true, onlyCategories: Object.keys(AIMS) };
  const address = `${service.origin}${runPath('reading-room')}`;
  const { lhr } = await lighthouse.default(address, flags, lighthouse.desktopConfig);
  writeFileSync(path.join(TEST_FOLDER, 'lighthouse.json'), JSON.stringify(lhr));
  for (const [category, aim] of Object.entries(AIMS)) {
    const score = Math.round((lhr.categories[category]?.score ?? 0) * 100);
    console.log(`${category}: ${score}, at least ${aim} aimed at`);
    if (score < aim) process.exitCode = 1;
  }
  const poor = Object.values(lhr.audits).filter(({ score }) => score !== null && score < 0.9);
  for (const { id, score, displayValue = '' } of poor.slice(0, WORST_AUDITS))
    console.log(`  ${id}: ${Math.round(score! * 100)} ${displayValue}`);
} finally {
  await context.close();
  await service.close();
  await leavePostgres(TEST_FOLDER);
  rmSync(profile, { recursive: true, force: true });
}
