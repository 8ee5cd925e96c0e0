import { type APIResponse, type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import type { Role } from '#shared/contract/records.ts';
import { findChromium } from '#server/cli/chromium.mjs';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { stableId } from '#server/demo/stable-id.ts';

export const CHROMIUM_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** A condition that has not come true by then never will. */
const PATIENCE_MS = 15_000;

export async function launchChromium(): Promise<Browser> {
  const executablePath = findChromium();
  if (executablePath === undefined) throw new Error('There is no chromium on the PATH');
  return chromium.launch({ executablePath, args: CHROMIUM_FLAGS });
}

/** A browser profile: one person's cookies and cache at one machine. */
export async function openProfile(browser: Browser, origin: string): Promise<BrowserContext> {
  const context = await browser.newContext({
    baseURL: origin,
    viewport: { width: 1440, height: 900 },
    reducedMotion: 'reduce',
  });
  await furnish(context);
  return context;
}

/** What every profile of the tests and benches has, however it was opened. */
export async function furnish(context: BrowserContext): Promise<void> {
  context.setDefaultTimeout(PATIENCE_MS);
  // Outside of the tests tsx names functions by a helper of its own, which code handed to a page does not find there.
  await context.addInitScript('globalThis.__name = (named) => named;');
  // The first steps come up once for each person; here everybody has seen them.
  const people = DEMO_ACCOUNTS.map(({ role }) => stableId(`person/${role}`));
  await context.addInitScript((ids) => {
    // An empty page keeps nothing and says so.
    if (location.protocol === 'about:') return;
    for (const id of ids) localStorage.setItem(`fairweight.first-steps.${id}`, 'seen');
  }, people);
}

/** One window of a profile, and whatever the browser complained of in it. */
export class Visit {
  readonly origin: string;
  readonly page: Page;
  readonly context: BrowserContext;
  readonly #complaints: string[] = [];
  readonly #expected: RegExp[] = [];

  private constructor(origin: string, page: Page) {
    this.origin = origin;
    this.page = page;
    this.context = page.context();
    page.on('pageerror', (error) => this.#complaints.push(`not caught: ${error.stack ?? error.message}`));
    page.on('console', (message) => {
      if (message.type() === 'error')
        this.#complaints.push(`console: ${message.text()} ${message.location().url}`);
    });
  }

  static async begin(context: BrowserContext, origin: string): Promise<Visit> {
    return new Visit(origin, await context.newPage());
  }

  /** What is about to be complained of and belongs to the test, e.g. the 404 that is asked for. */
  expectComplaint(complaint: RegExp): void {
    this.#expected.push(complaint);
  }

  /** Errors on the console and exceptions nobody caught, without the expected ones. */
  get complaints(): readonly string[] {
    return this.#complaints.filter((text) => !this.#expected.some((expected) => expected.test(text)));
  }

  /** Goes to an address and waits until everything on the page has arrived. */
  async open(address: string): Promise<void> {
    await this.page.goto(address);
    await this.page.getByRole('heading', { level: 1 }).first().waitFor();
    await this.page.waitForFunction(() =>
      [...document.querySelectorAll('[role=status]')].every(
        ({ textContent }) => !/^(Loading|The chart appears)/.test(textContent),
      ),
    );
  }

  /** Signs in without the screen; the page has the session from then on. */
  async signIn(role: Role): Promise<void> {
    const { email } = DEMO_ACCOUNTS.find((account) => account.role === role)!;
    await this.call('post', '/session', { email, password: DEMO_PASSWORD });
  }

  /** A call to the API in this person's name, for what is not the subject of a test. */
  async call<T = unknown>(method: 'get' | 'post' | 'put', path: string, body?: object): Promise<T> {
    const answer = await this.ask(method, path, body);
    if (!answer.ok())
      throw new Error(`${method} ${path} ended with ${answer.status()} ${await answer.text()}`);
    return (await answer.json()) as T;
  }

  /** The same for a call that may be refused. */
  async ask(method: 'get' | 'post' | 'put', path: string, body?: object): Promise<APIResponse> {
    const url = `${this.origin}/api${path}`;
    if (method === 'get') return this.context.request.get(url);
    const session = await this.context.request.get(`${this.origin}/api/session`);
    const { csrfToken } = (await session.json()) as { csrfToken: string };
    const options = { headers: { 'x-csrf-token': csrfToken }, data: body ?? {} };
    return method === 'post'
      ? this.context.request.post(url, options)
      : this.context.request.put(url, options);
  }
}
