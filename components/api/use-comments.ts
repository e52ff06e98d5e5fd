import { useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  commentListSchema,
  commentSchema,
  type Comment,
  type commentRequest,
  type replyRequest,
} from '@/shared/api/comments';
import { expectedNumber, upsertComment, withoutComment } from './comments-cache';
import { request } from './request';
import { useSession } from './session-provider';

/** What comments hang on: the working layout, or one revision of it. */
export type CommentSubject =
  | { readonly kind: 'layout'; readonly layoutId: string }
  | { readonly kind: 'revision'; readonly layoutId: string; readonly revisionId: string };

type CommentList = z.output<typeof commentListSchema>;
type NewComment = z.input<typeof commentRequest>;
type NewReply = z.input<typeof replyRequest>;

/** Key of a list of comments in the cache. */
export function commentsKey(subject: CommentSubject): readonly string[] {
  return subject.kind === 'layout'
    ? ['comments', 'layout', subject.layoutId]
    : ['comments', 'revision', subject.revisionId];
}

/** The comments of a layout or a revision, by number. */
export function useComments(subject: CommentSubject) {
  return useQuery({
    queryKey: commentsKey(subject),
    queryFn: ({ signal }) => request('GET', listPathOf(subject), { schema: commentListSchema, signal }),
  });
}

/** Sends a new comment: it is in the list at once, and taken out again when the server refuses it. */
export function useSendComment(subject: CommentSubject) {
  const client = useQueryClient();
  const { member } = useSession();
  const key = commentsKey(subject);
  return useMutation({
    mutationFn: (body: NewComment) => request('POST', listPathOf(subject), { body, schema: commentSchema }),
    onMutate: async (body) => {
      await client.cancelQueries({ queryKey: key });
      const items = client.getQueryData<CommentList>(key)?.items ?? [];
      const shown: Comment = {
        id: body.id,
        layoutId: subject.layoutId,
        revisionId: subject.kind === 'revision' ? subject.revisionId : null,
        number: expectedNumber(items),
        target: body.target,
        text: body.text.trim(),
        author: { id: member.id, name: member.name, initials: member.initials },
        createdAt: new Date().toISOString(),
        resolvedAt: null,
        resolvedBy: null,
        replies: [],
        abilities: { reply: false, resolve: false },
      };
      changeList(client, key, (list) =>
        list.some((item) => item.id === shown.id) ? list : upsertComment(list, shown),
      );
      return { shown };
    },
    onError: (_error, _body, context) => {
      if (!context) return;
      const { id, createdAt } = context.shown;
      // Only what is still the one shown in advance: it may have arrived although its answer got lost.
      changeList(client, key, (list) =>
        list.some((item) => item.id === id && item.createdAt === createdAt) ? withoutComment(list, id) : list,
      );
    },
    onSuccess: (comment) => changeList(client, key, (list) => upsertComment(list, comment)),
  });
}

/** Sends a reply to a comment; the server answers with the whole thread. */
export function useSendReply(comment: Comment) {
  const client = useQueryClient();
  const { member } = useSession();
  return useMutation({
    mutationFn: (body: NewReply) =>
      request('POST', `${commentPath(comment)}/replies`, { body, schema: commentSchema }),
    onMutate: (body) => {
      const createdAt = new Date().toISOString();
      const author = { id: member.id, name: member.name, initials: member.initials };
      const reply = { id: body.id, text: body.text.trim(), author, createdAt };
      changeThread(client, comment.id, (thread) =>
        thread.replies.some((item) => item.id === reply.id)
          ? thread
          : { ...thread, replies: [...thread.replies, reply] },
      );
      return { createdAt };
    },
    onError: (_error, body, context) => {
      changeThread(client, comment.id, (thread) => ({
        ...thread,
        replies: thread.replies.filter(
          (reply) => reply.id !== body.id || reply.createdAt !== context?.createdAt,
        ),
      }));
    },
    onSuccess: (answer) => changeThread(client, comment.id, () => answer),
  });
}

/** Resolves a comment or opens it again. */
export function useResolveComment(comment: Comment) {
  const client = useQueryClient();
  const { member } = useSession();
  return useMutation({
    mutationFn: (resolved: boolean) =>
      request('PATCH', commentPath(comment), { body: { resolved }, schema: commentSchema }),
    onMutate: (resolved) => {
      const before = { resolvedAt: comment.resolvedAt, resolvedBy: comment.resolvedBy };
      changeThread(client, comment.id, (thread) => ({
        ...thread,
        resolvedAt: resolved ? new Date().toISOString() : null,
        resolvedBy: resolved ? member.name : null,
      }));
      return { before };
    },
    onError: (_error, _resolved, context) => {
      const before = context?.before;
      if (before) changeThread(client, comment.id, (thread) => ({ ...thread, ...before }));
    },
    onSuccess: (answer) => changeThread(client, comment.id, () => answer),
  });
}

function listPathOf(subject: CommentSubject): string {
  return subject.kind === 'layout'
    ? `/api/layouts/${encodeURIComponent(subject.layoutId)}/comments`
    : `/api/revisions/${encodeURIComponent(subject.revisionId)}/comments`;
}

function commentPath(comment: Comment): string {
  return `/api/comments/${encodeURIComponent(comment.id)}`;
}

function changeList(
  client: QueryClient,
  key: readonly string[],
  change: (items: readonly Comment[]) => readonly Comment[],
): void {
  client.setQueryData<CommentList>(key, (list) => ({ items: [...change(list?.items ?? [])] }));
}

/** Changes a thread in every list that shows it. */
function changeThread(client: QueryClient, commentId: string, change: (thread: Comment) => Comment): void {
  client.setQueriesData<CommentList>({ queryKey: ['comments'] }, (list) =>
    list ? { items: list.items.map((item) => (item.id === commentId ? change(item) : item)) } : list,
  );
}
