import { pino, type DestinationStream, type Logger } from 'pino';

/**
 * Log lines as JSON on standard output, or to `destination`. What opens an account never gets in: such fields are
 * struck out wherever they stand, and of an error only name, code, message and stack are kept, for database errors
 * carry the statement with its values.
 */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  const options = {
    level,
    base: null,
    redact: { paths: secretPaths, censor: 'struck out' },
    serializers: { err: errorLine },
  };
  return destination ? pino(options, destination) : pino(options);
}

const secretNames = ['password', 'token', 'cookie', 'authorization', '["set-cookie"]', '["x-xsrf-token"]'];
const secretPaths = secretNames.flatMap((name) => {
  const step = name.startsWith('[') ? name : `.${name}`;
  return [name, `*${step}`, `*.*${step}`];
});

function errorLine(error: unknown): object {
  if (!(error instanceof Error)) return { message: String(error) };
  const { code } = error as { code?: unknown };
  return {
    type: error.name,
    ...(code === undefined ? {} : { code }),
    message: error.message,
    stack: error.stack,
  };
}
