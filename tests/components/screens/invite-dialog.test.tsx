import { fireEvent, screen } from '@testing-library/react';
import { InviteDialog } from '@/components/screens/invite-dialog';
import { RenewalDialog } from '@/components/screens/renewal-dialog';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { kept } from '@/tests/support/kept-in-memory';
import { done, refused, renderSignedIn, SESSION, settle, StubApi } from '@/tests/support/stub-api';

jest.mock('idb-keyval', () => jest.requireActual('@/tests/support/kept-in-memory'));

const INVITE = 'POST /api/invitations';
const DRAFT = `draft:${SESSION.member.id}:invite`;

async function openDialog(api: StubApi) {
  const onClose = jest.fn();
  await renderSignedIn(
    <>
      <InviteDialog onClose={onClose} />
      <RenewalDialog />
    </>,
  );
  return { api, onClose };
}

const email = () => screen.getByLabelText<HTMLInputElement>('E-mail');
const type = (field: HTMLElement, value: string) => fireEvent.change(field, { target: { value } });

async function press(name: string) {
  fireEvent.click(screen.getByRole('button', { name }));
  await settle();
}

describe('inviting somebody', () => {
  beforeEach(() => kept.clear());

  test('sends the address and the roles once, and closes', async () => {
    const { api, onClose } = await openDialog(new StubApi().prepare(INVITE, done({}, 201)));
    type(email(), 'new@example.com');
    fireEvent.click(screen.getByRole('checkbox', { name: /Reviewer/ }));
    await press('Send the invitation');
    expect(api.sentTo(INVITE)).toEqual([{ email: 'new@example.com', roles: ['reviewer'] }]);
    expect(onClose).toHaveBeenCalledTimes(1);
  });

  test('says at each field what is wrong, stands in the first of them, and sends nothing', async () => {
    const { api, onClose } = await openDialog(new StubApi());
    type(email(), 'nobody');
    await press('Send the invitation');
    expect(screen.getByText('This is not an e-mail address.')).toBeTruthy();
    expect(screen.getByText('Needs at least one role.')).toBeTruthy();
    expect(document.activeElement).toBe(email());
    expect(email().value).toBe('nobody');
    expect(api.sentTo(INVITE)).toEqual([]);
    expect(onClose).not.toHaveBeenCalled();
  });

  test("puts the server's problem at its field", async () => {
    const answer = refused('invalid', 'The request is not valid.', [
      { path: 'body.email', message: 'is a member already' },
    ]);
    await openDialog(new StubApi().prepare(INVITE, answer));
    type(email(), 'old@example.com');
    fireEvent.click(screen.getByRole('checkbox', { name: /Reviewer/ }));
    await press('Send the invitation');
    expect(screen.getByText('This is a member already.')).toBeTruthy();
    expect(email().getAttribute('aria-invalid')).toBe('true');
  });

  test('takes up what was typed before a reload', async () => {
    kept.set(DRAFT, { email: 'half@exam', roles: ['installer'] });
    await openDialog(new StubApi());
    expect(email().value).toBe('half@exam');
    expect(screen.getByRole('checkbox', { name: /Installer/ }).getAttribute('aria-checked')).toBe('true');
  });

  test.each([
    ['of another shape', { email: 7, roles: 'installer' }],
    ['of nothing', null],
    ['that is text', 'half'],
  ])('begins empty with a draft %s', async (_what, draft) => {
    kept.set(DRAFT, draft);
    await openDialog(new StubApi());
    expect(email().value).toBe('');
  });

  test('forgets the draft once the invitation is sent', async () => {
    kept.set(DRAFT, { email: 'new@example.com', roles: ['reviewer'] });
    await openDialog(new StubApi().prepare(INVITE, done({}, 201)));
    await press('Send the invitation');
    expect(kept.has(DRAFT)).toBe(false);
  });

  test('keeps everything while the session is renewed, then sends it', async () => {
    const expired = refused('not-signed-in', 'Sign in first.');
    const api = new StubApi()
      .prepare(INVITE, expired, done({}, 201))
      .prepare('POST /api/session', done(SESSION));
    const { onClose } = await openDialog(api);
    type(email(), 'new@example.com');
    fireEvent.click(screen.getByRole('checkbox', { name: /Reviewer/ }));
    await press('Send the invitation');
    type(screen.getByLabelText('Password'), 'a password of tests');
    await press('Sign in');
    expect(api.sentTo(INVITE)).toHaveLength(2);
    expect(onClose).toHaveBeenCalledTimes(1);
  });

  test('has nothing that axe objects to', async () => {
    await openDialog(new StubApi());
    await press('Send the invitation');
    expect(await accessibilityProblems()).toEqual([]);
  });
});
