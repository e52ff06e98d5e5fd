import { compareLabels, neverTogetherRows, positionRows } from '@/components/panels/revision-sheet-rows';
import { CAUTIONS_LEAD, cautionsFor } from '@/components/panels/revision-cautions';
import { createId } from '@/shared/ids';
import { buildAntenna, buildDocument, buildRadio } from '../../support/build-review';

const marine = buildRadio({ name: 'VHF marine' });
const land = buildRadio({ name: 'VHF land' });
const antennas = [
  buildAntenna({ label: 'A10', radioId: null }),
  buildAntenna({ label: 'A2', radioId: land.id, x: 0.48, y: -0.43, azimuthDeg: 90 }),
  buildAntenna({ label: 'A1', radioId: marine.id }),
];
const neverTogether = {
  id: createId(),
  radioIds: [marine.id, land.id] as const,
  rule: 'Interlock on the push-to-talk lines.',
};
const document = buildDocument(
  { antennas, radios: [marine, land] },
  { neverTogether: { [neverTogether.id]: neverTogether } },
);

test('the table has a line for every antenna, A2 before A10', () => {
  expect(positionRows(document).map((row) => row.label)).toEqual(['A1', 'A2', 'A10']);
});

test('a line carries the position as the document holds it, with the names of part and radio', () => {
  expect(positionRows(document)[1]).toMatchObject({
    x: 0.48,
    y: -0.43,
    mountHeight: 0,
    azimuthDeg: 90,
    radio: 'VHF land',
    part: 'Quarter-wave whip, 460 MHz',
  });
});

test('an antenna without a radio says so instead of naming one', () => {
  expect(positionRows(document)[2]?.radio).toBeNull();
});

test('a rule of never together names both radios and the antennas that they feed', () => {
  expect(neverTogetherRows(document)).toEqual([
    {
      id: neverTogether.id,
      radios: ['VHF marine', 'VHF land'],
      antennas: ['A1', 'A2'],
      rule: neverTogether.rule,
    },
  ]);
});

test('labels are ordered as people count', () => {
  expect(['A10', 'B1', 'A9'].sort(compareLabels)).toEqual(['A9', 'A10', 'B1']);
});

test.each(['vehicle', 'rooftop', 'handset'] as const)('a %s carries all five cautions', (kind) => {
  expect(
    cautionsFor(kind)
      .map((caution) => caution.id)
      .sort(),
  ).toEqual(['batteries', 'drilling', 'exposure', 'height', 'lightning']);
  expect(CAUTIONS_LEAD).toContain('Local codes');
});
