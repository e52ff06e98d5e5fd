import { accept, refuse, type Problem, type Result } from '../errors';
import type { LayoutDocument } from './document';
import { HANDSET_BOARD, TRACKER_BOARD } from './starters/handset-starters';
import { FLAT_OFFICE_ROOF, MAST_HEAD } from './starters/rooftop-starters';
import { documentOf, type Dimensions, type StarterPlatform } from './starters/starter';
import { PICKUP_CAB_ROOF, PILOT_BOAT_WHEELHOUSE, VAN_ROOF } from './starters/vehicle-starters';

export type { Dimensions, StarterDimension, StarterPlatform } from './starters/starter';

/** The outlines that a survey can begin with. */
export const STARTER_PLATFORMS: readonly StarterPlatform[] = [
  VAN_ROOF,
  PICKUP_CAB_ROOF,
  PILOT_BOAT_WHEELHOUSE,
  FLAT_OFFICE_ROOF,
  MAST_HEAD,
  HANDSET_BOARD,
  TRACKER_BOARD,
];

/** The starter with that identifier, or null. */
export function findStarterPlatform(starterId: string): StarterPlatform | null {
  return STARTER_PLATFORMS.find((starter) => starter.id === starterId) ?? null;
}

/**
 * The document of a starter with typed dimensions (m); those left out are the starter's own. Refused with a
 * path per dimension that it does not have or that is out of its range.
 */
export function buildPlatformDocument(
  starterId: string,
  dimensions: Dimensions = {},
): Result<LayoutDocument> {
  const starter = findStarterPlatform(starterId);
  if (!starter) {
    return refuse('invalid', 'There is no starter outline of that name.', [
      { path: 'starter', message: `is none of ${STARTER_PLATFORMS.map(({ id }) => id).join(', ')}` },
    ]);
  }
  const problems = dimensionProblems(starter, dimensions);
  if (problems.length > 0) return refuse('invalid', 'The dimensions do not suit this outline.', problems);
  return accept(documentOf(starter, { ...initialDimensions(starter), ...dimensions }));
}

/** The dimensions that a starter has when nothing is typed, m. */
export function initialDimensions(starter: StarterPlatform): Dimensions {
  return Object.fromEntries(starter.dimensions.map(({ key, initial }) => [key, initial]));
}

/** What is wrong with typed dimensions; paths begin with `dimensions`. */
export function dimensionProblems(starter: StarterPlatform, dimensions: Dimensions): Problem[] {
  return Object.entries(dimensions).flatMap(([key, value]) => {
    const path = `dimensions.${key}`;
    const range = starter.dimensions.find((dimension) => dimension.key === key);
    if (!range) return [{ path, message: 'is not a dimension of this outline' }];
    if (!Number.isFinite(value)) return [{ path, message: 'is not a finite number' }];
    if (value < range.least) return [{ path, message: `is less than ${range.least} m` }];
    return value > range.most ? [{ path, message: `is more than ${range.most} m` }] : [];
  });
}
