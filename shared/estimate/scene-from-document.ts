import { sceneProblems } from '../em/scene-problems';
import type { Ground, Vector3, Wire } from '../em/scene';
import { pairValidity } from '../em/validity';
import type { LayoutDocument, PlacedAntenna, Surface, WireElement } from '../layout/document';
import { surfaceAt } from '../layout/placement';
import type { Reason } from './estimate-result';

/** An antenna as the solver sees it. */
export type AntennaScene = {
  readonly antenna: PlacedAntenna;
  readonly surface: Surface | null;
  /** Its wires that stand in the scene; the plane is z = 0. */
  readonly wires: readonly Wire[];
  /** Identifiers of its wires that have a port. */
  readonly ports: readonly string[];
  /** Why nothing that this antenna takes part in is held; null when nothing speaks against it. */
  readonly reason: Reason | null;
};

/** A layout as the solver sees it. */
export type DocumentScene = {
  readonly ground: Ground;
  /** In the order of their identifiers. */
  readonly antennas: readonly AntennaScene[];
  readonly wires: readonly Wire[];
};

/**
 * Builds scenes from documents; keeps what belongs to antennas that did not change. Every antenna is measured
 * from the surface that it stands on, all surfaces being taken as one flat plane.
 */
export class SceneBuilder {
  private readonly known = new WeakMap<PlacedAntenna, AntennaScene & { readonly ground: Ground }>();

  /** Never throws for a document that the schema accepts: what cannot be solved is left out, with its reason. */
  build(document: LayoutDocument): DocumentScene {
    const placed = Object.values(document.antennas)
      .sort((a, b) => (a.id < b.id ? -1 : 1))
      .map((antenna) => ({ antenna, surface: surfaceAt(document, antenna) }));
    const ground = placed.some(({ antenna, surface }) => surface?.conducting && hasWire(antenna))
      ? 'plane'
      : 'none';
    const antennas = placed.map(({ antenna, surface }) => this.sceneOf(antenna, surface, ground));
    return withoutTouching(ground, antennas);
  }

  private sceneOf(antenna: PlacedAntenna, surface: Surface | null, ground: Ground): AntennaScene {
    const known = this.known.get(antenna);
    if (known && known.surface === surface && known.ground === ground) return known;
    const made = { ...antennaScene(antenna, surface, ground), ground };
    this.known.set(antenna, made);
    return made;
  }
}

/** Whether any element of the antenna is a wire. */
export function hasWire({ part }: PlacedAntenna): boolean {
  return part.elements.some(({ kind }) => kind === 'wire');
}

function antennaScene(antenna: PlacedAntenna, surface: Surface | null, ground: Ground): AntennaScene {
  const { label } = antenna;
  if (surface === null) {
    return left(antenna, surface, 'off-surface', `${label} stands beside every surface.`);
  }
  const wires: Wire[] = [];
  let reason: Reason | null = null;
  for (const element of antenna.part.elements) {
    if (element.kind === 'declared') {
      reason ??= {
        code: 'not-computed',
        message: `${label} is known by its datasheet only (${element.form}): not computed yet.`,
      };
      continue;
    }
    const wire = placeElement(antenna, element, ground);
    const [problem] = sceneProblems({ ground, frequencies: [1], wires: [wire] });
    if (problem) {
      reason ??= { code: 'geometry', message: `A wire of ${label} ${problem.message}.` };
      continue;
    }
    if (wire.feed === 'none') reason ??= withoutPlane(antenna, ground);
    wires.push(wire);
  }
  if (ground === 'plane' && !surface.conducting && wires.length > 0) {
    reason ??= {
      code: 'no-plane',
      message: `${label} stands on ${surface.name}, which does not conduct; the estimate knows one metal plane.`,
    };
  }
  const ports = wires.filter(({ feed }) => feed !== 'none').map(({ id }) => id);
  return { antenna, surface, wires, ports, reason };
}

