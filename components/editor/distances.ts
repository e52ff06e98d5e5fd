import { pointDistance } from '@/shared/geometry/point';
import { polygonAxisDistances } from '@/shared/geometry/polygon';
import type { LayoutDocument, PlacedAntenna, Point } from '@/shared/layout/document';
import { surfaceAt } from '@/shared/layout/placement';
import { wavelength } from '@/shared/units/constants';
import type { Distance } from './editor-snapshot';

/** So many neighbours get a distance line, the nearest ones; more would hide the drawing. */
const NEIGHBOURS_SHOWN = 3;

/**
 * The frequency that an antenna's wavelengths are counted at, Hz: the middle of its radio's first transmit band, else
 * of its first receive band; null without a radio or a band.
 */
export function antennaFrequency(
  document: Pick<LayoutDocument, 'radios'>,
  antenna: Pick<PlacedAntenna, 'radioId'>,
): number | null {
  if (antenna.radioId === null || !Object.hasOwn(document.radios, antenna.radioId)) return null;
  const radio = document.radios[antenna.radioId];
  const band = radio?.transmitBands[0] ?? radio?.receiveBands[0];
  return band ? (band.from + band.to) / 2 : null;
}

/**
 * Distances of an antenna at a point: along both axes to the nearest edge of the surface it stands on, then to its
 * nearest neighbours; in metres and in wavelengths of the antenna's own band.
 */
export function distancesFrom(
  document: LayoutDocument,
  antenna: Pick<PlacedAntenna, 'id' | 'radioId'>,
  point: Point,
  options: { readonly without?: readonly string[] } = {},
): Distance[] {
  const frequency = antennaFrequency(document, antenna);
  const inWavelengths = (length: number) => (frequency === null ? null : length / wavelength(frequency));
  return [...edgeDistances(document, point), ...neighbourDistances(document, antenna.id, point, options)].map(
    (distance) => ({ ...distance, wavelengths: inWavelengths(distance.length) }),
  );
}

type Bare = Omit<Distance, 'wavelengths'>;

function edgeDistances(document: LayoutDocument, point: Point): Bare[] {
  const outline = surfaceAt(document, point)?.outline;
  if (!outline) return [];
  const { ahead, behind, left, right } = polygonAxisDistances(outline, point);
  const along = nearer(ahead, behind);
  const across = nearer(left, right);
  return [
    ...(along === null ? [] : [edge(point, { x: point.x + along, y: point.y })]),
    ...(across === null ? [] : [edge(point, { x: point.x, y: point.y + across })]),
  ];
}

function edge(from: Point, end: Point): Bare {
  return { to: { kind: 'edge' }, from, end, length: pointDistance(from, end) };
}

/** The shorter of two distances, with the sign of its direction; null when there is neither. */
function nearer(forward: number | null, backward: number | null): number | null {
  if (forward === null) return backward === null ? null : -backward;
  return backward === null || forward <= backward ? forward : -backward;
}

function neighbourDistances(
  document: LayoutDocument,
  id: string,
  point: Point,
  { without = [] }: { readonly without?: readonly string[] },
): Bare[] {
  return Object.values(document.antennas)
    .filter((other) => other.id !== id && !without.includes(other.id))
    .map((other) => ({
      to: { kind: 'antenna' as const, id: other.id },
      from: point,
      end: { x: other.x, y: other.y },
      length: pointDistance(point, other),
    }))
    .sort((a, b) => a.length - b.length)
    .slice(0, NEIGHBOURS_SHOWN);
}
