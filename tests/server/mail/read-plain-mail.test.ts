import { readPlainMail } from '@/server/mail/read-plain-mail';

const message = (headers: string, body: string) => `${headers}\r\n\r\n${body}`;

test('a plain message is read as it is', () => {
  expect(readPlainMail(message('Subject: plain', 'first\r\n\r\nsecond'))).toEqual({
    subject: 'plain',
    text: 'first\n\nsecond',
  });
});

test('base64 and quoted-printable bodies are decoded', () => {
  const encoded = Buffer.from('Ωλ ä').toString('base64');
  expect(readPlainMail(message('Content-Transfer-Encoding: base64', encoded)).text).toBe('Ωλ ä');
  expect(readPlainMail(message('Content-Transfer-Encoding: quoted-printable', 'a=\r\nb =C3=A4')).text).toBe(
    'ab ä',
  );
});

test('encoded words of a folded subject are joined', () => {
  const subject = 'Subject: =?UTF-8?Q?one_=C3=A4?=\r\n =?UTF-8?B?IHR3bw==?=';
  expect(readPlainMail(message(subject, '')).subject).toBe('one ä two');
});
