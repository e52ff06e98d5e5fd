import { dot, segmentDistance, vectorBetween, wireLength } from './chain';
import type { Scene, Wire } from './scene';
import { endsOnPlane, standsOnPlane } from './validity';

/** What is wrong with a scene, and where: a path such as `wires[2].load.re`. */
export type SceneProblem = { readonly path: string; readonly message: string };

/** Everything that keeps a well-formed scene from being solved; empty when it can be. */
export function sceneProblems(scene: Scene): SceneProblem[] {
  const problems: SceneProblem[] = [];
  const add = (path: string, message: string) => problems.push({ path, message });
  if (scene.wires.length === 0) add('wires', 'is empty');
  if (scene.frequencies.length === 0) add('frequencies', 'is empty');
  scene.frequencies.forEach((frequency, i) => {
    if (!(frequency > 0 && Number.isFinite(frequency)))
      add(`frequencies[${i}]`, 'must be a positive number of hertz');
  });
  const seen = new Map<string, number>();
  scene.wires.forEach((wire, i) => {
    const path = `wires[${i}]`;
    const earlier = seen.get(wire.id);
    if (earlier !== undefined) add(`${path}.id`, `is also the id of wires[${earlier}]`);
    seen.set(wire.id, i);
    addWireProblems(scene, wire, path, add);
  });
  scene.wires.forEach((wire, i) => {
    for (let j = i + 1; j < scene.wires.length; j += 1) {
      const other = scene.wires[j]!;
      const distance = segmentDistance(wire.start, wire.end, other.start, other.end);
      if (distance <= wire.radius + other.radius) add(`wires[${j}]`, `touches wires[${i}]`);
    }
  });
  return problems;
}

function addWireProblems(
  scene: Scene,
  wire: Wire,
  path: string,
  add: (path: string, message: string) => void,
): void {
  if (!(wire.radius > 0 && Number.isFinite(wire.radius)))
    add(`${path}.radius`, 'must be a positive number of metres');
  if (!(wireLength(wire) > 0)) add(path, 'has no length');
  if (wire.load !== undefined) {
    if (wire.feed === 'none') add(`${path}.load`, 'closes a port that this wire does not have');
    if (!(wire.load.re > 0))
      add(`${path}.load.re`, 'must be positive: a reference without resistance has no power waves');
  }
  if (scene.ground === 'none') {
    if (wire.feed === 'start') add(`${path}.feed`, 'start needs ground "plane", on which the start stands');
    return;
  }
  const starts = standsOnPlane(wire, 'plane');
  const ends = endsOnPlane(wire, 'plane');
  if (wire.start[2] < 0 && !starts) add(`${path}.start[2]`, 'lies below the plane');
  if (wire.end[2] < 0 && !ends) add(`${path}.end[2]`, 'lies below the plane');
  if (starts && ends) add(path, 'lies in the plane');
  else if (wire.feed === 'start' && !starts)
    add(`${path}.start[2]`, 'must be 0: a wire fed at its start stands on the plane');
  else if (wire.feed === 'start' && ends) add(`${path}.end[2]`, 'touches the plane');
  else if (wire.feed === 'centre' && (starts || ends))
    add(path, 'is fed at its centre and touches the plane');
  else if (touchesPlane(wire, starts, ends)) add(path, 'touches the plane');
}

/** A wire that lies on the plane with its surface without being joined to it. */
function touchesPlane(wire: Wire, starts: boolean, ends: boolean): boolean {
  const axis = vectorBetween(wire.start, wire.end);
  const length = Math.sqrt(dot(axis, axis));
  // The rim of a sloping wire's end reaches lower than its axis by the radius times the cosine of its slope.
  const rim = length > 0 ? wire.radius * (Math.hypot(axis[0], axis[1]) / length) : 0;
  const startLow = !starts && wire.start[2] >= 0 && wire.start[2] < rim;
  const endLow = !ends && wire.end[2] >= 0 && wire.end[2] < rim;
  return startLow || endLow;
}
