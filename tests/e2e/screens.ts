import type { Page } from 'playwright-core';
import type { Project, Role, ShareLink } from '#shared/contract/records.ts';
import type { Visit } from '../support/browser.ts';
import {
  ARCADE,
  beamId,
  candidateId,
  candidatePath,
  CLINIC,
  LIBRARY,
  runPath,
  sweepPath,
} from '../support/browser-demo.ts';
import {
  openDifference,
  openHugeRun,
  openRunByBounds,
  openSavedViews,
  openWidenedRun,
} from './screens-of-runs.ts';

/** A screen in one of its states: who looks at it, and how one gets there. */
export interface Screen {
  readonly name: string;
  readonly role: Role | null;
  readonly arrive: (visit: Visit) => Promise<void>;
}

const at = (name: string, role: Role | null, address: string): Screen => ({
  name,
  role,
  arrive: (visit) => visit.open(address),
});

/** An address, then what one does there until the state stands. */
const after = (
  name: string,
  [role, address]: readonly [Role | null, string],
  act: (page: Page, visit: Visit) => Promise<unknown>,
): Screen => ({
  name,
  role,
  arrive: async (visit) => {
    await visit.open(address);
    await act(visit.page, visit);
  },
});

const NEW_SWEEP = `${LIBRARY}/beams/${beamId('library', 'B6')}/sweeps/new`;
const COMPARED = `${LIBRARY}/shortlist?compare=${candidateId('A')},${candidateId('B')}&base=${candidateId('A')}`;

const fill = async (page: Page, values: Readonly<Record<string, string>>): Promise<void> => {
  for (const [label, text] of Object.entries(values))
    await page.getByLabel(label, { exact: true }).fill(text);
};

async function evaluate(page: Page, width: string): Promise<void> {
  await fill(page, { 'Width b': width, 'Depth h': '34', 'Concrete f′c': '5', 'Bottom bars': '8-#8' });
  await page.getByRole('button', { name: 'Evaluate' }).click();
  await page.getByRole('article').waitFor();
}

/** A project in which nothing has been done yet. */
async function openEmptyProject(visit: Visit, tab: string): Promise<void> {
  const projects = await visit.call<Project[]>('get', '/projects');
  const known = projects.find(({ name }) => name === 'Saltmarsh Hide');
  const { designBasis } = projects[0]!;
  const input = { name: 'Saltmarsh Hide', number: 'TP-1071', designBasis };
  const { id } = known ?? (await visit.call<Project>('post', '/projects', input));
  await visit.open(`/projects/${id}/${tab}`);
}

async function openSharedShortlist(visit: Visit): Promise<void> {
  await visit.signIn('engineer');
  const { token } = await visit.call<ShareLink>('post', `${LIBRARY}/share-links`);
  await visit.context.clearCookies();
  await visit.open(`/shared/${token}`);
}

async function waitForever(page: Page, address: string, what: string): Promise<void> {
  await page.route(what, () => undefined);
  await page.goto(address);
  await page.getByText('Loading').first().waitFor({ state: 'attached' });
}

const OFFICE: readonly Screen[] = [
  at('sign-in', null, '/sign-in'),
  after('sign-in-refused', [null, '/sign-in'], async (page) => {
    await fill(page, { 'E-mail': 'engineer@tidemill.example', Password: 'low tide' });
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('alert').waitFor();
  }),
  at('projects', 'engineer', '/projects'),
  {
    name: 'projects-loading',
    role: 'engineer',
    arrive: ({ page }) => waitForever(page, '/projects', '**/api/projects'),
  },
  {
    name: 'projects-unreachable',
    role: 'engineer',
    arrive: async ({ page }) => {
      await page.route('**/api/projects', (route) => route.abort());
      await page.goto('/projects');
      await page.getByRole('button', { name: 'Try again' }).waitFor();
    },
  },
  at('new-project', 'engineer', '/projects/new'),
  at('office-standards', 'admin', '/office-standards'),
  at('office-standards-read', 'engineer', '/office-standards'),
  after('office-standard', ['admin', '/office-standards'], async (page) => {
    await page.getByRole('link', { name: /^Change US/ }).click();
    await page.getByLabel('Name of the standard').waitFor();
  }),
  at('office-standard-new', 'admin', '/office-standards/new'),
  after('account-menu', ['engineer', '/projects'], async (page) => {
    await page.getByRole('button', { name: /Engineer/ }).click();
    await page.getByRole('menu').waitFor();
  }),
  after('shortcuts', ['engineer', '/projects'], async (page) => {
    await page.keyboard.press('?');
    await page.getByRole('dialog', { name: 'Keyboard shortcuts' }).waitFor();
  }),
  after('go-to', ['engineer', `${LIBRARY}/beams`], async (page) => {
    await page.keyboard.press('Control+k');
    await page.getByRole('option', { name: /^Beam B6/ }).waitFor();
  }),
  after('first-steps', ['engineer', `${LIBRARY}/beams`], async (page) => {
    await page.keyboard.press('Control+k');
    await page.getByRole('combobox').fill('first steps');
    await page.keyboard.press('Enter');
    await page.getByRole('complementary', { name: 'First steps' }).waitFor();
  }),
  at('verification', 'engineer', '/verification'),
  at('operations-idle', 'admin', '/operations'),
  at('not-found', 'engineer', '/no-such-page'),
  at('forbidden', 'engineer', '/forbidden'),
];

