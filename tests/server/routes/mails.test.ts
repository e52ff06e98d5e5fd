import { startMailCatcher, type MailCatcher } from '@/server/local/mail-catcher';
import { createMailer } from '@/server/mail/mailer';
import { CaughtMail } from '@/server/models/caught-mail';
import { mailListSchema } from '@/shared/api/session';
import { buildMember, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
let catcher: MailCatcher;
beforeAll(async () => {
  server = await startTestServer({ demo: true });
  catcher = await startMailCatcher(async ({ recipient, subject, text }) => {
    await CaughtMail.create({ recipient, subject, body: text, receivedAt: new Date() });
  });
});
afterAll(async () => {
  await catcher.close();
  await server.stop();
});

test('a message that went through SMTP is read by a member of the demo as it was written', async () => {
  const mailer = createMailer(catcher.smtpUrl);
  const mail = {
    to: 'somebody@example.com',
    subject: 'Eine Prüfung of a long subject that needs more than one encoded word to be carried: ΩλÖ',
    text: `First line\n\n.\nUmlaut ä, Ω\nhttp://127.0.0.1:8080/invitation/${'x'.repeat(60)}`,
    messageId: 'one',
  };
  await mailer.send(mail);
  mailer.close();
  const agent = await server.signIn(
    await buildMember(['installer'], { team: await buildTeam({ demo: true }) }),
  );
  const response = await agent.get('/api/mails');
  const { items } = mailListSchema.parse(response.body);
  expect(items).toHaveLength(1);
  expect(items[0]).toMatchObject({ to: mail.to, subject: mail.subject });
  expect(items[0]?.text.trimEnd()).toBe(mail.text);
});

test('mail is hidden from members of other teams and from visitors', async () => {
  const agent = await server.signIn(await buildMember(['administrator']));
  expect((await agent.get('/api/mails')).status).toBe(404);
  expect((await server.visitor().get('/api/mails')).status).toBe(401);
});

test('a mailer whose server is away says so, so that the task is tried again', async () => {
  const gone = await startMailCatcher(async () => undefined);
  await gone.close();
  const mailer = createMailer(gone.smtpUrl);
  await expect(
    mailer.send({ to: 'a@example.com', subject: 's', text: 't', messageId: 'm' }),
  ).rejects.toThrow();
  mailer.close();
});
