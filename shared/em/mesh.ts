import { chainOfWire, wireLength, type Chain } from './chain';
import { wavelength } from './constants';
import type { Ground, Wire } from './scene';
import { endsOnPlane, standsOnPlane } from './validity';

/**
 * A wire cut into pieces. The unknowns are the peak-referred currents of the nodes `firstNode` ... `lastNode`;
 * an end is among them only where its current goes on, in the plane's image (or, in time, in a junction).
 */
export type WireMesh = {
  readonly wire: Wire;
  readonly chain: Chain;
  readonly firstNode: number;
  readonly lastNode: number;
  /** The node that carries the port, or null. */
  readonly portNode: number | null;
  /** Whether the current is one assumed sinusoid and not solved. */
  readonly isOnePiece: boolean;
};

/** Segments per wavelength of a solved current: the mesh adds less than 0.05 dB to an isolation. */
const segmentsPerWavelength = 14;
/** However short the wire, its charge crowds toward the tip. */
const leastSegments = 8;
/** Pieces below 2.5 radii leave the thin-wire approximation; the mesh rather stays coarse. */
const leastSegmentInRadii = 2.5;

/** One piece per wire, the textbook's sinusoid: an arm on the plane, or two arms in the air. */
export function meshOfOnePiece(wire: Wire, ground: Ground): WireMesh {
  const starts = standsOnPlane(wire, ground);
  const ends = !starts && endsOnPlane(wire, ground);
  const node = starts ? 0 : 1;
  const port = wire.feed === 'none' ? null : node;
  const chain = chainOfWire(wire, starts || ends ? 1 : 2);
  return { wire, chain, firstNode: node, lastNode: node, portNode: port, isOnePiece: true };
}

/** As many pieces as the frequency (hertz) asks for. `refinement` multiplies their number. */
export function meshOfManyPieces(wire: Wire, ground: Ground, frequency: number, refinement = 1): WireMesh {
  const segments = segmentCount(wire, frequency, refinement);
  const starts = standsOnPlane(wire, ground);
  const ends = endsOnPlane(wire, ground);
  const port = wire.feed === 'none' ? null : wire.feed === 'start' ? 0 : segments / 2;
  return {
    wire,
    chain: chainOfWire(wire, segments),
    firstNode: starts ? 0 : 1,
    lastNode: ends ? segments : segments - 1,
    portNode: port,
    isOnePiece: false,
  };
}

/** Number of unknowns of a mesh. */
export function unknownCount(mesh: WireMesh): number {
  return mesh.lastNode - mesh.firstNode + 1;
}

/** Even, so that a centre feed finds its node. */
function segmentCount(wire: Wire, frequency: number, refinement: number): number {
  const length = wireLength(wire);
  const wanted =
    Math.max(leastSegments, (segmentsPerWavelength * length) / wavelength(frequency)) * refinement;
  const most = length / (leastSegmentInRadii * wire.radius);
  return 2 * Math.max(1, Math.ceil(Math.min(wanted, most) / 2));
}
