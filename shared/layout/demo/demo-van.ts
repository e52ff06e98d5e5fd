import { STARTER_ANTENNAS, STARTER_RADIOS } from '../starter-parts';
import type { DemoLayout } from './demo-layout';

/**
 * The patrol van's roof. It opens with one pair that lacks isolation: the land-mobile VHF whip was put into the
 * hole next to the UHF whip, and its broadband noise reaches the UHF receiver. Over the cab the pair is clear.
 */
export const DEMO_VAN: DemoLayout = {
  key: 'van',
  starter: 'van-roof',
  platformName: 'Patrol van roof',
  radios: {
    marine: STARTER_RADIOS.marine,
    vhf: { ...STARTER_RADIOS.vhf, noiseDbcPerHz: -147 },
    uhf: STARTER_RADIOS.uhf,
    cellular: STARTER_RADIOS.cellular,
    navigation: STARTER_RADIOS.navigation,
    'wireless-lan': STARTER_RADIOS['wireless-lan'],
  },
  neverTogether: [
    {
      radios: ['marine', 'vhf'],
      rule: 'The control head lets one VHF radio transmit at a time and mutes the other.',
    },
  ],
  antennas: [
    {
      name: 'VHF marine',
      part: STARTER_ANTENNAS['whip-marine'],
      radio: 'marine',
      x: 2.45,
      y: 0.42,
      feederLossDb: 0.5,
    },
    {
      name: 'VHF land',
      part: STARTER_ANTENNAS['whip-vhf'],
      radio: 'vhf',
      x: 1.5,
      y: -0.1,
      feederLossDb: 0.5,
    },
    { name: 'UHF', part: STARTER_ANTENNAS['whip-uhf'], radio: 'uhf', x: 1.5, y: 0.02, feederLossDb: 0.8 },
    {
      name: 'Cellular',
      part: STARTER_ANTENNAS['whip-cellular'],
      radio: 'cellular',
      x: 0.45,
      y: 0.45,
      feederLossDb: 1.2,
    },
    {
      name: 'Navigation',
      part: STARTER_ANTENNAS['patch-navigation'],
      radio: 'navigation',
      x: 2.3,
      y: -0.45,
      feederLossDb: 1,
    },
    {
      name: '2.4 GHz',
      part: STARTER_ANTENNAS['whip-2g4'],
      radio: 'wireless-lan',
      x: 0.5,
      y: -0.45,
      feederLossDb: 1.5,
    },
  ],
};
