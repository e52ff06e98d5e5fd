import { hashPassword } from '../auth/password';
import { transact } from '../database/transaction';
import { recordAudit } from '../models/audit-entry';
import { Membership } from '../models/membership';
import { normalizeEmail, Person } from '../models/person';
import { Team } from '../models/team';
import type { Services } from '../services';
import { accept, refuse, type Result } from '@/shared/errors';

/** What the first visitor enters. */
export interface FirstVisitInput {
  readonly code: string;
  readonly team: string;
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** Makes the first team and its administrator, once, for whoever holds the code that the server printed. */
export async function setUpTeam(services: Services, input: FirstVisitInput): Promise<Result<Membership>> {
  if ((await Person.count()) > 0) {
    return refuse('wrong-state', 'A team is set up already. Ask its administrator for an invitation.');
  }
  if (!services.firstVisit.take(input.code)) {
    return refuse('forbidden', 'This is not the code that the server printed when it started.', [
      { path: 'code', message: 'is not the printed code' },
    ]);
  }
  try {
    const passwordHash = await hashPassword(input.password);
    return accept(
      await transact(services.sequelize, async (transaction) => {
        const team = await Team.create({ name: input.team }, { transaction });
        const person = await Person.create(
          { name: input.name, email: normalizeEmail(input.email), passwordHash },
          { transaction },
        );
        const membership = await Membership.create(
          { teamId: team.id, personId: person.id, roles: ['administrator'] },
          { transaction },
        );
        await recordAudit({ action: 'team-made', teamId: team.id, personId: person.id }, transaction);
        return membership;
      }),
    );
  } catch (error) {
    services.firstVisit.putBack();
    throw error;
  }
}
