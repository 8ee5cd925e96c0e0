import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { CLINIC, LIBRARY } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';
import handWorked from '#shared/verification/cases/hand-worked.json' with { type: 'json' };
import optima from '#shared/verification/cases/optima.json' with { type: 'json' };

const office = useBrowserOffice();

const fill = async (page: Page, values: Readonly<Record<string, string>>): Promise<void> => {
  for (const [label, text] of Object.entries(values))
    await page.getByLabel(label, { exact: true }).fill(text);
};

/** The working as printed: symbol → result, with its unit. */
async function readWorking(page: Page): Promise<Map<string, string>> {
  const lines = page.locator('details', { hasText: 'Working, line by line' }).getByRole('listitem');
  await lines.first().waitFor();
  const pairs = await lines.evaluateAll((found) =>
    found.map((line) => {
      const [left, right] = [...line.querySelector('div')!.children] as HTMLElement[];
      return [left!.innerText.split(' =')[0]!.trim(), right!.innerText] as const;
    }),
  );
  return new Map(pairs);
}

const numberIn = (text: string): number =>
  Number(/[\d,]+(\.\d+)?/.exec(text)![0].replaceAll(',', '')) * (text.startsWith('−') ? -1 : 1);

/** Equal once the finer of the two is rounded to the digits of the coarser, which is the printed one. */
function expectPrinted(text: string | undefined, printed: string, name: string): void {
  const decimals = printed.split('.')[1]?.length ?? 0;
  expect(numberIn(text ?? '').toFixed(decimals), name).toBe(printed);
}

/**
 * HAND-01 of shared/verification/cases/hand-worked.json: one section worked by hand and by an independent script for this project;
 * no outside source. Figures as printed there, in the units of the screen.
 */
describe('HAND-01 typed into the page for one section', () => {
  it('comes back with every printed digit', async () => {
    const { expected } = handWorked.find(({ id }) => id === 'HAND-01')!;
    const printed = (name: keyof typeof expected): number => Number(expected[name]);
    const { page } = await office.visit('engineer');
    await page.goto(`${CLINIC}/section`);
    await page.getByLabel('Stirrups', { exact: true }).selectOption('10');
    await fill(page, {
      'Width b': '300',
      'Depth h': '500',
      'Concrete f′c': '30',
      'Steel fy': '420',
      'Clear cover': '40',
      'Bottom bars': '3-25',
      'Top bars': '2-16',
      Spacing: '150',
    });
    await page.getByLabel('Stirrup bend').selectOption('no bend allowance');
    await page.getByLabel('Spacing', { exact: true }).press('Enter');
    await page.getByRole('article', { name: 'Section 300 × 500 mm' }).waitFor();
    await page.getByRole('radio', { name: '5' }).check();
    const working = await readWorking(page);
    for (const [symbol, figure] of [
      ['d', printed('d').toFixed(1)],
      ['β1', String(printed('beta1'))],
      ['c', String(printed('c'))],
      ['a', String(printed('a'))],
      ['ε2', String(printed('eps_t'))],
      ['Mn', String(printed('Mn_kNm'))],
      ['φ', String(printed('phi'))],
      ['φMn', String(printed('phiMn_kNm'))],
      ['As,min', String(printed('As_min'))],
      ['n', String(printed('n'))],
      ['kd', String(printed('kd'))],
      ['Icr', String(printed('Icr') / 1e6)],
      ['φy', '7.161'],
      ['μφ', String(printed('mu_phi'))],
      ['fc/f′c at yield', String(printed('fc_at_yield_share'))],
    ] as const)
      expectPrinted(working.get(symbol), figure, symbol);
    expect(printed('phi_y')).toBe(7.161e-6);
    expectPrinted(working.get('fs1')!.replace('−', ''), String(printed('fs2_MPa')), 'stress of the top bars');
    // Printed 34.87 × 10⁻⁶, though 0.003/86.046 is 34.865: three figures are safe.
    expect(numberIn(working.get('φu')!).toPrecision(3)).toBe((printed('phi_u') * 1e6).toPrecision(3));

    const fit = page.getByRole('listitem').filter({ hasText: 'Bar fit' }).first();
    expect(await fit.innerText()).toContain(`${printed('clear_gap')} mm there`);
    const least = page.getByRole('listitem').filter({ hasText: 'Least steel' }).first();
    expect(await least.innerText()).toContain('437.50 asked, 1,472.6 mm² there');
    await page.getByText('At first yield the concrete carries 89% of f′c.').waitFor();
    await page.getByText('no allowance for the stirrup’s bend').waitFor();
  });

  it('keeps the typed section over a reload, and says what is missing beside the field', async () => {
    const { page } = await office.visit('engineer');
    await page.goto(`${CLINIC}/section`);
    await fill(page, { 'Width b': '300', 'Depth h': '500', 'Bottom bars': '3 pieces' });
    await page.getByRole('button', { name: 'Evaluate' }).click();
    const strength = page.getByLabel('Concrete f′c', { exact: true });
    await expect.poll(() => strength.getAttribute('aria-invalid')).toBe('true');
    const bars = page.getByLabel('Bottom bars');
    const message = page.locator(
      `[id="${(await bars.getAttribute('aria-describedby'))!.split(' ').at(-1)}"]`,
    );
    expect(await message.innerText()).toMatch(/3 pieces/);
    await page.reload();
    expect(await page.getByLabel('Width b', { exact: true }).inputValue()).toBe('300');
    expect(await bars.inputValue()).toBe('3 pieces');
  });
});

/**
 * OPT-01: the optimum of Amir & Hasegawa (1989), restated by Gandomi, Yang & Alavi, Computers & Structures 89 (2011), finds
 * 6.32 in², eight No. 8, in 8.5 × 34 in. In two layers no one can build it.
 */
describe('the bars of a published optimum', () => {
  it('are rejected with the width that two layers of them need', async () => {
    const { expected: optimum } = optima.find(({ id }) => id === 'OPT-01')!;
    const { page } = await office.visit('engineer');
    await page.goto(`${LIBRARY}/section`);
    await page.getByLabel('Stirrups', { exact: true }).selectOption('#3');
    await fill(page, {
      'Width b': String(optimum.b),
      'Depth h': String(optimum.h),
      'Concrete f′c': '5',
      'Steel fy': '50',
      'Bottom bars': '8-#8',
      'Layers at most': '2',
      Spacing: '8',
    });
    expect(await page.getByLabel('Clear cover', { exact: true }).inputValue()).toBe('1.5');
    await page.getByRole('button', { name: 'Evaluate' }).click();
    const section = page.getByRole('article', { name: 'Section 8.5 × 34 in' });
    await section.getByText('✕ Fails 1 of 1 listed check').waitFor();
    const fit = section.getByRole('listitem').filter({ hasText: 'Bar fit' });
    const text = await fit.innerText();
    for (const part of ['fails', '11.25 asked, 8.5 in there', 'need more width for at most 2 layers'])
      expect(text).toContain(part);
    expect(await section.innerText()).toContain('The bars cannot be placed: there is no curvature.');
  });
});
