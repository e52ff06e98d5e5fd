import type { QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import type { commentListSchema } from '@/shared/api/comments';
import { mergeLiveComment } from './comments-cache';
import type { EditorTransport, LiveEvent } from './live-transport';
import { commentsKey } from './use-comments';
import { revisionsKey, settleRevision } from './use-revisions';

type CommentList = z.output<typeof commentListSchema>;

/** No right is taken from a live event: it was made for everybody. The list that is fetched next brings one's own. */
const NO_RIGHTS = { submit: false, return: false, freeze: false, comment: false } as const;

/** Brings what the line tells of a layout's comments and revisions into the cache; returns how to stop. */
export function followReview(
  client: QueryClient,
  transport: Pick<EditorTransport, 'listen'>,
  layoutId: string,
): () => void {
  return transport.listen((event) => applyReviewEvent(client, layoutId, event));
}

/** What one event of the line changes in the cache. */
export function applyReviewEvent(client: QueryClient, layoutId: string, event: LiveEvent): void {
  if (event.kind === 'comment' && event.layoutId === layoutId) {
    const { comment } = event;
    const key = commentsKey(
      comment.revisionId === null
        ? { kind: 'layout', layoutId }
        : { kind: 'revision', layoutId, revisionId: comment.revisionId },
    );
    const list = client.getQueryData<CommentList>(key);
    if (!list) return;
    const known = list.items.some((item) => item.id === comment.id);
    client.setQueryData<CommentList>(key, { items: [...mergeLiveComment(list.items, comment)] });
    if (!known) void client.invalidateQueries({ queryKey: key });
  } else if (event.kind === 'revision' && event.layoutId === layoutId) {
    settleRevision(client, { ...event.revision, abilities: NO_RIGHTS });
  } else if (event.kind === 'connected') {
    // While the line was down events passed by unheard.
    void client.invalidateQueries({ queryKey: commentsKey({ kind: 'layout', layoutId }) });
    void client.invalidateQueries({ queryKey: revisionsKey(layoutId) });
  }
}
