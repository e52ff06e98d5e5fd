import {
  describeEvent,
  describeWorkingCopy,
  explainState,
  findFreeze,
  groupHash,
  orderRevisions,
  shortHash,
} from '@/components/panels/revision-words';
import { REVISION_STATES } from '@/shared/api/jobs';
import { REVISION_EVENTS } from '@/shared/api/revisions';
import { buildRevision } from '../../support/build-review';

const AT = '2031-03-04T09:15:00.000Z';

test('only a frozen revision is said to be built from', () => {
  for (const state of REVISION_STATES) {
    expect(explainState(state).includes('do not build') || explainState(state).includes('Do not build')).toBe(
      state !== 'frozen',
    );
  }
});

test('every kind of event names the person', () => {
  for (const kind of REVISION_EVENTS) {
    expect(describeEvent({ kind, by: 'Ann Approver', at: AT, reason: null })).toContain('Ann Approver');
  }
});

test('a hash is read in groups of four, and its short form is the first twelve digits', () => {
  const hash = '0123456789abcdef'.repeat(4);
  expect(shortHash(hash)).toBe('0123 4567 89ab');
  expect(groupHash(hash).replaceAll(' ', '')).toBe(hash);
  expect(groupHash('')).toBe('');
});

test('who froze it is found although a later one has superseded it', () => {
  const frozen = { kind: 'frozen', by: 'Ann Approver', at: AT, reason: 'agreed' } as const;
  const later = { kind: 'superseded', by: 'Bo Approver', at: AT, reason: null } as const;
  expect(findFreeze({ events: [frozen, later] })).toBe(frozen);
  expect(findFreeze({ events: [] })).toBeNull();
});

test('the newest revision comes first', () => {
  const a = buildRevision({ letter: 'A', savedAt: '2031-03-04T09:15:00.000Z' });
  const b = buildRevision({ letter: 'B', savedAt: '2031-03-05T09:15:00.000Z' });
  expect(orderRevisions([a, b]).map((revision) => revision.letter)).toEqual(['B', 'A']);
});

test('the working copy says how far it is from the last revision', () => {
  const a = buildRevision({ letter: 'A', sequence: 7 });
  expect(describeWorkingCopy([], 3).detail).toContain('No revision');
  expect(describeWorkingCopy([a], 7)).toEqual({
    title: 'Working copy, after A',
    detail: 'Nothing has changed since A.',
  });
  expect(describeWorkingCopy([a], 8).detail).toBe('1 change since A.');
  expect(describeWorkingCopy([a], 12).detail).toBe('5 changes since A.');
});
