import { STARTER_ANTENNAS, STARTER_RADIOS } from '../starter-parts';
import type { DemoLayout } from './demo-layout';

/** The harbour office roof: base-station dipoles on poles, a link panel and navigation timing. */
export const DEMO_ROOF: DemoLayout = {
  key: 'roof',
  starter: 'flat-office-roof',
  platformName: 'Harbour office roof',
  radios: {
    marine: STARTER_RADIOS.marine,
    vhf: STARTER_RADIOS.vhf,
    uhf: STARTER_RADIOS.uhf,
    cellular: STARTER_RADIOS.cellular,
    timing: { ...STARTER_RADIOS.navigation, name: 'Navigation timing receiver' },
    link: STARTER_RADIOS.link,
  },
  neverTogether: [
    { radios: ['marine', 'vhf'], rule: 'One operator position: the desk keys one VHF radio at a time.' },
  ],
  antennas: [
    {
      name: 'VHF marine',
      part: STARTER_ANTENNAS['dipole-marine'],
      radio: 'marine',
      x: 11.875,
      y: 7,
      mountHeight: 3,
      feederLossDb: 1.4,
    },
    {
      name: 'VHF land',
      part: STARTER_ANTENNAS['dipole-vhf'],
      radio: 'vhf',
      x: 0.125,
      y: 7,
      mountHeight: 3,
      feederLossDb: 1.1,
    },
    {
      name: 'UHF',
      part: STARTER_ANTENNAS['dipole-uhf'],
      radio: 'uhf',
      x: 11.875,
      y: 1,
      mountHeight: 2.6,
      feederLossDb: 2.2,
    },
    {
      name: 'Cellular',
      part: STARTER_ANTENNAS['dipole-cellular'],
      radio: 'cellular',
      x: 0.125,
      y: 1,
      mountHeight: 1.8,
      feederLossDb: 2.6,
    },
    {
      name: 'Link panel',
      part: STARTER_ANTENNAS['panel-link'],
      radio: 'link',
      x: 11.875,
      y: 4,
      mountHeight: 2,
      feederLossDb: 0.5,
    },
    {
      name: 'Navigation timing',
      part: STARTER_ANTENNAS['patch-navigation'],
      radio: 'timing',
      x: 6,
      y: 0.125,
      mountHeight: 0.8,
      feederLossDb: 3,
    },
  ],
};
