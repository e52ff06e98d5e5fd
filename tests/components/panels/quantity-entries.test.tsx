import {
  angleEntry,
  bandwidthEntry,
  decibelEntry,
  frequencyEntry,
  gainEntry,
  lengthEntry,
  levelEntry,
  noiseEntry,
  powerEntry,
  type Entry,
} from '@/components/panels/quantity-entries';

const ENTRIES: readonly (readonly [
  name: string,
  entry: Entry,
  bare: string,
  stored: number,
  shown: string,
])[] = [
  ['a length in millimetres', lengthEntry('mm'), '310', 0.31, '310 mm'],
  ['a length in inches', lengthEntry('in'), '12', 0.3048, '12 in'],
  ['a frequency', frequencyEntry, '155.5', 155.5e6, '155.5 MHz'],
  ['a bandwidth', bandwidthEntry, '12.5', 12_500, '12.5 kHz'],
  ['a power', powerEntry, '25', 25, '25 W'],
  ['a level', levelEntry, '-20', -20, '−20 dBm'],
  ['a noise density', noiseEntry, '-150', -150, '−150 dBc/Hz'],
  ['a gain', gainEntry, '2.15', 2.15, '2.15 dBi'],
  ['a loss', decibelEntry, '3', 3, '3 dB'],
  ['a bearing', angleEntry, '45', 45, '45°'],
];

describe.each(ENTRIES)('an entry for %s', (_name, entry, bare, stored, shown) => {
  test('reads a bare number in the unit it shows', () => {
    const reading = entry.read(bare);
    expect(reading.ok && reading.value).toBeCloseTo(stored, 9);
    expect(entry.format(stored)).toBe(shown);
  });

  test('reads what it shows', () => {
    const reading = entry.read(shown);
    expect(reading.ok && reading.value).toBeCloseTo(stored, 9);
  });

  test('gives an example of what it takes that it takes itself', () => {
    const refused = entry.read('3 kg');
    if (refused.ok) throw new Error('three kilograms were taken');
    const examples = (/such as (.*)\.$/.exec(refused.message)?.[1] ?? '').split(/, | or /);
    expect(examples.length).toBeGreaterThan(0);
    for (const example of [...examples, ...(/: (.*)\.$/.exec(entry.hint)?.[1] ?? '').split(', ')]) {
      expect([example, entry.read(example).ok]).toEqual([example, true]);
    }
  });
});
