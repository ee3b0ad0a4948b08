import type { Server } from 'node:http';
import type { Logger } from 'pino';
import type { Worker } from './worker.js';

const longestEndMs = 10_000;

/**
 * On SIGTERM or SIGINT: no new connections, requests in hand are finished, then the workers' pieces of work, then
 * `close`. Whoever is still connected after ten seconds is cut off. A second signal ends at once.
 */
export function endOnSignals(parts: {
  server: Server;
  workers: readonly Worker[];
  logger: Logger;
  close: () => Promise<void>;
}): void {
  const { server, workers, logger } = parts;
  const end = async (signal: string): Promise<void> => {
    logger.info({ signal }, 'ending');
    const closed = new Promise((resolve) => server.close(resolve));
    const cutOff = setTimeout(() => server.closeAllConnections(), longestEndMs);
    await closed;
    clearTimeout(cutOff);
    await Promise.all(workers.map((worker) => worker.stop()));
    await parts.close();
    logger.info('ended');
    process.exit(0);
  };
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.once(signal, () => {
      process.once(signal, () => process.exit(1));
      void end(signal);
    });
  }
}

/**
 * What nobody caught is a bug, and what it left half done is not known: it is logged and the process ends with 1, for
 * whatever started it to start it anew. A rejected promise that nobody awaits counts the same.
 */
export function endOnBugs(logger: Logger): void {
  const end = (error: unknown): void => {
    logger.fatal({ err: error }, 'a bug ends this process');
    process.exit(1);
  };
  process.on('uncaughtException', end);
  process.on('unhandledRejection', end);
}
