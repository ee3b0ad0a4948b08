import { createLetters } from '../../../server/mail/letters.js';
import { createWatchMail, type WatchMail } from '../../../server/mail/watch-mail.js';
import { makeNextDigest } from '../../../server/watches/digest.service.js';
import { createHappenings, type Happening } from '../../../server/watches/happenings.js';
import { tellNext } from '../../../server/watches/telling.service.js';
import type { TestApp } from './app.js';

export interface Watching {
  /** Mail on watches as the app writes it. */
  readonly mail: WatchMail;
  /** Lets something happen, in a transaction of its own. */
  happen(happening: Partial<Happening>): Promise<void>;
  /** Tells all that is untold, as one worker does; `mail` in place of the app's own. */
  tell(mail?: WatchMail): Promise<void>;
  /** Makes all digests that are due. */
  digest(mail?: WatchMail): Promise<void>;
}

let made = 0;

/** Telling and digests without their workers, by a clock that the test turns. */
export function watchingOf(app: TestApp, clock: () => Date): Watching {
  const { knex, url } = app;
  const mail = createWatchMail({
    publicAddress: url,
    letters: createLetters(url),
    secret: 'a session secret for the tests only',
    clock,
  });
  return {
    mail,
    async happen(happening) {
      made += 1;
      await knex.transaction((trx) =>
        createHappenings({ clock }).add(trx, {
          kind: 'edition-published',
          key: `event:${made}`,
          title: `Event ${made}`,
          path: '/hardware',
          actorId: null,
          about: {},
          ...happening,
        }),
      );
    },
    async tell(by = mail) {
      while (await tellNext({ knex, clock, mail: by }));
    },
    async digest(by = mail) {
      while (await makeNextDigest({ knex, clock, mail: by }));
    },
  };
}
