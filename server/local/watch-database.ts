import type { PrivateDatabase } from './private-database';

const LOOK_MS = 1_000;

/** Keeps a private database running until told to stop. */
export interface DatabaseWatch {
  stop(): Promise<void>;
}

/** Starts a private database again whenever it ended without being asked to; what was committed is there. */
export function watchDatabase(database: PrivateDatabase, report: (error: unknown) => void): DatabaseWatch {
  let reviving: Promise<void> | undefined;
  const timer = setInterval(() => {
    if (reviving || database.isAlive()) return;
    report(new Error('the database ended by itself and is started again'));
    reviving = database
      .revive()
      .catch(report)
      .finally(() => {
        reviving = undefined;
      });
  }, LOOK_MS);
  return {
    stop: async () => {
      clearInterval(timer);
      await reviving;
    },
  };
}
