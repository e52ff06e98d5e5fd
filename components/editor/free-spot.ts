import { boxAround, boxCentre } from '@/shared/geometry/box';
import { pointDistance } from '@/shared/geometry/point';
import type { LayoutDocument, PlacedAntenna, Point } from '@/shared/layout/document';
import { placementProblem } from '@/shared/layout/placement';
import { gridStep } from './key-commands';
import { roundTo } from './snap-spot';

/** Places tried along the longer side of the platform. */
const PLACES_ALONG = 24;

/**
 * The place on the grid nearest to the platform's middle where an antenna may stand with room around it; with less
 * room when the platform is crowded; null when it may stand nowhere.
 */
export function freeSpot(document: LayoutDocument, antenna: PlacedAntenna): Point | null {
  const box = boxAround(document.platform.outline);
  const step = gridStep(document);
  const pitch = Math.max(
    step,
    roundTo(Math.max(box.maxX - box.minX, box.maxY - box.minY) / PLACES_ALONG, step),
  );
  const centre = boxCentre(box);
  const allowed = placesOver(box, pitch, step)
    .filter((place) => !placementProblem(document, { ...antenna, ...place }))
    .sort((a, b) => pointDistance(a, centre) - pointDistance(b, centre));
  const standing = Object.values(document.antennas);
  for (const room of [3 * pitch, 1.5 * pitch, step]) {
    const found = allowed.find((place) => standing.every((other) => pointDistance(other, place) >= room));
    if (found) return found;
  }
  return null;
}

function placesOver(box: ReturnType<typeof boxAround>, pitch: number, step: number): Point[] {
  const places: Point[] = [];
  for (let x = box.minX + pitch / 2; x <= box.maxX; x += pitch) {
    for (let y = box.minY + pitch / 2; y <= box.maxY; y += pitch) {
      places.push({ x: roundTo(x, step), y: roundTo(y, step) });
    }
  }
  return places;
}
