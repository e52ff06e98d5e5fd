import { ConfigError } from '../config/config';
import { describeError } from '../config/logger';
import { StartProblem } from '../local/start-problem';

/** Runs a command line to its end; a failure is one line on stderr and exit code 1. */
export async function runCommand(work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    for (const line of explain(error)) process.stderr.write(`${line}\n`);
    process.exitCode = 1;
  }
}

/** What a person is told of a failure: one line for each thing that is wrong. */
export function explain(error: unknown): readonly string[] {
  if (error instanceof ConfigError) return error.lines;
  if (error instanceof StartProblem) return [error.message];
  return [`Elbowroom could not go on: ${String(describeError(error)['message']).split('\n')[0]}`];
}
