import { mkdirSync } from 'node:fs';
import path from 'node:path';
import pg from 'pg';
import type { Browser, BrowserContext } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest';
import type { Role } from '#shared/contract/records.ts';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { launchChromium, openProfile, Visit } from './browser.ts';
import { type DemoService, startDemoService } from './browser-service.ts';

/** What a failed test's pages looked like. */
const FAILURES_FOLDER = path.join(TEST_FOLDER, 'failed-pages');

export interface BrowserOffice {
  readonly origin: string;
  /** A new window: of whoever has that role, signed in, or for null of a stranger with nothing in their browser. */
  visit: (role: Role | null) => Promise<Visit>;
  /** Ends everybody's session at the service, behind the browsers' backs. */
  endSessions: () => Promise<void>;
}

/**
 * One running service with the demo office and one browser for the tests of a file. A role's windows share a profile.
 * After each test its windows are closed, and it fails for what a browser has complained of unless it said to expect it.
 */
export function useBrowserOffice(): BrowserOffice {
  let service: DemoService | undefined;
  let browser: Browser | undefined;
  const profiles = new Map<Role, BrowserContext>();
  const visits: Visit[] = [];

  beforeAll(async () => {
    [service, browser] = await Promise.all([startDemoService(inject('postgresUrl')), launchChromium()]);
  });
  afterEach(async ({ task }) => {
    const ended = visits.splice(0);
    if (task.result?.state === 'fail') await keepPictures(ended, task.name);
    await Promise.all(ended.map(({ page }) => page.close()));
    const complaints = ended.flatMap((visit) => visit.complaints);
    expect(complaints, 'what the browser complained of').toEqual([]);
  });
  afterAll(async () => {
    await browser?.close();
    await service?.close();
  });

  const visit = async (role: Role | null): Promise<Visit> => {
    const known = role === null ? undefined : profiles.get(role);
    const visit = await Visit.begin(known ?? (await openProfile(browser!, service!.origin)), service!.origin);
    visits.push(visit);
    if (role !== null && known === undefined) {
      await visit.signIn(role);
      profiles.set(role, visit.context);
    }
    return visit;
  };
  return {
    get origin() {
      return service!.origin;
    },
    visit,
    endSessions: async () => {
      const database = new pg.Client({ connectionString: service!.databaseUrl });
      await database.connect();
      await database.query('delete from session');
      await database.end();
      profiles.clear();
    },
  };
}

async function keepPictures(visits: readonly Visit[], testName: string): Promise<void> {
  mkdirSync(FAILURES_FOLDER, { recursive: true });
  const name = testName.replaceAll(/\W+/g, '-').slice(0, 80);
  for (const [i, { page }] of visits.entries())
    await page.screenshot({ path: path.join(FAILURES_FOLDER, `${name}-${i + 1}.png`), fullPage: true });
}
