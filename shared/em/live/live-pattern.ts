import { complexSolve } from '../../numerics/complex-lu';
import { createComplexMatrix, type ComplexMatrix } from '../../numerics/complex-matrix';
import { chainOfWire, type Chain } from '../chain';
import { loadOf } from '../network';
import { acceptedPower, azimuthsOf, comparePatterns, gainDbi } from '../pattern';
import { addRadiationVector, directionOf, intensityOf, transverseParts } from '../radiation';
import type { Complex, Ground, Pattern, PatternRequest, Vector3 } from '../scene';
import { drivenCurrents } from './bordered-network';
import type { FrequencySystem, Slot } from './frequency-system';

/**
 * How the functions of one wire radiate into one cut. The shape belongs to the wire's kind and direction, the
 * phase to its place; a vertical wire has one shape for all bearings.
 */
type Radiation = {
  readonly azimuthDeg: readonly number[];
  readonly directions: readonly Vector3[];
  /** Azimuths (one for a vertical wire) by functions by theta re, theta im, phi re, phi im. */
  shape: Float64Array;
  readonly phaseRe: Float64Array;
  readonly phaseIm: Float64Array;
  aloneDbi: number[];
  kind: number;
  place: number;
};

/** The cuts asked for so far at one frequency, by wire and cut. */
export type RadiationCache = Map<Slot, Map<string, Radiation>>;

/**
 * Azimuth cut of the wire at slot `driven` of an up-to-date system, all other ports closed.
 * @throws RangeError for a wire without a port
 */
export function livePattern(
  system: FrequencySystem,
  cache: RadiationCache,
  driven: number,
  request: PatternRequest,
): Pattern {
  const port = system.portOf[driven]!;
  if (port < 0 || system.network === null)
    throw new RangeError('a wire without a port has no pattern of its own');
  const own = radiationOf(system, cache, system.slots[driven]!, request);
  const size = system.slots.reduce((sum, slot) => sum + slot.own.count, 0);
  const re = new Float64Array(size);
  const im = new Float64Array(size);
  drivenCurrents(system.network, port, re, im);
  const bearings = own.azimuthDeg.length;
  const total = new Float64Array(4 * bearings);
  let start = 0;
  for (const i of system.order) {
    const slot = system.slots[i]!;
    addFunctions(radiationOf(system, cache, slot, request), slot.own.count, re, im, start, total);
    start += slot.own.count;
  }
  const slot = system.slots[driven]!;
  const { loadedAdmittance: y } = system.network;
  const at = port * y.columns + port;
  const power = acceptedPower({ re: y.re[at]!, im: y.im[at]! }, loadOf(slot.wire));
  return comparePatterns(own.azimuthDeg, gains(slot.own.k, total, power), own.aloneDbi);
}

/** Port current per volt, siemens, and the functions' currents of a wire alone, its port closed by `load`. */
export function solveAlone(
  slot: Slot,
  load: Complex,
): { admittance: Complex; re: Float64Array; im: Float64Array } {
  const { count, impedance, portCurrents } = slot.own;
  if (portCurrents === null) throw new RangeError(`wire ${slot.wire.id} has no port`);
  const z: ComplexMatrix = { ...impedance, re: impedance.re.slice(), im: impedance.im.slice() };
  const right = createComplexMatrix(count, 1);
  right.re.set(portCurrents);
  for (let a = 0; a < count; a += 1) {
    for (let b = 0; b < count; b += 1) {
      z.re[a * count + b]! += portCurrents[a]! * portCurrents[b]! * load.re;
      z.im[a * count + b]! += portCurrents[a]! * portCurrents[b]! * load.im;
    }
  }
  const { re, im } = complexSolve(z, right);
  const sum = (part: Float64Array) => part.reduce((total, value, m) => total + value * portCurrents[m]!, 0);
  return { admittance: { re: sum(re), im: sum(im) }, re, im };
}

function radiationOf(
  system: FrequencySystem,
  cache: RadiationCache,
  slot: Slot,
  request: PatternRequest,
): Radiation {
  const key = `${request.elevationDeg} ${request.stepDeg}`;
  let cuts = cache.get(slot);
  if (cuts === undefined) cache.set(slot, (cuts = new Map<string, Radiation>()));
  let radiation = cuts.get(key);
  if (radiation === undefined) cuts.set(key, (radiation = emptyRadiation(request)));
  if (radiation.kind !== slot.kind) {
    radiation.kind = slot.kind;
    radiation.shape = shapeOf(system.ground, slot, radiation.directions);
    if (slot.own.portCurrents !== null) radiation.aloneDbi = aloneGains(slot, radiation);
  }
  if (radiation.place !== slot.place) {
    radiation.place = slot.place;
    setPhases(system.ground, slot, radiation);
  }
  return radiation;
}

