import createSessionStore from 'connect-session-sequelize';
import type { RequestHandler } from 'express';
import session, { Store } from 'express-session';
import { SessionRecord } from '../models/session-record';
import type { Services } from '../services';
import { signInPassport } from './sign-in-passport';
import { loadSignedIn } from './signed-in';

/** The name of the session's cookie. */
export const SESSION_COOKIE = 'elbowroom.sid';
const SESSION_LIFETIME_MS = 14 * 24 * 60 * 60 * 1000;

declare module 'express-session' {
  interface SessionData {
    /** The team the person works in at the moment. */
    teamId?: string;
  }
}

/** What makes `request.signedIn`: the same handlers serve requests and Socket.IO's handshake (`io.engine.use`). */
export function createSessionHandlers(services: Services): readonly RequestHandler[] {
  const SequelizeStore = createSessionStore(Store);
  const store = new SequelizeStore({
    db: services.sequelize,
    table: SessionRecord.name,
    checkExpirationInterval: 0,
    expiration: SESSION_LIFETIME_MS,
    // One write for each request would cost more than the request; a session ends two weeks after signing in.
    disableTouch: true,
    extendDefaultFields: (defaults, data: { passport?: { user?: string } }) => ({
      ...defaults,
      personId: data.passport?.user ?? null,
    }),
  } as ConstructorParameters<typeof SequelizeStore>[0]);
  return [
    session({
      name: SESSION_COOKIE,
      secret: services.sessionSecret,
      store,
      resave: false,
      saveUninitialized: false,
      cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: SESSION_LIFETIME_MS, path: '/' },
    }),
    signInPassport.session(),
    loadSignedIn,
  ];
}
