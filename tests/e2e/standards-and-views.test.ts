import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { beamId, LIBRARY, runPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

const field = (page: Page, label: string) => page.getByLabel(label, { exact: true });
const asked = (page: Page, key: string): string | null => new URL(page.url()).searchParams.get(key);

describe('what the office builds', () => {
  it('is set by an admin, fills the next sweep, and is said where a sweep departs from it', async () => {
    const admin = await office.visit('admin');
    await admin.open('/office-standards');
    await admin.page.getByRole('link', { name: /^Change US customary/ }).click();
    await field(admin.page, 'Concrete strengths').fill('4, 5');
    await field(admin.page, 'Depth h in steps of').fill('2');
    await admin.page.getByRole('button', { name: 'Save the standard' }).click();
    await admin.page.getByText('4, 5 ksi').waitFor();

    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/beams/${beamId('library', 'B6')}/sweeps/new`);
    await page.getByText(/were filled from “US customary, Grade 60: Floor beams”/).waitFor();
    expect(await field(page, 'Depth h by').inputValue()).toBe('2');
    await page
      .getByRole('row', { name: /^#8 .*2–4 in one layer, 5, 6, 8 in two layers; 7 does not fit/ })
      .waitFor();
    await field(page, 'Depth h by').fill('1');
    await page.getByText('h = 17 in is no multiple of the office’s 2 in').waitFor();
    await page
      .getByLabel('office standard')
      .selectOption({ label: 'US customary, Grade 60: Transfer beams' });
    await page.getByRole('button', { name: 'Fill from it' }).click();
    await expect.poll(() => field(page, 'Depth h to').inputValue()).toBe('60');
    await page.getByRole('button', { name: 'Take that back' }).click();
    await expect.poll(() => field(page, 'Depth h to').inputValue()).toBe('32');
  });
});

describe('a run', () => {
  it('is kept as one looks at it under a name, for a colleague to open and not to change', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${runPath('reading-room')}?x=costPerM&y=depthMm&f=depthMm:~584.2&by=barCount&band=2`);
    await page.getByRole('button', { name: 'Views' }).click();
    await page.getByRole('menuitem', { name: 'Save this view' }).click();
    await field(page, 'Name of the view').fill('Under the ceiling');
    await page.keyboard.press('Enter');
    await page.getByText('“Under the ceiling” is saved for everybody of the project').waitFor();

    const colleague = await office.visit('checker');
    await colleague.open(`${LIBRARY}/sweeps`);
    await colleague.page.getByRole('link', { name: 'Under the ceiling', exact: true }).click();
    await colleague.page.getByRole('region', { name: 'Ranges set' }).waitFor();
    expect(['x', 'y', 'f', 'by', 'band'].map((key) => asked(colleague.page, key))).toEqual([
      'costPerM',
      'depthMm',
      'depthMm:~584.2',
      'barCount',
      '2',
    ]);
    await colleague.page.getByRole('button', { name: /^Views/ }).click();
    await colleague.page.getByRole('menuitem', { name: 'Rename, replace or delete' }).click();
    await colleague.page.getByRole('dialog', { name: 'Saved views of this sweep' }).waitFor();
    expect(await colleague.page.getByRole('button', { name: 'Delete Under the ceiling' }).count()).toBe(0);
  });

  it('is run again as it was and set against itself: nothing asked otherwise, the same result', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(runPath('roof'));
    await page.getByRole('button', { name: 'More' }).click();
    await page.getByRole('menuitem', { name: /^Run it again/ }).click();
    await page.getByRole('heading', { name: /B4/ }).waitFor();
    await page.getByText('Run 2', { exact: true }).waitFor();
    await page.getByText('none better than the front').waitFor();
    await page.getByRole('button', { name: 'More' }).click();
    await page.getByRole('menuitem', { name: 'Set against run 1' }).click();
    await page.getByText('Nothing that went into them differs').waitFor();
    await page.getByText('Both gave the same result').waitFor();
    await page.getByText('4 kept, 0 gained, 0 lost.').waitFor();
    await page.getByLabel('Measure up').selectOption('costPerM');
    await expect.poll(() => asked(page, 'y')).toBe('costPerM');
    await page.getByRole('table', { name: 'The best of each run, side by side' }).waitFor();
  });
});
