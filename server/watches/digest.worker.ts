import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { WatchMail } from '../mail/watch-mail.js';
import { repeatedly, type Worker } from '../worker.js';
import { makeNextDigest } from './digest.service.js';

const pauseMs = 30_000;

/** Makes the digests that are due, one person after the other. */
export function createDigestWorker(around: {
  knex: Knex;
  clock: () => Date;
  mail: WatchMail;
  logger: Logger;
}): Worker {
  return repeatedly({
    round: async () => ({ more: await makeNextDigest(around) }),
    pauseMs,
    onError: (error) => around.logger.warn({ err: error }, 'digests could not be made; trying again'),
  });
}
