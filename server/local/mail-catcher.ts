import type { AddressInfo } from 'node:net';
import type { Readable } from 'node:stream';
import { SMTPServer } from 'smtp-server';
import { readPlainMail } from '../mail/read-plain-mail';

const SIZE_LIMIT_BYTES = 1024 * 1024;

/** A message as the catcher hands it over. */
export interface CaughtMessage {
  readonly recipient: string;
  readonly subject: string;
  readonly text: string;
}

/** A local SMTP server that keeps every message instead of sending it on. */
export interface MailCatcher {
  readonly smtpUrl: string;
  close(): Promise<void>;
}

/** Starts a catcher on a free port of 127.0.0.1; a message is acknowledged after `keep` is done. */
export async function startMailCatcher(
  keep: (message: CaughtMessage) => Promise<void>,
): Promise<MailCatcher> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    size: SIZE_LIMIT_BYTES,
    disableReverseLookup: true,
    onData: (stream, session, done) => {
      readAll(stream)
        .then(async (source) => {
          const { subject, text } = readPlainMail(source);
          for (const { address } of session.envelope.rcptTo)
            await keep({ recipient: address, subject, text });
        })
        .then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
    },
  });
  // A client that hangs up in the middle is no concern of the server's.
  server.on('error', () => undefined);
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(0, '127.0.0.1', () => resolve());
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

async function readAll(stream: Readable): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks).toString('utf8');
}
