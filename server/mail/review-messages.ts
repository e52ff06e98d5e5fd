import type { MessageText } from './messages';

/** What a layout is called in a message: job, platform and layout. */
export interface LayoutNames {
  readonly job: string;
  readonly platform: string;
  readonly layout: string;
}

/** A new comment, or an answer to one. */
export function writeComment(comment: {
  readonly names: LayoutNames;
  readonly number: number;
  readonly author: string;
  readonly about: string;
  readonly text: string;
  readonly isReply: boolean;
  readonly link: string;
}): MessageText {
  const verb = comment.isReply ? 'answered comment' : 'made comment';
  return {
    subject: oneLine(`Comment ${comment.number} on ${comment.names.job}, ${comment.names.layout}`),
    text: [
      oneLine(`${comment.author} ${verb} ${comment.number} ${comment.about}, ${listNames(comment.names)}:`),
      '',
      comment.text,
      '',
      comment.link,
    ].join('\n'),
  };
}

/** A revision that waits for an approver. */
export function writeSubmitted(revision: {
  readonly names: LayoutNames;
  readonly letter: string;
  readonly by: string;
  readonly link: string;
}): MessageText {
  return {
    subject: oneLine(
      `Revision ${revision.letter} of ${revision.names.job}, ${revision.names.layout} is in review`,
    ),
    text: [
      oneLine(`${revision.by} submitted revision ${revision.letter} of ${listNames(revision.names)}.`),
      'It waits for an approver to freeze or return it.',
      '',
      revision.link,
    ].join('\n'),
  };
}

/** What an approver decided. */
export function writeDecision(revision: {
  readonly names: LayoutNames;
  readonly letter: string;
  readonly decision: 'returned' | 'frozen';
  readonly by: string;
  readonly reason: string;
  readonly link: string;
}): MessageText {
  const verb = revision.decision === 'frozen' ? 'froze' : 'returned';
  return {
    subject: oneLine(
      `Revision ${revision.letter} of ${revision.names.job}, ${revision.names.layout} is ${revision.decision}`,
    ),
    text: [
      oneLine(`${revision.by} ${verb} revision ${revision.letter} of ${listNames(revision.names)}:`),
      '',
      revision.reason,
      '',
      revision.link,
    ].join('\n'),
  };
}

function listNames({ job, platform, layout }: LayoutNames): string {
  return `${job}, ${platform}, ${layout}`;
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ');
}
