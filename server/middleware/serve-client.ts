import { join } from 'node:path';
import express, { Router } from 'express';
import { refuseRequest } from './refusal-error';

const YEAR_MS = 365 * 24 * 60 * 60 * 1000;
// Expo names what it bundles after its content: `entry-<32 hexadecimal digits>.js`, `Barlow.<hash>.ttf`.
const HASHED_NAME = /[-.][0-9a-f]{16,}\.[a-z0-9]+$/i;

/** Serves the built client: files that are there, and the one page for every other address. */
export function serveClient(folder: string): Router {
  const router = Router();
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      dotfiles: 'ignore',
      setHeaders: (response, path) => {
        response.setHeader(
          'Cache-Control',
          HASHED_NAME.test(path) ? `public, max-age=${YEAR_MS / 1000}, immutable` : 'no-cache',
        );
      },
    }),
  );
  // A missing part must be missing: the page in its place would be run as a script.
  router.use(['/_expo', '/assets', '/socket.io'], () => {
    refuseRequest('not-found', 'There is nothing at this address.');
  });
  router.get('/{*path}', (_request, response) => {
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(folder, 'index.html'), { dotfiles: 'allow' });
  });
  return router;
}
