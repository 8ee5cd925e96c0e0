/**
 * The chart of a run over a million sections while it is enlarged, drawn smaller and moved, frame by frame by the browser's
 * own clock. Without a desktop Chromium draws on the processor, so this is the slowest screen there is.
 */
import type { Page } from 'playwright-core';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { launchChromium, openProfile, Visit } from '../tests/support/browser.ts';
import { runPath } from '../tests/support/browser-demo.ts';
import { startDemoService } from '../tests/support/browser-service.ts';

const AIM_FPS = 30;
const TURNS = 90;
const HELD_STEPS = 60;

const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
const service = await startDemoService(maintenanceUrl);
const browser = await launchChromium();
try {
  const visit = await Visit.begin(await openProfile(browser, service.origin), service.origin);
  await visit.signIn('engineer');
  await visit.open(runPath('reading-room-fine'));
  const { page } = visit;
  await page.waitForLoadState('networkidle');
  const chart = page.getByRole('slider', { name: /^Section along the front/ });
  await chart.locator('canvas').waitFor();
  const { x, y, width, height } = (await chart.boundingBox())!;
  await page.mouse.move(x + width / 2, y + height / 2);
  await report('nothing moves', page, async () => {
    await page.evaluate(() => new Promise((resolve) => setTimeout(resolve, 1000)));
  });
  await report('enlarged and reduced by the wheel', page, async () => {
    await page.keyboard.down('Control');
    for (let turn = 0; turn < TURNS; turn++) await page.mouse.wheel(0, turn % 30 < 15 ? -60 : 60);
    await page.keyboard.up('Control');
  });
  await page.keyboard.down('Shift');
  await report('moved with the mouse', page, async () => {
    await page.mouse.move(x + width * 0.3, y + height * 0.3);
    await page.mouse.down();
    for (let step = 1; step <= HELD_STEPS; step++)
      await page.mouse.move(x + width * (0.3 + (0.4 * step) / HELD_STEPS), y + height * 0.5);
    await page.mouse.up();
  });
  await page.keyboard.up('Shift');
  await report('along the front by keys', page, async () => {
    await chart.focus();
    for (let step = 0; step < HELD_STEPS; step++) await page.keyboard.press('ArrowRight');
  });
} finally {
  await browser.close();
  await service.close();
  await leavePostgres(TEST_FOLDER);
}

/** Frames while something is done: their number a second, and the longest tenth of them. */
async function report(what: string, page: Page, act: () => Promise<void>): Promise<void> {
  await page.evaluate(() => {
    const kept: number[] = [];
    const tick = (at: number) => {
      kept.push(at);
      if (Reflect.get(window, 'framesKept') === kept) requestAnimationFrame(tick);
    };
    Reflect.set(window, 'framesKept', kept);
    requestAnimationFrame(tick);
  });
  await act();
  const at = await page.evaluate(() => {
    const kept = Reflect.get(window, 'framesKept') as number[];
    Reflect.set(window, 'framesKept', null);
    return kept;
  });
  const gaps = at.slice(1).map((time, i) => time - at[i]!);
  gaps.sort((a, b) => a - b);
  const total = gaps.reduce((sum, gap) => sum + gap, 0);
  const fps = (gaps.length * 1000) / total;
  const slowTenth = gaps[Math.floor(gaps.length * 0.9)]!;
  console.log(
    `${what}: ${fps.toFixed(0)} frames a second, ${(fps / AIM_FPS).toFixed(2)} of the ${AIM_FPS} aimed at; ` +
      `slowest tenth from ${slowTenth.toFixed(0)} ms, longest ${gaps.at(-1)!.toFixed(0)} ms, ${gaps.length} frames`,
  );
}
