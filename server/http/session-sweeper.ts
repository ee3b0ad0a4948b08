import type { Knex } from 'knex';
import type { Logger } from 'pino';
import { repeatedly, type Worker } from '../worker.js';
import { sweepSessions } from './session-store.js';

const quarterHour = 15 * 60 * 1000;

/** Deletes ended sessions every quarter of an hour. */
export function sessionSweeper(needs: { knex: Knex; clock: () => Date; logger: Logger }): Worker {
  return repeatedly({
    round: async () => {
      await sweepSessions(needs.knex, needs.clock());
      return { more: false };
    },
    pauseMs: quarterHour,
    onError: (error) =>
      needs.logger.warn({ err: error }, 'ended sessions could not be deleted; trying again later'),
  });
}
