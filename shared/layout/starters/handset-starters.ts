import { polygonRectangle } from '../../geometry/polygon';
import { dimension, extra, footprint, overall, type StarterPlatform } from './starter';

/** A handset's board: copper with clearances at both short edges, battery and shield cans. */
export const HANDSET_BOARD: StarterPlatform = {
  id: 'handset-board',
  name: 'Handset board',
  kind: 'handset',
  summary: 'Board of 150 x 72 mm with antenna clearances at both short edges',
  dimensions: [
    ...overall([0.15, 0.09, 0.25], [0.072, 0.045, 0.16], [0.001, 0.0004, 0.004], 'Board thickness'),
    extra('canHeight', 'Shield can height', 0.0018, 0.0005, 0.006, ['can']),
    extra('batteryHeight', 'Battery height', 0.005, 0.001, 0.012, ['battery']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const half = width / 2;
    const clearance = length * 0.067;
    // A short, wide board has little clearance: the cut corner stays within it.
    const corner = Math.min(width * 0.08, clearance * 0.6);
    const height = dimension(dimensions, 'height');
    const outline = chamfered(length, half, corner);
    return {
      outline,
      datum: 'Bottom edge of the board on the centre line',
      forwardAxis: 'top edge',
      surfaces: {
        copper: {
          name: 'Ground copper',
          outline: polygonRectangle(clearance, -half, length - clearance, half),
          height,
          conducting: true,
        },
        bottom: {
          name: 'Bottom clearance',
          outline: [
            { x: 0, y: -half + corner },
            { x: corner, y: -half },
            { x: clearance, y: -half },
            { x: clearance, y: half },
            { x: corner, y: half },
            { x: 0, y: half - corner },
          ],
          height,
          conducting: false,
        },
        top: {
          name: 'Top clearance',
          outline: [
            { x: length - clearance, y: -half },
            { x: length - corner, y: -half },
            { x: length, y: -half + corner },
            { x: length, y: half - corner },
            { x: length - corner, y: half },
            { x: length - clearance, y: half },
          ],
          height,
          conducting: false,
        },
      },
      obstacles: {
        battery: {
          name: 'Battery',
          outline: polygonRectangle(length * 0.2, -half * 0.82, length * 0.66, half * 0.28),
          base: 0,
          height: dimension(dimensions, 'batteryHeight'),
          metal: true,
        },
        can: {
          name: 'Shield can',
          outline: polygonRectangle(length * 0.36, half * 0.36, length * 0.64, half * 0.86),
          base: 0,
          height: dimension(dimensions, 'canHeight'),
          metal: true,
        },
      },
      keepOuts: {
        camera: {
          name: 'Camera',
          outline: polygonRectangle(length * 0.76, half * 0.3, length * 0.9, half * 0.85),
          reason: 'The lens and its flexible connection need this room.',
        },
        connector: {
          name: 'Charging connector',
          outline: polygonRectangle(0, -half * 0.18, clearance, half * 0.18),
          reason: 'The connector and its shell stand here.',
        },
      },
      mountPoints: {
        'pad-top': { name: 'Feed pad, top', x: length - clearance, y: -half * 0.6 },
        'pad-bottom': { name: 'Feed pad, bottom', x: clearance, y: half * 0.6 },
      },
      cableEntries: { radio: { name: 'Radio module', x: length * 0.5, y: half * 0.34 } },
    };
  },
};

/** A small tracker's board: one copper area, a coin-sized battery and one shield can. */
export const TRACKER_BOARD: StarterPlatform = {
  id: 'tracker-board',
  name: 'Tracker board',
  kind: 'handset',
  summary: 'Small board for a tracker with a battery and one shield can',
  dimensions: [
    ...overall([0.096, 0.05, 0.2], [0.058, 0.03, 0.14], [0.0012, 0.0004, 0.004], 'Board thickness'),
    extra('canHeight', 'Shield can height', 0.002, 0.0005, 0.006, ['can']),
    extra('batteryHeight', 'Battery height', 0.006, 0.001, 0.015, ['battery']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const half = width / 2;
    const outline = chamfered(length, half, width * 0.1);
    return {
      outline,
      datum: 'Bottom edge of the board on the centre line',
      forwardAxis: 'top edge',
      surfaces: {
        copper: { name: 'Ground copper', outline, height: dimension(dimensions, 'height'), conducting: true },
      },
      obstacles: {
        battery: {
          name: 'Battery',
          outline: polygonRectangle(length * 0.14, -half * 0.62, length * 0.5, half * 0.62),
          base: 0,
          height: dimension(dimensions, 'batteryHeight'),
          metal: true,
        },
        can: {
          name: 'Shield can',
          outline: polygonRectangle(length * 0.56, -half * 0.4, length * 0.76, half * 0.4),
          base: 0,
          height: dimension(dimensions, 'canHeight'),
          metal: true,
        },
      },
      keepOuts: {
        screw: {
          name: 'Case screw',
          outline: polygonRectangle(length * 0.02, half * 0.68, length * 0.02 + width * 0.12, half * 0.92),
          reason: 'The screw boss stands here.',
        },
      },
      mountPoints: {
        'pad-1': { name: 'Feed pad 1', x: length * 0.93, y: half * 0.7 },
        'pad-2': { name: 'Feed pad 2', x: length * 0.93, y: -half * 0.7 },
        'pad-3': { name: 'Feed pad 3', x: length * 0.07, y: 0 },
      },
      cableEntries: { radio: { name: 'Radio module', x: length * 0.66, y: half * 0.45 } },
    };
  },
};

function chamfered(length: number, half: number, corner: number): { x: number; y: number }[] {
  return [
    { x: 0, y: -half + corner },
    { x: corner, y: -half },
    { x: length - corner, y: -half },
    { x: length, y: -half + corner },
    { x: length, y: half - corner },
    { x: length - corner, y: half },
    { x: corner, y: half },
    { x: 0, y: half - corner },
  ];
}
