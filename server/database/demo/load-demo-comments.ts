import { CommentReplyRow } from '../../models/comment-reply-row';
import { CommentRow } from '../../models/comment-row';
import { decodeDocument } from '../../models/document-codec';
import type { Layout } from '../../models/layout';
import type { CommentTarget } from '@/shared/api/comments';
import { DEMO_COMMENTS, type DemoComment } from './demo-comments';
import type { DemoContext } from './demo-context';
import { findDemoLayout } from './find-demo-layout';

/** Puts the demo's comments on its layouts; nobody gets mail for them. */
export async function loadDemoComments(context: DemoContext): Promise<void> {
  const { team, member, transaction } = context;
  // A millisecond apart, so that threads keep their order.
  let time = Date.now() - 1000;
  const next = () => new Date((time += 1));
  for (const comment of DEMO_COMMENTS) {
    const { layout } = await findDemoLayout(context, comment.job);
    const number = layout.commentCount + 1;
    await layout.update({ commentCount: number }, { transaction });
    const createdAt = next();
    const row = await CommentRow.create(
      {
        teamId: team.id,
        layoutId: layout.id,
        number,
        target: JSON.stringify(targetOf(comment, layout)),
        text: comment.text,
        authorId: member(comment.by).id,
        createdAt,
      },
      { transaction },
    );
    for (const { by, text } of comment.replies) {
      await CommentReplyRow.create(
        { commentId: row.id, text, authorId: member(by).id, createdAt: next() },
        { transaction },
      );
    }
    if (comment.resolvedBy !== null) {
      const resolved = { resolvedAt: next(), resolvedById: member(comment.resolvedBy).id };
      await row.update(resolved, { transaction });
    }
  }
}

function targetOf({ target }: DemoComment, layout: Layout): CommentTarget {
  if (target.kind === 'spot') return target;
  const antennas = Object.values(decodeDocument(layout.document).antennas);
  const antenna = antennas.find(({ label }) => label === target.label);
  if (antenna === undefined) throw new Error(`the demo has no antenna ${target.label}`);
  return { kind: 'antenna', antennaId: antenna.id, label: antenna.label };
}
