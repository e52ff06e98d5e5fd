import type { AntennaPart, LayoutDocument, PlacedAntenna, Radio } from '@/shared/layout/document';
import { idFromName } from '@/shared/layout/named-id';

const id = (name: string) => idFromName(`test van roof ${name}`);

/** A quarter-wave whip for land mobile, as a part. */
export const WHIP: AntennaPart = {
  name: 'Whip',
  elements: [
    {
      id: id('whip'),
      kind: 'wire',
      form: 'whip',
      length: 0.46,
      radius: 0.001,
      quarterWaveAt: null,
      offset: { x: 0, y: 0, z: 0 },
    },
  ],
};

const RADIO: Radio = {
  id: id('radio'),
  name: 'Land mobile',
  receiveOnly: false,
  transmitBands: [{ from: 149e6, to: 151e6 }],
  receiveBands: [{ from: 153e6, to: 155e6 }],
  power: 25,
  noiseDbcPerHz: -155,
  noiseFigureDb: 6,
  bandwidth: 12_500,
  overloadDbm: -20,
  rejections: [],
};

/** A flat roof of 4 m by 2 m with a keep-out at its front and three whips on a row. */
export function vanRoof(): LayoutDocument {
  const outline = rectangle(0, -1, 4, 1);
  return {
    version: 1,
    platform: {
      kind: 'vehicle',
      name: 'Van',
      starter: 'van-roof',
      length: 4,
      width: 2,
      height: 2.5,
      outline,
      datum: 'Rear edge, middle',
      forwardAxis: 'forward',
    },
    surfaces: {
      [id('roof')]: { id: id('roof'), name: 'Roof', outline, height: 2.5, conducting: true },
    },
    obstacles: {},
    keepOuts: {
      [id('hatch')]: {
        id: id('hatch'),
        name: 'Hatch',
        outline: rectangle(3, -0.5, 3.8, 0.5),
        reason: 'The hatch opens here.',
      },
    },
    mountPoints: {
      [id('hole')]: { id: id('hole'), name: 'Old hole', x: 2.513, y: 0.807 },
    },
    cableEntries: {},
    radios: { [RADIO.id]: RADIO },
    neverTogether: {},
    antennas: Object.fromEntries(
      [whip('A1', 0.5), whip('A2', 1.5), whip('A3', 2.5)].map((antenna) => [antenna.id, antenna]),
    ),
  };
}

function whip(label: string, x: number): PlacedAntenna {
  return {
    id: id(label),
    label,
    name: `Whip ${label}`,
    part: WHIP,
    x,
    y: -0.3,
    mountHeight: 0,
    azimuthDeg: 0,
    tiltDeg: 0,
    radioId: label === 'A3' ? null : RADIO.id,
    feederLossDb: 0,
  };
}

function rectangle(left: number, bottom: number, right: number, top: number) {
  return [
    { x: left, y: bottom },
    { x: right, y: bottom },
    { x: right, y: top },
    { x: left, y: top },
  ];
}
