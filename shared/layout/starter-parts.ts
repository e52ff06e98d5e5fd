import type { AntennaPart, Band, DeclaredElement, FilterRejection, Radio, WireElement } from './document';
import { idFromName } from './named-id';
import { halfWaveLength, quarterWaveLength } from './quarter-wave';

/**
 * The parts that a new team finds on its shelf. Generic, of no maker; the values are typical of their class
 * (common practice), meant to be overwritten with those of the datasheet at hand.
 */

/** A radio as it stands on the shelf: without an identifier. */
export type ShelfRadio = Omit<Radio, 'id'>;

const MHZ = 1e6;
const NO_OFFSET = { x: 0, y: 0, z: 0 };

/** Antennas on a new shelf, by a key that stays. */
export const STARTER_ANTENNAS = {
  'whip-marine': { name: 'Quarter-wave whip, marine VHF', elements: [whip('whip-marine', 157 * MHZ, 0.001)] },
  'whip-vhf': { name: 'Quarter-wave whip, land-mobile VHF', elements: [whip('whip-vhf', 169 * MHZ, 0.001)] },
  'whip-uhf': { name: 'Quarter-wave whip, UHF', elements: [whip('whip-uhf', 460 * MHZ, 0.001)] },
  'whip-cellular': {
    name: 'Quarter-wave whip, cellular',
    elements: [whip('whip-cellular', 870 * MHZ, 0.0008)],
  },
  'whip-2g4': { name: 'Quarter-wave whip, 2.4 GHz', elements: [whip('whip-2g4', 2442 * MHZ, 0.0005)] },
  'dipole-marine': {
    name: 'Base-station dipole, marine VHF',
    elements: [dipole('dipole-marine', 159 * MHZ, 0.003)],
  },
  'dipole-vhf': {
    name: 'Base-station dipole, land-mobile VHF',
    elements: [dipole('dipole-vhf', 169 * MHZ, 0.003)],
  },
  'dipole-uhf': { name: 'Half-wave dipole, UHF', elements: [dipole('dipole-uhf', 460 * MHZ, 0.002)] },
  'dipole-cellular': {
    name: 'Half-wave dipole, cellular',
    elements: [dipole('dipole-cellular', 870 * MHZ, 0.001)],
  },
  'whip-868': { name: 'Stub whip, 868 MHz', elements: [whip('whip-868', 868 * MHZ, 0.0004)] },
  'patch-navigation': {
    name: 'Patch, upward, navigation',
    elements: [declared('patch-navigation', 'patch', 3, 'circular', band(1559, 1610))],
  },
  'inverted-f-cellular': {
    name: 'Inverted-F, cellular',
    elements: [declared('inverted-f-cellular', 'inverted-F', 0, 'vertical', band(791, 960))],
  },
  'inverted-f-2g4': {
    name: 'Inverted-F, 2.4 GHz',
    elements: [declared('inverted-f-2g4', 'inverted-F', 1, 'vertical', band(2400, 2483.5))],
  },
  'panel-link': {
    name: 'Link panel, 5.8 GHz',
    elements: [declared('panel-link', 'panel', 16, 'vertical', band(5725, 5875))],
  },
  'cover-two': {
    name: 'Low cover, cellular and navigation',
    elements: [
      { ...whip('cover-two/cellular', 870 * MHZ, 0.0008), offset: { x: 0.03, y: 0, z: 0 } },
      {
        ...declared('cover-two/navigation', 'patch', 2, 'circular', band(1559, 1610)),
        offset: { x: -0.03, y: 0, z: 0 },
      },
    ],
  },
} as const satisfies Readonly<Record<string, AntennaPart>>;

