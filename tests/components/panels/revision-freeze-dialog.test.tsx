import { fireEvent, screen } from '@testing-library/react';
import { RevisionFreezeDialog } from '@/components/panels/revision-freeze-dialog';
import { RenewalDialog } from '@/components/screens/renewal-dialog';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { buildRevision } from '@/tests/support/build-review';
import { kept } from '@/tests/support/kept-in-memory';
import { done, refused, renderSignedIn, SESSION, settle, StubApi } from '@/tests/support/stub-api';

jest.mock('idb-keyval', () => jest.requireActual('@/tests/support/kept-in-memory'));

const revision = buildRevision({ letter: 'B', state: 'in review' });
const FREEZE = `POST /api/revisions/${revision.id}/freeze`;
const frozen = done({ ...revision, state: 'frozen' });

async function openDialog(api: StubApi) {
  kept.clear();
  const onClose = jest.fn();
  await renderSignedIn(
    <>
      <RevisionFreezeDialog revision={revision} onClose={onClose} />
      <RenewalDialog />
    </>,
  );
  return { api, onClose };
}

const reason = () => screen.getByLabelText<HTMLTextAreaElement>('Reason');
const password = () => screen.getByLabelText<HTMLInputElement>('Your password');
const type = (field: HTMLElement, value: string) => fireEvent.change(field, { target: { value } });

async function press(name: string) {
  fireEvent.click(screen.getByRole('button', { name }));
  await settle();
}

describe('freezing a revision', () => {
  test('sends the reason and the password once, and closes', async () => {
    const { api, onClose } = await openDialog(new StubApi().prepare(FREEZE, frozen));
    type(reason(), 'Measured and agreed.');
    type(password(), 'a password of tests');
    await press('Freeze B');
    expect(api.sentTo(FREEZE)).toEqual([{ reason: 'Measured and agreed.', password: 'a password of tests' }]);
    expect(onClose).toHaveBeenCalledTimes(1);
  });

  test('asks for what is missing where it is missing, and sends nothing', async () => {
    const { api, onClose } = await openDialog(new StubApi());
    await press('Freeze B');
    expect(screen.getByText('Say why.')).toBeTruthy();
    expect(screen.getByText('Enter your password.')).toBeTruthy();
    expect(reason().getAttribute('aria-invalid')).toBe('true');
    expect(api.sentTo(FREEZE)).toEqual([]);
    expect(onClose).not.toHaveBeenCalled();
  });

  test('says at the password that it is wrong, and keeps the reason', async () => {
    const answer = refused('wrong-password', 'The password is not right.');
    await openDialog(new StubApi().prepare(FREEZE, answer));
    type(reason(), 'Measured and agreed.');
    type(password(), 'not it');
    await press('Freeze B');
    expect(screen.getByText('This is not your password. Nothing was frozen.')).toBeTruthy();
    expect(password().getAttribute('aria-invalid')).toBe('true');
    expect(reason().value).toBe('Measured and agreed.');
  });

  test('shows a refusal of the whole in its own words', async () => {
    const answer = refused('own-submission', 'You submitted this revision: somebody else freezes it.');
    const { onClose } = await openDialog(new StubApi().prepare(FREEZE, answer));
    type(reason(), 'Agreed.');
    type(password(), 'a password of tests');
    await press('Freeze B');
    expect(screen.getByRole('alert').textContent).toContain('somebody else freezes it');
    expect(onClose).not.toHaveBeenCalled();
  });

  test('keeps everything while the server cannot be reached, and works at the next try', async () => {
    const { onClose } = await openDialog(new StubApi().prepare(FREEZE, 'unreachable', frozen));
    type(reason(), 'Agreed.');
    type(password(), 'a password of tests');
    await press('Freeze B');
    expect(screen.getByRole('alert').textContent).toContain('nothing typed is lost');
    expect([reason().value, password().value]).toEqual(['Agreed.', 'a password of tests']);
    await press('Freeze B');
    expect(onClose).toHaveBeenCalledTimes(1);
  });

  test('goes on after the session ran out: the password once more, in place, and it is sent again', async () => {
    const expired = refused('not-signed-in', 'Sign in first.');
    const api = new StubApi().prepare(FREEZE, expired, frozen).prepare('POST /api/session', done(SESSION));
    const { onClose } = await openDialog(api);
    type(reason(), 'Agreed.');
    type(password(), 'a password of tests');
    await press('Freeze B');
    expect(screen.getByRole('dialog', { name: 'Sign in again' })).toBeTruthy();
    type(screen.getByLabelText('Password'), 'a password of tests');
    await press('Sign in');
    expect(api.sentTo(FREEZE)).toHaveLength(2);
    expect(api.sentTo(FREEZE)[1]).toEqual(api.sentTo(FREEZE)[0]);
    expect(onClose).toHaveBeenCalledTimes(1);
  });

  test('finds the half-written reason again after a reload', async () => {
    new StubApi();
    kept.clear();
    kept.set(`draft:${SESSION.member.id}:freeze:${revision.id}`, 'Measured and');
    await renderSignedIn(<RevisionFreezeDialog revision={revision} onClose={() => undefined} />);
    expect(reason().value).toBe('Measured and');
    expect(password().value).toBe('');
  });

  test('has no accessibility problem, before and after a refusal', async () => {
    await openDialog(new StubApi());
    expect(await accessibilityProblems()).toEqual([]);
    await press('Freeze B');
    expect(await accessibilityProblems()).toEqual([]);
  });
});