function emptyRadiation(request: PatternRequest): Radiation {
  const azimuthDeg = azimuthsOf(request);
  return {
    azimuthDeg,
    directions: azimuthDeg.map((azimuth) => directionOf(azimuth, request.elevationDeg)),
    shape: new Float64Array(0),
    phaseRe: new Float64Array(azimuthDeg.length),
    phaseIm: new Float64Array(azimuthDeg.length),
    aloneDbi: [],
    kind: -1,
    place: -1,
  };
}

/** The wire is laid at the origin of the phases: above the plane at its own height, in free space at zero. */
function shapeOf(ground: Ground, slot: Slot, directions: readonly Vector3[]): Float64Array {
  const { own, wire, sense } = slot;
  const laid = chainOfWire(wire, own.mesh.chain.segments);
  const chain: Chain = { ...laid, origin: [0, 0, ground === 'plane' ? wire.start[2] : 0] };
  const nodes = chain.segments + 1;
  const column = { chain, re: new Float64Array(nodes), im: new Float64Array(nodes) };
  const bearings = sense === 0 ? directions.length : 1;
  const shape = new Float64Array(bearings * own.count * 4);
  const n = new Float64Array(6);
  for (let m = 0; m < own.count; m += 1) {
    for (let i = 0; i < nodes; i += 1) column.re[i] = own.functions[i * own.count + m]!;
    for (let b = 0; b < bearings; b += 1) {
      n.fill(0);
      addRadiationVector(own.k, ground, column, directions[b]!, n);
      const { theta, phi } = transverseParts(n, directions[b]!);
      shape.set([theta.re, theta.im, phi.re, phi.im], (b * own.count + m) * 4);
    }
  }
  return shape;
}

function setPhases(ground: Ground, slot: Slot, radiation: Radiation): void {
  const [x, y, z] = slot.wire.start;
  const { k } = slot.own;
  radiation.directions.forEach(([rx, ry, rz], b) => {
    const phase = k * (x * rx + y * ry + (ground === 'none' ? z * rz : 0));
    radiation.phaseRe[b] = Math.cos(phase);
    radiation.phaseIm[b] = Math.sin(phase);
  });
}

/** Adds sum_m c_m shape_m e^{j phase} to `total` (bearings by theta re, theta im, phi re, phi im). */
function addFunctions(
  radiation: Radiation,
  count: number,
  re: Float64Array,
  im: Float64Array,
  start: number,
  total: Float64Array,
): void {
  const { shape, phaseRe, phaseIm } = radiation;
  const stride = shape.length > count * 4 ? count * 4 : 0;
  let thetaRe = 0;
  let thetaIm = 0;
  let phiRe = 0;
  let phiIm = 0;
  for (let b = 0; b < phaseRe.length; b += 1) {
    if (b === 0 || stride > 0) {
      thetaRe = thetaIm = phiRe = phiIm = 0;
      for (let m = 0; m < count; m += 1) {
        const at = b * stride + m * 4;
        const cr = re[start + m]!;
        const ci = im[start + m]!;
        thetaRe += cr * shape[at]! - ci * shape[at + 1]!;
        thetaIm += cr * shape[at + 1]! + ci * shape[at]!;
        phiRe += cr * shape[at + 2]! - ci * shape[at + 3]!;
        phiIm += cr * shape[at + 3]! + ci * shape[at + 2]!;
      }
    }
    const c = phaseRe[b]!;
    const s = phaseIm[b]!;
    total[4 * b]! += thetaRe * c - thetaIm * s;
    total[4 * b + 1]! += thetaRe * s + thetaIm * c;
    total[4 * b + 2]! += phiRe * c - phiIm * s;
    total[4 * b + 3]! += phiRe * s + phiIm * c;
  }
}

function aloneGains(slot: Slot, radiation: Radiation): number[] {
  const load = loadOf(slot.wire);
  const { admittance, re, im } = solveAlone(slot, load);
  const total = new Float64Array(4 * radiation.azimuthDeg.length);
  // Alone, the place changes no gain: phases of one serve.
  const atOrigin: Radiation = {
    ...radiation,
    phaseRe: radiation.phaseRe.map(() => 1),
    phaseIm: radiation.phaseIm.map(() => 0),
  };
  addFunctions(atOrigin, slot.own.count, re, im, 0, total);
  return gains(slot.own.k, total, acceptedPower(admittance, load));
}

function gains(k: number, total: Float64Array, power: number): number[] {
  return Array.from({ length: total.length / 4 }, (_, b) => {
    const across =
      total[4 * b]! ** 2 + total[4 * b + 1]! ** 2 + total[4 * b + 2]! ** 2 + total[4 * b + 3]! ** 2;
    return gainDbi(intensityOf(k, across), power);
  });
}
