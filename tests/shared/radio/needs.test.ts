import fc from 'fast-check';
import {
  carrierFrequencies,
  channelFrequencies,
  groupFrequencies,
  nearestFrequency,
  SAME_FREQUENCY_SHARE,
} from '@/shared/radio/band-frequencies';
import { levelOfPower, receiverNoiseDbm } from '@/shared/radio/levels';
import { marginState } from '@/shared/radio/margin-state';
import { overloadNeedDb } from '@/shared/radio/overload';
import { filterRejectionDb, pathLossesDb } from '@/shared/radio/path-losses';
import type { RadioFigures } from '@/shared/radio/radio-figures';
import { transmitterNoiseNeedDb } from '@/shared/radio/transmitter-noise';

const radio: RadioFigures = {
  receiveOnly: false,
  transmitBands: [{ from: 156e6, to: 158e6 }],
  receiveBands: [
    { from: 156e6, to: 158e6 },
    { from: 160e6, to: 162e6 },
  ],
  power: 25,
  noiseDbcPerHz: -150,
  noiseFigureDb: 7,
  bandwidth: 12_500,
  overloadDbm: -20,
  rejections: [
    { from: 400e6, to: 500e6, rejectionDb: 50 },
    { from: 450e6, to: 470e6, rejectionDb: 60 },
  ],
};

test('25 W are 44 dBm, a milliwatt is 0 dBm', () => {
  expect(levelOfPower(25)).toBeCloseTo(43.979, 3);
  expect(levelOfPower(1e-3)).toBeCloseTo(0, 12);
  expect(levelOfPower(0)).toBe(-Infinity);
});

// k T0 is -173.98 dBm/Hz at 290 K (IEEE definition of noise figure; k of the SI Brochure 2019).
test('a receiver of 12.5 kHz and 7 dB noise figure has its noise at -126.0 dBm', () => {
  expect(receiverNoiseDbm(1, 0)).toBeCloseTo(-173.975, 3);
  expect(receiverNoiseDbm(12_500, 7)).toBeCloseTo(-173.975 + 40.969 + 7, 3);
});

test('overload needs the carrier brought down to what the receiver bears: 44 + 20 = 64 dB', () => {
  expect(overloadNeedDb(radio, radio)).toBeCloseTo(43.979 + 20, 3);
});

test('noise needs, worked by hand: 44 - 150 dBm/Hz against -173.98 + 7 - 6 dBm/Hz are 66.9 dB', () => {
  expect(transmitterNoiseNeedDb(radio, radio)).toBeCloseTo(43.979 - 150 - (-173.975 + 7 - 6), 2);
});

test('the bandwidth of the victim falls out of its noise need', () => {
  const wide = { ...radio, bandwidth: 20e6 };
  expect(transmitterNoiseNeedDb(radio, wide)).toBeCloseTo(transmitterNoiseNeedDb(radio, radio), 9);
});

test('of overlapping filter bands the greater rejection counts, outside of them none', () => {
  expect(filterRejectionDb(radio, 460e6)).toBe(60);
  expect(filterRejectionDb(radio, 420e6)).toBe(50);
  expect(filterRejectionDb(radio, 399e6)).toBe(0);
  expect(filterRejectionDb(radio, 470e6)).toBe(60);
});

test('feeders and both filters are counted once', () => {
  expect(pathLossesDb(radio, { ...radio, rejections: [] }, 1.3, 460e6)).toBeCloseTo(61.3, 9);
});

test('a radio is looked at low, middle and high of each of its bands', () => {
  expect(carrierFrequencies(radio)).toEqual([156e6, 157e6, 158e6]);
  expect(channelFrequencies(radio)).toEqual([156e6, 157e6, 158e6, 160e6, 161e6, 162e6]);
});

test('a radio that only receives, or has no power, has no carrier', () => {
  expect(carrierFrequencies({ ...radio, receiveOnly: true })).toEqual([]);
  expect(carrierFrequencies({ ...radio, power: 0 })).toEqual([]);
});

test.each([
  [-0.001, 'lacking'],
  [0, 'tight'],
  [5.99, 'tight'],
  [6, 'clear'],
])('a margin of %d dB is %s', (margin, state) => {
  expect(marginState(margin, 1.5)).toBe(state);
});

test('a model that is known to 8 dB only is clear from 8 dB on', () => {
  expect(marginState(7, 8)).toBe('tight');
  expect(marginState(8, 8)).toBe('clear');
});

test('every frequency stands within half the group width of the middle that speaks for it', () => {
  const frequency = fc.double({ min: 1e6, max: 6e9, noNaN: true });
  fc.assert(
    fc.property(fc.array(frequency, { minLength: 1, maxLength: 60 }), (frequencies) => {
      const middles = groupFrequencies(frequencies);
      for (const one of frequencies) {
        const middle = middles[nearestFrequency(middles, one)]!;
        // Rounding of the share itself is far below 1e-9.
        expect(Math.abs(one - middle)).toBeLessThanOrEqual(one * (SAME_FREQUENCY_SHARE / 2 + 1e-9));
      }
      expect(groupFrequencies([...frequencies].reverse())).toEqual(middles);
    }),
    { seed: 7 },
  );
});

test('more filter and less power never need more isolation', () => {
  const share = fc.double({ min: 0.01, max: 1, noNaN: true });
  fc.assert(
    fc.property(share, fc.double({ min: 0, max: 80, noNaN: true }), (share, rejectionDb) => {
      const weaker = { ...radio, power: radio.power * share };
      expect(overloadNeedDb(weaker, radio)).toBeLessThanOrEqual(overloadNeedDb(radio, radio));
      expect(transmitterNoiseNeedDb(weaker, radio)).toBeLessThanOrEqual(transmitterNoiseNeedDb(radio, radio));
      const filtered = { ...radio, rejections: [...radio.rejections, { from: 1e6, to: 6e9, rejectionDb }] };
      expect(pathLossesDb(filtered, radio, 0, 460e6)).toBeGreaterThanOrEqual(
        pathLossesDb(radio, radio, 0, 460e6),
      );
    }),
    { seed: 7 },
  );
});
