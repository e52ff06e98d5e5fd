import type { RequestHandler } from 'express';
import type { Lifecycle } from '../lifecycle';
import { answerRefusal } from './answer-error';

/** Refuses new work once the server stops, so that what runs can end. */
export function refuseWhileStopping(lifecycle: Lifecycle): RequestHandler {
  return (request, response, next) => {
    if (lifecycle.phase !== 'stopping') return next();
    response.setHeader('Connection', 'close');
    answerRefusal(request, response, {
      code: 'stopping',
      message: 'The server is stopping. Try again in a little while.',
    });
  };
}
