import type { Knex } from 'knex';
import { postsUntilKnown, type DeskFirstPost, type DeskPhoto } from '../../shared/contract/desk-posts.js';
import type { AuditLog, AuditSubject } from '../audit/audit.js';
import { AlreadyThere, NotFound } from '../http/problems.js';
import type { DeskClaims } from './claims.js';
import { deskLookStore as store, type FirstPostRow, type LookState } from './desk-look.store.js';
import { readSubject } from './subject.store.js';
import type { TakeDownService } from './take-down.service.js';

export type DeskLookService = ReturnType<typeof createDeskLookService>;

/** What stands on the pages and the desk still looks at: first posts of new members, photos used outside of editions. */
export function createDeskLookService(parts: {
  knex: Knex;
  clock: () => Date;
  audit: AuditLog;
  claims: Pick<DeskClaims, 'demandFree'>;
  takeDown: Pick<TakeDownService, 'takeDown'>;
}) {
  const { knex, clock, audit, claims, takeDown } = parts;

  return {
    async readFirstPost(id: number): Promise<DeskFirstPost> {
      const row = await store.firstPost(knex, id);
      if (!row) throw noSuchItem();
      const [subject, fineSoFar] = await Promise.all([
        readSubject(knex, { kind: row.kind, id: row.subjectId }),
        store.fineSoFar(knex, row.accountId),
      ]);
      const { state, title, createdAt } = row;
      return { id, state, since: createdAt.toISOString(), title, subject: subject ?? null, fineSoFar };
    },

    /** After the third fine one the desk knows the member. ClaimedByAnother, AlreadyThere. */
    async findPostFine(moderatorId: number, id: number): Promise<void> {
      await claims.demandFree({ kind: 'first-post', id }, moderatorId);
      await knex.transaction(async (trx) => {
        const post = waiting(await store.holdFirstPost(trx, id));
        const at = clock();
        await store.decideFirstPost(trx, id, { state: 'fine', by: moderatorId, at });
        const known = (await store.fineSoFar(trx, post.accountId)) >= postsUntilKnown;
        if (known) await store.makeKnown(trx, post.accountId, at);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'first-post-fine',
          subject: { kind: auditKinds[post.kind], id: post.subjectId, name: post.title },
          details: { accountId: post.accountId, known },
        });
      });
    },

    async takePostDown(moderatorId: number, id: number, reason: string): Promise<void> {
      await claims.demandFree({ kind: 'first-post', id }, moderatorId);
      await knex.transaction(async (trx) => {
        const { kind, subjectId } = waiting(await store.holdFirstPost(trx, id));
        await takeDown.takeDown(trx, { kind, id: subjectId, moderatorId, reason });
      });
    },

    async readPhoto(id: number): Promise<DeskPhoto> {
      const [look, subject] = await Promise.all([
        store.photoLook(knex, id),
        readSubject(knex, { kind: 'photo', id }),
      ]);
      if (!look || !subject) throw noSuchItem();
      return { id, state: look.state, since: look.createdAt.toISOString(), subject };
    },

    async findPhotoFine(moderatorId: number, id: number): Promise<void> {
      await claims.demandFree({ kind: 'photo', id }, moderatorId);
      await knex.transaction(async (trx) => {
        waiting(await store.holdPhotoLook(trx, id));
        await store.decidePhotoLook(trx, id, { state: 'fine', by: moderatorId, at: clock() });
        const subject = await readSubject(trx, { kind: 'photo', id });
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'photo-fine',
          subject: { kind: 'photo', id, name: subject?.title ?? '' },
        });
      });
    },

    async takePhotoDown(moderatorId: number, id: number, reason: string): Promise<void> {
      await claims.demandFree({ kind: 'photo', id }, moderatorId);
      await knex.transaction(async (trx) => {
        waiting(await store.holdPhotoLook(trx, id));
        await takeDown.takeDown(trx, { kind: 'photo', id, moderatorId, reason });
      });
    },
  };
}

const auditKinds: Record<FirstPostRow['kind'], AuditSubject> = {
  question: 'question',
  reply: 'reply',
  trial: 'trial',
  'fit-report': 'fit-report',
  reading: 'measurement',
};

function waiting<Row extends { state: LookState }>(row: Row | undefined): Row {
  if (!row) throw noSuchItem();
  if (row.state !== 'waiting') throw new AlreadyThere('This is decided already.', 'Go back to the queue.');
  return row;
}

function noSuchItem(): NotFound {
  return new NotFound('There is no such thing on the desk.', 'Read the queue again.');
}
