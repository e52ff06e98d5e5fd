/**
 * `npm run bench [-- group ...]`: measures every figure (or those of the named groups) and prints a line of JSON each.
 * A figure that cannot be measured is said on stderr and ends the run with exit code 1.
 */
import { readdirSync } from 'node:fs';
import path from 'node:path';
import type { Figure } from './figure';

async function main(): Promise<void> {
  const wanted = new Set(process.argv.slice(2));
  const files = readdirSync(__dirname).filter((file) => file.endsWith('.bench.ts'));
  let failed = false;
  for (const file of files) {
    const { figures } = (await import(path.join(__dirname, file))) as { figures: readonly Figure[] };
    for (const figure of figures) {
      if (wanted.size > 0 && !wanted.has(figure.group) && !wanted.has(figure.name)) continue;
      try {
        const value = await figure.measure();
        console.log(
          JSON.stringify({ name: figure.name, value: Number(value.toPrecision(4)), unit: figure.unit }),
        );
      } catch (error) {
        failed = true;
        console.error(`${figure.name}: ${error instanceof Error ? error.message : String(error)}`);
      }
    }
  }
  process.exit(failed ? 1 : 0);
}

void main();
