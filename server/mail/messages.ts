/** The text of a message and its subject. */
export interface MessageText {
  readonly subject: string;
  readonly text: string;
}

const FAREWELL = 'If you did not expect this message, leave it alone: nothing happens without the link.';

/** An invitation into a team. */
export function writeInvitation(invitation: {
  readonly team: string;
  readonly invitedBy: string;
  readonly link: string;
  readonly expiresAt: Date;
}): MessageText {
  return {
    subject: `Invitation to ${oneLine(invitation.team)}`,
    text: [
      `${oneLine(invitation.invitedBy)} invites you to plan antenna layouts with ${oneLine(invitation.team)} in Elbowroom.`,
      '',
      'Open this link and choose a password:',
      invitation.link,
      '',
      `The link works once, until ${formatDay(invitation.expiresAt)}.`,
      FAREWELL,
    ].join('\n'),
  };
}

/** A way to a new password. */
export function writeNewPassword(reset: { readonly link: string; readonly minutes: number }): MessageText {
  return {
    subject: 'A new password for Elbowroom',
    text: [
      'Somebody, probably you, asked for a new password. Open this link to choose it:',
      reset.link,
      '',
      `The link works once, for ${reset.minutes} minutes.`,
      FAREWELL,
    ].join('\n'),
  };
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ');
}

function formatDay(date: Date): string {
  return `${date.toISOString().slice(0, 16).replace('T', ' ')} UTC`;
}
