import type { Locator, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import type { Run, Sweep } from '#shared/contract/records.ts';
import { beamId, CLINIC } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';
import { scaledSweep } from '../support/office-project.ts';

const office = useBrowserOffice();

/** 1001 × 1801 × 96: more than half a minute of two threads, none of which is waited for. */
const HUGE = scaledSweep(1001, 1801);
const HUGE_COUNT = 1001 * 1801 * 96;

const print = (count: number): string => count.toLocaleString('en-US');
const countIn = (text: string): number => Number(text.replaceAll(',', ''));

const bar = (page: Page): Locator => page.getByRole('progressbar', { name: 'Sections evaluated' });

async function shareDone(page: Page): Promise<number> {
  return Number(await bar(page).getAttribute('aria-valuenow'));
}

/** Sections evaluated so far by the line under the front. */
async function evaluatedSoFar(page: Page): Promise<number> {
  const claim = page.getByText(`of ${print(HUGE_COUNT)} evaluated, none of these better than the front`);
  return countIn((await claim.innerText()).split(' ')[0]!);
}

describe('a run of a hundred and seventy million sections', () => {
  it('shows its front growing, also after a reload, and keeps what is done when it is cancelled', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    const sweep = await visit.call<Sweep>('post', `/beams/${beamId('clinic', 'G3')}/sweeps`, {
      name: 'Every millimetre',
      definition: HUGE,
    });
    await page.goto(`${CLINIC}/sweeps/${sweep.id}`);
    await page.getByRole('button', { name: 'Run', exact: true }).click();
    await page.getByText('Running', { exact: true }).waitFor();
    await page.getByRole('slider', { name: /^Section along the front/ }).waitFor({ timeout: 60_000 });
    const early = await evaluatedSoFar(page);
    await expect.poll(() => evaluatedSoFar(page)).toBeGreaterThan(early);

    await page.reload();
    await page.getByText('Running', { exact: true }).waitFor();
    const reloaded = await evaluatedSoFar(page);
    expect(reloaded).toBeGreaterThan(early);
    await expect.poll(() => evaluatedSoFar(page)).toBeGreaterThan(reloaded);
    expect(await shareDone(page)).toBeGreaterThan(0);
    expect(await shareDone(page)).toBeLessThan(100);

    await page.getByRole('button', { name: 'Cancel' }).click();
    const words = page.getByText(/^cancelled: [\d,]+ of [\d,]+ evaluated$/);
    await words.waitFor();
    await page.getByText('Cancelled', { exact: true }).waitFor();
    expect(await bar(page).count()).toBe(0);
    const [kept = 0, whole] = (await words.innerText()).match(/[\d,]+/g)!.map(countIn);
    expect(whole).toBe(HUGE_COUNT);
    await expect.poll(() => evaluatedSoFar(page)).toBe(kept);
    expect(kept).toBeGreaterThanOrEqual(reloaded);
    const section = page.getByRole('region', { name: 'Chosen section' });
    await section.getByText('✓ Meets the listed checks', { exact: true }).waitFor();
    await page.getByRole('button', { name: 'Run again' }).waitFor();

    const record = await visit.call<Run>('get', `/runs/${new URL(page.url()).pathname.split('/').at(-1)}`);
    expect(record).toMatchObject({ state: 'cancelled', evaluated: kept });
    await page.goto(`${CLINIC}/sweeps`);
    const row = page.getByRole('table', { name: 'Runs of Every millimetre' }).getByRole('row').nth(1);
    expect(await row.innerText()).toContain(`${print(kept)} of ${print(HUGE_COUNT)}`);
  });
});
