import type { Router } from 'express';
import type { Services } from '../services';
import { createAccountRouter } from './account';
import { createInvitationsRouter } from './invitations';
import { createMailsRouter } from './mails';
import { createMembersRouter } from './members';
import { createPasswordsRouter } from './passwords';
import { createSessionRouter, createSessionsRouter } from './session';
import { createCommentsRouter } from './comments';
import { createJobsRouter } from './jobs';
import { createLayoutsRouter } from './layouts';
import { createPartsRouter } from './parts';
import { createPlatformsRouter } from './platforms';
import { createRevisionsRouter } from './revisions';
import { createSetupRouter } from './setup';

/** A resource and where it is. */
export interface MountedRouter {
  readonly path: string;
  readonly router: Router;
}

/** Every resource of the interface; health stands in front of all of them. */
export function listRouters(services: Services): readonly MountedRouter[] {
  return [
    { path: '/api/setup', router: createSetupRouter(services) },
    { path: '/api/session', router: createSessionRouter(services) },
    { path: '/api/sessions', router: createSessionsRouter(services) },
    { path: '/api/account', router: createAccountRouter(services) },
    { path: '/api/passwords', router: createPasswordsRouter(services) },
    { path: '/api/members', router: createMembersRouter(services) },
    { path: '/api/invitations', router: createInvitationsRouter(services) },
    { path: '/api/mails', router: createMailsRouter(services) },
    { path: '/api/comments', router: createCommentsRouter(services) },
    { path: '/api/jobs', router: createJobsRouter(services) },
    { path: '/api/layouts', router: createLayoutsRouter(services) },
    { path: '/api/parts', router: createPartsRouter() },
    { path: '/api/platforms', router: createPlatformsRouter(services) },
    { path: '/api/revisions', router: createRevisionsRouter(services) },
  ];
}
