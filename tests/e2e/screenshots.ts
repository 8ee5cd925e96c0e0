/**
 * `npm run screenshots [-- name...]`: every screen and state of the demo office, or those whose name holds one of the
 * words, at three widths on light and dark paper, into .data/screenshots. To be looked at, not compared.
 */
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { ensureChromium } from '#server/cli/chromium.mjs';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { PROJECT_ROOT, TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { launchChromium, openProfile, Visit } from '../support/browser.ts';
import { startDemoService } from '../support/browser-service.ts';
import { SCREENS, type Screen } from './screens.ts';

const FOLDER = path.join(PROJECT_ROOT, '.data', 'screenshots');
const WIDTHS = [1440, 1024, 390] as const;
const PAPERS = ['light', 'dark'] as const;

const words = process.argv.slice(2);
const wanted = SCREENS.filter(({ name }) => words.length === 0 || words.some((word) => name.includes(word)));
if (wanted.length === 0) throw new Error(`No screen is called ${words.join(' or ')}`);

await ensureChromium();
mkdirSync(FOLDER, { recursive: true });
const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
const service = await startDemoService(maintenanceUrl);
const browser = await launchChromium();
const missed: string[] = [];
try {
  for (const screen of wanted) await show(browser, screen);
} finally {
  await browser.close();
  await service.close();
  await leavePostgres(TEST_FOLDER);
}
const count = (wanted.length - missed.length) * WIDTHS.length * PAPERS.length;
console.log(`${count} pictures of ${wanted.length} screens in ${path.relative(PROJECT_ROOT, FOLDER)}`);
if (missed.length > 0) process.exitCode = 1;

/** A profile of its own for each screen, so that none shows what another has left behind. */
async function show(shown: Browser, { name, role, arrive }: Screen): Promise<void> {
  const context = await openProfile(shown, service.origin);
  const visit = await Visit.begin(context, service.origin);
  try {
    if (role !== null) await visit.signIn(role);
    await arrive(visit);
    // What is fetched last, as the menu; a page that is made to wait never comes to rest.
    await visit.page.waitForLoadState('networkidle', { timeout: 3000 }).catch(() => undefined);
    for (const paper of PAPERS)
      for (const width of WIDTHS) await takePicture(visit.page, { name, paper, width });
    console.log(name);
  } catch (error) {
    missed.push(name);
    console.error(`${name}: ${error instanceof Error ? error.message : String(error)}`);
  } finally {
    await context.close();
  }
}

async function takePicture(
  page: Page,
  { name, paper, width }: { name: string; paper: (typeof PAPERS)[number]; width: number },
): Promise<void> {
  await page.emulateMedia({ colorScheme: paper });
  await page.setViewportSize({ width, height: width < 500 ? 844 : 900 });
  // A chart takes its new size and colours a moment later.
  await page.waitForFunction(() =>
    [...document.querySelectorAll('[role=slider][aria-label^="Section along"]')].every(
      (chart) => chart.querySelector('canvas')?.clientWidth === chart.clientWidth,
    ),
  );
  await page.evaluate(
    () => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))),
  );
  await page.screenshot({ path: path.join(FOLDER, `${name}-${width}-${paper}.png`), fullPage: true });
}
