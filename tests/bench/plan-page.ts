import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { io } from 'socket.io-client';
import type { JobDetail } from '@/shared/api/jobs';
import type { JoinAnswer, OperationAnswer } from '@/shared/api/live';
import type { Layout } from '@/shared/api/layouts';
import type { Setup } from '@/shared/api/session';
import { createId } from '@/shared/ids';
import {
  DOCUMENT_VERSION,
  type LayoutDocument,
  type PlacedAntenna,
  type Radio,
} from '@/shared/layout/document';
import type { Change } from '@/shared/layout/operation';
import { placementProblem } from '@/shared/layout/placement';
import { STARTER_ANTENNAS, STARTER_RADIOS } from '@/shared/layout/starter-parts';
import { makeDataFolder, removeDataFolder, spawnServer } from '../support/spawned-server';

/** A real server with a real client, a browser, and somebody who may edit. */
export type PlanBench = {
  readonly url: string;
  readonly browser: Browser;
  readonly account: Setup['demoAccounts'][number];
};

/** Whips that fill a layout up, each with a radio of its own. */
const FILLERS = [
  { part: STARTER_ANTENNAS['whip-vhf'], radio: STARTER_RADIOS.vhf },
  { part: STARTER_ANTENNAS['whip-uhf'], radio: STARTER_RADIOS.uhf },
  { part: STARTER_ANTENNAS['whip-cellular'], radio: STARTER_RADIOS.cellular },
  { part: STARTER_ANTENNAS['whip-2g4'], radio: STARTER_RADIOS['wireless-lan'] },
] as const;

/** Clear distance between two antennas that fill up, m. */
const APART = 0.3;

/** Starts the product with the demo in a folder of its own, measures, and takes all of it away again. */
export async function withPlanBench<T>(measure: (bench: PlanBench) => Promise<T>): Promise<T> {
  const folder = makeDataFolder();
  // a client that is built already can be named, so that it is not built for each figure
  const server = spawnServer(folder, { ELBOWROOM_CLIENT: process.env.ELBOWROOM_CLIENT ?? 'build' });
  try {
    const url = await server.ready;
    const browser = await chromium.launch({
      executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--no-first-run'],
    });
    try {
      const setup = (await (await fetch(`${url}/api/setup`)).json()) as Setup;
      const account = setup.demoAccounts.find(({ roles }) => roles.includes('integrator'));
      if (!account) throw new Error('the demo has no integrator');
      return await measure({ url, browser, account });
    } finally {
      await browser.close();
    }
  } finally {
    server.child.kill('SIGTERM');
    await server.exit;
    removeDataFolder(folder);
  }
}

/** Signs the context in and answers with the demo van's layout. */
export async function openDemoLayout(context: BrowserContext, { url, account }: PlanBench): Promise<Layout> {
  const { email, password } = account;
  const answer = await context.request.post(`${url}/api/session`, {
    data: { email, password },
    headers: { origin: url },
  });
  if (!answer.ok()) throw new Error(`signing in was answered with ${answer.status()}`);
  const jobs = (await read(context, `${url}/api/jobs`)) as {
    readonly items: readonly { readonly id: string }[];
  };
  for (const { id } of jobs.items) {
    const job = (await read(context, `${url}/api/jobs/${id}`)) as JobDetail;
    const layoutId = job.platforms.find(({ kind }) => kind === 'vehicle')?.layouts[0]?.id;
    if (layoutId !== undefined) return (await read(context, `${url}/api/layouts/${layoutId}`)) as Layout;
  }
  throw new Error('the demo has no vehicle');
}

async function read(context: BrowserContext, url: string): Promise<unknown> {
  const answer = await context.request.get(url);
  if (!answer.ok()) throw new Error(`${url} was answered with ${answer.status()}`);
  return answer.json();
}

/** Adds whips with radios until `count` antennas stand on the layout, in one operation. */
export async function fillLayout(
  context: BrowserContext,
  url: string,
  layout: Layout,
  count: number,
): Promise<void> {
  const cookie = (await context.cookies(url)).map(({ name, value }) => `${name}=${value}`).join('; ');
  const socket = io(url, { transports: ['websocket'], extraHeaders: { cookie, origin: url } });
  try {
    const join = { layoutId: layout.id, after: null, version: DOCUMENT_VERSION };
    const joined = (await socket.timeout(5000).emitWithAck('join', join)) as JoinAnswer;
    if (!joined.ok) throw new Error(joined.refusal.message);
    const operation = { id: createId(), version: DOCUMENT_VERSION, changes: fillers(layout.document, count) };
    const message = { layoutId: layout.id, operation };
    const answer = (await socket.timeout(5000).emitWithAck('operation', message)) as OperationAnswer;
    if (!answer.ok) throw new Error(JSON.stringify(answer.refusal));
  } finally {
    socket.disconnect();
  }
}

function fillers(document: LayoutDocument, count: number): readonly Change[] {
  const changes: Change[] = [];
  const standing: PlacedAntenna[] = Object.values(document.antennas);
  const { length, width } = document.platform;
  for (let x = 0.2; x < length - 0.15; x += 0.05) {
    for (let y = -width / 2; y <= width / 2; y += 0.05) {
      if (standing.length === count) return changes;
      const filler = FILLERS[standing.length % FILLERS.length]!;
      const radio: Radio = { ...filler.radio, id: createId() };
      const antenna: PlacedAntenna = {
        id: createId(),
        label: `A${standing.length + 1}`,
        name: filler.part.name,
        part: filler.part,
        x: Number(x.toFixed(3)),
        y: Number(y.toFixed(3)),
        mountHeight: 0,
        azimuthDeg: 0,
        tiltDeg: 0,
        radioId: radio.id,
        feederLossDb: 1,
      };
      if (placementProblem(document, antenna)) continue;
      if (standing.some((other) => Math.hypot(other.x - antenna.x, other.y - antenna.y) < APART)) continue;
      standing.push(antenna);
      changes.push(
        { kind: 'add', collection: 'radios', value: radio },
        { kind: 'add', collection: 'antennas', value: antenna },
      );
    }
  }
  throw new Error(`only ${standing.length} antennas found room`);
}

/** Waits until the plan can be worked with: its antennas can be reached, the worst pair stands there, the line stands. */
export async function waitUntilUsable(page: Page): Promise<void> {
  await page.locator('[data-testid="plan"] svg').first().waitFor();
  await page.locator('[data-testid="plan"] [aria-label^="A1"]').first().waitFor();
  await page
    .getByText(/^A\d+ into A\d+/)
    .filter({ visible: true })
    .first()
    .waitFor();
  await page
    .getByText(/^saved$/)
    .filter({ visible: true })
    .first()
    .waitFor();
}
