import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { canonicalJson, revisionHash } from '@/shared/layout/revision-hash';
import { BARE_ROOF, idOf, someDocument } from './arbitrary-layout';

const content = {
  layoutId: idOf('layout'),
  letter: 'A',
  document: BARE_ROOF,
  results: { pairs: [] },
  solverVersion: '1',
};

/** The same value with the fields of every object in another order. */
function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([name, field]) => [name, reversed(field)]),
  );
}

describe('the canonical text', () => {
  test.each<[unknown, string]>([
    [{ b: 1, a: [true, null, 'x'] }, '{"a":[true,null,"x"],"b":1}'],
    // RFC 8785, 3.2.2: numbers as ECMAScript prints them
    [[333333333.3333333, 1e30, 4.5, 2e-3, 1e-27, -0], '[333333333.3333333,1e+30,4.5,0.002,1e-27,0]'],
    // RFC 8785, 3.2.3: names sorted by UTF-16 code units
    [
      { '€': 1, '\r': 2, '\ufb33': 3, '1': 4, '\u{1F600}': 5, '\u0080': 6, ö: 7 },
      '{"\\r":2,"1":4,"\u0080":6,"ö":7,"€":1,"\u{1F600}":5,"\ufb33":3}',
    ],
    ['\u0000\u001f"\\/€', '"\\u0000\\u001f\\"\\\\/€"'],
  ])('of %j is that of RFC 8785', (value, text) => {
    expect(canonicalJson(value)).toBe(text);
  });

  test('does not depend on the order of fields, and reads back', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value);
        expect(canonicalJson(reversed(value))).toBe(text);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
      { seed: 81, numRuns: 300 },
    );
  });

  test('of what is no JSON is a broken invariant', () => {
    expect(() => canonicalJson(undefined)).toThrow();
    expect(() => canonicalJson({ a: Number.NaN })).toThrow();
    expect(() => canonicalJson([Infinity])).toThrow();
  });
});

describe('the hash of a revision', () => {
  test('is the SHA-256 of the canonical text of its five fields', () => {
    const expected = createHash('sha256').update(canonicalJson(content), 'utf8').digest('hex');
    expect(revisionHash(content)).toBe(expected);
    expect(revisionHash(content)).toMatch(/^[0-9a-f]{64}$/);
  });

  test('changes with each of them, and with nothing else', () => {
    const others = [
      { layoutId: idOf('another') },
      { letter: 'B' },
      { document: { ...BARE_ROOF, platform: { ...BARE_ROOF.platform, height: 2.501 } } },
      { results: { pairs: [1] } },
      { solverVersion: '2' },
    ].map((change) => revisionHash({ ...content, ...change }));
    expect(new Set([revisionHash(content), ...others]).size).toBe(6);
    expect(revisionHash({ ...content, note: 'x' } as typeof content)).toBe(revisionHash(content));
  });

  test('is the same before a document is stored and after it is read back', () => {
    fc.assert(
      fc.property(someDocument, (document) => {
        const stored = JSON.parse(JSON.stringify(document)) as typeof document;
        return revisionHash({ ...content, document }) === revisionHash({ ...content, document: stored });
      }),
      { seed: 82, numRuns: 100 },
    );
  });
});
