import type { Knex } from 'knex';
import type { DeskSubject } from '../../shared/contract/desk-subjects.js';
import type { TakenDownKind } from '../../shared/contract/taken-down.js';
import type { AuditLog, AuditSubject } from '../audit/audit.js';
import { AlreadyThere, NotFound } from '../http/problems.js';
import type { DeskWords } from '../mail/desk-mail.js';
import type { MeasurementService } from '../measurements/measurements.js';
import type { IndexNotice } from '../write-ups/trial.service.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { deskLookStore } from './desk-look.store.js';
import { flagStore } from './flag.store.js';
import { readSubject } from './subject.store.js';
import { markedKinds, takeDownStore as store } from './take-down.store.js';
import { tellTellers } from './tellers.js';

/** Who takes what down, or puts it back, and why. */
export interface TakeDownOrder {
  readonly kind: TakenDownKind;
  readonly id: number;
  readonly moderatorId: number;
  readonly reason: string;
}

export interface TakeDownParts {
  readonly clock: () => Date;
  readonly audit: AuditLog;
  readonly mail: DeskWords;
  readonly measurements: Pick<MeasurementService, 'decideWithin' | 'remakeConsensus'>;
  readonly writeUps: Pick<WriteUpService, 'judgeAnew'>;
  readonly searchOutbox: IndexNotice;
}

export type TakeDownService = ReturnType<typeof createTakeDownService>;

/** Takes what members wrote off the pages, with a reason, and puts it back. Everything runs in the transaction handed in. */
export function createTakeDownService(parts: TakeDownParts) {
  const { clock, audit, mail, measurements, writeUps, searchOutbox } = parts;

  return {
    /**
     * NotFound; AlreadyThere where it is off the pages already. Its writer is told by mail. What waits at the desk on the
     * same thing is settled with it, and those who told of it hear so.
     */
    async takeDown(trx: Knex, order: TakeDownOrder): Promise<void> {
      await change(trx, order, 'take-down');
      const matter = await matterOf(trx, order);
      await mail.queueTakenDown(trx, matter);
      await closeOn(trx, order, matter.path);
    },

    /** NotFound; AlreadyThere where it stands on the pages. Its writer is told by mail. */
    async putBack(trx: Knex, order: TakeDownOrder): Promise<void> {
      await change(trx, order, 'put-back');
      await mail.queuePutBack(trx, await matterOf(trx, order));
    },

    /**
     * Everything an account wrote that is still on the pages. `at` names the occasion: `putBackAllOf` with it puts back
     * exactly this and not what was taken down one by one. Whoever orders it tells the account.
     */
    async takeDownAllOf(
      trx: Knex,
      accountId: number,
      { moderatorId, reason }: { moderatorId: number; reason: string },
    ): Promise<{ at: Date; count: number }> {
      const by = { at: clock(), moderatorId, reason };
      let count = 0;
      // As many statements as there are kinds, whatever the account wrote.
      for (const kind of markedKinds) count += await store.markAllOf(trx, kind, accountId, by);
      const features = await store.setAsideAllOf(trx, accountId, by);
      await followAllOf(trx, accountId, features);
      await deskLookStore.closeAllOf(trx, accountId, moderatorId, by.at);
      const settlement = { outcome: 'taken-down', reason, by: moderatorId, at: by.at } as const;
      const tellers = await flagStore.settleAllOf(trx, accountId, settlement);
      await tellTellers(trx, mail, tellers, { ...settlement, path: '/' });
      await noteAll(trx, accountId, moderatorId, 'all-taken-down', reason);
      return { at: by.at, count };
    },

    async putBackAllOf(
      trx: Knex,
      accountId: number,
      { moderatorId, reason, at }: { moderatorId: number; reason: string; at: Date },
    ): Promise<void> {
      for (const kind of markedKinds) await store.unmarkAllOf(trx, kind, accountId, at);
      const features = await store.takeBackAllOf(trx, accountId, at);
      await followAllOf(trx, accountId, features);
      await noteAll(trx, accountId, moderatorId, 'all-put-back', reason);
    },
  };

  async function change(trx: Knex, order: TakeDownOrder, way: 'take-down' | 'put-back'): Promise<void> {
    const { kind, id, moderatorId, reason } = order;
    if (kind === 'reading') {
      // The measurements note it in the audit log themselves.
      await measurements.decideWithin(trx, id, moderatorId, way === 'take-down' ? reason : null);
      return;
    }
    const row = await store.hold(trx, kind, id);
    if (!row) throw new NotFound(`There is no such ${kind}.`, 'Read the desk again.');
    if (way === 'take-down' && row.takenDownAt)
      throw new AlreadyThere('It is taken down already.', 'Read it again.');
    if (way === 'put-back' && !row.takenDownAt)
      throw new AlreadyThere('It stands on the pages.', 'Read it again.');
    await store.mark(trx, kind, id, way === 'take-down' ? { at: clock(), moderatorId, reason } : null);
    if (kind === 'trial') await follow(trx, await store.writeUpsOfTrials(trx, { id }));
    if (kind === 'photo') await reindex(trx, await store.writeUpsOfPhotos(trx, { id }));
    const subject = await readSubject(trx, { kind, id });
    await audit.note(trx, {
      actorId: moderatorId,
      action: way === 'take-down' ? 'taken-down' : 'put-back',
      subject: { kind: auditKinds[kind], id, name: subject?.title ?? kind },
      reason,
    });
  }

  async function closeOn(trx: Knex, order: TakeDownOrder, path: string): Promise<void> {
    const { moderatorId, reason } = order;
    const at = clock();
    await deskLookStore.closeOn(trx, order, moderatorId, at);
    const settlement = { outcome: 'taken-down', reason, by: moderatorId, at } as const;
    const tellers = await flagStore.settleOn(trx, order, settlement);
    await tellTellers(trx, mail, tellers, { ...settlement, path });
  }

  /** Standings rest on trials. Few write-ups are concerned; each is held while it is judged. */
  async function follow(trx: Knex, writeUpIds: readonly number[]): Promise<void> {
    for (const writeUpId of writeUpIds) await writeUps.judgeAnew(trx, writeUpId);
  }

  async function reindex(trx: Knex, writeUpIds: readonly number[]): Promise<void> {
    for (const writeUpId of writeUpIds) await searchOutbox.add(trx, writeUpId);
  }

  async function followAllOf(trx: Knex, accountId: number, features: readonly number[]): Promise<void> {
    await follow(trx, await store.writeUpsOfTrials(trx, { account_id: accountId }));
    await reindex(trx, await store.writeUpsOfPhotos(trx, { owner_id: accountId }));
    await measurements.remakeConsensus(features, trx);
  }

  async function noteAll(
    trx: Knex,
    accountId: number,
    moderatorId: number,
    action: string,
    reason: string,
  ): Promise<void> {
    const name = await store.nameOf(trx, accountId);
    await audit.note(trx, {
      actorId: moderatorId,
      action,
      subject: { kind: 'account', id: accountId, name },
      reason,
    });
  }

  async function matterOf(trx: Knex, { kind, id, reason }: TakeDownOrder) {
    const subject: DeskSubject = (await readSubject(trx, { kind, id }))!;
    const { path, person, title } = subject;
    return {
      accountId: person.id,
      key: `${kind}:${id}`,
      what: `your ${lowerFirst(title)}`,
      path,
      reason,
      at: clock(),
    };
  }
}

const auditKinds: Record<Exclude<TakenDownKind, 'reading'>, AuditSubject> = {
  question: 'question',
  reply: 'reply',
  trial: 'trial',
  'fit-report': 'fit-report',
  photo: 'photo',
};

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
