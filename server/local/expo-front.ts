import { spawn } from 'node:child_process';
import type { IncomingMessage, Server } from 'node:http';
import type { Socket } from 'node:net';
import { join, resolve } from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { createProxyMiddleware } from 'http-proxy-middleware';
import type { RequestHandler } from 'express';
import { readEnvironment } from '../config/environment';
import { findFreePort } from './private-database';
import { StartProblem } from './start-problem';

const ROOT = resolve(__dirname, '../..');
const READY_WITHIN_MS = 120_000;
const POLL_MS = 300;
const OWN_PATHS = ['/socket.io/', '/api/'];

/** Starts Expo's development server on a free port and passes on to it what is not ours, upgrades included. */
export async function openExpoFront(
  http: Server,
): Promise<{ handler: RequestHandler; close: () => Promise<void> }> {
  const port = await findFreePort();
  const target = `http://127.0.0.1:${port}`;
  const child = spawn(
    process.execPath,
    [join(ROOT, 'node_modules/expo/bin/cli'), 'start', '--port', String(port), '--localhost'],
    {
      cwd: ROOT,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: {
        ...readEnvironment(),
        BROWSER: 'none',
        EXPO_NO_TELEMETRY: '1',
        EXPO_OFFLINE: '1',
        NODE_OPTIONS: '',
      },
    },
  );
  await waitUntilReady(target, () => child.exitCode === null);
  const proxy = createProxyMiddleware({
    target,
    // Expo's server answers only to its own address.
    changeOrigin: true,
    headers: { origin: target },
    ws: false,
  });
  const onUpgrade = (request: IncomingMessage, socket: unknown, head: Buffer) => {
    if (!OWN_PATHS.some((path) => request.url?.startsWith(path)))
      proxy.upgrade(request as never, socket as Socket, head);
  };
  http.on('upgrade', onUpgrade);
  return {
    handler: proxy as unknown as RequestHandler,
    close: async () => {
      http.off('upgrade', onUpgrade);
      if (child.exitCode !== null) return;
      const ended = new Promise((done) => child.once('close', done));
      child.kill('SIGTERM');
      await ended;
    },
  };
}

async function waitUntilReady(target: string, isAlive: () => boolean): Promise<void> {
  const end = Date.now() + READY_WITHIN_MS;
  while (Date.now() < end) {
    if (!isAlive())
      throw new StartProblem("Expo's development server did not start; its reason stands above.");
    const answered = await fetch(`${target}/status`).then(
      (response) => response.ok,
      () => false, // not listening yet
    );
    if (answered) return;
    await delay(POLL_MS);
  }
  throw new StartProblem("Expo's development server does not answer.");
}
