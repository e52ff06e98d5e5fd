import { Router } from 'express';
import { QueryTypes } from 'sequelize';
import type { Lifecycle } from '../lifecycle';
import type { Services } from '../services';

const ANSWER_WITHIN_MS = 2_000;

/** GET /api/health: asks the database each time. */
export function createHealthRouter(services: Services, lifecycle: Lifecycle): Router {
  const router = Router();
  router.get('/', async (request, response) => {
    response.setHeader('Cache-Control', 'no-store');
    const status = lifecycle.phase === 'ready' ? await askDatabase(services) : lifecycle.phase;
    if (status !== 'ok') request.log.warn({ status }, 'not healthy');
    response.status(status === 'ok' ? 200 : 503).json({ status });
  });
  return router;
}

async function askDatabase(services: Services): Promise<'ok' | 'without database'> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<'without database'>((resolve) => {
    timer = setTimeout(() => resolve('without database'), ANSWER_WITHIN_MS);
  });
  const asked = services.sequelize.query('SELECT 1', { type: QueryTypes.SELECT }).then(
    () => 'ok' as const,
    (error: unknown) => {
      services.log.warn({ err: error }, 'the database did not answer');
      return 'without database' as const;
    },
  );
  return Promise.race([asked, late]).finally(() => clearTimeout(timer));
}
