import { STARTER_ANTENNAS, STARTER_RADIOS } from '../starter-parts';
import type { DemoLayout } from './demo-layout';

/** The pilot's handheld tracker: four small antennas on one board. */
export const DEMO_TRACKER: DemoLayout = {
  key: 'tracker',
  starter: 'tracker-board',
  platformName: 'Tracker board',
  radios: {
    cellular: STARTER_RADIOS.cellular,
    navigation: STARTER_RADIOS.navigation,
    beacon: STARTER_RADIOS.beacon,
    'wireless-lan': STARTER_RADIOS['wireless-lan'],
  },
  antennas: [
    {
      name: 'Beacon',
      part: STARTER_ANTENNAS['whip-868'],
      radio: 'beacon',
      x: 0.09,
      y: 0.02,
      feederLossDb: 0.2,
    },
    {
      name: '2.4 GHz',
      part: STARTER_ANTENNAS['whip-2g4'],
      radio: 'wireless-lan',
      x: 0.09,
      y: -0.02,
      feederLossDb: 0.2,
    },
    {
      name: 'Cellular',
      part: STARTER_ANTENNAS['inverted-f-cellular'],
      radio: 'cellular',
      x: 0.006,
      y: -0.015,
      feederLossDb: 0.3,
    },
    {
      name: 'Navigation',
      part: STARTER_ANTENNAS['patch-navigation'],
      radio: 'navigation',
      x: 0.083,
      y: 0,
      feederLossDb: 0.2,
    },
  ],
};
