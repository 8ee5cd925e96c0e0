import { describe, expect, it } from 'vitest';
import { DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { candidatePath, LIBRARY } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

describe('what a role is shown', () => {
  it('offers a viewer nothing to change and no money', async () => {
    const visit = await office.visit('viewer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/beams`);
    for (const name of [/add a beam/i, /^edit/i, /^delete/i, /new sweep/i, /name and number/i])
      expect(await page.getByRole('button', { name }).or(page.getByRole('link', { name })).count()).toBe(0);
    await visit.open(candidatePath('B'));
    expect(await page.getByText(/^Cost/).count()).toBe(0);
    await visit.open(`${LIBRARY}/prices`);
    await page.getByText('Rates are not shown to viewers').waitFor();
  });

  it('shows a link’s reader the shortlist without signing in and without rates, until it is revoked', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/shortlist`);
    await page.getByRole('button', { name: 'Share the shortlist' }).click();
    await page.getByRole('button', { name: 'Create a link' }).click();
    const address = await page.getByLabel('Address of the link').first().inputValue();

    const guest = await office.visit(null);
    await guest.open(address);
    await guest.page.getByRole('heading', { name: 'Tidemill Library' }).waitFor();
    const text = await guest.page.getByRole('main').innerText();
    expect(text).toContain('Calculation of candidate B');
    expect(text).not.toMatch(/USD|\bcosts?\b/i);

    await page.getByRole('button', { name: 'Revoke' }).first().click();
    await page.getByText('No link yet.').waitFor();
    guest.expectComplaint(/404 \(Not Found\) .*\/api\/shared\//);
    await guest.page.reload();
    await guest.page.getByRole('heading', { name: 'This link no longer works' }).waitFor();
  });
});

describe('a form', () => {
  it('loses nothing when the session ends in the middle of it', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    // The first call finds no session; the token of the new one is not yet known at the second.
    visit.expectComplaint(/40[13] \((Unauthorized|Forbidden)\)/);
    await visit.open(`${LIBRARY}/basis`);
    const cover = page.getByLabel('Clear cover');
    const before = await cover.inputValue();
    await cover.fill('1.75');
    // An answer still on its way would bring the rolling session's cookie back.
    await page.waitForLoadState('networkidle');
    await page.context().clearCookies();
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByRole('dialog', { name: 'Your session has ended' }).waitFor();
    await page.getByLabel('Password').fill(DEMO_PASSWORD);
    await page.getByLabel('Password').press('Enter');
    await page.getByText('Design basis saved').waitFor();
    await page.reload();
    expect(await cover.inputValue()).toBe('1.75');
    await cover.fill(before);
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText('Design basis saved').waitFor();
  });

  it('says in the project’s units what is wrong, and asks before it is left', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/basis`);
    await page.getByLabel('Clear cover').fill('99');
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText('Clear cover must be at most 7.874 in').waitFor();
    await page.getByRole('link', { name: /^Sweeps/ }).click();
    await page.getByRole('button', { name: 'Stay' }).click();
    expect(await page.getByLabel('Clear cover').inputValue()).toBe('99');
  });
});

describe('a chosen light or dark', () => {
  it('is on the page without waiting for the application’s own script', async () => {
    const visit = await office.visit('checker');
    const { page } = visit;
    await visit.open('/projects');
    await page.getByRole('button', { name: /Checker/ }).click();
    await page.getByRole('menuitemradio', { name: 'Dark paper' }).click();
    await page.route('**/assets/*.js', (route) => route.abort());
    visit.expectComplaint(/ERR_FAILED/);
    await page.reload();
    const paper = await page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
    expect(paper).toBe('rgb(20, 24, 26)');
  });
});
