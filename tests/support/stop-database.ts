import { rmSync } from 'node:fs';
import './start-database';

/** Ends the throw-away MariaDB of a test run and removes its folder. */
export default async function stopDatabase(): Promise<void> {
  const running = globalThis.runningTestDatabase;
  if (running === undefined) return;
  await running.database.stop();
  rmSync(running.folder, { recursive: true, force: true });
}
