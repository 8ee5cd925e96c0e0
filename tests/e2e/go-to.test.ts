import { AxeBuilder } from '@axe-core/playwright';
import type { Locator, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { candidatePath, LIBRARY, runPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

async function axeFindings(page: Page): Promise<string[]> {
  const found = await new AxeBuilder({ page }).setLegacyMode(true).analyze();
  return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`);
}

const pathOf = (page: Page): string => new URL(page.url()).pathname;

const palette = (page: Page): Locator => page.getByRole('dialog', { name: 'Go to, or do' });

async function choose(page: Page, typed: string, name: RegExp): Promise<void> {
  await page.keyboard.press('Control+k');
  await palette(page).getByRole('combobox').fill(typed);
  await palette(page).getByRole('option').first().filter({ hasText: name }).waitFor();
  await page.keyboard.press('Enter');
  await palette(page).waitFor({ state: 'detached' });
}

describe('everything by name, under Ctrl K', () => {
  it('goes to beams, sweeps, runs, candidates, pages and projects, and does what the page can do', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/beams`);
    await page.keyboard.press('Control+k');
    await palette(page)
      .getByRole('option', { name: /^Beam B6/ })
      .waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await palette(page).getByRole('combobox').fill('no such thing at all');
    await page.getByText(/^Nothing here is called/).waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await page.keyboard.press('Escape');

    await choose(page, 'beam b6', /Beam B6/);
    await page.locator('tr[aria-current]', { hasText: 'B6' }).waitFor();
    await choose(page, 'candidate b', /Candidate B/);
    await expect.poll(() => pathOf(page)).toBe(candidatePath('B'));
    await choose(page, 'shortlist', /Shortlist/);
    await expect.poll(() => pathOf(page)).toBe(`${LIBRARY}/shortlist`);
    await choose(page, 'share', /Share the shortlist/);
    await page.getByRole('dialog', { name: /Share/ }).waitFor();
    await page.keyboard.press('Escape');

    await visit.open(runPath('reading-room'));
    const chart = page.getByRole('slider', { name: /^Section along the front/ });
    const before = await chart.getAttribute('aria-valuenow');
    await choose(page, 'next section', /Next section/);
    await expect.poll(() => chart.getAttribute('aria-valuenow')).not.toBe(before);
    await choose(page, 'wharf', /Wharf Lane Clinic/);
    await page.getByRole('heading', { name: 'Wharf Lane Clinic' }).waitFor();
  });
});

describe('the first steps', () => {
  it('come up once for each person, lead through five places, and come back when asked for', async () => {
    const visit = await office.visit(null);
    const { page } = visit;
    await visit.signIn('engineer');
    await page.addInitScript(() =>
      localStorage.setItem('counted', `${Number(localStorage.getItem('counted')) + 1}`),
    );
    await page.addInitScript(() => {
      if (localStorage.getItem('counted') === '1')
        for (const key of Object.keys(localStorage))
          if (key.startsWith('fairweight.first-steps')) localStorage.removeItem(key);
    });
    await visit.open('/projects');
    const steps = page.getByRole('complementary', { name: 'First steps' });
    await steps.getByText('Step 1 of 5').waitFor();
    expect(await axeFindings(page)).toEqual([]);
    for (const look of ['See the beams', 'See the sweeps', 'See a run', 'See the shortlist', 'See a sheet']) {
      await steps.getByRole('link', { name: look }).click();
      await page.getByRole('heading', { level: 1 }).first().waitFor();
      await steps.getByRole('button', { name: /^(Next|Done)$/ }).click();
    }
    await steps.waitFor({ state: 'detached' });
    await page.reload();
    await page.getByRole('heading', { level: 1 }).first().waitFor();
    expect(await steps.count()).toBe(0);
    await choose(page, 'first steps', /First steps/);
    await steps.getByRole('button', { name: 'Skip' }).click();
    await steps.waitFor({ state: 'detached' });
  });
});

declare global {
  interface Window {
    shifted: number;
  }
}

/** How far things moved that nobody had touched, as browsers score it: 0 is nothing, 0.1 the most that is called good. */
async function shiftOf(page: Page, address: string): Promise<number> {
  await page.goto(address);
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  await page.waitForLoadState('networkidle');
  return page.evaluate(() => window.shifted);
}

describe('a page that arrives late', () => {
  it('stands where its skeleton stood', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await page.addInitScript(() => {
      window.shifted = 0;
      new PerformanceObserver((list) => {
        for (const entry of list.getEntries()) {
          const shift = entry as PerformanceEntry & { value: number; hadRecentInput: boolean };
          if (!shift.hadRecentInput) window.shifted += shift.value;
        }
      }).observe({ type: 'layout-shift', buffered: true });
    });
    const shifts: Record<string, number> = {};
    const addresses = [
      '/projects',
      `${LIBRARY}/beams`,
      `${LIBRARY}/sweeps`,
      `${LIBRARY}/shortlist`,
      candidatePath('B'),
      runPath('reading-room'),
    ];
    for (const address of addresses) shifts[address] = await shiftOf(page, address);
    console.log(shifts);
    for (const address of addresses) expect(shifts[address], address).toBeLessThan(0.1);
  });
});
