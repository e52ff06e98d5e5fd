/**
 * The test command: formatting, lint, types, import arrows, unit, component, server and browser tests.
 * Two lanes run side by side (the checks of the text, the tests in Node); the browser journeys follow alone.
 * Ends with one line, `N passed, N failed`; exit code 1 when anything failed.
 */
import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

const ROOT = path.resolve(__dirname, '..');
const scratch = mkdtempSync(path.join(tmpdir(), 'elbowroom-tests-'));

type Step = { readonly name: string; readonly command: readonly string[]; readonly jest?: boolean };
type Outcome = { readonly name: string; readonly passed: number; readonly failed: number };

const CHECKS: readonly Step[] = [
  { name: 'formatting', command: ['prettier', '--check', '--log-level', 'warn', '.'] },
  { name: 'route types', command: ['expo', 'customize', 'tsconfig.json'] },
  { name: 'types', command: ['tsc', '--noEmit', '-p', '.'] },
  { name: 'lint', command: ['eslint', '.', '--max-warnings', '0'] },
  {
    name: 'import arrows',
    command: [
      'depcruise',
      '--config',
      '.dependency-cruiser.cjs',
      'app',
      'components',
      'server',
      'shared',
      'assets',
    ],
  },
];
const NODE_TESTS: readonly Step[] = [
  { name: 'unit tests', command: ['jest', '--selectProjects', 'unit'], jest: true },
  { name: 'component tests', command: ['jest', '--selectProjects', 'web'], jest: true },
  { name: 'server tests', command: ['jest', '--selectProjects', 'server'], jest: true },
];
const JOURNEYS: readonly Step[] = [
  { name: 'journeys', command: ['jest', '--selectProjects', 'journeys', '--runInBand'], jest: true },
];

function run(command: readonly string[]): Promise<{ code: number; output: string }> {
  return new Promise((resolve) => {
    const child = spawn(path.join(ROOT, 'node_modules/.bin', command[0]!), command.slice(1), {
      cwd: ROOT,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: {
        ...process.env,
        NODE_ENV: command[0] === 'jest' ? 'test' : 'development',
        FORCE_COLOR: '0',
        CI: '1',
      },
    });
    const chunks: Buffer[] = [];
    child.stdout.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.stderr.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.on('error', (error) => resolve({ code: 1, output: String(error) }));
    child.on('close', (code) => resolve({ code: code ?? 1, output: Buffer.concat(chunks).toString() }));
  });
}

async function runStep(step: Step): Promise<Outcome> {
  const began = Date.now();
  const report = path.join(scratch, `${step.name.replace(/ /g, '-')}.json`);
  const { code, output } = await run(
    step.jest ? [...step.command, '--json', `--outputFile=${report}`] : step.command,
  );
  const outcome = step.jest ? readJestReport(step.name, report, code) : checkOutcome(step.name, code);
  const seconds = ((Date.now() - began) / 1000).toFixed(1);
  console.log(
    `${outcome.failed === 0 ? 'ok    ' : 'FAILED'} ${step.name} (${outcome.passed} passed, ${outcome.failed} failed, ${seconds} s)`,
  );
  if (outcome.failed > 0) console.log(output);
  return outcome;
}

function checkOutcome(name: string, code: number): Outcome {
  return { name, passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
}

/** A run that found no tests, crashed or exited non-zero counts as at least one failure. */
function readJestReport(name: string, report: string, code: number): Outcome {
  let text: string;
  try {
    text = readFileSync(report, 'utf8');
  } catch (error) {
    console.log(`${name}: no report (${String(error)})`);
    return { name, passed: 0, failed: 1 };
  }
  const result = JSON.parse(text) as {
    numPassedTests: number;
    numFailedTests: number;
    numPendingTests: number;
    numRuntimeErrorTestSuites: number;
  };
  const failed = result.numFailedTests + result.numRuntimeErrorTestSuites + result.numPendingTests;
  return { name, passed: result.numPassedTests, failed: code !== 0 && failed === 0 ? 1 : failed };
}

async function runLane(steps: readonly Step[]): Promise<Outcome[]> {
  const outcomes: Outcome[] = [];
  for (const step of steps) outcomes.push(await runStep(step));
  return outcomes;
}

async function main(): Promise<void> {
  const lanes = await Promise.all([runLane(CHECKS), runLane(NODE_TESTS)]);
  const outcomes = [...lanes.flat(), ...(await runLane(JOURNEYS))];
  rmSync(scratch, { recursive: true, force: true });
  const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
  const failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
  console.log(`${passed} passed, ${failed} failed`);
  process.exitCode = failed === 0 ? 0 : 1;
}

void main();
