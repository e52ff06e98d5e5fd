import fc from 'fast-check';
import {
  countOutlinePoints,
  documentBytes,
  referenceProblems,
  sizeProblems,
} from '@/shared/layout/integrity';
import { BARE_ROOF, idOf, plainRadio, someDocument, whipAt } from './arbitrary-layout';

describe('the integrity of a document', () => {
  test('a document without references has no problem', () => {
    expect(referenceProblems(BARE_ROOF)).toEqual([]);
    expect(sizeProblems(BARE_ROOF)).toEqual([]);
  });

  test('every reference that points nowhere is named', () => {
    const rule = { id: idOf('rule'), radioIds: [idOf('one'), idOf('gone')] as const, rule: 'Interlock' };
    const document = {
      ...BARE_ROOF,
      radios: { [idOf('one')]: plainRadio('one') },
      neverTogether: { [rule.id]: rule },
      antennas: { [idOf('whip')]: whipAt(1, 0, { radioId: idOf('gone') }) },
    };
    expect(referenceProblems(document).map(({ path }) => path)).toEqual([
      `antennas.${idOf('whip')}.radioId`,
      `neverTogether.${idOf('rule')}.radioIds`,
    ]);
  });

  test('its size is that of its text in UTF-8', () => {
    fc.assert(
      fc.property(someDocument, (document) => {
        expect(documentBytes(document)).toBe(Buffer.byteLength(JSON.stringify(document), 'utf8'));
      }),
      { seed: 71, numRuns: 100 },
    );
    const name = '\u{1F4E1} ä ½ 天';
    const document = { ...BARE_ROOF, platform: { ...BARE_ROOF.platform, name } };
    expect(documentBytes(document)).toBe(Buffer.byteLength(JSON.stringify(document), 'utf8'));
  });

  test('the points of all outlines count together', () => {
    // the platform's and the roof's, four each
    expect(countOutlinePoints(BARE_ROOF)).toBe(8);
  });
});