/** A whip that is not fed against the plane has no port that these models know; as a conductor it counts. */
function withoutPlane({ label }: PlacedAntenna, ground: Ground): Reason {
  return ground === 'plane'
    ? {
        code: 'raised-whip',
        message: `${label} is a whip raised above its surface: what it is fed against is not in the model.`,
      }
    : {
        code: 'no-plane',
        message: `${label} is a whip on a surface that does not conduct: it has nothing to stand against.`,
      };
}

/**
 * An element where its antenna stands: offset and axis tilted toward the azimuth, then turned to it. Azimuths
 * count clockwise from x, so that toward +y they are negative.
 */
function placeElement(antenna: PlacedAntenna, element: WireElement, ground: Ground): Wire {
  const { x, y, mountHeight, azimuthDeg, tiltDeg } = antenna;
  const turn = (vector: Vector3): Vector3 => turned(vector, azimuthDeg, tiltDeg);
  const [ox, oy, oz] = turn([element.offset.x, element.offset.y, element.offset.z]);
  const [ux, uy, uz] = turn([0, 0, 1]);
  const at: Vector3 = [x + ox, y + oy, mountHeight + oz];
  const along = (from: Vector3, by: number): Vector3 => [
    from[0] + by * ux,
    from[1] + by * uy,
    from[2] + by * uz,
  ];
  const id = `${antenna.id}/${element.id}`;
  const { length, radius } = element;
  if (element.form === 'dipole') {
    return { id, start: along(at, -length / 2), end: along(at, length / 2), radius, feed: 'centre' };
  }
  const stands = ground === 'plane' && Math.abs(at[2]) <= 1e-3 * radius;
  const foot: Vector3 = stands ? [at[0], at[1], 0] : at;
  return { id, start: foot, end: along(foot, length), radius, feed: stands ? 'start' : 'none' };
}

function turned([x, y, z]: Vector3, azimuthDeg: number, tiltDeg: number): Vector3 {
  if (azimuthDeg === 0 && tiltDeg === 0) return [x, y, z];
  const tilt = (tiltDeg * Math.PI) / 180;
  const azimuth = (azimuthDeg * Math.PI) / 180;
  const forward = x * Math.cos(tilt) + z * Math.sin(tilt);
  return [
    forward * Math.cos(azimuth) + y * Math.sin(azimuth),
    y * Math.cos(azimuth) - forward * Math.sin(azimuth),
    z * Math.cos(tilt) - x * Math.sin(tilt),
  ];
}

/** Of two antennas whose wires touch the earlier one stays in the scene; nothing is held for either. */
function withoutTouching(ground: Ground, antennas: readonly AntennaScene[]): DocumentScene {
  const reasons = new Map<AntennaScene, Reason>();
  const wires: Wire[] = [];
  const owners: AntennaScene[] = [];
  for (const scene of antennas) {
    for (const wire of scene.wires) {
      const touched = wires.findIndex((other) => pairValidity(wire, other)?.code === 'touching');
      if (touched < 0) {
        wires.push(wire);
        owners.push(scene);
        continue;
      }
      const other = owners[touched]!;
      const message =
        other === scene
          ? `Two wires of ${scene.antenna.label} touch.`
          : `${scene.antenna.label} touches ${other.antenna.label}.`;
      for (const one of [scene, other]) reasons.set(one, { code: 'touching', message });
    }
  }
  if (reasons.size === 0) return { ground, antennas, wires };
  const present = new Set(wires);
  return {
    ground,
    wires,
    antennas: antennas.map((scene) => {
      const reason = reasons.get(scene);
      if (!reason) return scene;
      const kept = scene.wires.filter((wire) => present.has(wire));
      const ports = kept.filter(({ feed }) => feed !== 'none').map(({ id }) => id);
      return { ...scene, wires: kept, ports, reason: scene.reason ?? reason };
    }),
  };
}

function left(antenna: PlacedAntenna, surface: Surface | null, code: string, message: string): AntennaScene {
  return { antenna, surface, wires: [], ports: [], reason: { code, message } };
}
