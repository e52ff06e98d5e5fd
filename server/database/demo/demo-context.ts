import type { Transaction } from 'sequelize';
import type { Membership } from '../../models/membership';
import type { Team } from '../../models/team';

/** What the parts of the demo are loaded into. */
export interface DemoContext {
  readonly team: Team;
  /** The membership of a demo address, such as `integrator@example.com`. */
  member(email: string): Membership;
  readonly transaction: Transaction;
}
