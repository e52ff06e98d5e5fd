import { render, screen } from '@testing-library/react';
import { AppRoot } from '@/components/screens/app-root';
import { done, refused, SESSION, settle, StubApi } from '@/tests/support/stub-api';

jest.mock('idb-keyval', () => jest.requireActual('@/tests/support/kept-in-memory'));

const mockAddress = { path: '/', next: undefined as string | undefined };
jest.mock('expo-router', () => ({
  usePathname: () => mockAddress.path,
  useGlobalSearchParams: () => ({ next: mockAddress.next }),
  useRouter: () => ({ push: jest.fn(), replace: jest.fn() }),
  Redirect: ({ href }: { readonly href: string }) => `to ${href}`,
}));

const OUT = refused('not-signed-in', 'Sign in first.');
const BUILDER = { ...SESSION, abilities: { ...SESSION.abilities, seeJobs: false } };

/** What somebody sees at an address: the screen, or where they are sent. */
async function shownAt(path: string, session: Parameters<StubApi['prepare']>[1]): Promise<string> {
  const url = new URL(path, 'http://localhost');
  globalThis.history.replaceState(null, '', path);
  mockAddress.path = url.pathname;
  mockAddress.next = url.searchParams.get('next') ?? undefined;
  new StubApi().prepare('GET /api/session', session);
  const { container } = render(<AppRoot>the screen</AppRoot>);
  await settle();
  return container.textContent ?? '';
}

describe('who sees which screen', () => {
  test.each([
    ['/', 'to /sign-in'],
    ['/people', 'to /sign-in?next=%2Fpeople'],
    ['/layouts/abc?comment=7', 'to /sign-in?next=%2Flayouts%2Fabc%3Fcomment%3D7'],
    ['/sign-in', 'the screen'],
    ['/setup', 'the screen'],
    ['/forgotten', 'the screen'],
    ['/invitation/abc', 'the screen'],
    ['/password/abc', 'the screen'],
  ])('signed out at %s: %s', async (path, shown) => {
    expect(await shownAt(path, OUT)).toBe(shown);
  });

  test.each([
    ['/', 'to /jobs'],
    ['/sign-in', 'to /jobs'],
    ['/sign-in?next=%2Flayouts%2Fabc%3Fcomment%3D7', 'to /layouts/abc?comment=7'],
    ['/people', 'the screen'],
    ['/invitation/abc', 'the screen'],
    ['/password/abc', 'the screen'],
  ])('signed in at %s: %s', async (path, shown) => {
    expect(await shownAt(path, done(SESSION))).toBe(shown);
  });

  test.each(['//elsewhere.example.com', 'https://elsewhere.example.com', '/\\elsewhere.example.com'])(
    'nobody is sent out of the product by %s',
    async (next) => {
      expect(await shownAt(`/sign-in?next=${encodeURIComponent(next)}`, done(SESSION))).toBe('to /jobs');
    },
  );

  test.each([
    ['/', 'to /frozen'],
    ['/jobs', 'to /frozen'],
    ['/jobs/abc', 'to /frozen'],
    ['/parts', 'to /frozen'],
    ['/r/abc', 'the screen'],
    ['/account', 'the screen'],
  ])('who only builds at %s: %s', async (path, shown) => {
    expect(await shownAt(path, done(BUILDER))).toBe(shown);
  });

  test('a server out of reach is said, with a way to try again', async () => {
    jest.useFakeTimers({ doNotFake: ['setImmediate', 'queueMicrotask'] });
    await shownAt('/people', 'unreachable');
    // The two repetitions of a query wait one second, then two.
    for (let second = 0; second < 4; second += 1) {
      jest.advanceTimersByTime(1000);
      await settle();
    }
    jest.useRealTimers();
    expect(screen.getByRole('alert').textContent).toContain('The server did not answer');
    expect(screen.getByRole('button', { name: 'Try again' })).toBeTruthy();
  });
});
