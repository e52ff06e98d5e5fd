import { halfWaveLength, quarterWaveLength } from '@/shared/layout/quarter-wave';

describe('the length of a resonant wire', () => {
  test('is 0.95 of a quarter of the wave: 0.4579 m at 155.5 MHz', () => {
    // 299792458 / 155.5e6 = 1.9279258 m; a quarter of it 0.4819814 m; 95 per cent of that 0.4578824 m
    expect(quarterWaveLength(155.5e6)).toBeCloseTo(0.4578824, 6);
  });

  test('of a dipole is twice that of a whip', () => {
    expect(halfWaveLength(2.4e9)).toBe(2 * quarterWaveLength(2.4e9));
  });
});
