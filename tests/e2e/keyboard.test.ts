import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { beamId, LIBRARY, runPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

interface Stop {
  /** What a screen reader calls it, as far as labels and text tell. */
  readonly name: string;
  readonly hasVisibleFocus: boolean;
}

const MOST_STOPS = 150;

/** The control that has the focus; its outline is drawn on itself, or on the label around it. */
async function currentStop(page: Page): Promise<Stop> {
  return page.evaluate(() => {
    const element = document.activeElement as HTMLInputElement;
    const label = element.labels?.[0]?.textContent ?? '';
    const name = element.getAttribute('aria-label') ?? (label === '' ? element.textContent : label);
    const outlined = [element, element.closest('label')].some((one) => {
      if (one === null) return false;
      const { outlineStyle, outlineWidth } = getComputedStyle(one);
      return outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 1;
    });
    return { name: name.replaceAll(/\s+/g, ' ').trim(), hasVisibleFocus: outlined };
  });
}

/** Presses Tab until a control of that name has the focus; answers all it came by. */
async function tabTo(page: Page, last: string): Promise<Stop[]> {
  const stops: Stop[] = [];
  while (stops.length < MOST_STOPS) {
    await page.keyboard.press('Tab');
    const stop = await currentStop(page);
    stops.push(stop);
    if (stop.name === last) return stops;
  }
  throw new Error(`Tab never came to ${last}, but to: ${stops.map(({ name }) => name).join(' | ')}`);
}

/** Every stop shows that it has the focus, and the named ones come in that order. */
function expectInOrder(stops: readonly Stop[], names: readonly string[]): void {
  expect(stops.filter(({ hasVisibleFocus }) => !hasVisibleFocus)).toEqual([]);
  const passed = stops.map(({ name }) => name).filter((name) => names.includes(name));
  expect([...new Set(passed)]).toEqual(names);
}

describe('with the keyboard alone', () => {
  it('one signs in', async () => {
    const { page } = await office.visit(null);
    await page.goto('/sign-in');
    await expect.poll(async () => (await currentStop(page)).name).toBe('E-mail');
    await page.keyboard.type('estimator@tidemill.example');
    await page.keyboard.press('Tab');
    expect(await currentStop(page)).toEqual({ name: 'Password', hasVisibleFocus: true });
    await page.keyboard.type(DEMO_PASSWORD);
    await page.keyboard.press('Tab');
    expect(await currentStop(page)).toEqual({ name: 'Sign in', hasVisibleFocus: true });
    await page.keyboard.press('Space');
    await page.getByRole('heading', { name: 'Projects' }).waitFor();
  });

  it('one comes by every control of the sweep form and starts a run with Enter', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/beams/${beamId('library', 'B6')}/sweeps/new`);
    await page.getByLabel('Name of the sweep').focus();
    const axes = ['Width b', 'Depth h'].flatMap((axis) =>
      ['from', 'to', 'by'].map((end) => `${axis} ${end}`),
    );
    expectInOrder(await tabTo(page, 'Save'), [
      'Moment Mu',
      'Ductility μφ at least',
      'Depth h at most',
      'office standard',
      'Fill from it',
      ...axes,
      'Concrete f′c values, parted by commas',
      '#6',
      '#9',
      'number of bars, as 2–8 or 2, 4, 6',
      'Layers at most',
      'One bar size on each face',
      'Run',
      'Save',
    ]);
    await page.getByLabel('Depth h by', { exact: true }).press('Enter');
    await page.getByText('none better than the front').waitFor();
  });

  it('one comes by whatever a run’s page offers, and pins a section', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(runPath('roof'));
    await page
      .getByRole('slider', { name: /^Section along the front/ })
      .locator('canvas')
      .waitFor();
    const stops = await tabTo(page, 'Pin to shortlist');
    expectInOrder(stops, [
      'Skip to the page',
      'Change the sweep',
      'Measure up',
      'Measure across (leading)',
      'Near-best band',
      'Section along the front, Depth h against Steel',
      'Pin to shortlist',
    ]);
    expect(stops.some(({ name }) => name.startsWith('Look at '))).toBe(true);
    await page.keyboard.press('Enter');
    await page.keyboard.type('Found without a mouse');
    await page.keyboard.press('Tab');
    await page.keyboard.press('Enter');
    await page.getByText(/Pinned to B4 as candidate/).waitFor();
  });

  it('one skips to the page, lists the shortcuts and goes places', async () => {
    const visit = await office.visit('engineer');
    const { page } = visit;
    await visit.open(`${LIBRARY}/sweeps`);
    await page.keyboard.press('Tab');
    expect((await currentStop(page)).name).toBe('Skip to the page');
    await page.keyboard.press('?');
    await page.getByRole('dialog', { name: 'Keyboard shortcuts' }).waitFor();
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.keyboard.press('g');
    await page.keyboard.press('b');
    await page.waitForURL(/\/beams$/);
  });
});
