import { unknownCount, type WireMesh } from '../mesh';

/**
 * A field along the wire's active nodes, up to a factor; half at an end whose current goes on. `weight` is how
 * much its response counts among the others, all brought to the same norm.
 */
export type IncidentField = { readonly re: Float64Array; readonly im: Float64Array; readonly weight: number };

/** Distances of the sources beside the wire, wavelengths: most neighbours stand in the far field. */
const distancesInWavelengths = [0.7, 3, 12];
/** Plane waves by the share of k along the wire: broadside, as from afar on the same roof, and slanted. */
const planeWaveShares = [0, 0.2];

/** Weights found on random mixed-band layouts: a far neighbour's wave matters most, weak pairs hang on it. */
const besideWeight = 3;
const broadsideWeight = 10;
const slantedWeight = 1;

/**
 * The fields that neighbours can throw at a wire: spherical waves from nodes beside it (every neighbour's field
 * is a sum of those, reaction.ts), at several distances and all along it, and plane waves. Where the wire stands
 * upright on the plane every source has its image and the fields are even.
 */
export function incidentFamily(k: number, mesh: WireMesh): IncidentField[] {
  const { step, segments } = mesh.chain;
  const length = step * segments;
  const [ux, uy] = mesh.chain.direction;
  const grounded = (mesh.firstNode === 0 || mesh.lastNode === segments) && ux * ux + uy * uy < 1e-16;
  const family: IncidentField[] = [];
  for (const share of distancesInWavelengths) {
    const distance = (2 * Math.PI * share) / k;
    const spacing = Math.min(length, distance);
    const count = Math.ceil(length / spacing) + 1;
    const weight = besideWeight / Math.sqrt(count);
    for (let i = 0; i < count; i += 1) {
      family.push(
        sampled(mesh, grounded, (s) => sphericalWave(k, distance, s - (i * length) / (count - 1)), weight),
      );
    }
  }
  for (const share of planeWaveShares) {
    const signs = grounded || share === 0 ? [1] : [1, -1];
    for (const sign of signs) {
      family.push(
        sampled(
          mesh,
          grounded,
          (s) => [Math.cos(sign * k * share * s), Math.sin(sign * k * share * s)],
          share === 0 ? broadsideWeight : slantedWeight,
        ),
      );
    }
  }
  return family;
}

function sphericalWave(k: number, distance: number, axial: number): [number, number] {
  const r = Math.sqrt(distance * distance + axial * axial);
  return [Math.cos(k * r) / r, -Math.sin(k * r) / r];
}

/** s counts from the plane on a wire that stands on it, from the wire's start otherwise. */
function sampled(
  mesh: WireMesh,
  grounded: boolean,
  field: (s: number) => [number, number],
  weight: number,
): IncidentField {
  const n = unknownCount(mesh);
  const { step, segments } = mesh.chain;
  const fromEnd = grounded && mesh.firstNode !== 0;
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    const node = mesh.firstNode + i;
    const s = step * (fromEnd ? segments - node : node);
    const [a, b] = field(s);
    const [c, d] = grounded ? field(-s) : [0, 0];
    const weight = node === 0 || node === segments ? 0.5 : 1;
    re[i] = weight * (a + c);
    im[i] = weight * (b + d);
  }
  return { re, im, weight };
}
