import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { FirstVisit } from './auth/first-visit';
import type { SocketRevocation } from './auth/socket-revocation';
import type { LiveLayouts } from './collaboration/live-layouts';
import type { Config } from './config/config';
import type { Mailer } from './mail/mailer';
import type { RateLimits } from './middleware/limit-rate';

/** What the parts of a running server share. */
export interface Services {
  readonly config: Config;
  readonly log: Logger;
  /** The application's connection; never the owner's. */
  readonly sequelize: Sequelize;
  readonly revocation: SocketRevocation;
  /** The open layouts, and what their watchers hear. */
  readonly live: LiveLayouts;
  readonly firstVisit: FirstVisit;
  readonly mailer: Mailer;
  readonly limits: RateLimits;
  readonly sessionSecret: string;
  /** Folder for uploaded files. */
  readonly filesFolder: string;
  /** The address that people use, without a slash at the end. */
  baseUrl(): string;
}
