import { spawn } from 'node:child_process';

type Run = { code: number | null; out: string; err: string };

function solve(input: string, args: readonly string[] = ['--method', 'emf']): Promise<Run> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/cli/solve.ts', ...args], {
      cwd: process.cwd(),
    });
    let out = '';
    let err = '';
    child.stdout.on('data', (chunk: Buffer) => (out += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (err += chunk.toString()));
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, out, err }));
    // A refusal of the arguments closes the pipe before all is read.
    child.stdin.on('error', () => undefined);
    child.stdin.end(input);
  });
}

const scene = {
  ground: 'plane',
  frequencies: [155e6, 460e6],
  wires: [
    { id: 'a', start: [0, 0, 0], end: [0, 0, 0.46], radius: 0.0015, feed: 'start' },
    {
      id: 'b',
      start: [0.5, 0, 0],
      end: [0.5, 0, 0.16],
      radius: 0.0015,
      feed: 'start',
      load: { re: 75, im: 5 },
    },
    { id: 'p', start: [0, 0.5, 0], end: [0, 0.5, 0.7], radius: 0.005, feed: 'none' },
  ],
  pattern: { elevationDeg: 0, stepDeg: 90 },
};

describe('solve', () => {
  it.each(['emf', 'live', 'moment'])('answers a scene by %s as JSON and nothing else', async (method) => {
    const { code, out, err } = await solve(JSON.stringify(scene), ['--method', method]);
    expect({ code, err }).toEqual({ code: 0, err: '' });
    const answer = JSON.parse(out);
    expect(Object.keys(answer)).toEqual(['method', 'solverVersion', 'results']);
    expect(answer.method).toBe(method);
    expect(Object.keys(answer.results[0])).toEqual([
      'frequency',
      'ports',
      'z',
      's',
      'isolationDb',
      'patterns',
      'validity',
    ]);
    expect(answer.results.map((result: { frequency: number }) => result.frequency)).toEqual(
      scene.frequencies,
    );
    expect(answer.results[0].ports).toEqual(['a', 'b']);
    expect(answer.results[0].isolationDb[0][0]).toBeNull();
    expect(answer.results[0].isolationDb[0][1]).toBeCloseTo(answer.results[0].isolationDb[1][0], 6);
    expect(Object.keys(answer.results[0].patterns.a)).toEqual([
      'azimuthDeg',
      'gainDbi',
      'aloneDbi',
      'rippleDb',
      'deepestBearingDeg',
    ]);
  });

  it('answers an array with an array, and a scene without a pattern with none', async () => {
    const { out } = await solve(JSON.stringify([{ ...scene, pattern: undefined }, scene]));
    const answers = JSON.parse(out);
    expect(answers).toHaveLength(2);
    expect(answers[0].results[0].patterns).toEqual({});
  });

  it('reads a byte order mark and input that comes in pieces', async () => {
    const many = Array.from({ length: 400 }, () => scene);
    const { code, out } = await solve(`\uFEFF${JSON.stringify(many, null, 2)}`);
    expect(code).toBe(0);
    expect(JSON.parse(out)).toHaveLength(400);
  });

  it('names every problem of every scene with its path, one a line, and writes no answer', async () => {
    const second = { ...scene.wires[1], load: { re: 0, im: 0 } };
    const bad = { ...scene, colour: 'red', wires: [{ ...scene.wires[0], radius: -1, heigth: 2 }, second] };
    const low = {
      ...scene,
      wires: [
        { ...scene.wires[0], end: [0, 0, -0.4] },
        second,
        { ...scene.wires[2], load: { re: 1, im: 0 } },
      ],
    };
    const { code, out, err } = await solve(JSON.stringify([bad, low]));
    expect({ code, out }).toEqual({ code: 1, out: '' });
    const paths = err
      .trimEnd()
      .split('\n')
      .map((line) => line.slice(0, line.indexOf(': ')));
    expect(paths.sort()).toEqual(
      [
        '[0].colour',
        '[0].wires[0].heigth',
        '[0].wires[0].radius',
        '[1].wires[0].end[2]',
        '[1].wires[1].load.re',
        '[1].wires[2].load',
      ].sort(),
    );
  });

  it.each([
    ['nothing', '', 'input: is empty'],
    ['text', 'hello', 'input: is not JSON'],
    ['a number', '7', 'input: '],
    ['nesting a hundred thousand deep', '['.repeat(100_000), 'input: is not JSON'],
    ['a number beyond all numbers', JSON.stringify(scene).replace('155000000', '1e999'), 'frequencies[0]: '],
    ['a string for a number', JSON.stringify(scene).replace('0.46', '"0.46"'), 'wires[0].end[2]: '],
    ['a point of two coordinates', JSON.stringify(scene).replace('[0,0,0.46]', '[0,0.46]'), 'wires[0].end'],
  ])('refuses %s', async (_, input, beginning) => {
    const { code, out, err } = await solve(input);
    expect({ code, out }).toEqual({ code: 1, out: '' });
    expect(err.startsWith(beginning)).toBe(true);
    expect(err.trimEnd().split('\n')).toHaveLength(1);
  });

  it.each([[[]], [['--method', 'magic']], [['--method']], [['--method', 'emf', 'extra']]])(
    'tells its usage for the arguments %j',
    async (args) => {
      const { code, err } = await solve(JSON.stringify(scene), args);
      expect(code).toBe(1);
      expect(err).toMatch(/^usage: /);
    },
  );
});
