import { hitTarget, type HitScene } from '@/components/canvas/hit-test';

const EMPTY: HitScene = { antennas: [], balloons: [], pills: [] };
const scene: HitScene = {
  antennas: [
    { id: 'A1', at: { x: 100, y: 100 } },
    { id: 'A2', at: { x: 130, y: 100 } },
  ],
  balloons: [{ id: 'comment', at: { x: 200, y: 100 }, radius: 12 }],
  pills: [{ from: 'A1', into: 'A2', box: { left: 300, top: 90, width: 60, height: 20 } }],
};

describe('what lies under a pointer', () => {
  test.each([
    ['touch', 22],
    ['pen', 16],
    ['mouse', 14],
  ] as const)('an antenna is reached by %s from %d px, and not from farther', (pointer, reach) => {
    expect(hitTarget(scene, { x: 100 - reach, y: 100 }, pointer)).toEqual({ kind: 'antenna', id: 'A1' });
    expect(hitTarget(scene, { x: 99.9 - reach, y: 100 }, pointer)).toEqual({ kind: 'ground' });
  });

  test('of two antennas the nearer one is meant', () => {
    expect(hitTarget(scene, { x: 114, y: 100 }, 'touch')).toEqual({ kind: 'antenna', id: 'A1' });
    expect(hitTarget(scene, { x: 116, y: 100 }, 'touch')).toEqual({ kind: 'antenna', id: 'A2' });
  });

  test('an antenna under a balloon can still be taken up at its centre', () => {
    const over = { ...scene, balloons: [{ id: 'comment', at: { x: 100, y: 100 }, radius: 12 }] };
    expect(hitTarget(over, { x: 100, y: 100 }, 'touch')).toEqual({ kind: 'antenna', id: 'A1' });
    expect(hitTarget(over, { x: 110, y: 100 }, 'mouse')).toEqual({ kind: 'comment', id: 'comment' });
  });

  test('a link is pressed at its text', () => {
    expect(hitTarget(scene, { x: 340, y: 105 }, 'mouse')).toEqual({ kind: 'pair', from: 'A1', into: 'A2' });
    expect(hitTarget(scene, { x: 340, y: 116 }, 'mouse')).toEqual({ kind: 'pair', from: 'A1', into: 'A2' });
    expect(hitTarget(scene, { x: 340, y: 130 }, 'mouse')).toEqual({ kind: 'ground' });
  });

  test('where nothing is, there is ground', () => {
    expect(hitTarget(EMPTY, { x: 0, y: 0 }, 'touch')).toEqual({ kind: 'ground' });
  });
});
