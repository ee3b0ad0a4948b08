import type { Knex } from 'knex';
import type { LimitKind } from '../../shared/contract/members.js';
import type { AuditLog } from '../audit/audit.js';
import type { MemberCaller } from '../http/caller.js';
import { AlreadyThere, NotAllowed, NotFound } from '../http/problems.js';
import { endSessionsOf } from '../http/session-store.js';
import type { LimitMail } from '../mail/limit-mail.js';
import type { TakeDownService } from '../moderation/take-down.service.js';
import type { WithdrawalDesk } from '../moderation/withdrawal.service.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { termInWords } from '../http/term-words.js';
import { memberLimitStore as limits } from './member-limit.store.js';
import { memberStore as members, type StoredMember } from './member.store.js';
import { mayLimit, noSuchMember } from './members.service.js';

const dayMs = 24 * 60 * 60 * 1000;

export interface LimitParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly audit: AuditLog;
  readonly mail: LimitMail;
  readonly takeDown: Pick<TakeDownService, 'takeDownAllOf' | 'putBackAllOf'>;
  readonly withdrawals: Pick<WithdrawalDesk, 'withdrawWithin' | 'putBackWithin'>;
  readonly writeUps: Pick<WriteUpService, 'withdrawals'>;
}

export type LimitService = ReturnType<typeof createLimitService>;

/** Sets limits on accounts and lifts them. What goes with a limit is taken off the pages, never deleted. */
export function createLimitService(parts: LimitParts) {
  const { knex, clock, audit, mail, takeDown, withdrawals, writeUps } = parts;

  return {
    /** NotAllowed for oneself and for those of the desk; AlreadyThere while another limit holds. */
    async limitMember(
      caller: MemberCaller,
      accountId: number,
      wish: { kind: LimitKind; reason: string; days: number | null; works: 'stay' | 'go' },
    ): Promise<void> {
      const { kind, reason, days, works } = wish;
      const moderatorId = caller.accountId;
      await knex.transaction(async (trx) => {
        const member = await members.hold(trx, accountId);
        if (!member) throw noSuchMember();
        demandMayLimit(caller, member);
        const from = clock();
        if (await limits.holdingOf(trx, accountId, from))
          throw new AlreadyThere(
            'A limit holds on this account already.',
            'Lift it before you set another one.',
          );
        const until = days === null ? null : new Date(from.getTime() + days * dayMs);
        const limitId = await limits.add(trx, { accountId, kind, reason, from, until, setBy: moderatorId });
        if (works === 'go') await takeWorks(trx, { limitId, accountId, moderatorId, reason });
        if (kind === 'blocked') await endSessionsOf(trx, accountId);
        await audit.note(trx, {
          actorId: moderatorId,
          action: kind === 'limited' ? 'member-limited' : 'member-blocked',
          subject: { kind: 'account', id: accountId, name: member.displayName },
          reason,
          details: { until: until?.toISOString() ?? 'until lifted', works },
        });
        const { email, displayName } = member;
        await mail.queueLimitSet(trx, {
          limitId,
          accountId,
          email,
          displayName,
          kind,
          reason,
          term: termInWords(until),
          worksGo: works === 'go',
        });
      });
    },

    /** Lifts it and tells whose account it was; NotFound where it no longer holds. */
    async liftLimit(
      caller: MemberCaller,
      limitId: number,
      { reason, works }: { reason: string; works: 'leave' | 'put-back' },
    ): Promise<number> {
      // Read outside the transaction: it never changes, and the account is held before the limit.
      const accountId = await limits.accountOf(knex, limitId);
      if (accountId === undefined) throw noSuchLimit();
      const moderatorId = caller.accountId;
      await knex.transaction(async (trx) => {
        const member = await members.hold(trx, accountId);
        const limit = await limits.hold(trx, limitId);
        const at = clock();
        if (!member || !limit) throw noSuchLimit();
        demandMayLimit(caller, member);
        const runOut = limit.until !== null && limit.until <= at;
        const putBack = works === 'put-back' && limit.worksGoneAt !== null;
        if (limit.liftedAt || (runOut && !putBack)) throw noSuchLimit();
        await limits.lift(trx, limitId, { at, accountId: moderatorId, reason });
        if (putBack)
          await giveWorksBack(trx, { limitId, accountId, moderatorId, reason, at: limit.worksGoneAt! });
        const { email, displayName } = member;
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'limit-lifted',
          subject: { kind: 'account', id: accountId, name: displayName },
          reason,
          details: { kind: limit.kind, works: putBack ? 'put back' : 'left' },
        });
        const { kind } = limit;
        await mail.queueLimitLifted(trx, { limitId, accountId, email, displayName, kind, reason, putBack });
      });
      return accountId;
    },
  };

  interface Works {
    readonly limitId: number;
    readonly accountId: number;
    readonly moderatorId: number;
    readonly reason: string;
  }

  /** Everything they wrote goes, with the write-ups that nobody else wrote an edition of. */
  async function takeWorks(trx: Knex, { limitId, accountId, moderatorId, reason }: Works): Promise<void> {
    const { at } = await takeDown.takeDownAllOf(trx, accountId, { moderatorId, reason });
    await limits.markWorksGone(trx, limitId, at);
    // Each is held, noted and told of like any other withdrawal.
    for (const slug of await writeUps.withdrawals.soleWriteUpsOf(trx, accountId))
      await withdrawals.withdrawWithin(trx, {
        slug,
        moderatorId,
        reason: toldToReaders,
        instead: null,
        limitId,
      });
  }

  async function giveWorksBack(
    trx: Knex,
    { limitId, accountId, moderatorId, reason, at }: Works & { at: Date },
  ) {
    await takeDown.putBackAllOf(trx, accountId, { moderatorId, reason, at });
    for (const slug of await writeUps.withdrawals.writeUpsWithdrawnWith(trx, limitId))
      await withdrawals.putBackWithin(trx, { slug, moderatorId, reason, tell: false });
  }
}

/** What readers of a write-up are told; the reason for the limit is between the desk and the member. */
const toldToReaders = 'The desk has taken down what its author wrote.';

function demandMayLimit(caller: MemberCaller, member: Pick<StoredMember, 'id' | 'role'>): void {
  if (mayLimit(caller, member)) return;
  if (caller.accountId === member.id)
    throw new NotAllowed('Nobody sets a limit on themself.', 'Ask another administrator.');
  throw new NotAllowed('Moderators set limits on members and makers only.', 'Ask an administrator.');
}

function noSuchLimit(): NotFound {
  return new NotFound('There is no such limit that holds.', 'Read the member’s page again.');
}
