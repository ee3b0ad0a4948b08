import type { Knex } from 'knex';
import type { Claim } from '../../shared/contract/desk-queue.js';
import { ProblemError } from '../http/problems.js';
import { claimStore, type ClaimRow, type ItemRef } from './claim.store.js';

/** How long an item stays in hand, in milliseconds; the page of the item renews it while it is open. */
const lasts = 20 * 60 * 1000;

/** Somebody else at the desk has the item in hand. */
export class ClaimedByAnother extends ProblemError {
  constructor(holder: ClaimRow | undefined) {
    super(
      'claimed-by-another',
      409,
      holder
        ? `${holder.displayName} has this in hand until ${holder.until.toISOString().slice(11, 16)} UTC.`
        : 'Somebody else has taken this in hand in the meantime.',
      'Leave it to them, or take it over after a word with them.',
    );
  }
}

export type DeskClaims = ReturnType<typeof createDeskClaims>;

/** Which moderator has which item in hand. A claim ends by itself. */
export function createDeskClaims({ knex, clock }: { knex: Knex; clock: () => Date }) {
  return {
    async standing(item: ItemRef): Promise<Claim | null> {
      const row = await claimStore.standing(knex, item, clock());
      return row ? toClaim(row) : null;
    },

    /** Takes it, or renews it; `takeOverFrom`: the moderator who is asked for it. Throws ClaimedByAnother. */
    async claim(item: ItemRef, moderatorId: number, takeOverFrom: number | null): Promise<Claim> {
      const now = clock();
      const until = new Date(now.getTime() + lasts);
      const taken = await claimStore.take(knex, item, moderatorId, now, until);
      if (!taken && takeOverFrom !== null)
        await claimStore.takeOver(knex, item, takeOverFrom, moderatorId, until);
      // Who has it now says it all: the same moderator may have asked twice at once.
      const holder = await claimStore.standing(knex, item, now);
      if (holder?.moderatorId !== moderatorId) throw new ClaimedByAnother(holder);
      return toClaim(holder);
    },

    giveUp: (item: ItemRef, moderatorId: number): Promise<void> => claimStore.giveUp(knex, item, moderatorId),

    /**
     * Before an item is decided: ClaimedByAnother while somebody else has it in hand. Asked outside of the decision's
     * transaction, whose first read would fix what it sees.
     */
    async demandFree(item: ItemRef, moderatorId: number): Promise<void> {
      const holder = await claimStore.standing(knex, item, clock());
      if (holder && holder.moderatorId !== moderatorId) throw new ClaimedByAnother(holder);
    },
  };
}

function toClaim({ moderatorId, displayName, until }: ClaimRow): Claim {
  return { person: { id: moderatorId, displayName }, until: until.toISOString() };
}
