import fc from 'fast-check';
import type { LayoutDocument } from '@/shared/layout/document';
import { LIMITS } from '@/shared/layout/limits';
import type { Change } from '@/shared/layout/operation';
import { applyOperation } from '@/shared/layout/operations';
import { canonicalJson } from '@/shared/layout/revision-hash';
import { upgradeDocument } from '@/shared/layout/upgrades';
import {
  BARE_ROOF,
  deepFreeze,
  idOf,
  operationFor,
  operationOf,
  plainRadio,
  someDocument,
  someIntents,
  whipAt,
} from './arbitrary-layout';

const runs = { seed: 31, numRuns: 400 };

/** The document with these antennas and radios. */
function roofWith(overrides: Partial<LayoutDocument>): LayoutDocument {
  return { ...BARE_ROOF, ...overrides };
}

function filed<T extends { readonly id: string }>(...objects: readonly T[]): Record<string, T> {
  return Object.fromEntries(objects.map((object) => [object.id, object]));
}

function refusalOf(document: LayoutDocument, ...changes: readonly Change[]) {
  const result = applyOperation(document, operationOf(...changes));
  if (result.ok) throw new Error('the operation was accepted');
  return result.refusal;
}

describe('applying an operation', () => {
  test('leaves a document that holds in every rule, or none at all', () => {
    let accepted = 0;
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const result = applyOperation(document, operation);
        if (!result.ok) return result.refusal.message.length > 0;
        accepted += 1;
        return upgradeDocument(JSON.parse(JSON.stringify(result.value))).ok;
      }),
      runs,
    );
    // a law about nothing would hold as well
    expect(accepted).toBeGreaterThan(runs.numRuns / 10);
  });

  test('changes nothing in the document it is given, and nothing in itself', () => {
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = deepFreeze(operationFor(document, intents));
        const text = canonicalJson(document);
        applyOperation(deepFreeze(document), operation);
        return canonicalJson(document) === text;
      }),
      runs,
    );
  });

  test('gives the same answer a second time', () => {
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const [one, other] = [applyOperation(document, operation), applyOperation(document, operation)];
        return canonicalJson(one) === canonicalJson(other);
      }),
      runs,
    );
  });

  test('shares what did not change with the document before', () => {
    const document = roofWith({ radios: filed(plainRadio('one')), antennas: filed(whipAt(1, 0)) });
    const result = applyOperation(
      document,
      operationOf({ kind: 'set', collection: 'antennas', id: idOf('whip'), fields: { azimuthDeg: 30 } }),
    );
    expect(result.ok && result.value.radios).toBe(document.radios);
    expect(result.ok && result.value.antennas[idOf('whip')]?.part).toBe(
      document.antennas[idOf('whip')]?.part,
    );
  });

  test('two people who set different fields of one antenna both get what they want, in either order', () => {
    const document = roofWith({ antennas: filed(whipAt(1, 0)) });
    const move: Change = { kind: 'set', collection: 'antennas', id: idOf('whip'), fields: { x: 2 } };
    const turn: Change = {
      kind: 'set',
      collection: 'antennas',
      id: idOf('whip'),
      fields: { azimuthDeg: 90 },
    };
    const inOrder = (...changes: readonly Change[]) =>
      changes.reduce((current, change) => {
        const result = applyOperation(current, operationOf(change));
        if (!result.ok) throw new Error(result.refusal.message);
        return result.value;
      }, document);
    expect(inOrder(move, turn)).toEqual(inOrder(turn, move));
    expect(inOrder(move, turn).antennas[idOf('whip')]).toMatchObject({ x: 2, azimuthDeg: 90 });
  });

  test('an operation of several changes holds whole or not at all', () => {
    const document = deepFreeze(roofWith({ antennas: filed(whipAt(1, 0)) }));
    const refusal = refusalOf(
      document,
      { kind: 'set', collection: 'antennas', id: idOf('whip'), fields: { azimuthDeg: 30 } },
      { kind: 'remove', collection: 'antennas', id: idOf('nobody') },
    );
    expect(refusal.code).toBe('removed-object');
    expect(document.antennas[idOf('whip')]?.azimuthDeg).toBe(0);
  });
});

