import { createHmac } from 'node:crypto';
import { Membership } from '../models/membership';
import { Team } from '../models/team';
import type { Services } from '../services';
import type { Setup } from '@/shared/api/session';
import { verifyPassword } from './password';
import { requireLoaded } from './signed-in';

type DemoAccount = Setup['demoAccounts'][number];

const fittingHashes = new Map<string, boolean>();

/** The password of a demo account: different in every data folder, the same at every start. */
export function deriveDemoPassword(sessionSecret: string, email: string): string {
  const digits = createHmac('sha256', sessionSecret).update(`demo ${email}`).digest('hex');
  return ['corrin', digits.slice(0, 4), digits.slice(4, 8), digits.slice(8, 12)].join('-');
}

/** The demo accounts whose password is still the derived one, while the demo is on. */
export async function listDemoAccounts(services: Services): Promise<DemoAccount[]> {
  if (!services.config.demo) return [];
  const memberships = await Membership.findAll({
    where: { deactivatedAt: null },
    include: ['person', { model: Team, as: 'team', where: { demo: true } }],
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const accounts: DemoAccount[] = [];
  for (const { person, roles } of memberships.map(requireLoaded)) {
    const password = deriveDemoPassword(services.sessionSecret, person.email);
    if (await fits(password, person.passwordHash)) {
      accounts.push({ name: person.name, email: person.email, password, roles: [...roles] });
    }
  }
  return accounts;
}

async function fits(password: string, hash: string): Promise<boolean> {
  const key = `${password} ${hash}`;
  const known = fittingHashes.get(key);
  if (known !== undefined) return known;
  const fitting = await verifyPassword(password, hash);
  fittingHashes.set(key, fitting);
  return fitting;
}
