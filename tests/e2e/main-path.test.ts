import type { Locator, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { useBrowserOffice } from '../support/browser-office.ts';
import { markCentre } from '../support/browser-chart.ts';

const office = useBrowserOffice();
const engineer = DEMO_ACCOUNTS.find(({ role }) => role === 'engineer')!;

/**
 * Widths 12 to 18 by 2 and depths 18 to 26 by 1 as typed; of the office's standard for floor beams four mixes, 5 sizes × 2 to
 * 8 bars, none or 3 sizes × 2 to 4.
 */
const SECTION_COUNT = 4 * 9 * 4 * (5 * 7) * (1 + 3 * 3);
const WHY = 'Leaves the duct its 2 in';

/** The value beside a label in a list of terms. */
const termValue = (scope: Locator, term: string): Locator =>
  scope.locator('dt', { hasText: term }).locator('xpath=following-sibling::dd');

async function signIn(page: Page): Promise<void> {
  await page.goto('/');
  await page.getByLabel('E-mail').fill(engineer.email);
  await page.getByLabel('Password').fill('not the password');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page
    .getByRole('alert')
    .filter({ hasText: /password/i })
    .waitFor();
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByLabel('Password').press('Enter');
  await page.getByRole('heading', { name: 'Projects' }).waitFor();
}

async function addBeam(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Tidemill Library' }).click();
  await page.getByRole('button', { name: 'Add a beam' }).click();
  const dialog = page.getByRole('dialog', { name: 'New beam' });
  await dialog.getByLabel('Mark').fill('B10');
  await dialog.getByRole('button', { name: 'Add beam' }).click();
  await dialog.getByText('Span must be a number').waitFor();
  expect(await dialog.getByLabel('Mark').inputValue()).toBe('B10');
  for (const [label, text] of [
    ['Location', 'Void over the stair'],
    ['Span', '26'],
    ['Count', '4'],
    ['Moment Mu', '1,240'],
    ['Shear Vu', '50'],
    ['Ductility target μφ', '6'],
    ['Depth cap', '26'],
  ] as const)
    await dialog.getByLabel(label).fill(text);
  await dialog.getByLabel('Moment Mu').fill('240');
  await dialog.getByRole('button', { name: 'Add beam' }).click();
  const row = page.getByRole('table', { name: 'Beams' }).getByRole('row', { name: /^B10/ });
  await row.waitFor();
  const cells = await row.getByRole('cell').allInnerTexts();
  expect(cells.slice(0, 9)).toEqual(['Void over the stair', '26', '4', '240', '50', '6', '26', '0', '0']);
}

/** Types the ranges, one of them wrong at first; returns the share that cannot fit as printed. */
async function typeRanges(page: Page): Promise<string> {
  await page.getByRole('link', { name: 'New sweep for B10' }).click();
  const size = page.getByRole('complementary', { name: 'Size of the space' });
  const count = size.locator('p').first();
  const field = (name: string) => page.getByLabel(name, { exact: true });
  await field('Width b from').fill('12');
  await field('Width b to').fill('8');
  await size.getByText('One field needs attention.').waitFor();
  expect(await count.innerText()).toBe('—');
  const message = await field('Width b to').getAttribute('aria-describedby');
  expect(await page.locator(`[id="${message}"]`).innerText()).toContain(
    'Width b: the end is below the start',
  );
  await field('Depth h from').fill('18');
  await field('Depth h to').fill('26');
  await field('Depth h by').fill('1');
  expect(await field('Width b to').inputValue(), 'what was typed stays').toBe('8');
  await field('Width b to').fill('18');
  await field('Width b by').fill('2');
  await expect.poll(() => count.innerText()).toBe(SECTION_COUNT.toLocaleString('en-US'));
  await expect.poll(() => termValue(size, 'Bars cannot fit').innerText()).toMatch(/^\d+(\.\d+)? %$/);
  return termValue(size, 'Bars cannot fit').innerText();
}

const slider = (page: Page): Locator => page.getByRole('slider', { name: /^Section along the front/ });
const chosenSection = (page: Page): Locator => page.getByRole('region', { name: 'Chosen section' });

/** The section the chart says is chosen and the one the page shows beside it, which must be one and the same. */
async function chosenOnChart(page: Page): Promise<string> {
  const words = (await slider(page).getAttribute('aria-valuetext'))!.split('\n')[0]!;
  const [size = '', ...steel] = words.split(', ');
  const header = chosenSection(page).getByRole('article').locator('header');
  await header
    .filter({ hasText: size })
    .filter({ hasText: steel.join(', ') })
    .waitFor();
  return words;
}

/** The selected mark is drawn in the colour of steel; where it is when the last section of the front is chosen. */
async function exploreChart(page: Page): Promise<void> {
  const canvas = slider(page).locator('canvas');
  await slider(page).focus();
  await page.keyboard.press('End');
  await expect.poll(() => slider(page).getAttribute('aria-valuenow')).not.toBe('1');
  const last = await chosenOnChart(page);
  const spot = await markCentre(canvas);
  await page.keyboard.press('Home');
  await expect.poll(() => slider(page).getAttribute('aria-valuenow')).toBe('1');
  expect(await chosenOnChart(page)).not.toBe(last);
  await canvas.click({ position: spot });
  await expect.poll(() => chosenOnChart(page)).toBe(last);

  await page.keyboard.press('Home');
  await page.keyboard.press('ArrowRight');
  await expect.poll(() => slider(page).getAttribute('aria-valuenow')).toBe('2');
  expect(await chosenOnChart(page)).not.toBe(last);
}

async function readChecks(page: Page): Promise<void> {
  const checks = chosenSection(page).getByRole('listitem');
  for (const [name, clause] of [
    ['Strength φMn', /ACI 318-19 .*22\.2/],
    ['Curvature ductility μφ', /project target/],
    ['Tension strain εt', /ACI 318-19 .*9\.3\.3\.1/],
    ['Least steel As', /ACI 318-19 .*9\.6\.1/],
    ['Bar fit b', /ACI 318-19 .*25\.2/],
  ] as const) {
    const text = await checks.filter({ hasText: name }).first().innerText();
    expect(text, name).toMatch(clause);
    expect(text, name).toMatch(/\b[01]\.\d\d\b/);
    expect(text, name).toMatch(/meets|at limit/);
  }
  const strength = await checks.filter({ hasText: 'Strength φMn' }).innerText();
  const [, ratio, asked, there] = /(\d\.\d\d)\n[^]*?\n(\d+) asked, (\d+) kip·ft there/.exec(strength)!;
  // All three are rounded for print.
  expect(Math.abs(Number(ratio) - Number(asked) / Number(there))).toBeLessThan(0.01);
  await chosenSection(page).getByText('✓ Meets the listed checks', { exact: true }).waitFor();
}

/** Pins the chosen section; returns the label it is given. */
async function pin(page: Page): Promise<string> {
  await chosenSection(page).getByRole('button', { name: 'Pin to shortlist' }).click();
  await page.getByLabel('Why this one, for B10').fill(WHY);
  await page.getByRole('button', { name: 'Pin', exact: true }).click();
  const link = chosenSection(page).getByRole('link', { name: /^candidate / });
  await link.waitFor();
  const label = (await link.innerText()).replace('candidate ', '');
  await page.getByText(`Pinned to B10 as candidate ${label}`).waitFor();
  return label;
}

describe('an engineer', () => {
  it('gets from signing in to a section on the shortlist, with its reasons, and never approves it', async () => {
    const visit = await office.visit(null);
    const { page } = visit;
    visit.expectComplaint(/401 \(Unauthorized\).*\/api\/session$/);
    await signIn(page);
    await addBeam(page);
    const cannotFit = await typeRanges(page);

    await page.getByRole('button', { name: 'Run', exact: true }).click();
    const proof = `${SECTION_COUNT.toLocaleString('en-US')} sections evaluated, none better than the front`;
    await page.getByText(proof).waitFor();
    await page.getByText('Finished', { exact: true }).waitFor();
    const reasons = page.getByRole('table', { name: 'Checks by the share of sections that fail them' });
    expect(await reasons.getByRole('row', { name: /^Bar fit/ }).innerText()).toContain(cannotFit);

    await exploreChart(page);
    await readChecks(page);
    const size = await chosenSection(page).getByRole('heading', { level: 2 }).innerText();
    const label = await pin(page);

    await chosenSection(page)
      .getByRole('link', { name: `candidate ${label}` })
      .click();
    const state = page.getByRole('region', { name: 'State' });
    await page.getByText(WHY).first().waitFor();
    expect(await state.getByRole('button').allInnerTexts()).toEqual(['Withdraw']);
    const candidateId = page.url().split('/').at(-1)!;
    for (const to of ['checked', 'approved']) {
      const answer = await visit.ask('post', `/candidates/${candidateId}/transitions`, { to, note: '' });
      expect(answer.status(), to).toBe(403);
    }

    await page.getByRole('link', { name: 'Shortlist' }).click();
    const row = page.getByRole('region', { name: 'Beam B10' }).getByRole('row', { name: `Compare ${label}` });
    const text = await row.innerText();
    for (const part of [...size.split('\n'), 'Proposed', engineer.name]) expect(text).toContain(part);
  });
});
