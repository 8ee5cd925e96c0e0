import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { candidateId, CLINIC, LIBRARY, runPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

const fill = async (page: Page, values: Readonly<Record<string, string>>): Promise<void> => {
  for (const [label, text] of Object.entries(values))
    await page.getByLabel(label, { exact: true }).fill(text);
};
const choose = (page: Page, option: string) => page.getByRole('radio', { name: option, exact: true }).check();
const fold = (page: Page, title: string) => page.locator('details', { hasText: title });
const unfold = async (page: Page, title: string): Promise<void> => {
  const summary = fold(page, title).locator('summary');
  await summary.focus();
  await page.keyboard.press('Enter');
};

async function axeFindings(page: Page): Promise<string[]> {
  const found = await new AxeBuilder({ page }).setLegacyMode(true).analyze();
  return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`);
}

describe('a beam with its slab, typed by hand', () => {
  it('says the width that counts while it is typed, and is drawn, designed and studied', async () => {
    const { page } = await office.visit('engineer');
    await page.goto(`${LIBRARY}/section`);
    await choose(page, 'T');
    await choose(page, 'Hogging');
    await page.getByLabel('Stirrups', { exact: true }).selectOption('#4');
    await choose(page, 'Designed');
    await fill(page, {
      'Width b': '14',
      'Depth h': '30',
      'Concrete f′c': '5',
      'Thickness hf': '6',
      'Clear to next web': '96',
      'Top bars': '4-#9',
      'Bottom bars': '3-#8',
      'Spacing at most': '12',
      'Moment Mu': '300',
      'Shear Vu': '90',
      Span: '30',
    });
    // ACI 318-19 Table 6.3.2.1 (memory): 14 + 2 min(8 × 6, 96/2, 360/8) = 14 + 2 × 45 = 104 in.
    await page.getByText('bf 104 in').waitFor();
    await page.getByLabel('Spacing at most').press('Enter');
    await page.getByRole('article', { name: 'Section T 14 × 30 in' }).waitFor();
    await page.getByText('4-#9 top, 3-#8 bottom', { exact: true }).waitFor();
    await page.getByText(/^Spacing designed for .* governed by/).waitFor();

    for (const title of ['Moment–curvature', 'Ductility by every convention', 'Where execution strays'])
      await unfold(page, title);
    await page.getByRole('row', { name: /^5 ultimate/ }).waitFor();
    await page.getByText(/^μφ of this section is .* to .*, by which convention is meant/).waitFor();
    await unfold(page, 'Beside its singly reinforced twin');
    await page.getByRole('columnheader', { name: 'No bottom bars' }).waitFor();
    await unfold(page, 'One step away');
    await page.getByRole('row', { name: /^b 14 → 16 in/ }).waitFor();
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.emulateMedia({ colorScheme });
      expect(await axeFindings(page)).toEqual([]);
    }
  });

  it('names what is missing of a slab beside its field, and keeps what was typed over a reload', async () => {
    const { page } = await office.visit('engineer');
    await page.goto(`${LIBRARY}/section`);
    await choose(page, 'L');
    await choose(page, 'As given');
    await fill(page, { 'Width b': '14', 'Depth h': '24', 'Concrete f′c': '5', 'Bottom bars': '3-#8' });
    await fill(page, { 'Thickness hf': '6', 'Width bf': '10' });
    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.getByText('The flange must be as wide as the web, or wider').waitFor();
    await page.reload();
    expect(await page.getByLabel('Width bf', { exact: true }).inputValue()).toBe('10');
    await fill(page, { 'Width bf': '40' });
    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.getByRole('article', { name: 'Section L 14 × 24 in' }).waitFor();
  });
});

describe('a section of a run', () => {
  it('leads to the swept section one step away', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(runPath('roof'));
    await unfold(page, 'One step away');
    const step = fold(page, 'One step away').getByRole('button').first();
    await step.waitFor();
    const before = new URL(page.url()).searchParams.get('i');
    await step.click();
    await page.waitForFunction((from) => new URL(location.href).searchParams.get('i') !== from, before);
  });
});

describe('a project that changes to EN 1992', () => {
  it('takes bars, symbols and national values of the code along, and goes back to the recommended ones', async () => {
    const visit = await office.visit('admin');
    const { page } = visit;
    await visit.open(`${CLINIC}/basis`);
    await page.getByLabel('Design code').selectOption('en1992');
    await page.getByLabel('Yield strength fyk').waitFor();
    const systems = await page.getByLabel('Seismic system').locator('option').allInnerTexts();
    expect(systems).toEqual(['None', 'Ductility class medium, DCM', 'Ductility class high, DCH']);
    await unfold(page, 'National values');
    const gammaC = page.getByLabel('γc, concrete');
    expect(await gammaC.getAttribute('placeholder')).toBe('1.5');
    await gammaC.fill('3');
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText('γc must be at most 2').waitFor();
    await page.getByRole('button', { name: 'Back to the recommended values' }).click();
    expect(await page.getByLabel('γc, concrete').inputValue()).toBe('');
    expect(await axeFindings(page)).toEqual([]);
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText(/^Design basis saved/).waitFor();

    await visit.open(`${CLINIC}/section`);
    await fill(page, { 'Width b': '300', 'Depth h': '500', 'Concrete fck': '30', 'Bottom bars': '3-25' });
    await fill(page, { 'Moment MEd': '150' });
    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.getByRole('listitem').filter({ hasText: 'Strength MRd' }).first().waitFor();
  });
});

describe('candidates side by side', () => {
  it('have their curves over each other, with the numbers in a table', async () => {
    const visit = await office.visit('estimator');
    const { page } = visit;
    const chosen = ['A', 'B'].map(candidateId).join(',');
    await visit.open(`${LIBRARY}/shortlist?compare=${chosen}&base=${candidateId('A')}`);
    await page.getByRole('img', { name: 'Moment over curvature of A, B' }).waitFor();
    const table = page.getByRole('table', { name: 'Moment–curvature of all' });
    expect(await table.getByRole('row').count()).toBe(3);
    await page.getByText('A is the cheapest now.').waitFor();
  });
});