const PROJECT: readonly Screen[] = [
  ...['beams', 'sweeps', 'shortlist', 'basis', 'prices', 'people'].map((tab) =>
    at(`project-${tab}`, 'admin', `${LIBRARY}/${tab}`),
  ),
  at('project-si-beams', 'engineer', `${CLINIC}/beams`),
  ...['beams', 'sweeps', 'shortlist', 'prices'].map((tab) => ({
    name: `empty-project-${tab}`,
    role: 'engineer' as const,
    arrive: (visit: Visit) => openEmptyProject(visit, tab),
  })),
  at('viewer-shortlist', 'viewer', COMPARED),
  at('viewer-prices', 'viewer', `${LIBRARY}/prices`),
  after('beam-refused', ['engineer', `${LIBRARY}/beams`], async (page) => {
    await page.getByRole('button', { name: 'Add a beam' }).click();
    await fill(page, { Mark: 'B10' });
    await page.getByRole('button', { name: 'Add beam' }).click();
    await page.getByText('Span must be a number').waitFor();
  }),
  after('beam-deletion', ['engineer', `${LIBRARY}/beams`], async (page) => {
    await page.getByRole('button', { name: 'Delete B1' }).click();
    await page.getByRole('alertdialog').or(page.getByRole('dialog')).waitFor();
  }),
  after('basis-en', ['engineer', `${CLINIC}/basis`], async (page) => {
    await page.getByLabel('Design code').selectOption('en1992');
    await page.locator('summary', { hasText: 'National values' }).click();
  }),
  after('basis-refused', ['engineer', `${LIBRARY}/basis`], async (page) => {
    await page.getByLabel('Clear cover').fill('99');
    await page.getByRole('button', { name: 'Save design basis' }).click();
    await page.getByText(/Clear cover must be at most/).waitFor();
  }),
];

const SWEEP: readonly Screen[] = [
  at('sweep-new', 'engineer', NEW_SWEEP),
  at('sweep-saved', 'engineer', sweepPath('reading-room')),
  at('sweep-read-only', 'checker', sweepPath('reading-room')),
  after('sweep-refused', ['engineer', NEW_SWEEP], async (page) => {
    await fill(page, { 'Width b to': '8', 'Depth h by': '0' });
    await page.getByText('2 fields need attention.').waitFor();
  }),
  after('sweep-by-bounds', ['engineer', NEW_SWEEP], async (page) => {
    await fill(page, { 'Width b to': '60', 'Width b by': '0.05', 'Depth h by': '0.01' });
    await page.getByText(/that can be evaluated one by one/).waitFor();
  }),
  after('sweep-too-large', ['engineer', NEW_SWEEP], async (page) => {
    await fill(page, {
      'Width b from': '10',
      'Width b to': '60',
      'Width b by': '0.05',
      'Depth h by': '0.01',
    });
    for (const counts of await page.getByLabel(/^number of bars/).all()) await counts.fill('2–60');
    await page.getByText(/that one run takes/).waitFor();
  }),
  after('session-ended', ['engineer', NEW_SWEEP], async (page) => {
    await page.context().clearCookies();
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByLabel('Password').waitFor();
  }),
];

