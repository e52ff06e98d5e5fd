import { solveScene } from '@/shared/em/solve-scene';
import type { Method } from '@/shared/em/scene';
import { parseScenes } from './parse-scenes';

const methods: readonly Method[] = ['emf', 'live', 'moment'];
const usage = 'usage: solve --method emf|live|moment < scene.json';

/** Standard output is the answer alone; everything else goes to standard error. */
async function main(): Promise<number> {
  const method = methodOf(process.argv.slice(2));
  if (method === null) return fail([usage]);
  const parsed = parseScenes(await readInput());
  if (!parsed.ok) return fail(parsed.problems.map(({ path, message }) => `${path}: ${message}`));
  const answers = parsed.scenes.map((scene) => solveScene(scene, method));
  await write(`${JSON.stringify(parsed.many ? answers : answers[0])}\n`);
  return 0;
}

function methodOf(args: readonly string[]): Method | null {
  const [flag, value] = args[0]?.startsWith('--method=') ? ['--method', args[0].slice(9)] : args;
  const rest = args.length - (args[0]?.startsWith('--method=') ? 1 : 2);
  if (flag !== '--method' || rest !== 0) return null;
  return methods.find((method) => method === value) ?? null;
}

async function readInput(): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of process.stdin) chunks.push(Buffer.from(chunk));
  // A byte order mark is no part of JSON, but editors leave it there.
  return Buffer.concat(chunks)
    .toString('utf8')
    .replace(/^\uFEFF/, '');
}

function fail(lines: readonly string[]): number {
  process.stderr.write(`${lines.map((line) => line.replace(/\s+/g, ' ')).join('\n')}\n`);
  return 1;
}

/** Waits until a pipe has taken everything: leaving earlier would cut long answers. */
function write(text: string): Promise<void> {
  return new Promise((resolve, reject) => {
    process.stdout.write(text, (error) => (error ? reject(error) : resolve()));
  });
}

main().then(
  (code) => {
    process.exitCode = code;
  },
  (error: unknown) => {
    process.exitCode = fail([`solver failed: ${error instanceof Error ? error.message : String(error)}`]);
  },
);
