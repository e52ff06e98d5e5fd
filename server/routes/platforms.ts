import { Router, type Request } from 'express';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { createLayout } from '../commands/create-layout';
import { touchJob } from '../commands/touch-job';
import { transact } from '../database/transaction';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam } from '../middleware/validate';
import { Platform } from '../models/platform';
import type { Actor } from '../policies/policy';
import { presentLayoutBrief } from '../presenters/platform';
import type { Services } from '../services';
import { idField } from '@/shared/api/fields';
import { layoutRequest, platformChangeRequest } from '@/shared/api/jobs';
import { describePlatform } from './jobs';

/** /api/platforms: what antennas go on. */
export function createPlatformsRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.patch('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const platform = await findPlatform(request, actor);
    authorize(actor, 'edit-layouts', platform);
    const { name } = parseBody(platformChangeRequest, request);
    await transact(services.sequelize, async (transaction) => {
      await platform.update({ name }, { transaction });
      await touchJob(platform.jobId, transaction);
    });
    response.json(await describePlatform(actor, platform));
  });

  router.post('/:id/layouts', async (request, response) => {
    const { actor } = readSignedIn(request);
    const platform = await findPlatform(request, actor);
    authorize(actor, 'edit-layouts', platform);
    const input = parseBody(layoutRequest, request);
    const layout = unwrap(await createLayout(services.sequelize, platform, input));
    response.status(201).json(presentLayoutBrief(actor, layout, []));
  });

  return router;
}

async function findPlatform(request: Request, actor: Actor): Promise<Platform> {
  const id = parseParam(idField, request, 'id');
  const platform = await Platform.findOne({ where: { id, teamId: actor.teamId } });
  return platform ?? refuseNotFound();
}
