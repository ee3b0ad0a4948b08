import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { RouteBinding } from '../http/binding.js';
import type { Mail } from '../mail/mail.js';
import type { Worker } from '../worker.js';
import { createDigestWorker } from './digest.worker.js';
import { createMailChoiceService } from './mail-choices.service.js';
import { createNoticeService } from './notices.service.js';
import { createTellingWorker } from './telling.worker.js';
import { watchBindings } from './watches.routes.js';
import { createWatchService, type WatchService } from './watches.service.js';

export type { WatchService };

/** What members want to be told of, telling them once, in the app and by mail, and how mail comes. */
export function createWatches(around: {
  knex: Knex;
  clock: () => Date;
  logger: Logger;
  mail: Pick<Mail, 'watch' | 'accountOfToken' | 'turnNoticesOff'>;
}): { bindings: RouteBinding[]; service: WatchService; workers: readonly Worker[] } {
  const { knex, mail } = around;
  const service = createWatchService(around);
  const telling = { ...around, mail: mail.watch };
  return {
    service,
    bindings: watchBindings({
      watches: service,
      notices: createNoticeService(around),
      choices: createMailChoiceService({ knex, accountOfToken: mail.accountOfToken }),
      turnNoticesOff: mail.turnNoticesOff,
    }),
    workers: [createTellingWorker(telling), createDigestWorker(telling)],
  };
}
