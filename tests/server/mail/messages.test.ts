import { writeInvitation, writeNewPassword } from '@/server/mail/messages';

test('an invitation names team, inviter, link and end', () => {
  const { subject, text } = writeInvitation({
    team: 'Workshop\nX',
    invitedBy: 'Somebody',
    link: 'http://127.0.0.1/invitation/t',
    expiresAt: new Date('2030-01-02T03:04:05Z'),
  });
  expect(subject).toBe('Invitation to Workshop X');
  expect(text).toContain('Somebody invites you');
  expect(text).toContain('\nhttp://127.0.0.1/invitation/t\n');
  expect(text).toContain('2030-01-02 03:04 UTC');
});

test('a message about a new password says how long its link works', () => {
  expect(writeNewPassword({ link: 'http://x/password/t', minutes: 60 }).text).toContain('60 minutes');
});
