import { loadOf } from '../network';
import type { Ground } from '../scene';
import {
  createBorderedNetwork,
  factoriseRest,
  setBorderCoupling,
  solveBorder,
  type BorderedNetwork,
  type Coupling,
} from './bordered-network';
import { ownCurrentsOf, type OwnCurrentCache } from './own-current-cache';
import {
  createPairCoupling,
  updatePairCoupling,
  type CouplingSide,
  type PairCoupling,
} from './pair-coupling';
import { verticalSense, type PlacedWire } from './placed-wire';

/** One wire at one frequency, and which of the wire's states it was computed for. */
export type Slot = CouplingSide & { readonly placed: PlacedWire; place: number; kind: number };

/**
 * The live network at one frequency. It follows the placed wires when asked to (`bringUpToDate`): only couplings
 * of changed wires are computed again, and a single wire that keeps moving is the border of a network whose rest
 * stays factorised.
 */
export type FrequencySystem = {
  readonly ground: Ground;
  /** Hertz. */
  readonly frequency: number;
  readonly cache: OwnCurrentCache;
  slots: Slot[];
  /** Couplings of the wires at i < j of `slots`, by i * slots.length + j. */
  pairs: (PairCoupling | undefined)[];
  network: BorderedNetwork | null;
  /** Slots in the order of the network's members; the border is the last. */
  order: number[];
  /** Place in the network's ports by slot, -1 without a port. */
  portOf: number[];
};

/** A system that knows no wire yet. */
export function createFrequencySystem(
  ground: Ground,
  frequency: number,
  cache: OwnCurrentCache,
): FrequencySystem {
  return { ground, frequency, cache, slots: [], pairs: [], network: null, order: [], portOf: [] };
}

/** Brings the system to the wires' present states; does nothing when nothing changed. */
export function bringUpToDate(system: FrequencySystem, wires: readonly PlacedWire[]): void {
  const { slots } = system;
  const sameWires = slots.length === wires.length && slots.every((slot, i) => slot.placed === wires[i]);
  if (!sameWires) {
    takeWires(system, wires);
    buildNetwork(system, wires.length - 1);
    return;
  }
  let moved = -1;
  let count = 0;
  for (let i = 0; i < slots.length; i += 1) {
    if (slots[i]!.place === slots[i]!.placed.place) continue;
    moved = i;
    count += 1;
  }
  if (count === 0) return;
  let kindChanged = false;
  for (let i = 0; i < slots.length; i += 1) {
    if (slots[i]!.place !== slots[i]!.placed.place) kindChanged = refreshSlot(system, i) || kindChanged;
  }
  for (let i = 0; i < slots.length; i += 1) {
    if (slots[i]!.place !== slots[i]!.placed.place) updatePairsOf(system, i);
  }
  for (const slot of slots) slot.place = slot.placed.place;
  const isBorder = count === 1 && system.network !== null && system.order[system.order.length - 1] === moved;
  if (isBorder && !kindChanged) updateBorder(system, system.network!);
  else buildNetwork(system, moved);
}

/** Another set of wires: what is known of wires that stay as they are is kept. */
function takeWires(system: FrequencySystem, wires: readonly PlacedWire[]): void {
  const { slots: oldSlots, pairs: oldPairs } = system;
  const oldIndex = new Map(oldSlots.map((slot, i) => [slot.placed, i]));
  const isKept = (placed: PlacedWire, i: number | undefined): i is number =>
    i !== undefined && oldSlots[i]!.place === placed.place;
  system.slots = wires.map((placed) => {
    const i = oldIndex.get(placed);
    return isKept(placed, i) ? oldSlots[i]! : createSlot(system, placed);
  });
  const n = wires.length;
  system.pairs = new Array<PairCoupling | undefined>(n * n);
  for (let i = 0; i < n; i += 1) {
    for (let j = i + 1; j < n; j += 1) {
      const a = oldIndex.get(wires[i]!);
      const b = oldIndex.get(wires[j]!);
      const kept =
        isKept(wires[i]!, a) && isKept(wires[j]!, b) && a < b ? oldPairs[a * oldSlots.length + b] : undefined;
      if (kept !== undefined) {
        system.pairs[i * n + j] = kept;
        continue;
      }
      const pair = createPairCoupling(system.slots[i]!, system.slots[j]!);
      updatePairCoupling(system.ground, system.slots[i]!, system.slots[j]!, pair);
      system.pairs[i * n + j] = pair;
    }
  }
}

