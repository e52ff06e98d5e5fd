import { Pressable, View } from 'react-native';
import { line, space, target } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import type { WebPressState } from '@/components/ui/button';
import { Icon } from '@/components/ui/icon';
import { Text } from '@/components/ui/text';
import type { Comment } from '@/shared/api/comments';
import { CommentBalloon } from './comment-balloon';
import { CommentThreadActions } from './comment-thread-actions';
import { momentText } from './moment-text';

type CommentThreadProps = {
  readonly comment: Comment;
  /** What the balloon points at, in words. */
  readonly where: string;
  readonly open: boolean;
  readonly onToggle: () => void;
  /** On its way to the server. */
  readonly sending: boolean;
};

/** A line of the list of comments; open, it holds the whole thread and what can be done with it. */
export function CommentThread({ comment, where, open, onToggle, sending }: CommentThreadProps) {
  const { color } = useTheme();
  const resolved = comment.resolvedAt !== null;
  return (
    <View role="listitem" style={{ borderBottomWidth: line.hair, borderColor: color.rule }}>
      <Pressable
        role="button"
        aria-expanded={open}
        aria-label={summary(comment, where)}
        onPress={onToggle}
        style={({ pressed, hovered }: WebPressState) => ({
          flexDirection: 'row',
          gap: space.m,
          minHeight: target.large,
          alignItems: 'flex-start',
          paddingVertical: space.s,
          backgroundColor: pressed || hovered === true ? color.hover : 'transparent',
        })}
      >
        <CommentBalloon number={comment.number} resolved={resolved} chosen={open} />
        <View style={{ flex: 1, gap: space.hair }}>
          <Text variant="smallFigures" tone={open ? 'action' : 'soft'}>
            {where}
          </Text>
          <Text numberOfLines={open ? undefined : 2}>{comment.text}</Text>
          <Text variant="small" tone="soft">
            {`${comment.author.name}, ${momentText(comment.createdAt)}`}
          </Text>
          {sending ? (
            <Text variant="small" tone="soft" live="polite">
              Sending
            </Text>
          ) : null}
          {!open && comment.replies.length > 0 ? (
            <Text variant="small" tone="soft">
              {countReplies(comment)}
            </Text>
          ) : null}
          {comment.resolvedAt !== null ? <ResolvedLine comment={comment} at={comment.resolvedAt} /> : null}
        </View>
      </Pressable>
      {open ? (
        <View style={{ gap: space.m, paddingLeft: space.xxl + space.m, paddingBottom: space.l }}>
          {comment.replies.length > 0 ? (
            <View role="list" aria-label={`Replies to ${comment.number}`} style={{ gap: space.m }}>
              {comment.replies.map((reply) => (
                <View
                  key={reply.id}
                  role="listitem"
                  style={{
                    gap: space.hair,
                    paddingLeft: space.m,
                    borderLeftWidth: line.bold,
                    borderColor: color.rule,
                  }}
                >
                  <Text>{reply.text}</Text>
                  <Text variant="small" tone="soft">
                    {`${reply.author.name}, ${momentText(reply.createdAt)}`}
                  </Text>
                </View>
              ))}
            </View>
          ) : null}
          {sending ? null : <CommentThreadActions comment={comment} />}
        </View>
      ) : null}
    </View>
  );
}

function ResolvedLine({ comment, at }: { readonly comment: Comment; readonly at: string }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.xs }}>
      <Icon name="check" size="s" tone="action" />
      <Text variant="small" tone="action" style={{ flexShrink: 1 }}>
        {`Resolved${comment.resolvedBy === null ? '' : ` by ${comment.resolvedBy}`}, ${momentText(at)}`}
      </Text>
    </View>
  );
}

function countReplies(comment: Comment): string {
  return comment.replies.length === 1 ? '1 reply' : `${comment.replies.length} replies`;
}

function summary(comment: Comment, where: string): string {
  const state = comment.resolvedAt === null ? 'open' : 'resolved';
  return `Comment ${comment.number}, ${state}, ${where}, ${comment.author.name}: ${comment.text}. ${countReplies(comment)}`;
}
