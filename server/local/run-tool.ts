import { spawn } from 'node:child_process';
import { readEnvironment } from '../config/environment';

/** What a tool answered. */
export interface ToolAnswer {
  readonly code: number | null;
  readonly output: string;
  readonly complaint: string;
}

/** Runs a program to its end, with a text on its standard input. */
export function runTool(
  command: string,
  args: readonly string[],
  input = '',
  environment: Readonly<Record<string, string>> = {},
): Promise<ToolAnswer> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: ['pipe', 'pipe', 'pipe'],
      env: { ...readEnvironment(), ...environment },
    });
    const output: Buffer[] = [];
    const complaint: Buffer[] = [];
    child.stdout.on('data', (chunk: Buffer) => output.push(chunk));
    child.stderr.on('data', (chunk: Buffer) => complaint.push(chunk));
    // A program that ends before it read everything is judged by its exit code.
    child.stdin.on('error', () => undefined);
    child.on('error', reject);
    child.on('close', (code) => {
      resolve({
        code,
        output: Buffer.concat(output).toString(),
        complaint: Buffer.concat(complaint).toString(),
      });
    });
    child.stdin.end(input);
  });
}
