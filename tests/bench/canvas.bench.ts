import { setTimeout } from 'node:timers/promises';
import type { CDPSession, Page } from 'playwright-core';
import { quantile } from '../support/whip-scenes';
import type { Figure } from './figure';
import { fillLayout, openDemoLayout, waitUntilUsable, withPlanBench } from './plan-page';

const ANTENNAS = 16;
/** Moves of the finger: about six seconds at sixty a second. */
const MOVES = 360;
const MOVE_MS = 16;
/** A frame that takes longer is one that a person sees, ms. */
const LATE_MS = 33;

/** Runs in the page: keeps how long each frame takes. As text, for what loads TypeScript here puts names of its own in. */
const KEEP_FRAMES = `(() => {
  const kept = (globalThis.dragFrames = []);
  let last = null;
  requestAnimationFrame(function frame(now) {
    if (last !== null) kept.push(now - last);
    last = now;
    requestAnimationFrame(frame);
  });
})()`;

let drag: Promise<readonly number[]> | null = null;

/** Frames of one and the same drag, ms each; both figures speak of it. */
function frames(): Promise<readonly number[]> {
  drag ??= withPlanBench(async (bench) => {
    const context = await bench.browser.newContext({
      viewport: { width: 1024, height: 768 },
      hasTouch: true,
    });
    const layout = await openDemoLayout(context, bench);
    await fillLayout(context, bench.url, layout, ANTENNAS);
    const page = await context.newPage();
    await page.goto(`${bench.url}/layouts/${layout.id}`);
    await waitUntilUsable(page);
    const antenna = page.locator('[data-testid="plan"] [aria-label^="A3"]').first();
    const cdp = await context.newCDPSession(page);
    const times = await dragInCircles(page, cdp, antenna);
    // the drag must have been one: the antenna stands elsewhere now
    if (times.length < MOVES / 4) throw new Error(`the drag took only ${times.length} frames`);
    return times;
  });
  return drag;
}

async function dragInCircles(
  page: Page,
  cdp: CDPSession,
  antenna: ReturnType<Page['locator']>,
): Promise<readonly number[]> {
  const before = await antenna.getAttribute('aria-label');
  const box = await antenna.boundingBox();
  if (!box) throw new Error('the antenna is not on the screen');
  const centre = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  const touch = (type: 'touchStart' | 'touchMove', at: { x: number; y: number }) =>
    cdp.send('Input.dispatchTouchEvent', { type, touchPoints: [{ ...at, id: 1 }] });
  await touch('touchStart', centre);
  await page.evaluate(KEEP_FRAMES);
  const moves: Promise<unknown>[] = [];
  for (let move = 1; move <= MOVES; move += 1) {
    const turn = move / 40;
    const reach = Math.min(1, move / 60);
    // a finger does not wait for the page: the next move comes whether the last one was drawn or not
    moves.push(
      touch('touchMove', {
        x: centre.x + 90 * reach * Math.sin(turn),
        y: centre.y + 60 * reach * Math.sin(1.7 * turn),
      }),
    );
    await setTimeout(MOVE_MS);
  }
  await Promise.all(moves);
  const times = await page.evaluate(() => (globalThis as unknown as { dragFrames: number[] }).dragFrames);
  await cdp.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  if ((await antenna.getAttribute('aria-label')) === before) throw new Error('the antenna did not move');
  return times;
}

export const figures: readonly Figure[] = [
  {
    name: 'canvas.drag.frame.p95',
    unit: 'ms',
    group: 'canvas',
    measure: async () => quantile(await frames(), 0.95),
  },
  {
    name: 'canvas.drag.late',
    unit: '%',
    group: 'canvas',
    measure: async () => {
      const times = await frames();
      return (100 * times.filter((time) => time > LATE_MS).length) / times.length;
    },
  },
];
