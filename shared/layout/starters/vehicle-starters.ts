import { polygonRectangle, polygonRegular } from '../../geometry/polygon';
import type { Point } from '../document';
import { dimension, extra, footprint, overall, type StarterPlatform } from './starter';

const DRILL_CAUTION = 'Curtain air bag and wiring behind the roof rail: do not drill.';

/** The roof of a panel van: rear edge at x = 0, the front tapering toward the windscreen. */
export const VAN_ROOF: StarterPlatform = {
  id: 'van-roof',
  name: 'Van roof',
  kind: 'vehicle',
  summary: 'Steel roof of a panel van with a light bar and a roof hatch',
  dimensions: [
    ...overall([3.2, 1.8, 5.5], [1.48, 1.2, 2.2], [1.98, 1.4, 3.2], 'Roof above ground'),
    extra('lightBarHeight', 'Light bar height', 0.14, 0.03, 0.4, ['light-bar']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const half = width / 2;
    const rail = 0.07;
    const outline: Point[] = [
      { x: 0, y: -half + 0.18 },
      { x: 0.07, y: -half + 0.05 },
      { x: 0.3, y: -half },
      { x: length * 0.875, y: -half },
      { x: length * 0.965, y: -half + 0.06 },
      { x: length, y: -half + 0.18 },
      { x: length, y: half - 0.18 },
      { x: length * 0.965, y: half - 0.06 },
      { x: length * 0.875, y: half },
      { x: 0.3, y: half },
      { x: 0.07, y: half - 0.05 },
      { x: 0, y: half - 0.18 },
    ];
    return {
      outline,
      datum: 'Rear edge of the roof on the centre line',
      forwardAxis: 'forward',
      surfaces: {
        roof: { name: 'Roof', outline, height: dimension(dimensions, 'height'), conducting: true },
      },
      obstacles: {
        'light-bar': {
          name: 'Light bar',
          outline: polygonRectangle(length * 0.855, -half + 0.18, length * 0.855 + 0.13, half - 0.18),
          base: 0,
          height: dimension(dimensions, 'lightBarHeight'),
          metal: true,
        },
      },
      keepOuts: {
        hatch: {
          name: 'Roof hatch',
          outline: polygonRectangle(length * 0.22, -half * 0.34, length * 0.22 + 0.45, half * 0.34),
          reason: 'The hatch opens and its frame bears no load.',
        },
        'rail-left': {
          name: 'Left roof rail',
          outline: polygonRectangle(0.35, half - rail, length * 0.84, half),
          reason: DRILL_CAUTION,
        },
        'rail-right': {
          name: 'Right roof rail',
          outline: polygonRectangle(0.35, -half, length * 0.84, -half + rail),
          reason: DRILL_CAUTION,
        },
      },
      mountPoints: {
        'blank-front': { name: 'Blanked hole, front', x: length * 0.7, y: 0 },
        'blank-rear': { name: 'Blanked hole, rear', x: length * 0.1, y: 0 },
      },
      cableEntries: {
        'rear-left': { name: 'Rear left gland', x: 0.16, y: half * 0.5 },
        middle: { name: 'Roof lining, middle', x: length * 0.6, y: half * 0.72 },
      },
    };
  },
};

/** The roof of a pickup's crew cab: short, nearly square, with a beacon at its rear. */
export const PICKUP_CAB_ROOF: StarterPlatform = {
  id: 'pickup-cab-roof',
  name: 'Pickup cab roof',
  kind: 'vehicle',
  summary: 'Short steel roof of a crew cab with a beacon',
  dimensions: [
    ...overall([1.45, 0.9, 2.4], [1.36, 1, 1.9], [1.82, 1.4, 2.6], 'Roof above ground'),
    extra('beaconHeight', 'Beacon height', 0.16, 0.03, 0.4, ['beacon']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const half = width / 2;
    const outline: Point[] = [
      { x: 0, y: -half * 0.86 },
      { x: length * 0.06, y: -half * 0.97 },
      { x: length * 0.3, y: -half },
      { x: length * 0.72, y: -half * 0.97 },
      { x: length * 0.95, y: -half * 0.84 },
      { x: length, y: -half * 0.7 },
      { x: length, y: half * 0.7 },
      { x: length * 0.95, y: half * 0.84 },
      { x: length * 0.72, y: half * 0.97 },
      { x: length * 0.3, y: half },
      { x: length * 0.06, y: half * 0.97 },
      { x: 0, y: half * 0.86 },
    ];
    return {
      outline,
      datum: 'Rear edge of the roof on the centre line',
      forwardAxis: 'forward',
      surfaces: {
        roof: { name: 'Roof', outline, height: dimension(dimensions, 'height'), conducting: true },
      },
      obstacles: {
        beacon: {
          name: 'Beacon',
          outline: polygonRegular({ x: length * 0.12, y: half * 0.55 }, 0.08, 12),
          base: 0,
          height: dimension(dimensions, 'beaconHeight'),
          metal: false,
        },
      },
      keepOuts: {
        bow: {
          name: 'Roof bow',
          outline: polygonRectangle(length * 0.46, -half * 0.85, length * 0.46 + 0.06, half * 0.85),
          reason: 'The bow stiffens the roof: do not drill.',
        },
      },
      mountPoints: { 'blank-rear': { name: 'Blanked hole, rear', x: length * 0.2, y: 0 } },
      cableEntries: { rear: { name: 'Rear window channel', x: 0.05, y: -half * 0.4 } },
    };
  },
};

/** The top of a pilot boat's wheelhouse: aluminium, raked front, radar pedestal and signal mast. */
export const PILOT_BOAT_WHEELHOUSE: StarterPlatform = {
  id: 'pilot-boat-wheelhouse',
  name: 'Pilot boat wheelhouse',
  kind: 'vehicle',
  summary: 'Aluminium wheelhouse top with a radar pedestal and a signal mast',
  dimensions: [
    ...overall([3.1, 2.2, 6], [2.5, 1.8, 4.2], [3.6, 2, 8], 'Top above the water'),
    extra('mastHeight', 'Signal mast height', 1.9, 0.5, 5, ['mast']),
    extra('pedestalHeight', 'Radar pedestal height', 0.55, 0.2, 2, ['pedestal']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const half = width / 2;
    const outline: Point[] = [
      { x: 0, y: -half + 0.1 },
      { x: 0.1, y: -half },
      { x: length * 0.68, y: -half },
      { x: length * 0.9, y: -half * 0.74 },
      { x: length, y: -half * 0.36 },
      { x: length, y: half * 0.36 },
      { x: length * 0.9, y: half * 0.74 },
      { x: length * 0.68, y: half },
      { x: 0.1, y: half },
      { x: 0, y: half - 0.1 },
    ];
    const radar = { x: length * 0.58, y: 0 };
    return {
      outline,
      datum: 'Aft edge of the wheelhouse top on the centre line',
      forwardAxis: 'bow',
      surfaces: {
        top: { name: 'Wheelhouse top', outline, height: dimension(dimensions, 'height'), conducting: true },
      },
      obstacles: {
        pedestal: {
          name: 'Radar pedestal',
          outline: polygonRectangle(radar.x - 0.16, -0.16, radar.x + 0.16, 0.16),
          base: 0,
          height: dimension(dimensions, 'pedestalHeight'),
          metal: true,
        },
        mast: {
          name: 'Signal mast',
          outline: polygonRegular({ x: length * 0.2, y: 0 }, 0.06, 12),
          base: 0,
          height: dimension(dimensions, 'mastHeight'),
          metal: true,
        },
        searchlight: {
          name: 'Searchlight',
          outline: polygonRegular({ x: length * 0.9, y: 0 }, 0.13, 12),
          base: 0,
          height: 0.35,
          metal: true,
        },
      },
      keepOuts: {
        radar: {
          name: 'Radar sweep',
          outline: polygonRegular(radar, Math.min(0.7, half * 0.6), 24),
          reason: 'The radar antenna turns here and radiates: nothing may stand in its sweep.',
        },
        ladder: {
          name: 'Ladder head',
          outline: polygonRectangle(0, half * 0.35, 0.45, half * 0.8),
          reason: 'The way up must stay free.',
        },
      },
      mountPoints: {
        'rail-port': { name: 'Rail base, port', x: length * 0.3, y: half * 0.88 },
        'rail-starboard': { name: 'Rail base, starboard', x: length * 0.3, y: -half * 0.88 },
        'bracket-aft': { name: 'Bracket, aft', x: 0.12, y: -half * 0.4 },
      },
      cableEntries: { gland: { name: 'Gland plate', x: length * 0.12, y: -half * 0.15 } },
    };
  },
};
