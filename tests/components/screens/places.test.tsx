import { homeOf, placesFor, placeWithin } from '@/components/screens/places';
import type { Session } from '@/shared/api/session';
import { SESSION } from '@/tests/support/stub-api';

function having(abilities: Partial<Session['abilities']>): Session {
  return { ...SESSION, abilities: { ...SESSION.abilities, ...abilities } };
}

const labels = (session: Session) => placesFor(session).map(({ label }) => label);

describe('places of the navigation', () => {
  test('who sees jobs begins at the jobs', () => {
    const session = having({ seeJobs: true });
    expect(homeOf(session)).toBe('/jobs');
    expect(labels(session)).toEqual(['Jobs', 'Parts', 'People', 'Account']);
  });

  test('who only builds begins at what is frozen', () => {
    const session = having({ seeJobs: false });
    expect(homeOf(session)).toBe('/frozen');
    expect(labels(session)).toEqual(['Frozen', 'People', 'Account']);
  });

  test('mails are a place only where the server shows them', () => {
    expect(labels(having({ seeMails: true }))).toContain('Mails');
    expect(labels(having({ seeMails: false }))).not.toContain('Mails');
  });

  test('where one begins is always a place', () => {
    for (const seeJobs of [true, false]) {
      const session = having({ seeJobs });
      expect(placesFor(session).map(({ href }) => href)).toContain(homeOf(session));
    }
  });
});

describe('a place within the product', () => {
  test.each([
    ['/people', '/people'],
    ['/layouts/abc?comment=7#end', '/layouts/abc?comment=7#end'],
    [`${globalThis.location.origin}/password/abc`, '/password/abc'],
  ])('%s leads to %s', (address, place) => {
    expect(placeWithin(address)).toBe(place);
  });

  test.each([
    undefined,
    '',
    'people',
    '//elsewhere.example.com',
    '/\\elsewhere.example.com',
    '/\t/elsewhere.example.com',
    'https://elsewhere.example.com/people',
    `${globalThis.location.origin}.example.com/people`,
    `${globalThis.location.origin}//elsewhere.example.com`,
    'javascript:alert(1)',
  ])('%j leads nowhere', (address) => {
    expect(placeWithin(address)).toBeNull();
  });
});
