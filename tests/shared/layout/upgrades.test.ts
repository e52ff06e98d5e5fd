import { DOCUMENT_VERSION } from '@/shared/layout/document';
import { upgradeDocument } from '@/shared/layout/upgrades';
import { BARE_ROOF } from './arbitrary-layout';

describe('upgrading a stored document', () => {
  test('a document of the current version stays as it is', () => {
    const result = upgradeDocument(BARE_ROOF);
    expect(result.ok && result.value).toBe(BARE_ROOF);
  });

  test('a version that nobody ever wrote is refused', () => {
    expect(upgradeDocument({ ...BARE_ROOF, version: 0 })).toMatchObject({
      ok: false,
      refusal: { code: 'invalid', message: 'Nobody knows version 0 of the layout document.' },
    });
  });

  test('a newer document asks for a reload, it is not guessed at', () => {
    expect(upgradeDocument({ ...BARE_ROOF, version: DOCUMENT_VERSION + 1 })).toMatchObject({
      ok: false,
      refusal: { code: 'outdated-client' },
    });
  });

  test.each([null, [], 'a text', 7, {}, { version: '1' }, { ...BARE_ROOF, version: Number.NaN }])(
    'what is no document is refused: %j',
    (value) => {
      expect(upgradeDocument(value)).toMatchObject({ ok: false, refusal: { code: 'invalid' } });
    },
  );
});
