import { hashPassword, verifyPassword } from '@/server/auth/password';
import { FirstVisit } from '@/server/auth/first-visit';
import { hashToken, makeToken } from '@/server/auth/token';
import { tokenField } from '@/shared/api/fields';

test('a password fits its own hash only', async () => {
  const hash = await hashPassword('ä password of people');
  expect(await verifyPassword('ä password of people', hash)).toBe(true);
  expect(await verifyPassword('a password of people', hash)).toBe(false);
  expect(await verifyPassword('ä password of people', undefined)).toBe(false);
});

test('what bcrypt would cut off is refused instead', async () => {
  const longest = 'x'.repeat(72);
  const hash = await hashPassword(longest);
  expect(await verifyPassword(longest, hash)).toBe(true);
  expect(await verifyPassword(`${longest}y`, hash)).toBe(false);
});

test('a token is one the schema takes, and its hash says nothing of it', () => {
  const token = makeToken();
  expect(tokenField.safeParse(token).success).toBe(true);
  expect(hashToken(token)).toMatch(/^[0-9a-f]{64}$/);
  expect(makeToken()).not.toBe(token);
});

test('the code of the first visit is taken once, spelled anyhow', () => {
  const visit = new FirstVisit();
  expect(visit.take('')).toBe(false);
  expect(visit.take(` ${visit.code.toUpperCase()}\n`)).toBe(true);
  expect(visit.take(visit.code)).toBe(false);
  visit.putBack();
  expect(visit.take(visit.code)).toBe(true);
});
