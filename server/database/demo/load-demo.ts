import type { Sequelize } from 'sequelize';
import { deriveDemoPassword } from '../../auth/demo-accounts';
import { hashRandomPassword } from '../../auth/password';
import { Membership } from '../../models/membership';
import { Person } from '../../models/person';
import { Team } from '../../models/team';
import { transact } from '../transaction';
import { DEMO_PEOPLE, DEMO_TEAM } from './demo-accounts';
import type { DemoContext } from './demo-context';
import { loadDemoComments } from './load-demo-comments';
import { loadDemoJobs } from './load-demo-jobs';
import { loadDemoRevision } from './load-demo-revision';

/**
 * Fills an empty database with the demo scenario, all of it or nothing; leaves any other alone.
 * @returns whether it was loaded.
 */
export async function loadDemo(sequelize: Sequelize, sessionSecret: string): Promise<boolean> {
  if ((await Person.count()) > 0 || (await Team.count()) > 0) return false;
  const people = await Promise.all(
    DEMO_PEOPLE.map(async ({ name, email, roles }) => ({
      name,
      email,
      roles,
      passwordHash: await hashRandomPassword(deriveDemoPassword(sessionSecret, email)),
    })),
  );
  await transact(sequelize, async (transaction) => {
    const team = await Team.create({ name: DEMO_TEAM, demo: true }, { transaction });
    const memberships = new Map<string, Membership>();
    for (const { name, email, roles, passwordHash } of people) {
      const person = await Person.create({ name, email, passwordHash }, { transaction });
      memberships.set(
        email,
        await Membership.create({ teamId: team.id, personId: person.id, roles }, { transaction }),
      );
    }
    const context: DemoContext = {
      team,
      member: (email) => {
        const membership = memberships.get(email);
        if (membership === undefined) throw new Error(`nobody in the demo has the address ${email}`);
        return membership;
      },
      transaction,
    };
    await loadDemoJobs(context);
    await loadDemoComments(context);
    await loadDemoRevision(context);
  });
  return true;
}
