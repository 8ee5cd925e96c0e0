import { readFile } from 'node:fs/promises';
import type { Locator, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { runPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();
const COST_BY_DUCTILITY = `${runPath('reading-room')}?x=costPerM&y=curvatureDuctility`;

const chart = (page: Page): Locator => page.getByRole('slider', { name: /^Section along the front/ });
const chosen = (page: Page): Locator => page.getByRole('region', { name: 'Chosen section' });
const asked = (page: Page, key: string): string | null => new URL(page.url()).searchParams.get(key);
const panel = (page: Page, name: string): Promise<void> =>
  page.getByRole('group', { name: 'Shown below the strip' }).getByText(name).click();

/** What lies within the ranges, once it is told from every section and not from the listed ones. */
async function withinRanges(page: Page): Promise<number> {
  const words = page.getByRole('region', { name: 'Ranges set' }).getByRole('status');
  await words.filter({ hasText: / of [\d,]+ sections, front \d/ }).waitFor();
  return Number((await words.innerText()).split(' ')[0]!.replaceAll(',', ''));
}

describe('a finished run', () => {
  it('is enlarged, divided by logarithms and told by a third measure, all of it in the address', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(COST_BY_DUCTILITY);
    await chart(page).locator('canvas').waitFor();
    await chart(page).focus();
    await page.keyboard.press('+');
    await expect.poll(() => asked(page, 'zx')).toMatch(/^[\d.]+~[\d.]+$/);
    await page.getByRole('button', { name: 'Whole' }).click();
    await expect.poll(() => asked(page, 'zx')).toBeNull();

    const { x, y, width, height } = (await chart(page).boundingBox())!;
    await page.mouse.move(x + width * 0.3, y + height * 0.3);
    await page.mouse.down();
    await page.mouse.move(x + width * 0.6, y + height * 0.7, { steps: 4 });
    await page.mouse.up();
    await expect.poll(() => asked(page, 'zy')).not.toBeNull();

    await page.getByLabel('log across').check();
    await page.getByLabel('Marks tell').selectOption('depthMm');
    expect([asked(page, 'log'), asked(page, 'by'), asked(page, 'zx')]).toEqual(['x', 'depthMm', null]);
    await page.reload();
    await chart(page).locator('canvas').waitFor();
    expect(await page.getByLabel('log across').isChecked()).toBe(true);
    expect(await page.getByLabel('Marks tell').inputValue()).toBe('depthMm');
  });

  it('finds the front in three measures, marks and lists it, and keeps to it over a reload and within ranges', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${COST_BY_DUCTILITY}&by=depthMm`);
    await chart(page).locator('canvas').waitFor();
    const marks = async () => Number(await chart(page).getAttribute('aria-valuemax'));
    const told = page.getByRole('region', { name: 'Trade-off' }).getByText(/^Marks: [\d,]+ sections/);
    const inTwo = await marks();
    await page.getByLabel('Front in three measures').check();
    await told.waitFor();
    // Until then it is the front of what has been ranked so far.
    await page.getByText(/sections evaluated, none better than the front/).waitFor();
    await expect.poll(marks).toBeGreaterThan(inTwo);
    const inThree = Number(/Marks: ([\d,]+) sections/.exec(await told.innerText())![1]!.replace(',', ''));
    await expect.poll(marks).toBe(inThree);
    await page.getByText(`Front ${inThree}`, { exact: true }).waitFor();
    expect(asked(page, 'in')).toBe('3');
    await page.reload();
    await told.waitFor();
    await expect.poll(marks).toBe(inThree);
    await page.getByRole('group', { name: 'Shown below the strip' }).getByText('Ranges').click();
    await page.getByLabel('Depth h to').fill('23');
    await withinRanges(page);
    await expect.poll(marks).toBeLessThan(inThree);
    await page.getByLabel('Front in three measures').uncheck();
    await expect.poll(() => asked(page, 'in')).toBeNull();
    await told.waitFor({ state: 'detached' });
  });

  it('keeps every view to the ranges set, by typing, by keys, over a reload, until a hand takes them out', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${COST_BY_DUCTILITY}&show=ranges`);
    await page.getByLabel('Depth h to').fill('23');
    const within = await withinRanges(page);
    expect(within).toBeGreaterThan(0);
    const handle = page.getByRole('slider', { name: 'Depth h at most' });
    expect(await handle.getAttribute('aria-valuetext')).toBe('23 in');
    await handle.focus();
    await page.keyboard.press('ArrowDown');
    await page.getByRole('region', { name: 'Ranges set' }).getByText('h ≤ 22 in').waitFor();
    await expect.poll(() => withinRanges(page)).toBeLessThan(within);

    await page.reload();
    await page.getByRole('region', { name: 'Ranges set' }).getByText('h ≤ 22 in').waitFor();
    await withinRanges(page);
    await panel(page, 'Table');
    const rows = page
      .getByRole('table', { name: 'Sections on the front' })
      .locator('tbody tr[aria-rowindex]');
    const depths = await rows.locator('td:nth-child(2)').allInnerTexts();
    expect(depths.length).toBeGreaterThan(2);
    expect(Math.max(...depths.map(Number))).toBeLessThanOrEqual(22);
    await page.getByRole('button', { name: 'Clear all' }).click();
    await page.getByRole('region', { name: 'Ranges set' }).waitFor({ state: 'detached' });
    expect(asked(page, 'f')).toBeNull();
  });

  it('is taken away by the keyboard: the sections within the ranges as a table, the chart and the drawing', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${COST_BY_DUCTILITY}&f=depthMm:~584.2`);
    const count = await withinRanges(page);
    await chart(page).locator('canvas').waitFor();
    const take = async (menu: string, item: RegExp): Promise<{ name: string; text: string }> => {
      await page.getByRole('button', { name: menu }).press('Enter');
      await page.getByRole('menuitem', { name: item }).focus();
      const [download] = await Promise.all([page.waitForEvent('download'), page.keyboard.press('Enter')]);
      return { name: download.suggestedFilename(), text: await readFile(await download.path(), 'utf8') };
    };
    const table = await take('Export', /^All within the ranges, CSV/);
    expect(table.name).toMatch(/-run-1-all\.csv$/);
    expect(table.text).toContain(`Rows,${count}\r\n`);
    expect(table.text).toContain('Ranges,h ≤ 23 in');
    const picture = await take('Export', /^Chart as SVG/);
    expect(picture.text).toMatch(/^<svg [^]*Curvature ductility μφ[^]*only h ≤ 23 in[^]*<\/svg>$/);
    const drawing = await take('Drawing as a file', /^Drawing as DXF/);
    expect(drawing.text).toMatch(/BARS[^]*CIRCLE[^]*EOF/);
  });

  it('is walked along the strip with the keys, pinned from there at once, and the pin taken back', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${runPath('reading-room')}?x=costPerM&y=curvatureDuctility`);
    const strip = page.getByRole('group', { name: /^Sections along the front/ });
    await strip.getByRole('button', { pressed: true }).focus();
    await page.keyboard.press('End');
    const pressed = strip.getByRole('button', { pressed: true });
    await expect.poll(() => chart(page).getAttribute('aria-valuenow')).not.toBe('1');
    await expect.poll(() => pressed.count()).toBe(1);
    await strip.getByRole('button', { name: /^Pin / }).last().click();
    await chosen(page)
      .getByText(/On the shortlist as/)
      .waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await chosen(page).getByRole('button', { name: 'Pin to shortlist' }).waitFor();
  });

  it('says what each check keeps out and by how much the best of it misses', async () => {
    const visit = await office.visit('checker');
    const { page } = visit;
    await visit.open(COST_BY_DUCTILITY);
    await page.getByRole('button', { name: /^In full/ }).click();
    const table = page.getByRole('table', { name: /^Checks, what they took/ });
    const row = table.getByRole('row', { name: /^Curvature ductility/ });
    expect(await row.innerText()).toMatch(/μφ ≥ 6[^]*%, [\d,]+ only this[^]*1\.\d\d/);
    await row.getByRole('button').click();
    await chosen(page).getByText('✕ Fails 1 of', { exact: false }).waitFor();
    expect(await page.getByRole('button', { name: /^Extend to/ }).count(), 'a checker runs no sweeps').toBe(
      0,
    );
  });

  it('is carried on past the end of a range at which the best lies, with one click', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(COST_BY_DUCTILITY);
    const before = page.url();
    await page.getByRole('button', { name: 'Extend to 8 in and run' }).click();
    await expect.poll(() => new URL(page.url()).pathname).not.toBe(new URL(before).pathname);
    await page.getByText(/evaluated, none better than the front/).waitFor();
    const ruler = page.getByRole('img', { name: /^Share that meets every check by Width b/ });
    expect(await ruler.getAttribute('aria-label')).toContain('8: ');
  });
});
