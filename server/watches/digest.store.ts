import type { Knex } from 'knex';
import type { MailRhythm } from '../../shared/contract/accounts.js';
import type { WatchSubject } from '../../shared/contract/watches.js';
import type { HappeningKind } from './happenings.js';

export interface DigestPerson {
  readonly accountId: number;
  readonly rhythm: 'daily' | 'weekly';
}

export interface DigestRow {
  readonly id: number;
  readonly kind: HappeningKind;
  readonly title: string;
  readonly path: string;
  readonly because: 'watch' | 'bench' | 'person';
  readonly subject: WatchSubject | null;
  readonly subjectId: number | null;
}

/** A period that has ended: its name, and the instant before which its notices are. */
export interface EndedPeriod {
  readonly name: string;
  readonly end: Date;
}

const mostCandidates = 50;

/** What the digests read and write. */
export const digestStore = {
  /** Some of those who have notices waiting for a period that has ended and no digest of it yet. */
  async due(db: Knex, periods: { daily: EndedPeriod; weekly: EndedPeriod }): Promise<number[]> {
    const waiting = (rhythms: readonly MailRhythm[], period: EndedPeriod) =>
      db('notices as n')
        .join('accounts as a', 'a.id', 'n.account_id')
        .leftJoin('digests as d', (on) => {
          on.on('d.account_id', 'a.id').andOnVal('d.period', period.name);
        })
        .where('n.mail', 'digest')
        .whereNull('n.mailed_at')
        .where('n.at', '<', period.end)
        .whereIn('a.mail_rhythm', rhythms)
        .whereNull('a.mail_refused_at')
        .whereNull('d.id')
        .distinct('a.id')
        .limit(mostCandidates)
        .pluck('a.id') as Promise<number[]>;
    // What is gathered comes daily to those who have the rest at once.
    const [daily, weekly] = await Promise.all([
      waiting(['at-once', 'daily'], periods.daily),
      waiting(['weekly'], periods.weekly),
    ]);
    return [...daily, ...weekly];
  },

  /** One of them whom no other worker has in hand, held until the transaction ends, with the rhythm they want now. */
  async holdOne(trx: Knex, accountIds: readonly number[]): Promise<DigestPerson | undefined> {
    const row: { id: number; rhythm: MailRhythm } | undefined = await trx('accounts')
      .whereIn('id', accountIds)
      .whereNull('mail_refused_at')
      .whereNot('mail_rhythm', 'none')
      .orderBy('id')
      .forUpdate()
      .skipLocked()
      .first('id', { rhythm: 'mail_rhythm' });
    return row && { accountId: row.id, rhythm: row.rhythm === 'weekly' ? 'weekly' : 'daily' };
  },

  /** Notes the digest; undefined where there is one of that person and period. */
  async add(trx: Knex, accountId: number, period: string, at: Date): Promise<number | undefined> {
    const [id] = await trx('digests')
      .insert({ account_id: accountId, period, made_at: at })
      .onConflict(['account_id', 'period'])
      .ignore();
    return id || undefined;
  },

  /** What waits for it, the oldest first. */
  async waiting(trx: Knex, accountId: number, end: Date): Promise<DigestRow[]> {
    return trx('notices as n')
      .join('happenings as h', 'h.id', 'n.happening_id')
      .where({ 'n.account_id': accountId, 'n.mail': 'digest' })
      .whereNull('n.mailed_at')
      .where('n.at', '<', end)
      .select('n.id', 'h.kind', 'h.title', 'h.path', 'n.because', 'n.subject', { subjectId: 'n.subject_id' })
      .orderBy('n.id');
  },

  async markMailed(trx: Knex, noticeIds: readonly number[], digest: { id: number; at: Date }): Promise<void> {
    await trx('notices').whereIn('id', noticeIds).update({ mailed_at: digest.at, digest_id: digest.id });
  },

  /** Lets go of what waits for a digest of somebody who wants none now, so that it does not come when they want some again. */
  async dropUnwanted(db: Knex): Promise<void> {
    await db('notices as n')
      .join('accounts as a', 'a.id', 'n.account_id')
      .where({ 'n.mail': 'digest', 'a.mail_rhythm': 'none' })
      .whereNull('n.mailed_at')
      .update({ 'n.mail': 'none' });
  },
};
