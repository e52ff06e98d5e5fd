import { antennaFrequency, distancesFrom } from '@/components/editor/distances';
import type { LayoutDocument, PlacedAntenna, Radio } from '@/shared/layout/document';
import { vanRoof } from '@/tests/support/van-roof';

const van = vanRoof();
const a1 = antenna(van, 'A1');
const a3 = antenna(van, 'A3');

test('wavelengths are counted at the middle of the transmit band, else of the receive band', () => {
  expect(antennaFrequency(van, a1)).toBe(150e6);
  const radios = Object.fromEntries(
    Object.values(van.radios).map((radio): [string, Radio] => [radio.id, { ...radio, transmitBands: [] }]),
  );
  expect(antennaFrequency({ radios }, a1)).toBe(154e6);
  expect(antennaFrequency(van, a3)).toBeNull();
  expect(antennaFrequency(van, { radioId: 'constructor' })).toBeNull();
});

test('the nearest edges stand first, one along and one across, then the neighbours by distance', () => {
  const distances = distancesFrom(van, a1, { x: 0.5, y: -0.3 });
  const ends = distances.map(({ to, end }) => (to.kind === 'edge' ? end : to.id));
  expect(ends.slice(2)).toEqual([antenna(van, 'A2').id, a3.id]);
  const [along, across, ...neighbours] = distances;
  expect([along?.end, across?.end]).toEqual([
    { x: 0, y: -0.3 },
    { x: 0.5, y: -1 },
  ]);
  // 1e-12 m is the rounding of sums of metres.
  expect(along?.length).toBeCloseTo(0.5, 12);
  expect(across?.length).toBeCloseTo(0.7, 12);
  expect(neighbours.map(({ length }) => length)).toEqual([1, 2]);
});

test('a metre at 150 MHz is 0.5003 wavelengths', () => {
  const neighbour = distancesFrom(van, a1, { x: 0.5, y: -0.3 }).find(({ to }) => to.kind === 'antenna');
  // f / c = 150e6 / 299792458 = 0.500346
  expect(neighbour?.wavelengths).toBeCloseTo(0.500346, 6);
  expect(distancesFrom(van, a3, a3).every(({ wavelengths }) => wavelengths === null)).toBe(true);
});

test('off the surface there are no edges to measure from, and those that move along do not count', () => {
  const distances = distancesFrom(van, a1, { x: -1, y: 0 }, { without: [antenna(van, 'A2').id] });
  expect(distances.map(({ to }) => to)).toEqual([{ kind: 'antenna', id: a3.id }]);
});

function antenna(document: LayoutDocument, label: string): PlacedAntenna {
  const found = Object.values(document.antennas).find((one) => one.label === label);
  if (!found) throw new Error(`no antenna ${label}`);
  return found;
}
