import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useCommentDraft } from '@/components/api/use-comment-draft';
import { useResolveComment, useSendReply } from '@/components/api/use-comments';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { Comment } from '@/shared/api/comments';
import { CommentComposer } from './comment-composer';
import { refusalText, textProblem } from './comment-text-problem';

/** What can be done with a thread: reply, resolve, open again. */
export function CommentThreadActions({ comment }: { readonly comment: Comment }) {
  const { draft, change, clear } = useCommentDraft(`reply:${comment.id}`);
  const reply = useSendReply(comment);
  const resolve = useResolveComment(comment);
  const [replying, setReplying] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const resolved = comment.resolvedAt !== null;
  const text = draft?.text ?? '';

  const send = () => {
    const wrong = textProblem(text);
    setProblem(wrong);
    if (wrong !== null || reply.isPending) return;
    const { id } = change({});
    reply.mutate(
      { id, text },
      {
        onSuccess: () => {
          clear();
          setReplying(false);
        },
      },
    );
  };
  const discard = () => {
    clear();
    reply.reset();
    setProblem(null);
    setReplying(false);
  };

  const writes = comment.abilities.reply && (replying || draft !== null);
  return (
    <View style={{ gap: space.m }}>
      {writes ? (
        <CommentComposer
          label={`Reply to ${comment.number}`}
          text={text}
          onTextChange={(next) => change({ text: next })}
          sendLabel="Send reply"
          onSend={send}
          onDiscard={discard}
          error={problem ?? refusalText(reply.error)}
          busy={reply.isPending}
          autoFocus={replying}
        />
      ) : null}
      {resolve.error ? (
        <Notice kind="error" text={describeError(resolve.error)} onClose={resolve.reset} />
      ) : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
        {comment.abilities.reply && !writes ? (
          <Button label="Reply" icon="comment" onPress={() => setReplying(true)} />
        ) : null}
        {comment.abilities.resolve ? (
          <Button
            label={resolved ? 'Open again' : 'Resolve'}
            icon={resolved ? 'undo' : 'check'}
            busy={resolve.isPending}
            onPress={() => resolve.mutate(!resolved)}
          />
        ) : null}
      </View>
    </View>
  );
}