const RUN: readonly Screen[] = [
  at('run-steel-depth', 'engineer', runPath('reading-room')),
  at('run-cost-depth', 'engineer', `${runPath('reading-room')}?x=costPerM&y=depthMm`),
  at('run-steel-ductility', 'engineer', `${runPath('reading-room')}?x=steelKgPerM&y=curvatureDuctility`),
  at('run-ranges', 'engineer', `${runPath('reading-room')}?show=ranges&f=depthMm:~584.2&by=depthMm`),
  at('run-why', 'engineer', `${runPath('reading-room')}?x=costPerM&y=curvatureDuctility&show=why`),
  at(
    'run-in-three',
    'engineer',
    `${runPath('reading-room')}?x=costPerM&y=curvatureDuctility&by=depthMm&in=3`,
  ),
  at(
    'run-other-rates',
    'engineer',
    `${runPath('reading-room')}?x=costPerM&y=depthMm&rates=today;steel:25;formwork:-20`,
  ),
  { name: 'run-widened', role: 'engineer', arrive: openWidenedRun },
  at('run-log', 'engineer', `${runPath('reading-room-fine')}?log=xy&by=barCount&as=size`),
  { name: 'run-by-bounds', role: 'engineer', arrive: (visit) => openRunByBounds(visit) },
  {
    name: 'run-by-bounds-why',
    role: 'engineer',
    arrive: (visit) => openRunByBounds(visit, { query: '?show=why' }),
  },
  {
    name: 'run-by-bounds-stopped',
    role: 'engineer',
    arrive: (visit) => openRunByBounds(visit, { isStopped: true }),
  },
  at('run-million', 'engineer', runPath('reading-room-fine')),
  at('run-si', 'engineer', runPath('ground-floor', CLINIC)),
  at('run-hogging-en', 'engineer', runPath('arcade-columns', ARCADE)),
  at('run-nothing-feasible', 'engineer', runPath('entrance-shallow')),
  at('run-viewer', 'viewer', runPath('reading-room-fine')),
  { name: 'run-difference', role: 'engineer', arrive: openDifference },
  { name: 'run-views', role: 'engineer', arrive: openSavedViews },
  after('run-more', ['engineer', runPath('roof')], async (page) => {
    await page.getByRole('button', { name: 'More' }).click();
    await page.getByRole('menuitem', { name: /^Run it again/ }).waitFor();
  }),
  after('run-export', ['engineer', runPath('roof')], async (page) => {
    await page.getByRole('button', { name: 'Export' }).click();
    await page.getByRole('menuitem', { name: /^Front, CSV/ }).waitFor();
  }),
  after('run-pinning', ['engineer', runPath('roof')], async (page) => {
    await page.getByRole('button', { name: 'Pin to shortlist' }).click();
    await page.getByRole('button', { name: 'Pin', exact: true }).waitFor();
  }),
  {
    name: 'run-loading',
    role: 'engineer',
    arrive: ({ page }) => waitForever(page, runPath('roof'), '**/views/*'),
  },
];

const SECTION: readonly Screen[] = [
  at('section-empty', 'engineer', `${LIBRARY}/section`),
  after('section-missing', ['engineer', `${LIBRARY}/section`], async (page) => {
    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.locator('[aria-invalid=true]').first().waitFor();
  }),
  after('section-evaluated', ['engineer', `${LIBRARY}/section`], (page) => evaluate(page, '16')),
  after('section-hogging-slab', ['engineer', `${LIBRARY}/section`], async (page) => {
    for (const way of ['T', 'Hogging', 'As given'])
      await page.getByRole('radio', { name: way, exact: true }).first().check();
    await fill(page, {
      'Width b': '14',
      'Depth h': '30',
      'Concrete f′c': '5',
      'Thickness hf': '6',
      'Width bf': '96',
    });
    await fill(page, { 'Top bars': '4-#9', 'Bottom bars': '2-#8' });
    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.getByRole('article').waitFor();
    for (const title of await page.locator('summary').all()) await title.click();
  }),
  after('section-rejected', ['engineer', `${LIBRARY}/section`], (page) => evaluate(page, '8.5')),
];

const SHORTLIST: readonly Screen[] = [
  at('compare', 'estimator', COMPARED),
  ...['A', 'B', 'C', 'D', 'E'].map((label) => at(`candidate-${label}`, 'checker', candidatePath(label))),
  at('candidate-slab', 'checker', candidatePath('F')),
  at('candidate-hogging-en', 'checker', candidatePath('A', 'arcade')),
  at('sheet', 'checker', `${candidatePath('B')}/sheet`),
  at('sheet-slab', 'checker', `${candidatePath('F')}/sheet`),
  at('sheet-hogging-en', 'checker', `${candidatePath('A', 'arcade')}/sheet`),
  after('candidate-check', ['checker', candidatePath('E')], async (page) => {
    await page.getByRole('button', { name: 'Mark as checked' }).click();
    await page.getByRole('dialog').waitFor();
  }),
  after('share', ['engineer', `${LIBRARY}/shortlist`], async (page) => {
    await page.getByRole('button', { name: 'Share the shortlist' }).click();
    await page.getByRole('button', { name: 'Create a link' }).click();
    await page.getByLabel('Address of the link').first().waitFor();
  }),
  { name: 'shared', role: null, arrive: openSharedShortlist },
  at('shared-revoked', null, `/shared/${'x'.repeat(43)}`),
];

/** Last: the first of them keeps both cores busy for a while. */
const LONG_RUNS: readonly Screen[] = [
  { name: 'run-under-way', role: 'engineer', arrive: async (visit) => void (await openHugeRun(visit)) },
  {
    name: 'operations-busy',
    role: 'admin',
    arrive: async (visit) => {
      await openHugeRun(visit);
      await visit.open('/operations');
      await visit.page.getByRole('table', { name: 'Shards in work' }).waitFor();
    },
  },
  {
    name: 'run-cancelled',
    role: 'engineer',
    arrive: async (visit) => {
      await openHugeRun(visit);
      await visit.page.getByRole('button', { name: 'Cancel' }).click();
      await visit.page.getByRole('button', { name: 'Run again' }).waitFor();
    },
  },
];

export const SCREENS: readonly Screen[] = [
  ...OFFICE,
  ...PROJECT,
  ...SWEEP,
  ...RUN,
  ...SECTION,
  ...SHORTLIST,
  ...LONG_RUNS,
];