function createSlot(system: FrequencySystem, placed: PlacedWire): Slot {
  return {
    placed,
    place: placed.place,
    kind: placed.kind,
    wire: placed.wire,
    own: ownCurrentsOf(system.cache, system.ground, system.frequency, placed.wire),
    sense: verticalSense(placed.wire),
    samples: new Map(),
  };
}

/** Takes the wire's new state into its slot; true when it is of another kind now. */
function refreshSlot(system: FrequencySystem, i: number): boolean {
  const slot = system.slots[i]!;
  slot.wire = slot.placed.wire;
  if (slot.kind === slot.placed.kind) return false;
  slot.kind = slot.placed.kind;
  slot.own = ownCurrentsOf(system.cache, system.ground, system.frequency, slot.wire);
  slot.sense = verticalSense(slot.wire);
  slot.samples.clear();
  const n = system.slots.length;
  for (let j = 0; j < n; j += 1) {
    if (j === i) continue;
    const [first, second] = i < j ? [i, j] : [j, i];
    system.pairs[first * n + second] = createPairCoupling(system.slots[first]!, system.slots[second]!);
  }
  return true;
}

function updatePairsOf(system: FrequencySystem, i: number): void {
  const { slots, pairs, ground } = system;
  const n = slots.length;
  for (let j = 0; j < n; j += 1) {
    if (j === i) continue;
    // Of two moved wires the later one computes their pair.
    if (j < i && slots[j]!.place !== slots[j]!.placed.place) continue;
    const first = Math.min(i, j);
    const second = Math.max(i, j);
    updatePairCoupling(ground, slots[first]!, slots[second]!, pairs[first * n + second]!);
  }
}

/** Factorises all wires but `border`, then solves with it. */
function buildNetwork(system: FrequencySystem, border: number): void {
  const { slots } = system;
  system.order = slots.map((_, i) => i).filter((i) => i !== border);
  if (slots.length > 0) system.order.push(border);
  if (slots.length === 0) {
    system.network = null;
    return;
  }
  const network = createBorderedNetwork(
    system.order.map((i) => {
      const { own, wire } = slots[i]!;
      return { impedance: own.impedance, portCurrents: own.portCurrents, load: loadOf(wire) };
    }),
  );
  system.network = network;
  system.portOf = slots.map(() => -1);
  let port = 0;
  for (const i of system.order) {
    if (slots[i]!.own.portCurrents === null) continue;
    system.portOf[i] = port;
    port += 1;
  }
  factoriseRest(network, (i, j) => couplingBetween(system, system.order[i]!, system.order[j]!));
  updateBorder(system, network);
}

function updateBorder(system: FrequencySystem, network: BorderedNetwork): void {
  const { order, pairs, slots } = system;
  const n = slots.length;
  const border = order[n - 1]!;
  for (let j = 0; j < n - 1; j += 1) {
    const other = order[j]!;
    const first = Math.min(border, other);
    const second = Math.max(border, other);
    setBorderCoupling(network, j, pairs[first * n + second]!, border > other);
  }
  solveBorder(network);
}

/** Impedances between the functions of slot i and those of slot j. */
function couplingBetween(system: FrequencySystem, i: number, j: number): Coupling {
  const n = system.slots.length;
  const pair = system.pairs[Math.min(i, j) * n + Math.max(i, j)]!;
  return { re: pair.re, im: pair.im, transposed: i > j };
}
