import type { Request, RequestHandler } from 'express';
import { refuseRequest } from '../middleware/refusal-error';
import { Membership } from '../models/membership';
import type { Person } from '../models/person';
import type { Team } from '../models/team';
import type { Actor } from '../policies/policy';

/** A membership with its person and team loaded. */
export type LoadedMembership = Membership & { readonly person: Person; readonly team: Team };

/** Who sends a request: the person, the membership they act by, and their other teams. */
export interface SignedIn {
  readonly actor: Actor;
  readonly person: Person;
  readonly membership: LoadedMembership;
  /** Active memberships, the current one included, by team name. */
  readonly memberships: readonly LoadedMembership[];
}

declare module 'express-serve-static-core' {
  interface Request {
    /** Absent when nobody is signed in, or their last membership was deactivated. */
    signedIn?: SignedIn;
  }
}

/** Loads who is signed in, after the session; works on Socket.IO's handshake as well. */
export const loadSignedIn: RequestHandler = (request, _response, next) => {
  const personId = request.user?.personId;
  if (personId === undefined) return next();
  findSignedIn(personId, request.session.teamId).then((signedIn) => {
    if (signedIn) request.signedIn = signedIn;
    next();
  }, next);
};

/** Refuses a request of somebody who is not signed in. */
export const requireSignedIn: RequestHandler = (request, _response, next) => {
  if (request.signedIn === undefined) refuseRequest('not-signed-in', 'Sign in to go on.');
  next();
};

/**
 * Who sends this request; only behind `requireSignedIn`.
 * @throws Error when the route forgot it.
 */
export function readSignedIn(request: Request): SignedIn {
  if (request.signedIn === undefined) throw new Error('the route does not require anybody to be signed in');
  return request.signedIn;
}

/** The person's active memberships, acting by the one in the wanted team or else the first. */
export async function findSignedIn(
  personId: string,
  teamId: string | undefined,
): Promise<SignedIn | undefined> {
  const found = await Membership.findAll({
    where: { personId, deactivatedAt: null },
    include: ['person', 'team'],
    order: [
      ['team', 'name', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const memberships = found.map(requireLoaded);
  const membership = memberships.find((candidate) => candidate.teamId === teamId) ?? memberships[0];
  if (membership === undefined) return undefined;
  return { actor: actorOf(membership), person: membership.person, membership, memberships };
}

/** The membership as the policy sees it. */
export function actorOf(membership: Membership): Actor {
  return {
    memberId: membership.id,
    personId: membership.personId,
    teamId: membership.teamId,
    roles: membership.roles,
    active: membership.deactivatedAt === null,
  };
}

/**
 * The membership, once its person and team are sure to be loaded.
 * @throws Error when they are not.
 */
export function requireLoaded(membership: Membership): LoadedMembership {
  if (!membership.person || !membership.team)
    throw new Error('the membership came without its person and team');
  return membership as LoadedMembership;
}