describe('an operation is refused', () => {
  const document = roofWith({ antennas: filed(whipAt(1, 0)) });
  const set = (fields: Record<string, unknown>): Change => ({
    kind: 'set',
    collection: 'antennas',
    id: idOf('whip'),
    fields,
  });

  test.each<[string, Record<string, unknown>, string, string]>([
    ['a text for a number', { x: '1' }, 'changes.0.fields.x', 'is not a number'],
    ['no number at all', { x: Number.NaN }, 'changes.0.fields.x', 'is not a number'],
    ['infinity', { x: Infinity }, 'changes.0.fields.x', 'is not a finite number'],
    ['too far away', { x: 1001 }, 'changes.0.fields.x', 'is more than 1000 m'],
    ['below the surface', { mountHeight: -0.1 }, 'changes.0.fields.mountHeight', 'is less than 0 m'],
    ['a field that nobody knows', { colour: 'red' }, 'changes.0.fields.colour', 'is not a field we know'],
    ['another identifier', { id: idOf('other') }, 'changes.0.fields.id', 'never changes'],
    ['nothing', {}, 'changes.0.fields', 'changes nothing'],
    ['an empty name', { name: '' }, 'changes.0.fields.name', 'is empty'],
    [
      'a name of 121 characters',
      { name: 'a'.repeat(121) },
      'changes.0.fields.name',
      'is longer than 120 characters',
    ],
    ['a name with a line break', { name: 'a\nb' }, 'changes.0.fields.name', 'holds a control character'],
    [
      'a part without elements',
      { part: { name: 'x', elements: [] } },
      'changes.0.fields.part.elements',
      'is empty',
    ],
    [
      'a radio that is not there',
      { radioId: idOf('nobody') },
      `antennas.${idOf('whip')}.radioId`,
      'names a radio that does not exist',
    ],
  ])('with its path: %s', (_what, fields, path, message) => {
    const refusal = refusalOf(document, set(fields));
    expect(refusal.code).toBe('invalid');
    expect(refusal.problems).toContainEqual({ path, message });
    expect(refusal.message).toContain(message);
  });

  test('a prototype hidden in its fields reaches nothing', () => {
    const fields = JSON.parse('{"__proto__":{"polluted":true},"x":1}') as Record<string, unknown>;
    expect(refusalOf(document, set(fields)).code).toBe('invalid');
    expect(({} as { polluted?: boolean }).polluted).toBeUndefined();
  });

  test('of another version of the document', () => {
    const result = applyOperation(document, { ...operationOf(set({ x: 2 })), version: 2 });
    expect(result).toMatchObject({ ok: false, refusal: { code: 'outdated-client' } });
  });

  test('without changes, or with too many', () => {
    expect(refusalOf(document).problems).toContainEqual({ path: 'changes', message: 'is empty' });
    const many = Array.from({ length: LIMITS.changesPerOperation + 1 }, () => set({ x: 2 }));
    expect(refusalOf(document, ...many).problems).toContainEqual({
      path: 'changes',
      message: 'has more than 256 entries',
    });
  });

  test('when it adds what is there already', () => {
    const refusal = refusalOf(document, { kind: 'add', collection: 'antennas', value: whipAt(2, 0) });
    expect(refusal).toMatchObject({ code: 'already-there', message: 'This antenna is already there.' });
  });

  test('when it changes what somebody removed', () => {
    const change: Change = { kind: 'set', collection: 'radios', id: idOf('gone'), fields: { power: 5 } };
    expect(refusalOf(document, change)).toMatchObject({
      code: 'removed-object',
      message: 'This radio was removed in the meantime.',
    });
  });

  test('at the sixty-fifth antenna', () => {
    const full = Array.from({ length: LIMITS.antennas }, (_, index) =>
      whipAt(1, 0, { id: idOf(`whip ${index}`) }),
    );
    const refusal = refusalOf(roofWith({ antennas: filed(...full) }), {
      kind: 'add',
      collection: 'antennas',
      value: whipAt(1, 0),
    });
    expect(refusal).toMatchObject({
      code: 'limit-reached',
      message: 'No more than 64 of these fit: antenna.',
    });
  });

  test('when the outlines of all together hold more than 2000 points', () => {
    const circle = (name: string) => ({
      id: idOf(name),
      name,
      reason: 'Test',
      outline: Array.from({ length: 1000 }, (_, index) => {
        const angle = (2 * Math.PI * index) / 1000;
        return { x: 2 + 0.1 * Math.cos(angle), y: 0.1 * Math.sin(angle) };
      }),
    });
    const refusal = refusalOf(
      BARE_ROOF,
      { kind: 'add', collection: 'keepOuts', value: circle('one') },
      { kind: 'add', collection: 'keepOuts', value: circle('two') },
    );
    expect(refusal).toMatchObject({
      code: 'limit-reached',
      message: 'The layout holds more than 2000 outline points.',
    });
  });

  test('off the surface, with the field to mend', () => {
    const refusal = refusalOf(document, set({ x: 4.2 }));
    expect(refusal).toMatchObject({
      code: 'not-placeable',
      message: 'A1 cannot stand there. It would stand off the surface.',
      problems: [{ path: `antennas.${idOf('whip')}.x`, message: 'It would stand off the surface.' }],
    });
  });

  test('into an obstacle by its height alone, with the height to mend', () => {
    const shelf = {
      id: idOf('rack'),
      name: 'Roof rack',
      outline: BARE_ROOF.platform.outline,
      base: 0.6,
      height: 0.2,
      metal: true,
    };
    const under = roofWith({ antennas: filed(whipAt(1, 0)), obstacles: filed(shelf) });
    expect(refusalOf(under, set({ mountHeight: 0.3 }))).toMatchObject({
      code: 'not-placeable',
      problems: [{ path: `antennas.${idOf('whip')}.mountHeight` }],
    });
  });
});

