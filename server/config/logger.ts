import { join } from 'node:path';
import { pino, type DestinationStream, type Logger } from 'pino';
import { createStream } from 'rotating-file-stream';
import type { Config } from './config';

const TOKEN_IN_PATH = /\/[A-Za-z0-9_-]{32,}(?=\/|$)/g;

/** A log whose lines are JSON, in a file of the data folder that is rotated daily and at 10 MB. */
export function openLog(config: Pick<Config, 'dataFolder' | 'logLevel'>): {
  log: Logger;
  close: () => Promise<void>;
} {
  const stream = createStream('elbowroom.log', {
    path: join(config.dataFolder, 'logs'),
    size: '10M',
    interval: '1d',
    maxFiles: 14,
  });
  // A log that cannot be written (a full disk) must not take the server with it.
  stream.on('error', () => undefined);
  return {
    log: createLog(config.logLevel, stream),
    close: () => new Promise((resolve) => stream.end(() => resolve())),
  };
}

/** A log that writes to a stream; nothing secret passes its serializers. */
export function createLog(level: string, stream: DestinationStream): Logger {
  return pino(
    {
      level,
      base: undefined,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: describeError, req: describeRequest, res: describeResponse },
    },
    stream,
  );
}

/** An address without its query and without the tokens in its path. */
export function redactAddress(address: string): string {
  return (address.split('?', 1)[0] ?? '').replace(TOKEN_IN_PATH, '/[token]');
}

/** What a log line says of an error: never the parameters of a statement or the text of a body. */
export function describeError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { message: String(error) };
  const { code, errno } = error as { code?: unknown; errno?: unknown };
  const calls = (error.stack ?? '').split('\n').filter((line) => line.startsWith('    at '));
  return {
    type: error.name,
    message: error.message.split(/\n?sql: /, 1)[0],
    ...(code === undefined ? {} : { code }),
    ...(errno === undefined ? {} : { errno }),
    stack: calls.slice(0, 20).join('\n'),
    ...(error.cause === undefined ? {} : { cause: describeError(error.cause) }),
  };
}

function describeRequest(request: {
  id?: unknown;
  method?: string;
  url?: string;
  raw?: { originalUrl?: string };
}) {
  const address = request.raw?.originalUrl ?? request.url ?? '';
  return { id: request.id, method: request.method, url: redactAddress(address) };
}

function describeResponse(response: { statusCode?: number }) {
  return { statusCode: response.statusCode };
}
