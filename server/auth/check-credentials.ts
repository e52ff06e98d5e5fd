import { normalizeEmail, Person } from '../models/person';
import { verifyPassword } from './password';

/** The person with this e-mail address and password, if there is one; takes as long when there is not. */
export async function checkCredentials(email: string, password: string): Promise<Person | undefined> {
  const person = await Person.findOne({ where: { email: normalizeEmail(email) } });
  const fits = await verifyPassword(password, person?.passwordHash);
  return fits && person ? person : undefined;
}
