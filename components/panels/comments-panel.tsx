import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useCommentDraft } from '@/components/api/use-comment-draft';
import { useComments, useSendComment, type CommentSubject } from '@/components/api/use-comments';
import { usePreferences } from '@/components/theme/preferences';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { CommentTarget } from '@/shared/api/comments';
import type { LayoutDocument } from '@/shared/layout/document';
import { CommentComposer } from './comment-composer';
import { countComments, filterComments, type CommentFilter } from './comment-list-order';
import { CommentTargetPicker } from './comment-target-picker';
import { describeTarget } from './comment-target-words';
import { refusalText, textProblem } from './comment-text-problem';
import { CommentThread } from './comment-thread';

export type CommentsPanelProps = {
  readonly subject: CommentSubject;
  /** Names what the balloons point at; null until it is there. */
  readonly document: LayoutDocument | null;
  readonly canComment: boolean;
  /** The balloon that is chosen on the drawing; its thread is open. */
  readonly selectedId: string | null;
  readonly onSelect: (commentId: string | null) => void;
  /** What was pointed at on the drawing for a new comment; null when nothing was. */
  readonly target: CommentTarget | null;
  readonly onTargetChange: (target: CommentTarget | null) => void;
  /** Starts choosing a spot on the drawing. */
  readonly onPickSpot?: () => void;
};

/** The balloons of a layout or of a revision as a list of threads, and where a new one is written. */
export function CommentsPanel(props: CommentsPanelProps) {
  const { subject, document, canComment, selectedId, onSelect } = props;
  const { lengthUnit } = usePreferences();
  const query = useComments(subject);
  const send = useSendComment(subject);
  const [filter, setFilter] = useState<CommentFilter>('open');
  const sendingId = send.isPending ? send.variables.id : null;

  const items = query.data?.items ?? [];
  const counts = countComments(items);
  const shown = filterComments(items, filter);
  // A balloon that is chosen on the drawing is shown whatever the filter says.
  const chosen = items.find((item) => item.id === selectedId);
  const list = chosen && !shown.includes(chosen) ? filterComments([...shown, chosen], 'all') : shown;

  return (
    <View style={{ gap: space.l }}>
      {canComment ? <NewComment {...props} send={send} /> : null}
      {query.isPending ? (
        <LoadingState label="Fetching the comments" />
      ) : query.isError && items.length === 0 ? (
        <ErrorState
          title="The comments did not arrive"
          text={describeError(query.error)}
          onRetry={() => void query.refetch()}
        />
      ) : items.length === 0 ? (
        <EmptyState title="No comments yet" text={emptyText(subject, canComment)} icon="comment" />
      ) : (
        <>
          <Choice
            label="Comments shown"
            labelHidden
            value={filter}
            onChange={setFilter}
            options={[
              { value: 'open', label: `Open ${counts.open}` },
              { value: 'resolved', label: `Resolved ${counts.resolved}` },
              { value: 'all', label: `All ${counts.all}` },
            ]}
          />
          {list.length === 0 ? (
            <Text tone="soft">
              {filter === 'open' ? 'Every comment is resolved.' : 'No comment has been resolved yet.'}
            </Text>
          ) : (
            <View role="list" aria-label="Comments">
              {list.map((comment) => (
                <CommentThread
                  key={comment.id}
                  comment={comment}
                  where={describeTarget(comment.target, document, lengthUnit)}
                  open={comment.id === selectedId}
                  onToggle={() => onSelect(comment.id === selectedId ? null : comment.id)}
                  sending={comment.id === sendingId}
                />
              ))}
            </View>
          )}
        </>
      )}
    </View>
  );
}

type NewCommentProps = CommentsPanelProps & { readonly send: ReturnType<typeof useSendComment> };

function NewComment({
  subject,
  document,
  target,
  onTargetChange,
  onPickSpot,
  onSelect,
  send,
}: NewCommentProps) {
  const name = subject.kind === 'layout' ? subject.layoutId : subject.revisionId;
  const { draft, change, clear } = useCommentDraft(`comment:${name}`);
  const { lengthUnit } = usePreferences();
  const [writing, setWriting] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const pointed = target ?? draft?.target ?? null;
  const text = draft?.text ?? '';

  const submit = () => {
    const wrong = pointed === null ? 'Choose what the comment points at.' : textProblem(text);
    setProblem(wrong);
    if (wrong !== null || pointed === null || send.isPending) return;
    const { id } = change({ target: pointed });
    send.mutate(
      { id, target: pointed, text },
      {
        onSuccess: (comment) => {
          finish();
          onSelect(comment.id);
        },
      },
    );
  };
  const finish = () => {
    clear();
    setWriting(false);
    setProblem(null);
    onTargetChange(null);
  };

  if (!writing && draft === null && target === null) {
    return <Button label="Write a comment" icon="comment" onPress={() => setWriting(true)} />;
  }
  const label = pointed ? `Comment on ${describeTarget(pointed, document, lengthUnit)}` : 'Comment';
  return (
    <CommentComposer
      label={label}
      text={text}
      onTextChange={(next) => change({ text: next, target: pointed })}
      sendLabel="Send comment"
      onSend={submit}
      onDiscard={() => {
        send.reset();
        finish();
      }}
      error={problem ?? refusalText(send.error)}
      busy={send.isPending}
    >
      <CommentTargetPicker
        target={pointed}
        document={document}
        onPickSpot={onPickSpot}
        onChange={(next) => {
          change({ target: next });
          onTargetChange(next);
        }}
      />
    </CommentComposer>
  );
}

function emptyText(subject: CommentSubject, canComment: boolean): string {
  const what = subject.kind === 'layout' ? 'layout' : 'revision';
  return canComment
    ? `A comment is a numbered balloon that points at a spot or an antenna of this ${what}. Everybody who looks at it sees it at once.`
    : `Nobody has commented on this ${what}.`;
}