describe('an antenna that a smaller platform left in the air', () => {
  const document = roofWith({ antennas: filed(whipAt(6, 0)) });
  const set = (fields: Record<string, unknown>) =>
    applyOperation(document, operationOf({ kind: 'set', collection: 'antennas', id: idOf('whip'), fields }));

  test('can still be named, turned and raised where it stands', () => {
    expect(set({ name: 'Left over' }).ok).toBe(true);
    expect(set({ azimuthDeg: 90 }).ok).toBe(true);
    expect(set({ mountHeight: 0.2 }).ok).toBe(true);
  });

  test('can be brought back onto the surface, but not moved through the air', () => {
    expect(set({ x: 3 }).ok).toBe(true);
    expect(set({ x: 5 })).toMatchObject({ ok: false, refusal: { code: 'not-placeable' } });
  });
});

describe('removing a radio', () => {
  const rule = { id: idOf('rule'), radioIds: [idOf('one'), idOf('two')] as const, rule: 'Interlock' };
  const radios = filed(plainRadio('one'), plainRadio('two'));
  const remove = (name: string): Change => ({ kind: 'remove', collection: 'radios', id: idOf(name) });

  test('is refused while an antenna uses it, and says which', () => {
    const document = roofWith({ radios, antennas: filed(whipAt(1, 0, { radioId: idOf('one') })) });
    expect(refusalOf(document, remove('one'))).toMatchObject({
      code: 'conflict',
      message: 'This radio is in use at A1: give it another radio first.',
      problems: [{ path: `antennas.${idOf('whip')}.radioId` }],
    });
    expect(applyOperation(document, operationOf(remove('two'))).ok).toBe(true);
  });

  test('is refused while a never-together rule names it', () => {
    const document = roofWith({ radios, neverTogether: filed(rule) });
    expect(refusalOf(document, remove('two'))).toMatchObject({
      code: 'conflict',
      message: 'A never-together rule names this radio: remove the rule first.',
      problems: [{ path: `neverTogether.${idOf('rule')}.radioIds` }],
    });
  });

  test('takes its rule along in one operation, in either order', () => {
    const document = roofWith({ radios, neverTogether: filed(rule) });
    const removeRule: Change = { kind: 'remove', collection: 'neverTogether', id: rule.id };
    expect(applyOperation(document, operationOf(removeRule, remove('one'))).ok).toBe(true);
    expect(applyOperation(document, operationOf(remove('one'), removeRule)).ok).toBe(true);
  });

  test('a rule between one radio and itself is no rule', () => {
    const refusal = refusalOf(roofWith({ radios }), {
      kind: 'add',
      collection: 'neverTogether',
      value: { ...rule, radioIds: [idOf('one'), idOf('one')] },
    });
    expect(refusal).toMatchObject({
      code: 'invalid',
      problems: [{ path: `neverTogether.${idOf('rule')}.radioIds`, message: 'names the same radio twice' }],
    });
  });
});
