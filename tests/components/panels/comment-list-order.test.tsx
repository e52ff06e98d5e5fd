import { countComments, filterComments } from '@/components/panels/comment-list-order';
import { buildComment } from '../../support/build-review';

const resolved = { resolvedAt: '2031-03-05T08:00:00.000Z', resolvedBy: 'Ina Integrator' };
const comments = [
  buildComment({ number: 3 }),
  buildComment({ number: 1, ...resolved }),
  buildComment({ number: 2 }),
];
const numbers = (filter: 'open' | 'resolved' | 'all') =>
  filterComments(comments, filter).map((comment) => comment.number);

test('open shows what nobody has resolved, by number', () => {
  expect(numbers('open')).toEqual([2, 3]);
});

test('resolved shows the rest, and all shows everything', () => {
  expect(numbers('resolved')).toEqual([1]);
  expect(numbers('all')).toEqual([1, 2, 3]);
});

test('the counts are the lengths of the lists', () => {
  expect(countComments(comments)).toEqual({ open: 2, resolved: 1, all: 3 });
  expect(countComments([])).toEqual({ open: 0, resolved: 0, all: 0 });
});

test('filtering leaves the list itself as it was', () => {
  filterComments(comments, 'all');
  expect(comments.map((comment) => comment.number)).toEqual([3, 1, 2]);
});
