import { describeTarget } from '@/components/panels/comment-target-words';
import {
  sheetAngle,
  sheetDecibel,
  sheetFrequency,
  sheetLength,
} from '@/components/panels/revision-sheet-figures';
import { buildAntenna, buildDocument } from '../../support/build-review';

test('millimetres are whole where the position is, and show the tenth where there is one', () => {
  expect(sheetLength(1.55, 'mm')).toBe('1550');
  expect(sheetLength(0.1 + 0.2, 'mm')).toBe('300');
  expect(sheetLength(1.5503, 'mm')).toBe('1550.3');
  expect(sheetLength(-0.43, 'mm')).toBe('\u2212430');
});

test('nothing is minus zero', () => {
  expect(sheetLength(-0.00001, 'mm')).toBe('0');
  expect(sheetLength(-0.0001, 'in')).toBe('0.00');
  expect(sheetAngle(-0)).toBe('0°');
  expect(sheetDecibel(-0.01, true)).toBe('0.0');
});

test('inches are to the hundredth: one is 25.4 mm by definition', () => {
  expect(sheetLength(0.0254, 'in')).toBe('1.00');
  expect(sheetLength(0.31, 'in')).toBe('12.20');
});

test('a margin carries its sign, an isolation does not, a missing number is a dash', () => {
  expect(sheetDecibel(7.25, true)).toBe('+7.3');
  expect(sheetDecibel(-8.04, true)).toBe('\u22128.0');
  expect(sheetDecibel(26.41)).toBe('26.4');
  expect(sheetDecibel(null)).toBe('–');
});

test('frequencies stand in megahertz without needless zeros', () => {
  expect(sheetFrequency(155.5e6)).toBe('155.5 MHz');
  expect(sheetFrequency(2.45e9)).toBe('2450 MHz');
  expect(sheetFrequency(null)).toBe('–');
});

test('a comment on an antenna goes by its present label, and says when the antenna is gone', () => {
  const antenna = buildAntenna({ label: 'A3', name: 'UHF' });
  const document = buildDocument({ antennas: [antenna] });
  const target = { kind: 'antenna', antennaId: antenna.id, label: 'A2' } as const;
  expect(describeTarget(target, document, 'mm')).toBe('A3 UHF');
  expect(describeTarget(target, buildDocument(), 'mm')).toBe('A2, removed since');
  expect(describeTarget(target, null, 'mm')).toBe('A2');
});

test('a comment on a spot names the position from the datum', () => {
  expect(describeTarget({ kind: 'spot', x: 1.2, y: -0.3 }, null, 'mm')).toBe(
    'Spot at x 1200, y \u2212300 mm',
  );
});
