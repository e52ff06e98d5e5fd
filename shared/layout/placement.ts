import { boxAround, boxContains } from '../geometry/box';
import { EDGE_TOLERANCE, polygonContains, polygonContainsStrictly, type Polygon } from '../geometry/polygon';
import type { AntennaPart, LayoutDocument, PlacedAntenna, Point, Surface } from './document';
import { compareLabels } from './labels';

/** Why an antenna may not stand somewhere; `objectId` names the keep-out or obstacle. */
export type PlacementProblem = {
  readonly code: 'off-surface' | 'keep-out' | 'obstacle';
  readonly message: string;
  readonly objectId: string | null;
};

/** Where something would stand: on the plan, and how far above the surface. */
export type Spot = Point & { readonly mountHeight: number; readonly part?: AntennaPart };

/** An antenna that stands where it may not, since the platform was changed under it. */
export type MisplacedAntenna = { readonly antenna: PlacedAntenna; readonly problem: PlacementProblem };

/** The surface that a point stands on: the highest of those that hold it, null beside all of them. */
export function surfaceAt(document: LayoutDocument, point: Point): Surface | null {
  let best: Surface | null = null;
  for (const surface of Object.values(document.surfaces)) {
    if (best && surface.height <= best.height) continue;
    if (polygonContains(surface.outline, point)) best = surface;
  }
  return best;
}

/**
 * Why an antenna may not stand at a spot, or null when it may. It must stand on a surface (the edge counts),
 * outside every keep-out, and neither in nor under an obstacle between its lowest and its highest point.
 */
export function placementProblem(document: LayoutDocument, spot: Spot): PlacementProblem | null {
  if (!surfaceAt(document, spot)) {
    return { code: 'off-surface', message: 'It would stand off the surface.', objectId: null };
  }
  for (const keepOut of Object.values(document.keepOuts)) {
    if (inside(keepOut.outline, spot)) {
      const message = `It would stand in the keep-out “${keepOut.name}”: ${keepOut.reason}`;
      return { code: 'keep-out', message: sentence(message), objectId: keepOut.id };
    }
  }
  const { low, high } = verticalExtent(spot);
  for (const obstacle of Object.values(document.obstacles)) {
    // What stands on top of it touches it: the sum of two heights may end a rounding above the mount.
    const clear = low >= obstacle.base + obstacle.height - EDGE_TOLERANCE || high < obstacle.base;
    if (!clear && inside(obstacle.outline, spot)) {
      return {
        code: 'obstacle',
        message: sentence(`It would stand in “${obstacle.name}”`),
        objectId: obstacle.id,
      };
    }
  }
  return null;
}

/** The antennas that stand where they may not, in the order of their labels. */
export function misplacedAntennas(document: LayoutDocument): MisplacedAntenna[] {
  return Object.values(document.antennas)
    .flatMap((antenna) => {
      const problem = placementProblem(document, antenna);
      return problem ? [{ antenna, problem }] : [];
    })
    .sort((a, b) => compareLabels(a.antenna, b.antenna));
}

/** Lowest and highest point of an antenna above its surface, m, taken upright. */
export function verticalExtent({ mountHeight, part }: Spot): { readonly low: number; readonly high: number } {
  let [low, high] = [mountHeight, mountHeight];
  for (const element of part?.elements ?? []) {
    const foot = mountHeight + element.offset.z;
    const length = element.kind === 'wire' ? element.length : 0;
    const below = element.kind === 'wire' && element.form === 'dipole' ? length / 2 : 0;
    low = Math.min(low, foot - below);
    high = Math.max(high, foot - below + length);
  }
  return { low, high };
}

function inside(outline: Polygon, point: Point): boolean {
  return boxContains(boxAround(outline), point) && polygonContainsStrictly(outline, point);
}

function sentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}
