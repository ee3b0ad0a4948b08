import type { Transporter } from 'nodemailer';
import { accountRoutes } from '../../shared/contract/accounts.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { ProblemError } from '../http/problems.js';
import type { Worker } from '../worker.js';
import { createLetters } from './letters.js';
import { createMailQueue, type MailQueue } from './mail-queue.js';
import { createMailWorker, type MailWorkerNeeds } from './mail-worker.js';
import { turnNoticesOff } from './recipients.store.js';
import { accountOfUnsubscribeToken } from './unsubscribe-token.js';

export interface Mail {
  readonly queue: MailQueue;
  readonly worker: Worker;
  readonly bindings: RouteBinding[];
  health(): Promise<{ ok: boolean; detail: string }>;
}

export function createMail(needs: MailWorkerNeeds & { secret: string }): Mail {
  const letters = createLetters(needs.publicAddress);
  return {
    queue: createMailQueue({ letters, secret: needs.secret, clock: needs.clock }),
    worker: createMailWorker(needs),
    bindings: [
      bind(accountRoutes.unsubscribe, async ({ query }) => {
        await turnNoticesOff(needs.knex, accountNamedBy(query.token, needs.secret));
      }),
      bind(accountRoutes.openUnsubscribe, async ({ query, response }) => {
        response.redirect(303, letters.turnOffPage(query.token));
      }),
    ],
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
