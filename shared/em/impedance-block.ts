import { createComplexMatrix, type ComplexMatrix } from '../numerics/complex-matrix';
import { chainMirrored, segmentDistance } from './chain';
import { freeSpaceImpedance } from './constants';
import type { WireMesh } from './mesh';
import { addChainBlock, addParallelBlock } from './reaction';
import type { Ground } from './scene';

/** Directions within 1e-8 rad of upright or horizontal count as such. */
const straightWithin = 1e-16;

/** The thin limit is taken at this share of the radius: what remains of it is below 1e-3 ohm. */
const thinShare = 1e-4;

/**
 * Self impedance block of one assumed sinusoid as the textbooks have it: of the radius only its logarithm is kept,
 * X(a) = X(a0) + (eta / 4 pi) 2 sin(2kh) ln(a / a0), half of that for an arm on the plane. A half-wave dipole has
 * its 42.5 ohm at every radius then; the terms left out are of the order of k a.
 * @source Balanis 2016, equations 8-60 and 8-61 (Ci(2ka^2/l) for small arguments)
 */
export function onePieceSelfBlock(k: number, ground: Ground, mesh: WireMesh): ComplexMatrix {
  const { chain, wire } = mesh;
  const [ux, uy] = chain.direction;
  // A sloping whip meets its image at an angle; the closed form knows straight wires alone.
  if (chain.segments === 1 && ux * ux + uy * uy >= straightWithin) return selfBlock(k, ground, mesh);
  const thin = { ...mesh, wire: { ...wire, radius: thinShare * wire.radius } };
  const block = selfBlock(k, ground, thin);
  const at = mesh.firstNode * block.columns + mesh.firstNode;
  const logarithm = chain.segments * Math.sin(2 * k * chain.step) * Math.log(1 / thinShare);
  block.im[at]! += (freeSpaceImpedance / (4 * Math.PI)) * logarithm;
  return block;
}

/**
 * Impedances between the node currents of one wire, its image included, all nodes by all nodes. The test
 * filament lies one radius off the axis. Over the plane only the real wire is tested: a whip gets half of the
 * dipole's impedance without further halving.
 */
export function selfBlock(k: number, ground: Ground, mesh: WireMesh): ComplexMatrix {
  const { chain, wire } = mesh;
  const block = createComplexMatrix(chain.segments + 1, chain.segments + 1);
  addParallelBlock(k, chain, chain, 'difference', wire.radius, 1, block.re, block.im);
  if (ground === 'none') return block;
  const image = chainMirrored(chain);
  const [ux, uy, uz] = chain.direction;
  if (ux * ux + uy * uy < straightWithin) {
    addParallelBlock(k, image, chain, 'sum', wire.radius, -1, block.re, block.im);
  } else if (uz * uz < straightWithin) {
    addParallelBlock(k, image, chain, 'difference', wire.radius, -1, block.re, block.im);
  } else {
    addChainBlock(k, image, chain, wire.radius, -1, block.re, block.im);
  }
  return block;
}

/** Impedances between the node currents of two wires, nodes of `source` by nodes of `test`, images included. */
export function mutualBlock(k: number, ground: Ground, source: WireMesh, test: WireMesh): ComplexMatrix {
  const block = createComplexMatrix(source.chain.segments + 1, test.chain.segments + 1);
  const offset = overlapOffset(source, test);
  addChainBlock(k, source.chain, test.chain, offset, 1, block.re, block.im);
  if (ground === 'plane') {
    addChainBlock(k, chainMirrored(source.chain), test.chain, offset, -1, block.re, block.im);
  }
  return block;
}

/** Wires that run through each other are never held; a shift by the greater radius keeps their numbers finite. */
function overlapOffset(source: WireMesh, test: WireMesh): number {
  const a = source.wire;
  const b = test.wire;
  const distance = segmentDistance(a.start, a.end, b.start, b.end);
  return distance < a.radius + b.radius ? Math.max(a.radius, b.radius) : 0;
}