/** Radios on a new shelf, by a key that stays. Values typical of their class. */
export const STARTER_RADIOS = {
  marine: {
    name: 'Marine VHF, 25 W',
    receiveOnly: false,
    transmitBands: [band(156.025, 157.425)],
    receiveBands: [band(156.05, 157.425), band(160.625, 162.025)],
    power: 25,
    noiseDbcPerHz: -155,
    noiseFigureDb: 8,
    bandwidth: 16e3,
    overloadDbm: -20,
    rejections: [rejection(400, 6000, 45)],
  },
  vhf: {
    name: 'Land-mobile VHF, 25 W',
    receiveOnly: false,
    transmitBands: [band(165.2, 167.8)],
    receiveBands: [band(169.8, 172.4)],
    power: 25,
    noiseDbcPerHz: -150,
    noiseFigureDb: 7,
    bandwidth: 12.5e3,
    overloadDbm: -20,
    rejections: [rejection(400, 600, 45), rejection(600, 6000, 60)],
  },
  uhf: {
    name: 'Land-mobile UHF, 10 W',
    receiveOnly: false,
    transmitBands: [band(453, 455)],
    receiveBands: [band(463, 465)],
    power: 10,
    noiseDbcPerHz: -152,
    noiseFigureDb: 7,
    bandwidth: 12.5e3,
    overloadDbm: -20,
    rejections: [rejection(100, 300, 50), rejection(700, 6000, 55)],
  },
  cellular: {
    name: 'Cellular data terminal',
    receiveOnly: false,
    transmitBands: [band(832, 862), band(880, 915)],
    receiveBands: [band(791, 821), band(925, 960)],
    power: 0.2,
    noiseDbcPerHz: -150,
    noiseFigureDb: 8,
    bandwidth: 10e6,
    overloadDbm: -15,
    rejections: [rejection(100, 700, 50), rejection(1200, 6000, 50)],
  },
  navigation: {
    name: 'Satellite navigation receiver',
    receiveOnly: true,
    transmitBands: [],
    receiveBands: [band(1559, 1610)],
    power: 0,
    noiseDbcPerHz: -174,
    noiseFigureDb: 2,
    bandwidth: 2.046e6,
    overloadDbm: -25,
    rejections: [rejection(100, 1500, 50), rejection(1680, 6000, 50)],
  },
  'wireless-lan': {
    name: 'Wireless network, 2.4 GHz',
    receiveOnly: false,
    transmitBands: [band(2400, 2483.5)],
    receiveBands: [band(2400, 2483.5)],
    power: 0.1,
    noiseDbcPerHz: -140,
    noiseFigureDb: 7,
    bandwidth: 20e6,
    overloadDbm: -15,
    rejections: [rejection(100, 2000, 45)],
  },
  beacon: {
    name: 'Short-range beacon, 868 MHz',
    receiveOnly: false,
    transmitBands: [band(868, 868.6)],
    receiveBands: [band(868, 868.6)],
    power: 0.025,
    noiseDbcPerHz: -140,
    noiseFigureDb: 7,
    bandwidth: 125e3,
    overloadDbm: -20,
    rejections: [rejection(1200, 6000, 40)],
  },
  link: {
    name: 'Point-to-point link, 5.8 GHz',
    receiveOnly: false,
    transmitBands: [band(5725, 5875)],
    receiveBands: [band(5725, 5875)],
    power: 0.5,
    noiseDbcPerHz: -145,
    noiseFigureDb: 6,
    bandwidth: 40e6,
    overloadDbm: -20,
    rejections: [rejection(100, 5000, 60)],
  },
} as const satisfies Readonly<Record<string, ShelfRadio>>;

/** What a new team's shelf holds. */
export const STARTER_PARTS: {
  readonly antennas: readonly AntennaPart[];
  readonly radios: readonly ShelfRadio[];
} = { antennas: Object.values(STARTER_ANTENNAS), radios: Object.values(STARTER_RADIOS) };

function whip(key: string, frequency: number, radius: number): WireElement {
  return wire(key, 'whip', quarterWaveLength(frequency), frequency, radius);
}

function dipole(key: string, frequency: number, radius: number): WireElement {
  return wire(key, 'dipole', halfWaveLength(frequency), frequency, radius);
}

function wire(
  key: string,
  form: WireElement['form'],
  length: number,
  quarterWaveAt: number,
  radius: number,
): WireElement {
  // Tenths of a millimetre: what can be cut.
  const cut = Math.round(length * 1e4) / 1e4;
  return {
    id: idFromName(`part/${key}`),
    kind: 'wire',
    form,
    length: cut,
    radius,
    quarterWaveAt,
    offset: NO_OFFSET,
  };
}

function declared(
  key: string,
  form: string,
  gainDbi: number,
  polarisation: DeclaredElement['polarisation'],
  over: Band,
): DeclaredElement {
  return {
    id: idFromName(`part/${key}`),
    kind: 'declared',
    form,
    gainDbi,
    polarisation,
    band: over,
    offset: NO_OFFSET,
  };
}

function band(fromMhz: number, toMhz: number): Band {
  return { from: fromMhz * MHZ, to: toMhz * MHZ };
}

function rejection(fromMhz: number, toMhz: number, rejectionDb: number): FilterRejection {
  return { ...band(fromMhz, toMhz), rejectionDb };
}
