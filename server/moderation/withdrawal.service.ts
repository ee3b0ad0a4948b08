import type { Knex } from 'knex';
import type { DeskWriteUp } from '../../shared/contract/withdrawal.js';
import type { AuditLog } from '../audit/audit.js';
import { FieldNotValid } from '../http/problems.js';
import type { DeskWords } from '../mail/desk-mail.js';
import type { Happenings } from '../watches/happenings.js';
import { partIdsOf } from '../write-ups/edition-links.js';
import { NoSuchWriteUp, WrongState } from '../write-ups/edition-problems.js';
import type { IndexNotice } from '../write-ups/trial.service.js';
import { noticeOf, type DeskWriteUpRow } from '../write-ups/withdrawal.service.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { CautionMissing, openHazards } from './caution-missing.js';

export interface WithdrawalParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly writeUps: WriteUpService;
  readonly mail: DeskWords;
  readonly searchOutbox: IndexNotice;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
}

export interface Withdrawal {
  readonly slug: string;
  readonly moderatorId: number;
  readonly reason: string;
  readonly instead: string | null;
  /** The limit of its only author that it goes with; the author hears of it with the limit. */
  readonly limitId: number | null;
}

export type WithdrawalDesk = ReturnType<typeof createWithdrawalDesk>;

/** Withdraws published write-ups, and puts them back. Nothing of them is deleted. */
export function createWithdrawalDesk(parts: WithdrawalParts) {
  const { knex, clock, writeUps, mail, searchOutbox, audit, happenings } = parts;
  const { withdrawals } = writeUps;

  async function find(slug: string, db?: Knex): Promise<DeskWriteUpRow> {
    const writeUp = await withdrawals.deskWriteUp(slug, db);
    if (!writeUp) throw new NoSuchWriteUp();
    return writeUp;
  }

  /** FieldNotValid unless it is another write-up that is published. */
  async function insteadIdOf(slug: string, writeUpId: number): Promise<number> {
    const other = await withdrawals.deskWriteUp(slug);
    if (other && !other.withdrawal && other.id !== writeUpId) return other.id;
    const remedy = 'Choose another write-up that is published, or none.';
    throw new FieldNotValid('instead', 'is not a write-up to go to instead', remedy);
  }

  const inHand = async (trx: Knex, writeUp: DeskWriteUpRow): Promise<DeskWriteUpRow> => {
    await writeUps.holdWriteUp(trx, writeUp.id);
    return find(writeUp.slug, trx);
  };

  /** Withdraws it in the caller's transaction; WrongState where it is withdrawn already. */
  async function withdrawWithin(trx: Knex, { slug, moderatorId, reason, instead, limitId }: Withdrawal) {
    const { id, title, withdrawal } = await inHand(trx, await find(slug));
    if (withdrawal)
      throw new WrongState('The write-up is withdrawn already.', 'Put it back first to withdraw it anew.');
    const insteadId = instead === null ? null : await insteadIdOf(instead, id);
    const at = clock();
    const content = await writeUps.publishedContent(trx, id);
    await withdrawals.withdrawHeld(trx, id, { at, by: moderatorId, reason, insteadId, limitId });
    await audit.note(trx, {
      actorId: moderatorId,
      action: 'write-up-withdrawn',
      subject: { kind: 'write-up', id, name: title },
      reason,
      details: { slug, ...(instead === null ? {} : { instead }) },
    });
    await happenings.add(trx, {
      kind: 'write-up-withdrawn',
      key: `write-up-withdrawn:${id}:${at.getTime()}`,
      title: `Withdrawn by the desk: ${title}`,
      text: reason,
      path: `/write-ups/${slug}`,
      actorId: moderatorId,
      about: { ...(content ? { parts: partIdsOf(content) } : {}), writeUps: [id] },
      people: (await writeUps.triersOf(trx, id, null)).map((accountId) => ({ accountId, atOnce: false })),
    });
    await searchOutbox.add(trx, id);
    if (limitId !== null) return;
    for (const accountId of await writeUps.authorIdsOf(trx, id))
      await mail.queueTakenDown(trx, { accountId, ...matterOf({ id, title, slug }), reason, at });
  }

  /** Puts it back in the caller's transaction. CautionMissing where cautions were taken off that it needs. */
  async function putBackWithin(
    trx: Knex,
    { slug, moderatorId, reason, tell }: { slug: string; moderatorId: number; reason: string; tell: boolean },
  ) {
    const { id, title, withdrawal } = await inHand(trx, await find(slug));
    if (!withdrawal) throw new WrongState('The write-up is not withdrawn.', 'Read it anew.');
    await withdrawals.putBackHeld(trx, id);
    const content = await writeUps.publishedContent(trx, id);
    const open = content ? openHazards(content, await writeUps.cautionsOf(id, trx)) : [];
    if (content && open.length > 0) {
      const remedy =
        'Place a caution for each hazard named, on its last edition at the desk, then put it back.';
      throw new CautionMissing('It names hazards that no caution answers.', remedy, content, open);
    }
    await audit.note(trx, {
      actorId: moderatorId,
      action: 'write-up-put-back',
      subject: { kind: 'write-up', id, name: title },
      reason,
      details: { slug },
    });
    await searchOutbox.add(trx, id);
    if (!tell) return;
    for (const accountId of await writeUps.authorIdsOf(trx, id))
      await mail.queuePutBack(trx, { accountId, ...matterOf({ id, title, slug }), reason, at: clock() });
  }

  async function readDeskWriteUp(slug: string): Promise<DeskWriteUp> {
    const { id, title, firstPublishedAt, withdrawal } = await find(slug);
    const { authors, editionCount } = await writeUps.writtenBy(id);
    return {
      id,
      slug,
      title,
      authors,
      editionCount,
      firstPublishedAt: firstPublishedAt.toISOString(),
      withdrawal: withdrawal && noticeOf(title, withdrawal, true),
    };
  }

  return {
    withdrawWithin,
    putBackWithin,
    readDeskWriteUp,

    async withdrawWriteUp(
      moderatorId: number,
      slug: string,
      wish: { reason: string; instead: string | null },
    ): Promise<DeskWriteUp> {
      await knex.transaction((trx) => withdrawWithin(trx, { slug, moderatorId, ...wish, limitId: null }));
      return readDeskWriteUp(slug);
    },

    async putBackWriteUp(moderatorId: number, slug: string, reason: string): Promise<DeskWriteUp> {
      await knex.transaction((trx) => putBackWithin(trx, { slug, moderatorId, reason, tell: true }));
      return readDeskWriteUp(slug);
    },
  };
}

/** What its authors are told of. */
function matterOf({ id, title, slug }: { id: number; title: string; slug: string }) {
  return { key: `write-up:${id}`, what: `your write-up “${title}”`, path: `/write-ups/${slug}/editions` };
}
