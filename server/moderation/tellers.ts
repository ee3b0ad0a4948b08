import type { Knex } from 'knex';
import type { FlagOutcome } from '../../shared/contract/flags.js';
import type { DeskWords } from '../mail/desk-mail.js';
import type { Teller } from './flag.store.js';

const outcomeWords: Record<FlagOutcome, string> = {
  kept: 'leaves it as it is',
  'taken-down': 'has taken it down',
  'dealt-with': 'has dealt with it',
};

/** Tells everybody who told the desk of a thing what came of it; each letter has a link of its own to turn mail off. */
export async function tellTellers(
  trx: Knex,
  mail: Pick<DeskWords, 'queueFlagSettled'>,
  tellers: readonly Teller[],
  news: { outcome: FlagOutcome; reason: string; path: string; at: Date },
): Promise<void> {
  const { outcome, ...rest } = news;
  for (const { flaggedId, accountId, title } of tellers)
    await mail.queueFlagSettled(trx, {
      ...rest,
      accountId,
      key: `flag:${flaggedId}`,
      what: title,
      outcome: outcomeWords[outcome],
    });
}
