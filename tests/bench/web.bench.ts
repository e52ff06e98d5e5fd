import { gzipSync } from 'node:zlib';
import { quantile } from '../support/whip-scenes';
import type { Figure } from './figure';
import { openDemoLayout, waitUntilUsable, withPlanBench, type PlanBench } from './plan-page';

const ROUNDS = 5;

/**
 * Milliseconds from an empty cache to a usable plan: from asking for the page to a sign-in that can be filled in, and
 * from pressing "Sign in" to antennas that can be reached, a worst pair that is told and a line that stands. What
 * the typing between the two takes is not counted.
 */
async function coldStart(bench: PlanBench, layoutId: string): Promise<number> {
  const context = await bench.browser.newContext({ viewport: { width: 1440, height: 900 } });
  try {
    const page = await context.newPage();
    const begin = performance.now();
    await page.goto(`${bench.url}/layouts/${layoutId}`, { waitUntil: 'commit' });
    const email = page.getByLabel('E-mail').first();
    await email.waitFor();
    const opened = performance.now() - begin;
    await email.fill(bench.account.email);
    const password = page.getByLabel('Password').first();
    await password.fill(bench.account.password);
    const pressed = performance.now();
    await password.press('Enter');
    await waitUntilUsable(page);
    return opened + performance.now() - pressed;
  } finally {
    await context.close();
  }
}

/** Kilobytes of gzip of every script that is fetched before the first screen stands. */
async function entrySize({ browser, url }: PlanBench): Promise<number> {
  const context = await browser.newContext();
  const page = await context.newPage();
  const bodies: Promise<Buffer>[] = [];
  page.on('response', (response) => {
    if (response.request().resourceType() === 'script') bodies.push(response.body());
  });
  await page.goto(url);
  await page.getByLabel('E-mail').first().waitFor();
  const sizes = (await Promise.all(bodies)).map((body) => gzipSync(body).length);
  if (sizes.length === 0) throw new Error('the page fetched no script');
  return sizes.reduce((sum, size) => sum + size, 0) / 1000;
}

export const figures: readonly Figure[] = [
  {
    name: 'web.cold.usable',
    unit: 'ms',
    group: 'web',
    measure: () =>
      withPlanBench(async (bench) => {
        const finder = await bench.browser.newContext();
        const { id } = await openDemoLayout(finder, bench);
        const times: number[] = [];
        for (let round = 0; round < ROUNDS; round += 1) times.push(await coldStart(bench, id));
        return quantile(times, 0.5);
      }),
  },
  { name: 'web.entry.gzip', unit: 'kB', group: 'web', measure: () => withPlanBench(entrySize) },
];
