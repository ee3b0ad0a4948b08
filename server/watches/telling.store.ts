import type { Knex } from 'knex';
import type { MailRhythm } from '../../shared/contract/accounts.js';
import type { WatchSubject } from '../../shared/contract/watches.js';
import type { HappeningKind } from './happenings.js';
import type { SubjectRef } from './subject-names.store.js';

export interface UntoldHappening {
  readonly id: number;
  readonly kind: HappeningKind;
  readonly title: string;
  readonly text: string;
  readonly path: string;
  readonly actorId: number | null;
  readonly at: Date;
}

/** Somebody whom a happening reaches, and one of the ways by which it does. */
export interface Reached {
  readonly accountId: number;
  readonly because: 'watch' | 'bench' | 'person';
  readonly atOnce: boolean;
  readonly about: SubjectRef | null;
}

export interface MailChoice {
  readonly rhythm: MailRhythm;
  readonly safetyMail: boolean;
  readonly refused: boolean;
}

export interface NewNotice extends Reached {
  readonly mail: 'none' | 'at-once' | 'digest';
  readonly mailedAt: Date | null;
}

const rowsAtOnce = 500;

/** What the telling reads and writes; all of it runs in the caller's transaction. */
export const tellingStore = {
  /** The oldest happening that nobody else is telling just now, held until the transaction ends. */
  async holdNext(trx: Knex): Promise<UntoldHappening | undefined> {
    return trx('happenings')
      .whereNull('told_at')
      .orderBy('id')
      .forUpdate()
      .skipLocked()
      .first('id', 'kind', 'title', 'text', 'path', 'at', { actorId: 'actor_id' });
  },

  /**
   * Who watches any of its subjects. A part is concerned by what concerns one of its revisions, and a joint by a
   * write-up on the two parts it is between.
   */
  async watchers(trx: Knex, happeningId: number): Promise<Reached[]> {
    const named = trx('happening_subjects').where({ happening_id: happeningId });
    const concerned = named
      .clone()
      .select('subject', 'subject_id')
      .union([
        trx('happening_subjects as s')
          .join('revisions as r', 'r.id', 's.subject_id')
          .where({ 's.happening_id': happeningId, 's.subject': 'revision' })
          .select(trx.raw("'part'"), 'r.part_id'),
        trx('happening_subjects as s')
          .join('write_ups as w', 'w.id', 's.subject_id')
          .join('edition_sides as a', 'a.edition_id', 'w.published_edition_id')
          .join('edition_sides as b', (on) => {
            on.on('b.edition_id', 'a.edition_id').andOn('b.joint', 'a.joint').andOn('b.side', '<>', 'a.side');
          })
          .join('features as fa', 'fa.part_id', 'a.part_id')
          .join('features as fb', 'fb.part_id', 'b.part_id')
          .join('joints as j', (on) => {
            on.on('j.feature_a', 'fa.id').andOn('j.feature_b', 'fb.id');
          })
          .where({ 's.happening_id': happeningId, 's.subject': 'write-up' })
          .select(trx.raw("'joint'"), 'j.id'),
      ]);
    const rows: { accountId: number; subject: WatchSubject; id: number }[] = await trx('watches as w')
      .join(concerned.as('c'), (on) => {
        on.on('c.subject', 'w.subject').andOn('c.subject_id', 'w.subject_id');
      })
      .select('w.subject', { accountId: 'w.account_id', id: 'w.subject_id' })
      .orderBy(['w.account_id', 'w.created_at', 'w.subject_id']);
    return rows.map(({ accountId, subject, id }) => ({
      accountId,
      because: 'watch',
      atOnce: false,
      about: { subject, id },
    }));
  },

  /**
   * Owners who agreed to be told of their bench. Where revisions of a part are named, it concerns those who have one of
   * them or do not know which they have; otherwise everybody who has the part.
   */
  async owners(trx: Knex, happeningId: number): Promise<Reached[]> {
    const rows: { accountId: number; partId: number; revisionId: number | null }[] = await trx(
      'bench_items as b',
    )
      .join('accounts as a', 'a.id', 'b.account_id')
      .where('a.bench_watch', true)
      .leftJoin(
        trx('happening_subjects as s')
          .join('revisions as r', 'r.id', 's.subject_id')
          .where({ 's.happening_id': happeningId, 's.subject': 'revision' })
          .distinct({ partId: 'r.part_id' })
          .as('named'),
        'named.partId',
        'b.part_id',
      )
      .leftJoin('happening_subjects as part', (on) => {
        on.on('part.subject_id', 'b.part_id')
          .andOnVal('part.happening_id', happeningId)
          .andOnVal('part.subject', 'part');
      })
      .leftJoin('happening_subjects as own', (on) => {
        on.on('own.subject_id', 'b.revision_id')
          .andOnVal('own.happening_id', happeningId)
          .andOnVal('own.subject', 'revision');
      })
      .where((either) => {
        void either
          .whereNotNull('own.subject_id')
          .orWhere((unknown) => unknown.whereNull('b.revision_id').whereNotNull('named.partId'))
          .orWhere((whole) => whole.whereNotNull('part.subject_id').whereNull('named.partId'));
      })
      .select({ accountId: 'b.account_id', partId: 'b.part_id', revisionId: 'b.revision_id' })
      .orderBy(['b.account_id', 'b.id']);
    return rows.map(({ accountId, partId, revisionId }) => ({
      accountId,
      because: 'bench',
      atOnce: false,
      about: revisionId === null ? { subject: 'part', id: partId } : { subject: 'revision', id: revisionId },
    }));
  },

  async people(trx: Knex, happeningId: number): Promise<Reached[]> {
    const rows: { accountId: number; atOnce: number }[] = await trx('happening_people')
      .where({ happening_id: happeningId })
      .select({ accountId: 'account_id', atOnce: 'at_once' });
    return rows.map(({ accountId, atOnce }) => ({
      accountId,
      because: 'person',
      atOnce: Boolean(atOnce),
      about: null,
    }));
  },

  /** What each wants of mail; accounts that are gone or were never confirmed are missing. */
  async choices(trx: Knex, accountIds: readonly number[]): Promise<ReadonlyMap<number, MailChoice>> {
    const rows: { id: number; rhythm: MailRhythm; safety: number; refusedAt: Date | null }[] = await trx(
      'accounts',
    )
      .whereIn('id', accountIds)
      .whereNotNull('confirmed_at')
      .select('id', { rhythm: 'mail_rhythm', safety: 'safety_mail', refusedAt: 'mail_refused_at' });
    return new Map(
      rows.map(({ id, rhythm, safety, refusedAt }) => [
        id,
        { rhythm, safetyMail: Boolean(safety), refused: refusedAt !== null },
      ]),
    );
  },

  async addNotices(trx: Knex, happening: UntoldHappening, notices: readonly NewNotice[]): Promise<void> {
    const rows = notices.map((notice) => ({
      happening_id: happening.id,
      account_id: notice.accountId,
      at: happening.at,
      at_once: notice.atOnce,
      because: notice.because,
      subject: notice.about?.subject ?? null,
      subject_id: notice.about?.id ?? null,
      mail: notice.mail,
      mailed_at: notice.mailedAt,
    }));
    for (let start = 0; start < rows.length; start += rowsAtOnce)
      await trx('notices').insert(rows.slice(start, start + rowsAtOnce));
  },

  async markTold(trx: Knex, happeningId: number, at: Date): Promise<void> {
    await trx('happenings').where({ id: happeningId }).update({ told_at: at });
  },
};
