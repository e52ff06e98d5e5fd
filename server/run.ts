import { explain } from './cli/run-command';
import { parseConfig } from './config/config';
import { readEnvironment } from './config/environment';
import { startServer, type RunningServer, type StartOptions } from './start';

/** Runs a server until SIGINT or SIGTERM; every failure is one line and exit code 1. */
export async function run(openFront?: StartOptions['openFront']): Promise<void> {
  const abort = new AbortController();
  let server: RunningServer | undefined;
  let stopping: Promise<void> | undefined;
  const stop = () => {
    abort.abort();
    if (server) stopping ??= server.stop().then(() => process.exit(0), fail);
  };
  process.on('unhandledRejection', (reason) => {
    if (server) server.log.error({ err: reason }, 'a promise was rejected and nobody looked');
    else fail(reason);
  });
  // After an exception that nobody caught the state is unknown: end in order rather than go on.
  process.on('uncaughtException', (error) => {
    if (!server) fail(error);
    server.log.fatal({ err: error }, 'an exception was not caught');
    stopping ??= server.stop().then(() => fail(error), fail);
  });
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
  // A console that went away (a closed terminal or pipe) must not end the server.
  process.stdout.on('error', () => undefined);
  process.stderr.on('error', () => undefined);
  try {
    const config = parseConfig(readEnvironment());
    server = await startServer(config, { say, signal: abort.signal, ...(openFront ? { openFront } : {}) });
    if (abort.signal.aborted) stop();
  } catch (error) {
    if (abort.signal.aborted) process.exit(0);
    fail(error);
  }
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

function fail(error: unknown): never {
  for (const line of explain(error)) process.stderr.write(`${line}\n`);
  process.exit(1);
}
