import type { Transporter } from 'nodemailer';
import { accountRoutes } from '../../shared/contract/accounts.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { ProblemError } from '../http/problems.js';
import type { Worker } from '../worker.js';
import { bindBounceIntake } from './bounce-intake.js';
import { createBounces } from './bounces.js';
import { createLetters } from './letters.js';
import { createMailQueue, type MailQueue } from './mail-queue.js';
import { createMailWorker, type MailWorkerNeeds } from './mail-worker.js';
import { turnNoticesOff } from './recipients.store.js';
import { createReturnPath } from './return-path.js';
import { accountOfUnsubscribeToken } from './unsubscribe-token.js';
import { createWatchMail, type WatchMail } from './watch-mail.js';

export interface Mail {
  readonly queue: MailQueue;
  /** Mail on what people watch. */
  readonly watch: WatchMail;
  readonly worker: Worker;
  readonly bindings: RouteBinding[];
  /** The account a link in a mail was made for; throws the problem of a link that is not good. */
  readonly accountOfToken: (token: string) => number;
  /** Stops notices for the holder of a link, as one click does. */
  readonly turnNoticesOff: (token: string) => Promise<void>;
  health(): Promise<{ ok: boolean; detail: string }>;
}

export function createMail(
  needs: Omit<MailWorkerNeeds, 'bounces' | 'returnPath'> & {
    secret: string;
    /** Secret of the bounce hook; where there is none, mail has no return path of its own and the hook is closed. */
    bounceSecret?: string | undefined;
  },
): Mail {
  const bounces = createBounces(needs);
  const returnPath =
    needs.bounceSecret === undefined
      ? undefined
      : createReturnPath({ secret: needs.bounceSecret, from: needs.from });
  const letters = createLetters(needs.publicAddress);
  const accountOfToken = (token: string): number => accountNamedBy(token, needs.secret);
  const turnOff = (token: string): Promise<void> => turnNoticesOff(needs.knex, accountOfToken(token));
  return {
    queue: createMailQueue({ letters, secret: needs.secret, clock: needs.clock }),
    watch: createWatchMail({ ...needs, letters }),
    worker: createMailWorker({ ...needs, bounces, returnPath }),
    bindings: [
      bind(accountRoutes.unsubscribe, ({ query }) => turnOff(query.token)),
      bind(accountRoutes.openUnsubscribe, async ({ query, response }) => {
        response.redirect(303, letters.turnOffPage(query.token));
      }),
      bindBounceIntake({ secret: needs.bounceSecret, returnPath, bounces }),
    ],
    accountOfToken,
    // Async, so that a link that is not good rejects.
    turnNoticesOff: async (token) => turnOff(token),
    health: () => mailHealth(needs.transport),
  };
}

function accountNamedBy(token: string, secret: string): number {
  const accountId = accountOfUnsubscribeToken(secret, token);
  if (accountId === undefined) {
    throw new ProblemError(
      'token-not-valid',
      422,
      'The link to turn notices off is not complete.',
      'Copy the whole address from the mail, or turn notices off in your profile.',
    );
  }
  return accountId;
}

async function mailHealth(transport: Transporter): Promise<{ ok: boolean; detail: string }> {
  try {
    await transport.verify();
    return { ok: true, detail: 'The mail server answers.' };
  } catch {
    return { ok: false, detail: 'The mail server does not answer; mails wait in the outbox.' };
  }
}
