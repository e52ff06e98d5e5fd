import { accept, refuse, type Result } from '../errors';
import { polygonCentroid } from '../geometry/polygon';
import type { CollectionName, LayoutDocument, ObjectOf, Platform, Point } from './document';
import { valuesEqual } from './equality';
import type { Change } from './operation';
import { collectionOf } from './operations';
import {
  buildPlatformDocument,
  findStarterPlatform,
  initialDimensions,
  type Dimensions,
} from './starter-platforms';
import { starterObjectId } from './starters/starter';

const DRAWN: readonly CollectionName[] = ['surfaces', 'obstacles', 'keepOuts', 'mountPoints', 'cableEntries'];

/**
 * The dimensions that a platform has now, m: length, width and height as typed, the heights of what stands on
 * it as the starter would have drawn them.
 */
export function platformDimensions(document: LayoutDocument): Dimensions {
  const starter = findStarterPlatform(document.platform.starter);
  const { length, width, height } = document.platform;
  const overall = { length, width, height };
  if (!starter) return overall;
  const dimensions: Record<string, number> = { ...initialDimensions(starter), ...overall };
  for (const { key, obstacles } of starter.dimensions) {
    const standing = obstacles
      .map((name) => document.obstacles[starterObjectId(starter.id, 'obstacles', name)])
      .find((obstacle) => obstacle !== undefined);
    if (standing) dimensions[key] = standing.height;
  }
  return dimensions;
}

/**
 * The changes that give a platform other dimensions (m; those left out stay). What still is as the starter drew
 * it is drawn anew; a surface that was edited is stretched; what else was edited or added keeps its size and
 * moves with its place. Antennas stay where they were measured: `misplacedAntennas` tells which of them no
 * longer stand well.
 */
export function resizePlatform(document: LayoutDocument, dimensions: Dimensions): Result<readonly Change[]> {
  const { platform } = document;
  const wanted = { ...platformDimensions(document), ...dimensions };
  const { length, width, height } = wanted;
  if (length === undefined || width === undefined || height === undefined) {
    return refuse('invalid', 'Length, width and height are needed.');
  }
  const before = buildPlatformDocument(platform.starter, platformDimensions(document));
  const after = buildPlatformDocument(platform.starter, wanted);
  if (findStarterPlatform(platform.starter) && !after.ok) return after;
  const stretch = (point: Point): Point => ({
    x: (point.x * length) / platform.length,
    y: (point.y * width) / platform.width,
  });
  const changes: Change[] = [];
  const untouched = before.ok && valuesEqual(platform.outline, before.value.platform.outline);
  const outline = untouched && after.ok ? after.value.platform.outline : platform.outline.map(stretch);
  const fields: Partial<Platform> = differing(platform, { length, width, height, outline });
  if (Object.keys(fields).length > 0) changes.push({ kind: 'set-platform', fields });
  for (const collection of DRAWN) {
    for (const object of Object.values(collectionOf(document, collection))) {
      const drawn = before.ok ? collectionOf(before.value, collection)[object.id] : undefined;
      const anew = after.ok ? collectionOf(after.value, collection)[object.id] : undefined;
      const next =
        drawn && anew && valuesEqual(object, drawn)
          ? anew
          : {
              ...object,
              ...movedWith(object, collection, stretch),
              ...raised(object, platform.height, height, collection),
            };
      const { id, ...rest } = differing(object, next);
      if (Object.keys(rest).length > 0)
        changes.push({ kind: 'set', collection, id: object.id, fields: rest });
    }
  }
  return accept(changes);
}

/** Where an object goes when the platform is stretched: surfaces stretch too, other outlines keep their size. */
function movedWith(
  object: ObjectOf<CollectionName>,
  collection: CollectionName,
  stretch: (point: Point) => Point,
): { outline?: Point[]; x?: number; y?: number } {
  if ('outline' in object) {
    if (collection === 'surfaces') return { outline: object.outline.map(stretch) };
    const centre = polygonCentroid(object.outline);
    const moved = stretch(centre);
    return {
      outline: object.outline.map(({ x, y }) => ({ x: x + moved.x - centre.x, y: y + moved.y - centre.y })),
    };
  }
  return 'x' in object ? stretch({ x: object.x, y: object.y }) : {};
}

/** A surface keeps its step above or below the platform's main height. */
function raised(
  object: ObjectOf<CollectionName>,
  from: number,
  to: number,
  collection: CollectionName,
): { height?: number } {
  if (collection !== 'surfaces' || !('height' in object)) return {};
  return { height: Math.max(0, object.height + to - from) };
}

function differing<T extends object>(before: T, after: Partial<T>): Partial<T> {
  const fields = Object.entries(after).filter(
    ([name, value]) => !valuesEqual((before as Record<string, unknown>)[name], value),
  );
  return Object.fromEntries(fields) as Partial<T>;
}
