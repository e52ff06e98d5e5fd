import {
  expectedNumber,
  mergeLiveComment,
  upsertComment,
  withoutComment,
} from '@/components/api/comments-cache';
import { upsertRevision } from '@/components/api/revisions-cache';
import { buildComment, buildRevision } from '../../support/build-review';

test('a new comment takes its place by number, a changed one keeps it', () => {
  const first = buildComment({ number: 1 });
  const third = buildComment({ number: 3 });
  const second = buildComment({ number: 2 });
  expect(upsertComment([first, third], second).map((item) => item.number)).toEqual([1, 2, 3]);
  const changed = { ...first, text: 'changed' };
  expect(upsertComment([first, third], changed)).toEqual([changed, third]);
});

test('a second arrival of the same comment changes nothing', () => {
  const comment = buildComment();
  expect(upsertComment(upsertComment([], comment), comment)).toEqual([comment]);
});

test('what was shown in advance can be taken back', () => {
  const kept = buildComment({ number: 1 });
  const gone = buildComment({ number: 2 });
  expect(withoutComment([kept, gone], gone.id)).toEqual([kept]);
});

test('a live event brings the text and keeps what I may do', () => {
  const mine = buildComment({ abilities: { reply: true, resolve: false } });
  const event = { ...mine, text: 'new', abilities: { reply: false, resolve: true } };
  expect(mergeLiveComment([mine], event)[0]).toEqual({ ...event, abilities: mine.abilities });
});

test('a live event about a comment never seen grants nothing until the list is fetched', () => {
  const event = buildComment({ abilities: { reply: true, resolve: true } });
  expect(mergeLiveComment([], event)[0]?.abilities).toEqual({ reply: false, resolve: false });
});

test('the next balloon is expected one past the highest', () => {
  expect(expectedNumber([])).toBe(1);
  expect(expectedNumber([buildComment({ number: 4 }), buildComment({ number: 2 })])).toBe(5);
});

test('a revision that changed its state replaces its line, newest first', () => {
  const a = buildRevision({ letter: 'A', sequence: 3 });
  const b = buildRevision({ letter: 'B', sequence: 9 });
  const returned = { ...a, state: 'returned' as const };
  expect(upsertRevision([b, a], returned)).toEqual([b, returned]);
  expect(upsertRevision([a], b)).toEqual([b, a]);
});
