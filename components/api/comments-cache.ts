import type { Comment } from '@/shared/api/comments';

const NOTHING: Comment['abilities'] = { reply: false, resolve: false };

/** Puts a comment that is new or changed into a list; the list keeps the order of its numbers. */
export function upsertComment(items: readonly Comment[], comment: Comment): readonly Comment[] {
  const known = items.some((item) => item.id === comment.id);
  const next = known ? items.map((item) => (item.id === comment.id ? comment : item)) : [...items, comment];
  return [...next].sort((a, b) => a.number - b.number);
}

/** Takes one that was only shown in advance out of a list again. */
export function withoutComment(items: readonly Comment[], commentId: string): readonly Comment[] {
  return items.filter((item) => item.id !== commentId);
}

/**
 * What arrives over the line is the thread as it stands for everybody; what I may do with it is my own: it is kept
 * from what was known before, and nothing is granted for a comment never seen until the list is fetched.
 */
export function mergeLiveComment(items: readonly Comment[], comment: Comment): readonly Comment[] {
  const before = items.find((item) => item.id === comment.id);
  return upsertComment(items, { ...comment, abilities: before?.abilities ?? NOTHING });
}

/** The number that the next balloon of a layout probably gets; the server decides. */
export function expectedNumber(items: readonly Comment[]): number {
  return items.reduce((most, item) => Math.max(most, item.number), 0) + 1;
}
