import { randomUUID } from 'node:crypto';
import type { Locator, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import type { Sweep } from '#shared/contract/records.ts';
import { DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { beamId, DEPOT, LIBRARY } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

const NEW_SWEEP = `${LIBRARY}/beams/${beamId('library', 'B6')}/sweeps/new`;

const field = (page: Page, name: string): Locator => page.getByLabel(name, { exact: true });

/** What stands beside a field because of what was typed into it. */
async function complaintBeside(page: Page, name: string): Promise<string> {
  const ids = (await field(page, name).getAttribute('aria-describedby')) ?? '';
  const error = ids.split(' ').find((id) => id.endsWith('-error'));
  return error === undefined ? '' : page.locator(`[id="${error}"]`).innerText();
}

const tally = (page: Page): Locator => page.getByRole('complementary', { name: 'Size of the space' });
const run = (page: Page): Promise<void> => page.getByRole('button', { name: 'Run', exact: true }).click();

async function openSweepForm(page: Page): Promise<void> {
  await page.goto(NEW_SWEEP);
  await field(page, 'Width b from').waitFor();
}

describe('the sweep form', () => {
  it('says beside the field what is wrong with a range, keeps it, and runs nothing', async () => {
    const { page } = await office.visit('engineer');
    const writes: string[] = [];
    page.on('request', (request) => request.method() !== 'GET' && writes.push(request.url()));
    await openSweepForm(page);
    for (const [name, text, complaint] of [
      ['Width b to', '11', 'Width b: the end is below the start'],
      ['Width b by', '0', 'Width b: the step must be more than zero'],
      ['Depth h by', '-1', 'Depth h: the step must be more than zero'],
      ['Depth h from', 'twenty', '“twenty”'],
      ['Depth h by', '0.001', 'Depth h: the step makes more than 2000 values'],
    ] as const) {
      const before = await field(page, name).inputValue();
      await field(page, name).fill(text);
      await expect.poll(() => complaintBeside(page, name)).toContain(complaint);
      await run(page);
      expect(await field(page, name).inputValue()).toBe(text);
      expect(await page.locator(':focus').getAttribute('aria-invalid'), 'where to go on').toBe('true');
      await field(page, name).fill(before);
      await expect.poll(() => complaintBeside(page, name)).toBe('');
    }
    expect(page.url()).toContain(NEW_SWEEP);
    expect(writes).toEqual([]);
  });

  it('asks for bars where none are chosen, and tells when none can be placed', async () => {
    const { page } = await office.visit('engineer');
    await openSweepForm(page);
    const sizes = page.getByRole('group', { name: 'Bottom bars: sizes' });
    const toggle = (size: string) => sizes.getByLabel(size, { exact: true }).press('Space');
    for (const size of ['#6', '#7', '#8', '#9', '#10']) await toggle(size);
    await sizes.getByText('Tension bars: choose at least one size').waitFor();
    await tally(page).getByText('One field needs attention.').waitFor();
    await toggle('#9');
    await page.getByLabel('number of bars, as 2–8 or 2, 4, 6').first().fill('8');
    await field(page, 'Width b from').fill('8');
    await field(page, 'Width b to').fill('8');
    await tally(page).getByText('None of them can be placed').waitFor();
    await tally(page).getByText('100 %').waitFor();
  });

  it('refuses more sections than bounds can search with their count and the range to coarsen', async () => {
    const { page } = await office.visit('engineer');
    await openSweepForm(page);
    const ranges = { 'Width b': ['10', '60', '0.05'], 'Depth h': ['18', '36', '0.01'] } as const;
    for (const [name, [from, to, by]] of Object.entries(ranges)) {
      await field(page, `${name} from`).fill(from);
      await field(page, `${name} to`).fill(to);
      await field(page, `${name} by`).fill(by);
    }
    await page.getByText('More than the 200,000,000 that can be evaluated one by one.').waitFor();
    for (const counts of await page.getByLabel(/^number of bars/).all()) await counts.fill('2–60');
    const count = (1001 * 1801 * 4 * (5 * 59) * (3 * 59 + 1)).toLocaleString('en-US');
    expect(count).toBe('378,660,322,040');
    await tally(page)
      .getByText(`${count} sections are more than the 200,000,000,000 that one run takes.`)
      .waitFor();
    expect(await complaintBeside(page, 'Depth h by')).toContain(
      `${count} sections: the depth h has 1,801 values. Use a larger step.`,
    );
    await run(page);
    await expect
      .poll(() => field(page, 'Depth h by').evaluate((element) => element === document.activeElement))
      .toBe(true);
    expect(page.url()).toContain(NEW_SWEEP);
    await page.reload();
    await page.getByText('Your unsaved changes of earlier are shown.').waitFor();
    expect(await field(page, 'Depth h by').inputValue(), 'kept over a reload').toBe('0.01');
  });

  it('is kept when the session ends in the middle of it, and saved after signing in again', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    // The token that goes with the ended session is refused once and renewed.
    visit.expectComplaint(/40[13] \((Unauthorized|Forbidden)\)/);
    await openSweepForm(page);
    await page.getByLabel('Name of the sweep').fill('Typed before the session ended');
    await field(page, 'Depth h to').fill('30');
    await office.endSessions();

    await page.getByRole('button', { name: 'Save', exact: true }).click();
    const dialog = page.getByRole('dialog', { name: 'Your session has ended' });
    await dialog.getByLabel('Password').fill('wrong');
    await dialog.getByRole('button', { name: 'Sign in' }).click();
    await dialog.getByRole('alert').waitFor();
    await dialog.getByLabel('Password').fill(DEMO_PASSWORD);
    await dialog.getByLabel('Password').press('Enter');
    await page.getByText('Typed before the session ended is saved').waitFor();
    await page.waitForURL(/\/sweeps\/[0-9a-f-]{36}$/);
    const saved = await visit.call<Sweep>('get', `/sweeps/${page.url().split('/').at(-1)}`);
    expect(saved.name).toBe('Typed before the session ended');
    expect(saved.definition.space.depth).toMatchObject({ kind: 'range', to: 30 * 25.4 });
  });
});

describe('an address', () => {
  it.each([
    ['an unknown project', 'project', `/projects/${randomUUID()}/beams`],
    ['what cannot be a project', 'project', '/projects/tidemill/beams'],
    ['a project of other people', 'project', `${DEPOT}/beams`],
    ['an unknown run', 'run', `${LIBRARY}/runs/${randomUUID()}`],
    ['an unknown candidate', 'candidate', `${LIBRARY}/candidates/${randomUUID()}`],
    ['no page at all', 'page', '/reports/monthly'],
  ])('of %s says plainly that there is no such %s', async (_what, thing, address) => {
    const visit = await office.visit('engineer');
    visit.expectComplaint(/40[04] \((Not Found|Bad Request)\)/);
    await visit.page.goto(address);
    await visit.page.getByRole('heading', { name: `There is no such ${thing}` }).waitFor();
    await visit.page.getByRole('link', { name: 'To the projects', exact: true }).click();
    await visit.page.getByRole('heading', { name: 'Projects' }).waitFor();
  });

  it('inside the office leads back to it after signing in', async () => {
    const { page } = await office.visit(null);
    await page.goto(`${LIBRARY}/prices`);
    await page.getByLabel('E-mail').fill('estimator@tidemill.example');
    await page.getByLabel('Password').fill(DEMO_PASSWORD);
    await page.getByLabel('Password').press('Enter');
    await page.getByRole('button', { name: 'Save price book' }).waitFor();
    expect(new URL(page.url()).pathname).toBe(`${LIBRARY}/prices`);
  });
});
