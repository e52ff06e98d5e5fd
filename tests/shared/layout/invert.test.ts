import fc from 'fast-check';
import type { LayoutDocument } from '@/shared/layout/document';
import { invertOperation, lastWriter, undoFor } from '@/shared/layout/invert';
import type { Change, CommittedOperation, Operation } from '@/shared/layout/operation';
import { applyChange, applyOperation, collectionOf } from '@/shared/layout/operations';
import { misplacedAntennas } from '@/shared/layout/placement';
import { canonicalJson } from '@/shared/layout/revision-hash';
import {
  BARE_ROOF,
  idOf,
  operationFor,
  operationOf,
  plainRadio,
  someDocument,
  someIntents,
  whipAt,
} from './arbitrary-layout';

const runs = { seed: 41, numRuns: 600 };

function applied(document: LayoutDocument, changes: readonly Change[]): LayoutDocument {
  return changes.reduce((current, change) => {
    const result = applyChange(current, change);
    if (!result.ok) throw new Error(result.refusal.message);
    return result.value;
  }, document);
}

function accepted(document: LayoutDocument, operation: Operation): LayoutDocument | null {
  const result = applyOperation(document, operation);
  return result.ok ? result.value : null;
}

describe('the inverse of an operation', () => {
  test('restores the document, field by field', () => {
    let count = 0;
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const after = accepted(document, operation);
        if (!after) return true;
        count += 1;
        return (
          canonicalJson(applied(after, invertOperation(document, operation))) === canonicalJson(document)
        );
      }),
      runs,
    );
    expect(count).toBeGreaterThan(runs.numRuns / 10);
  });

  test('is itself accepted wherever every antenna stood well before', () => {
    let count = 0;
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const after = accepted(document, operation);
        if (!after || misplacedAntennas(document).length > 0) return true;
        count += 1;
        return accepted(after, operationOf(...invertOperation(document, operation))) !== null;
      }),
      runs,
    );
    expect(count).toBeGreaterThan(20);
  });

  test('of something that cannot be applied is a broken invariant', () => {
    const operation = operationOf({ kind: 'remove', collection: 'antennas', id: idOf('nobody') });
    expect(() => invertOperation(BARE_ROOF, operation)).toThrow('nothing in antennas');
  });
});

describe('undoing my own edit', () => {
  test('restores the document as long as nobody else touched it', () => {
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const after = accepted(document, operation);
        if (!after) return true;
        const undo = undoFor(after, document, operation);
        return (
          undo.conflicts.length === 0 &&
          canonicalJson(applied(after, undo.changes)) === canonicalJson(document)
        );
      }),
      runs,
    );
  });

  test('leaves every field that somebody else wrote since', () => {
    let count = 0;
    fc.assert(
      fc.property(someDocument, someIntents, someIntents, (document, mine, theirs) => {
        const operation = operationFor(document, mine, 'mine');
        const after = accepted(document, operation);
        if (!after) return true;
        const other = operationFor(after, theirs, 'theirs');
        const current = accepted(after, other);
        if (!current) return true;
        count += 1;
        const undone = applied(current, undoFor(current, document, operation).changes);
        return other.changes.every((change) => keeps(change, after, current, undone));
      }),
      runs,
    );
    expect(count).toBeGreaterThan(50);
  });

  const document: LayoutDocument = {
    ...BARE_ROOF,
    radios: { [idOf('one')]: plainRadio('one') },
    antennas: { [idOf('whip')]: whipAt(1, 0, { radioId: idOf('one') }) },
  };
  const set = (fields: Record<string, unknown>): Operation =>
    operationOf({ kind: 'set', collection: 'antennas', id: idOf('whip'), fields });
  const remove: Change = { kind: 'remove', collection: 'antennas', id: idOf('whip') };

  test('takes back the field that is still mine and names the one that is not', () => {
    const mine = set({ x: 2, azimuthDeg: 90 });
    const current = applied(applied(document, mine.changes), set({ x: 3 }).changes);
    expect(undoFor(current, document, mine)).toEqual({
      changes: [{ kind: 'set', collection: 'antennas', id: idOf('whip'), fields: { azimuthDeg: 0 } }],
      conflicts: [{ collection: 'antennas', id: idOf('whip'), field: 'x' }],
    });
  });

  test('of what was removed since does nothing and says so', () => {
    const mine = set({ x: 2 });
    expect(undoFor(applied(document, [...mine.changes, remove]), document, mine)).toEqual({
      changes: [],
      conflicts: [{ collection: 'antennas', id: idOf('whip'), field: null }],
    });
  });

  test('of an antenna that I added is refused once somebody moved it', () => {
    const mine = operationOf({ kind: 'add', collection: 'antennas', value: whipAt(1, 0) });
    const current = applied(applied(BARE_ROOF, mine.changes), set({ x: 2 }).changes);
    expect(undoFor(current, BARE_ROOF, mine)).toEqual({
      changes: [],
      conflicts: [{ collection: 'antennas', id: idOf('whip'), field: null }],
    });
  });

  test('brings a radio back before the antenna that uses it', () => {
    const mine = operationOf(remove, { kind: 'remove', collection: 'radios', id: idOf('one') });
    const undo = undoFor(applied(document, mine.changes), document, mine);
    expect(undo.changes.map((change) => change.kind !== 'set-platform' && change.collection)).toEqual([
      'radios',
      'antennas',
    ]);
  });

  test('names who wrote last', () => {
    const by = (sequence: number, memberName: string, operation: Operation): CommittedOperation => ({
      sequence,
      operation,
      memberId: idOf(memberName),
      memberName,
      committedAt: '2026-12-01T08:00:00.000Z',
    });
    const history = [by(1, 'Ada', set({ x: 2 })), by(2, 'Ben', set({ x: 3 })), by(3, 'Cleo', set({ y: 1 }))];
    const conflict = { collection: 'antennas' as const, id: idOf('whip'), field: 'x' };
    expect(lastWriter(history, conflict)).toBe('Ben');
    expect(lastWriter(history, { ...conflict, field: 'tiltDeg' })).toBeNull();
    expect(lastWriter([...history, by(4, 'Dora', operationOf(remove))], conflict)).toBe('Dora');
  });
});

/** Whether what another person's change made different is still as they left it. */
function keeps(
  change: Change,
  before: LayoutDocument,
  theirs: LayoutDocument,
  undone: LayoutDocument,
): boolean {
  if (change.kind === 'set-platform') {
    return differingFields(before.platform, theirs.platform).every(
      (field) => valueOf(undone.platform, field) === valueOf(theirs.platform, field),
    );
  }
  const id = change.kind === 'add' ? change.value.id : change.id;
  const [was, left, is] = [before, theirs, undone].map(
    (document) => collectionOf(document, change.collection)[id],
  );
  if (!left) return is === undefined;
  return differingFields(was ?? {}, left).every((field) => is && valueOf(is, field) === valueOf(left, field));
}

function differingFields(before: object, after: object): string[] {
  return Object.keys(after).filter((field) => valueOf(before, field) !== valueOf(after, field));
}

function valueOf(object: object, field: string): string {
  return JSON.stringify((object as Record<string, unknown>)[field]) ?? 'undefined';
}
