import type { Request, Response } from 'express';
import type { Services } from '../services';
import { SESSION_COOKIE } from './session';
import { findSignedIn, type SignedIn } from './signed-in';

/**
 * Signs a person in on a session with a new identifier; answers undefined, and changes nothing, when they have
 * no active membership.
 */
export async function openSession(
  services: Services,
  request: Request,
  personId: string,
  teamId?: string,
): Promise<SignedIn | undefined> {
  const signedIn = await findSignedIn(personId, teamId);
  if (signedIn === undefined) return undefined;
  const earlierId = request.sessionID;
  await new Promise<void>((resolve, reject) => {
    request.logIn({ personId }, (error?: unknown) => (error ? reject(error as Error) : resolve()));
  });
  request.session.teamId = signedIn.actor.teamId;
  services.revocation.revokeSession(earlierId);
  request.signedIn = signedIn;
  return signedIn;
}

/** Ends the session of this browser, its cookie and its sockets. */
export async function closeSession(services: Services, request: Request, response: Response): Promise<void> {
  const sessionId = request.sessionID;
  await new Promise<void>((resolve, reject) => {
    request.session.destroy((error?: unknown) => (error ? reject(error as Error) : resolve()));
  });
  response.clearCookie(SESSION_COOKIE, { path: '/', httpOnly: true, sameSite: 'lax' });
  services.revocation.revokeSession(sessionId);
}
