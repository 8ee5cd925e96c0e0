import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Browser, BrowserContextOptions } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest';
import type { Role } from '#shared/contract/records.ts';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { launchChromium, Visit } from './browser.ts';
import { type DemoService, startDemoService } from './browser-service.ts';

/** What a failed test's pages looked like. */
const FAILURES_FOLDER = path.join(TEST_FOLDER, 'failed-pages');

export interface BrowserOffice {
  readonly origin: string;
  readonly databaseUrl: string;
  /** Somebody at a machine of their own: signed in as that role, or a stranger for null. */
  visit: (role: Role | null, options?: BrowserContextOptions) => Promise<Visit>;
  /** Ends the test's visits that are open so far; a complaint of the browser fails the test. */
  leave: () => Promise<void>;
}

/**
 * One running service with the demo office and one browser for the tests of a file. After each test every page is
 * closed, and the test fails for what a browser has complained of unless the test said to expect it.
 */
export function useBrowserOffice(): BrowserOffice {
  let service: DemoService | undefined;
  let browser: Browser | undefined;
  const visits: Visit[] = [];

  beforeAll(async () => {
    [service, browser] = await Promise.all([startDemoService(inject('postgresUrl')), launchChromium()]);
  });
  afterEach(async ({ task }) => {
    if (task.result?.state === 'fail') await keepPictures(visits, task.name);
    await leave();
  });
  afterAll(async () => {
    await browser?.close();
    await service?.close();
  });

  const leave = async () => {
    const ended = visits.splice(0);
    await Promise.all(ended.map(({ context }) => context.close()));
    expect(
      ended.flatMap(({ complaints }) => complaints),
      'what the browser complained of',
    ).toEqual([]);
  };
  return {
    get origin() {
      return service!.origin;
    },
    get databaseUrl() {
      return service!.databaseUrl;
    },
    leave,
    visit: async (role, options) => {
      const visit = await Visit.begin(browser!, service!.origin, options);
      visits.push(visit);
      if (role !== null) await visit.signIn(role);
      return visit;
    },
  };
}

async function keepPictures(visits: readonly Visit[], testName: string): Promise<void> {
  mkdirSync(FAILURES_FOLDER, { recursive: true });
  const name = testName.replaceAll(/\W+/g, '-').slice(0, 80);
  for (const [i, { page }] of visits.entries())
    await page.screenshot({ path: path.join(FAILURES_FOLDER, `${name}-${i + 1}.png`), fullPage: true });
}
