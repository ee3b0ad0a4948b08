import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { WatchMail } from '../mail/watch-mail.js';
import { repeatedly, type Worker } from '../worker.js';
import { tellNext } from './telling.service.js';

const pauseMs = 500;

/** Tells what has happened to those it concerns, the oldest first; several of them side by side never tell a thing twice. */
export function createTellingWorker(around: {
  knex: Knex;
  clock: () => Date;
  mail: WatchMail;
  logger: Logger;
}): Worker {
  return repeatedly({
    round: async () => ({ more: await tellNext(around) }),
    pauseMs,
    onError: (error) => around.logger.warn({ err: error }, 'what happened could not be told; trying again'),
  });
}
