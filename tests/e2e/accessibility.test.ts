import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import type { ShareLink } from '#shared/contract/records.ts';
import type { Visit } from '../support/browser.ts';
import { beamId, candidateId, candidatePath, LIBRARY, runPath, sweepPath } from '../support/browser-demo.ts';
import { useBrowserOffice } from '../support/browser-office.ts';

const office = useBrowserOffice();

const COMPARED = [candidateId('A'), candidateId('B')].join(',');
/** The longest first, so that the two windows end together. */
const PAGES_SIGNED_IN = [
  '/verification',
  candidatePath('B'),
  runPath('reading-room'),
  `${runPath('reading-room')}?show=ranges&f=depthMm:~584.2&by=fc`,
  `${runPath('reading-room')}?show=why&by=widthMm&in=3`,
  '/projects',
  '/projects/new',
  '/office-standards',
  `${runPath('roof')}/against/${runPath('stacks').split('/').at(-1)}`,
  ...['beams', 'sweeps', 'basis', 'prices', 'people'].map((tab) => `${LIBRARY}/${tab}`),
  `${LIBRARY}/shortlist?compare=${COMPARED}&base=${candidateId('A')}`,
  `${LIBRARY}/beams/${beamId('library', 'B6')}/sweeps/new`,
  sweepPath('reading-room'),
  runPath('entrance-shallow'),
  `${LIBRARY}/section`,
  `${LIBRARY}/section?run=${runPath('roof').split('/').at(-1)}&i=0`,
  '/no-such-page',
] as const;
const WIDTHS = [1440, 1024, 390] as const;

const nextFrame = (page: Page): Promise<unknown> =>
  page.evaluate(() => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))));

/** What another paper or width can break; everything else is the same document. */
const RULES_OF_LOOKS = ['color-contrast', 'target-size', 'scrollable-region-focusable', 'aria-hidden-focus'];

/**
 * The verification book has some hundred cases alike; two of each topic stand for them. The others are taken out of the
 * page, because what axe is told to leave out it reads all the same.
 */
const MORE_OF_THE_SAME = 'article:nth-of-type(n+3)';

const leaveTwoOfEach = (page: Page): Promise<void> =>
  page.evaluate((selector) => {
    for (const article of document.querySelectorAll(selector)) article.remove();
  }, MORE_OF_THE_SAME);

/** In legacy mode axe needs no second page to gather frames in: there are none. */
async function violations(page: Page, rules?: readonly string[]): Promise<string[]> {
  const axe = new AxeBuilder({ page }).setLegacyMode(true).options({ resultTypes: ['violations'] });
  const found = await (rules === undefined ? axe : axe.withRules([...rules])).analyze();
  return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`);
}

/** What axe has against the page on light and on dark paper, wide and narrow, and where it is wider than its window. */
async function problemsOf({ page }: Visit): Promise<string[]> {
  const problems: string[] = [];
  const note = (look: string, found: readonly string[]) =>
    problems.push(...found.map((problem) => `${look}: ${problem}`));
  for (const width of WIDTHS) {
    await page.setViewportSize({ width, height: 900 });
    // A chart follows its new room a moment later.
    const fits = () => document.documentElement.scrollWidth <= document.documentElement.clientWidth;
    const settled = page.waitForFunction(fits).then(
      () => true,
      () => false,
    );
    if (!(await settled)) note(`${width} px`, ['wider than its window']);
  }
  note('dark, narrow', await violations(page, RULES_OF_LOOKS));
  await page.emulateMedia({ colorScheme: 'light' });
  await page.setViewportSize({ width: 1440, height: 900 });
  await nextFrame(page);
  note('light, wide', await violations(page));
  return problems;
}

/** Looks at pages one after the other, in two windows at a time. */
async function inspect(visits: readonly Visit[], addresses: readonly string[]): Promise<string[]> {
  const left = [...addresses];
  const lanes = visits.map(async (visit) => {
    const problems: string[] = [];
    for (let address = left.shift(); address !== undefined; address = left.shift()) {
      await visit.page.emulateMedia({ colorScheme: 'dark' });
      await visit.open(address);
      await leaveTwoOfEach(visit.page);
      problems.push(...(await problemsOf(visit)).map((problem) => `${address} ${problem}`));
    }
    return problems;
  });
  return (await Promise.all(lanes)).flat();
}

describe('every page, on light and dark paper and at every width', () => {
  it('has nothing that axe finds and fits its window, for who is signed in', async () => {
    const visits = await Promise.all([office.visit('engineer'), office.visit('engineer')]);
    expect(await inspect(visits, PAGES_SIGNED_IN)).toEqual([]);
  });

  it('has nothing that axe finds and fits its window, for who runs the service', async () => {
    const addresses = ['/operations', '/office-standards/new'];
    expect(await inspect([await office.visit('admin')], addresses)).toEqual([]);
  });

  it('has nothing that axe finds and fits its window, for a stranger', async () => {
    const engineer = await office.visit('engineer');
    const { token } = await engineer.call<ShareLink>('post', `${LIBRARY}/share-links`);
    const visits = await Promise.all([office.visit(null), office.visit(null)]);
    for (const visit of visits) visit.expectComplaint(/40[04] .*\/api\/shared\//);
    const addresses = ['/sign-in', `/shared/${token}`, `/shared/${'x'.repeat(token.length)}`];
    expect(await inspect(visits, addresses)).toEqual([]);
  });
});
