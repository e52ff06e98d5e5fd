import type { Scene, Wire } from '@/shared/em/scene';
import { sceneProblems } from '@/shared/em/scene-problems';
import { solveScene } from '@/shared/em/solve-scene';
import { pairValidity } from '@/shared/em/validity';
import { dipole, uprightWhip } from '../../support/whip-scenes';

const whip = uprightWhip('a', [0, 0, 0], 0.46, 0.0015);
const good: Scene = {
  ground: 'plane',
  frequencies: [155e6],
  wires: [whip, uprightWhip('b', [1, 0, 0], 0.16, 0.0015)],
};

function withSecond(change: Partial<Wire>, ground: Scene['ground'] = 'plane'): Scene {
  return { ...good, ground, wires: [whip, { ...good.wires[1]!, ...change }] };
}

describe('problems of a scene', () => {
  it('finds none in a good scene', () => {
    expect(sceneProblems(good)).toEqual([]);
  });

  it.each<[string, Scene, string]>([
    ['a wire below the plane', withSecond({ end: [1, 0, -0.2] }), 'wires[1].end[2]'],
    ['a wire in the plane', withSecond({ end: [2, 0, 0], feed: 'none' }), 'wires[1]'],
    ['a wire without length', withSecond({ end: [1, 0, 0] }), 'wires[1]'],
    ['touching wires', withSecond({ start: [0.002, 0, 0], end: [0.002, 0, 0.2] }), 'wires[1]'],
    ['crossing wires', withSecond({ start: [-0.2, 0, 0.2], end: [0.2, 0, 0.2], feed: 'centre' }), 'wires[1]'],
    ['a load without resistance', withSecond({ load: { re: 0, im: 10 } }), 'wires[1].load.re'],
    [
      'a load on a wire without a port',
      withSecond({ feed: 'none', load: { re: 50, im: 0 } }),
      'wires[1].load',
    ],
    ['the same id twice', withSecond({ id: 'a' }), 'wires[1].id'],
    ['a whip that floats', withSecond({ start: [1, 0, 0.1] }), 'wires[1].start[2]'],
    ['a whip without a plane', withSecond({}, 'none'), 'wires[1].feed'],
    ['a centre-fed wire that stands on the plane', withSecond({ feed: 'centre' }), 'wires[1]'],
    ['no frequency', { ...good, frequencies: [] }, 'frequencies'],
    ['no wire', { ...good, wires: [] }, 'wires'],
    ['a radius of zero', withSecond({ radius: 0 }), 'wires[1].radius'],
  ])('names %s with its path', (_, scene, path) => {
    expect(sceneProblems(scene).map((problem) => problem.path)).toContain(path);
    expect(() => solveScene(scene, 'emf')).toThrow(RangeError);
  });
});

describe('validity', () => {
  const codes = (scene: Scene, method: 'emf' | 'live' | 'moment') =>
    solveScene(scene, method).results[0]!.validity.map((entry) => entry.code);

  it.each(['emf', 'live', 'moment'] as const)('%s holds for thin whips in their band', (method) => {
    expect(codes(good, method)).toEqual([]);
  });

  it.each(['emf', 'live', 'moment'] as const)('%s names thick, stout and close wires', (method) => {
    const stout = uprightWhip('b', [1, 0, 0], 0.5, 0.03);
    expect(codes({ ...good, wires: [whip, stout] }, method)).toEqual(
      expect.arrayContaining(['too-thick', 'too-stout']),
    );
    const close = uprightWhip('b', [0.01, 0, 0], 0.46, 0.0015);
    expect(codes({ ...good, wires: [whip, close] }, method)).toContain('too-close');
  });

  it('keeps the textbook model to arms of 0.4 wavelength, and its numbers finite beyond', () => {
    const wires = [
      dipole('a', [0, 0, 0], 1, [0, 0, 1], 0.001),
      dipole('b', [0.5, 0, 0], 0.9, [0, 0, 1], 0.001),
    ];
    const scene: Scene = { ground: 'none', frequencies: [299_792_458], wires };
    const result = solveScene(scene, 'emf').results[0]!;
    expect(result.validity.filter((entry) => entry.code === 'too-long-for-one-piece')).toHaveLength(2);
    expect(result.isolationDb.flat().every((value) => value === null || Number.isFinite(value))).toBe(true);
    expect(codes(scene, 'live')).toEqual([]);
  });

  it('tells touching from close', () => {
    expect(pairValidity(whip, uprightWhip('b', [0.002, 0, 0], 0.4, 0.0015))?.code).toBe('touching');
    expect(pairValidity(whip, uprightWhip('b', [0.012, 0, 0], 0.4, 0.0015))?.code).toBe('too-close');
    expect(pairValidity(whip, uprightWhip('b', [0.016, 0, 0], 0.4, 0.0015))).toBeNull();
  });
});

describe('answers', () => {
  it('follow the order of the fed wires, with null on the diagonal and at most 300 dB', () => {
    const pole: Wire = { ...uprightWhip('pole', [0.5, 0.5, 0], 0.7, 0.005), feed: 'none' };
    const pattern = { elevationDeg: 0, stepDeg: 90 };
    const result = solveScene({ ...good, wires: [pole, ...good.wires], pattern }, 'emf').results[0]!;
    expect(result.ports).toEqual(['a', 'b']);
    expect(result.isolationDb[0]![0]).toBeNull();
    expect(Object.keys(result.patterns)).toEqual(['a', 'b']);
    expect(result.patterns['a']!.azimuthDeg).toEqual([0, 90, 180, 270]);
    const across: Wire[] = [
      dipole('x', [0, 0, 0], 0.9, [1, 0, 0], 0.001),
      dipole('z', [0, 2, 0], 0.9, [0, 0, 1], 0.001),
    ];
    const isolated = solveScene({ ground: 'none', frequencies: [155e6], wires: across }, 'emf').results[0]!;
    expect(isolated.isolationDb[0]![1]).toBeLessThanOrEqual(300);
    expect(isolated.isolationDb[0]![1]).toBeGreaterThan(200);
  });
});
