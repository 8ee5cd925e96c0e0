import { rmSync } from 'node:fs';
import path from 'node:path';
import { type Browser, type BrowserContextOptions, chromium, type Page } from 'playwright-core';
import type { Role } from '#shared/contract/records.ts';
import { findChromium } from '#server/cli/chromium.mjs';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { launchFairweight, pressCtrlC } from './fairweight-process.ts';

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export interface OfficePage {
  readonly page: Page;
  /** Errors the browser has written to its console, and exceptions nobody caught. */
  readonly complaints: readonly string[];
}

export interface OfficeBrowser {
  readonly origin: string;
  /** A page of a new browser profile: one person at one machine. */
  open: (options?: BrowserContextOptions) => Promise<OfficePage>;
  /** The same, signed in. */
  openAs: (role: Role, options?: BrowserContextOptions) => Promise<OfficePage>;
  close: () => Promise<void>;
}

/** The demo office as `npm start` serves it, on a data folder of its own, and a real browser before it. */
export async function openOfficeBrowser(name: string): Promise<OfficeBrowser> {
  const folder = path.join(TEST_FOLDER, `${name}-${process.pid}`);
  const service = await launchFairweight(folder);
  await service.ready;
  const browser: Browser = await chromium.launch({ executablePath: findChromium()!, args: FLAGS });

  const open: OfficeBrowser['open'] = async (options = {}) => {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, ...options });
    const page = await context.newPage();
    const complaints: string[] = [];
    page.on('pageerror', (error) => complaints.push(String(error)));
    page.on('console', (message) => {
      if (message.type() === 'error') complaints.push(message.text());
    });
    return { page, complaints };
  };

  return {
    origin: service.origin,
    open,
    openAs: async (role, options) => {
      const opened = await open(options);
      await opened.page.goto(`${service.origin}/sign-in`);
      await signIn(opened.page, role);
      await opened.page.getByRole('heading', { name: 'Projects' }).waitFor();
      return opened;
    },
    close: async () => {
      await browser.close();
      pressCtrlC(service);
      await service.ended;
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Fills in whatever sign-in form the page shows. */
export async function signIn(page: Page, role: Role): Promise<void> {
  await page.getByLabel('E-mail').fill(DEMO_ACCOUNTS.find((account) => account.role === role)!.email);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByLabel('Password').press('Enter');
}
