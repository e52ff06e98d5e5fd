import type { CaughtMail } from '../models/caught-mail';
import type { Mail } from '@/shared/api/session';

/** A message that the mail catcher kept. */
export function presentMail(mail: CaughtMail): Mail {
  return {
    id: String(mail.id),
    to: mail.recipient,
    subject: mail.subject,
    text: mail.body,
    receivedAt: mail.receivedAt.toISOString(),
  };
}
