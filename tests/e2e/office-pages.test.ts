import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Candidate, Project } from '#shared/contract/records.ts';
import { openOfficeBrowser, signIn, type OfficeBrowser } from '../support/office-browser.ts';

let office: OfficeBrowser;
let project: Project;
let candidates: Candidate[];

beforeAll(async () => {
  office = await openOfficeBrowser('office-pages');
  const { page } = await office.openAs('engineer');
  const projects = await read<Project[]>(page, '/api/projects');
  project = projects.find(({ candidateCount }) => candidateCount >= 4)!;
  candidates = await read<Candidate[]>(page, `/api/projects/${project.id}/candidates`);
});
afterAll(() => office.close());

async function read<T>(page: Page, address: string): Promise<T> {
  return (await (await page.request.get(office.origin + address)).json()) as T;
}

async function visit(page: Page, address: string): Promise<void> {
  await page.goto(office.origin + address);
  await page.waitForLoadState('networkidle');
}

const pages = () => {
  const base = `/projects/${project.id}`;
  const compared = candidates.filter(({ beam }) => beam.id === candidates[0]!.beam.id).map(({ id }) => id);
  return [
    '/projects',
    '/projects/new',
    `${base}/beams`,
    `${base}/sweeps`,
    `${base}/shortlist?compare=${compared.join(',')}&base=${compared[0]}`,
    `${base}/basis`,
    `${base}/prices`,
    `${base}/people`,
    `${base}/candidates/${candidates[0]!.id}`,
    '/verification',
    '/no-such-page',
  ];
};

const overflow = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

describe('every page of the office', () => {
  it.each([
    { width: 1440, colorScheme: 'light' },
    { width: 1024, colorScheme: 'dark' },
    { width: 390, colorScheme: 'light' },
  ] as const)(
    'holds at $width px, $colorScheme: nothing axe finds, nothing wider than the window',
    async (look) => {
      const { page, complaints } = await office.openAs('engineer', {
        viewport: { width: look.width, height: 844 },
        colorScheme: look.colorScheme,
      });
      for (const address of pages()) {
        await visit(page, address);
        const { violations } = await new AxeBuilder({ page }).analyze();
        expect(
          violations.map(({ id, nodes }) => `${id}: ${nodes[0]!.html}`),
          address,
        ).toEqual([]);
        expect(await overflow(page), address).toBe(0);
      }
      expect(complaints).toEqual([]);
      await page.context().close();
    },
  );
});

describe('what a role is shown', () => {
  it('offers a viewer nothing to change and no money', async () => {
    const { page } = await office.openAs('viewer');
    await visit(page, `/projects/${project.id}/beams`);
    for (const name of [/add a beam/i, /^edit/i, /^delete/i, /new sweep/i, /name and number/i])
      expect(await page.getByRole('button', { name }).or(page.getByRole('link', { name })).count()).toBe(0);
    await visit(page, `/projects/${project.id}/candidates/${candidates[0]!.id}`);
    expect(await page.locator('main').innerText()).not.toContain('USD');
    expect(await page.getByText(/^Cost/).count()).toBe(0);
    await visit(page, `/projects/${project.id}/prices`);
    await page.getByText('Rates are not shown to viewers').waitFor();
    await page.context().close();
  });

  it('shows a link’s reader the shortlist without signing in and without rates', async () => {
    const { page } = await office.openAs('engineer');
    await visit(page, `/projects/${project.id}/shortlist`);
    await page.getByRole('button', { name: 'Share the shortlist' }).click();
    await page.getByRole('button', { name: 'Create a link' }).click();
    const address = await page.getByLabel('Address of the link').first().inputValue();

    const { page: guest, complaints } = await office.open();
    await guest.goto(address);
    await guest.getByRole('heading', { name: project.name }).waitFor();
    expect(await guest.locator('main').innerText()).not.toMatch(/USD|\bcost\b/i);
    expect((await new AxeBuilder({ page: guest }).analyze()).violations).toEqual([]);
    expect(complaints).toEqual([]);

    await page.getByRole('button', { name: 'Revoke' }).first().click();
    await page.getByText('No link yet.').waitFor();
    await guest.reload();
    await guest.getByText('This link no longer works').waitFor();
    await page.context().close();
    await guest.context().close();
  });
});

describe('a form', () => {
  it('loses nothing when the session ends in the middle of it', async () => {
    const { page } = await office.openAs('engineer');
    await visit(page, `/projects/${project.id}/basis`);
    const cover = page.getByLabel('Clear cover');
    const before = await cover.inputValue();
    await cover.fill('1.75');
    await page.context().clearCookies();
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByRole('dialog', { name: 'Your session has ended' }).waitFor();
    await signIn(page, 'engineer');
    await page.getByText('Design basis saved').waitFor();
    await page.reload();
    expect(await cover.inputValue()).toBe('1.75');
    await cover.fill(before);
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText('Design basis saved').waitFor();
    await page.context().close();
  });

  it('says in the project’s units what is wrong, and asks before it is left', async () => {
    const { page } = await office.openAs('engineer');
    await visit(page, `/projects/${project.id}/basis`);
    await page.getByLabel('Clear cover').fill('99');
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText('Clear cover must be at most 7.874 in').waitFor();
    await page.getByRole('link', { name: /^Sweeps/ }).click();
    await page.getByRole('button', { name: 'Stay' }).click();
    expect(await page.getByLabel('Clear cover').inputValue()).toBe('99');
    await page.context().close();
  });
});

describe('the keyboard', () => {
  it('skips to the page, lists the shortcuts and goes places', async () => {
    const { page } = await office.openAs('engineer');
    await visit(page, `/projects/${project.id}/sweeps`);
    await page.keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('Skip to the page');
    await page.keyboard.press('?');
    await page.getByRole('dialog', { name: 'Keyboard shortcuts' }).waitFor();
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.keyboard.press('g');
    await page.keyboard.press('b');
    await page.waitForURL(/\/beams$/);
    await page.context().close();
  });
});

describe('a chosen light or dark', () => {
  it('is on the page without waiting for the application’s own script', async () => {
    const { page } = await office.openAs('engineer', { colorScheme: 'light' });
    await page.getByRole('button', { name: /Engineer/ }).click();
    await page.getByRole('menuitemradio', { name: 'Dark paper' }).click();
    await page.route('**/assets/*.js', (route) => route.abort());
    await page.reload();
    const paper = await page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
    expect(paper).toBe('rgb(20, 24, 26)');
    await page.context().close();
  });
});
