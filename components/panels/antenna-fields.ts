import type { QuantityReading } from '@/components/ui/quantity-field';
import type { LayoutDocument, PlacedAntenna } from '@/shared/layout/document';
import { placementProblem } from '@/shared/layout/placement';

/** Numbers of a placed antenna that can be typed. */
export type AntennaNumber = 'x' | 'y' | 'mountHeight' | 'azimuthDeg' | 'tiltDeg' | 'feederLossDb';

const BOUNDS: Readonly<Record<AntennaNumber, readonly [number, number, string]>> = {
  x: [-1000, 1000, 'At most 1000 m from the datum.'],
  y: [-1000, 1000, 'At most 1000 m from the datum.'],
  mountHeight: [0, 1000, 'From 0 to 1000 m above the surface.'],
  azimuthDeg: [-360, 360, 'From −360 to 360 degrees.'],
  tiltDeg: [0, 90, 'From 0 (upright) to 90 degrees.'],
  feederLossDb: [0, 100, 'From 0 to 100 dB.'],
};

/** Takes a number for an antenna only when it lies within bounds and the antenna may stand there. */
export function checkAntennaNumber(
  document: LayoutDocument,
  antenna: PlacedAntenna,
  field: AntennaNumber,
  reading: QuantityReading,
): QuantityReading {
  if (!reading.ok) return reading;
  const [least, most, message] = BOUNDS[field];
  if (reading.value < least || reading.value > most) return { ok: false, message };
  if (field !== 'x' && field !== 'y' && field !== 'mountHeight') return reading;
  const problem = placementProblem(document, { ...antenna, [field]: reading.value });
  return problem ? { ok: false, message: problem.message } : reading;
}

/** A bearing as it is kept: 0 up to, but not including, 360. */
export function turnedBearing(degrees: number): number {
  return ((degrees % 360) + 360) % 360;
}

/** Why a mark on the drawing is refused: empty, too long, another antenna's. */
export function labelProblem(document: LayoutDocument, antennaId: string, text: string): string | null {
  if (text === '') return 'A mark is needed, such as A4.';
  if (text.length > 12) return 'At most 12 characters, so that it fits on the drawing.';
  const taken = Object.values(document.antennas).some(({ id, label }) => id !== antennaId && label === text);
  return taken ? `${text} stands on the plan already.` : null;
}
