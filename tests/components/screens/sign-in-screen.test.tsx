import { fireEvent, render, screen } from '@testing-library/react';
import { QueryClientProvider } from '@tanstack/react-query';
import { createQueryClient } from '@/components/api/query-client';
import { SessionProvider } from '@/components/api/session-provider';
import { SignInScreen } from '@/components/screens/sign-in-screen';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { done, refused, SESSION, settle, StubApi } from '@/tests/support/stub-api';

jest.mock('idb-keyval', () => jest.requireActual('@/tests/support/kept-in-memory'));
jest.mock('expo-router', () => ({
  useRouter: () => ({ push: jest.fn() }),
  Redirect: ({ href }: { readonly href: string }) => `to ${href}`,
  Link: ({ href, children }: { readonly href: string; readonly children: string }) => (
    <a href={href}>{children}</a>
  ),
}));

const SIGN_IN = 'POST /api/session';
const READY = { state: 'ready', demo: false, demoAccounts: [] };
const ACCOUNT = {
  name: 'Ada Approver',
  email: 'ada@example.com',
  password: 'shown by the demo',
  roles: ['approver', 'reviewer'],
};

async function openScreen(api: StubApi, setup: object = READY) {
  api.prepare('GET /api/session', refused('not-signed-in', 'Sign in first.'));
  api.prepare('GET /api/setup', done(setup));
  render(
    <QueryClientProvider client={createQueryClient()}>
      <SessionProvider>
        <SignInScreen />
      </SessionProvider>
    </QueryClientProvider>,
  );
  await settle();
  return api;
}

const email = () => screen.getByLabelText<HTMLInputElement>('E-mail');
const password = () => screen.getByLabelText<HTMLInputElement>('Password');
const type = (field: HTMLElement, value: string) => fireEvent.change(field, { target: { value } });

async function press(name: string | RegExp) {
  fireEvent.click(screen.getByRole('button', { name }));
  await settle();
}

describe('signing in', () => {
  test('sends what was typed', async () => {
    const api = await openScreen(new StubApi().prepare(SIGN_IN, done(SESSION)));
    type(email(), 'ada@example.com');
    type(password(), 'a password of tests');
    await press('Sign in');
    expect(api.sentTo(SIGN_IN)).toEqual([{ email: 'ada@example.com', password: 'a password of tests' }]);
  });

  test('keeps what was typed when it is refused, and says why', async () => {
    const answer = refused('wrong-credentials', 'This e-mail address and password do not belong together.');
    await openScreen(new StubApi().prepare(SIGN_IN, answer));
    type(email(), 'ada@example.com');
    type(password(), 'not it');
    await press('Sign in');
    expect(screen.getByRole('alert').textContent).toContain('do not belong together');
    expect([email().value, password().value]).toEqual(['ada@example.com', 'not it']);
  });

  test('asks for what is missing where it is missing, and sends nothing', async () => {
    const api = await openScreen(new StubApi());
    await press('Sign in');
    expect(screen.getByText('This is not an e-mail address.')).toBeTruthy();
    expect(screen.getByText('This is empty.')).toBeTruthy();
    expect(document.activeElement).toBe(email());
    expect(api.sentTo(SIGN_IN)).toEqual([]);
  });

  test('hides the password until it is asked for', async () => {
    await openScreen(new StubApi());
    expect(password().type).toBe('password');
    await press('Show the password');
    expect(password().type).toBe('text');
  });

  test('offers nobody outside of the demo', async () => {
    await openScreen(new StubApi());
    expect(screen.queryByText('Or look around as')).toBeNull();
  });

  test('takes one press in the demo', async () => {
    const setup = { state: 'ready', demo: true, demoAccounts: [ACCOUNT] };
    const api = await openScreen(new StubApi().prepare(SIGN_IN, done(SESSION)), setup);
    await press(/^Approver, reviewer.*Ada Approver$/);
    expect(api.sentTo(SIGN_IN)).toEqual([{ email: ACCOUNT.email, password: ACCOUNT.password }]);
  });

  test('leads to the first visit while there is no team', async () => {
    await openScreen(new StubApi(), { state: 'first-visit', demo: false, demoAccounts: [] });
    expect(document.body.textContent).toBe('to /setup');
  });

  test('has nothing that axe objects to', async () => {
    await openScreen(new StubApi(), { state: 'ready', demo: true, demoAccounts: [ACCOUNT] });
    await press('Sign in');
    expect(await accessibilityProblems()).toEqual([]);
  });
});
