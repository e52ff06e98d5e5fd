import { polygonRectangle, polygonRegular } from '../../geometry/polygon';
import { dimension, extra, footprint, overall, type StarterPlatform } from './starter';

/** A flat office roof: parapet all around, two air-conditioning units, hatch and walkway. True north is +x. */
export const FLAT_OFFICE_ROOF: StarterPlatform = {
  id: 'flat-office-roof',
  name: 'Flat office roof',
  kind: 'rooftop',
  summary: 'Roofing felt on concrete with a parapet and two air-conditioning units',
  dimensions: [
    ...overall([12, 6, 60], [8, 5, 40], [9.6, 3, 120], 'Roof above ground'),
    extra('parapetHeight', 'Parapet height', 0.5, 0.1, 1.5, ['south', 'north', 'east', 'west']),
    extra('unitHeight', 'Air-conditioning unit height', 1.3, 0.4, 3, ['unit-1', 'unit-2']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const wall = 0.25;
    const unit = { length: Math.min(2, length * 0.2), width: Math.min(1.2, width * 0.18) };
    const outline = polygonRectangle(0, 0, length, width);
    const parapet = { base: 0, height: dimension(dimensions, 'parapetHeight'), metal: false };
    const machine = { base: 0, height: dimension(dimensions, 'unitHeight'), metal: true };
    const unitX = length * 0.4;
    return {
      outline,
      datum: 'South-east corner, outer face of the parapet',
      forwardAxis: 'true north',
      surfaces: {
        roof: { name: 'Roof', outline, height: dimension(dimensions, 'height'), conducting: false },
      },
      obstacles: {
        south: { name: 'Parapet, south', outline: polygonRectangle(0, 0, wall, width), ...parapet },
        north: {
          name: 'Parapet, north',
          outline: polygonRectangle(length - wall, 0, length, width),
          ...parapet,
        },
        east: { name: 'Parapet, east', outline: polygonRectangle(wall, 0, length - wall, wall), ...parapet },
        west: {
          name: 'Parapet, west',
          outline: polygonRectangle(wall, width - wall, length - wall, width),
          ...parapet,
        },
        'unit-1': {
          name: 'Air-conditioning unit 1',
          outline: polygonRectangle(unitX, width * 0.28, unitX + unit.length, width * 0.28 + unit.width),
          ...machine,
        },
        'unit-2': {
          name: 'Air-conditioning unit 2',
          outline: polygonRectangle(unitX, width * 0.6, unitX + unit.length, width * 0.6 + unit.width),
          ...machine,
        },
      },
      keepOuts: {
        hatch: {
          name: 'Roof hatch',
          outline: polygonRectangle(length * 0.08, width * 0.12, length * 0.08 + 1, width * 0.12 + 1),
          reason: 'The way out must stay free.',
        },
        walkway: {
          name: 'Service walkway',
          outline: polygonRectangle(unitX - 0.9, width * 0.26, unitX - 0.1, width * 0.6 + unit.width),
          reason: 'Technicians pass here to the air-conditioning units.',
        },
      },
      mountPoints: {
        'pole-nw': { name: 'Pole bracket, north-west', x: length - wall / 2, y: width - 1 },
        'pole-ne': { name: 'Pole bracket, north-east', x: length - wall / 2, y: 1 },
        'pole-sw': { name: 'Pole bracket, south-west', x: wall / 2, y: width - 1 },
        'pole-se': { name: 'Pole bracket, south-east', x: wall / 2, y: 1 },
      },
      cableEntries: { gooseneck: { name: 'Gooseneck duct', x: length * 0.25, y: width * 0.8 } },
    };
  },
};

/** The head of a mast: arms around a tube, a lightning rod on top. True north is +x. */
export const MAST_HEAD: StarterPlatform = {
  id: 'mast-head',
  name: 'Mast head',
  kind: 'rooftop',
  summary: 'Open head frame with arms around a steel tube',
  dimensions: [
    ...overall([2.4, 1, 6], [2.4, 1, 6], [24, 4, 120], 'Head frame above ground'),
    extra('tubeHeight', 'Tube above the frame', 2.2, 0.2, 8, ['tube']),
  ],
  draw(dimensions) {
    const { length, width } = footprint(dimensions);
    const outline = polygonRegular({ x: 0, y: 0 }, 1, 12).map(({ x, y }) => ({
      x: (x * length) / 2,
      y: (y * width) / 2,
    }));
    return {
      outline,
      datum: 'Middle of the mast tube, top face of the head frame',
      forwardAxis: 'true north',
      surfaces: {
        frame: {
          name: 'Reach of the arms',
          outline,
          height: dimension(dimensions, 'height'),
          conducting: false,
        },
      },
      obstacles: {
        tube: {
          name: 'Mast tube',
          outline: polygonRegular({ x: 0, y: 0 }, 0.11, 16),
          base: 0,
          height: dimension(dimensions, 'tubeHeight'),
          metal: true,
        },
      },
      keepOuts: {
        climb: {
          name: 'Climbing way',
          outline: polygonRectangle(-length * 0.42, -0.25, -0.15, 0.25),
          reason: 'The climbing way and its fall arrester must stay free.',
        },
      },
      mountPoints: {
        'arm-north': { name: 'Arm, north', x: length * 0.45, y: 0 },
        'arm-south-east': { name: 'Arm, south-east', x: -length * 0.22, y: -width * 0.38 },
        'arm-south-west': { name: 'Arm, south-west', x: -length * 0.22, y: width * 0.38 },
      },
      cableEntries: { ladder: { name: 'Cable ladder', x: -0.14, y: 0.14 } },
    };
  },
};
