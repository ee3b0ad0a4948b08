import type { Knex } from 'knex';

export interface OutgoingMail {
  /** One mail for each; adding a second one under the same key does nothing. */
  readonly dedupeKey: string;
  readonly category: 'account' | 'notice';
  readonly accountId: number;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly unsubscribeUrl: string | null;
}

export interface ClaimedMail extends OutgoingMail {
  readonly id: number;
  /** Tries so far, with this one. */
  readonly attempts: number;
  /** Whether the recipient has turned notices off since it was queued. */
  readonly unwanted: boolean;
}

interface MailRecord {
  id: number;
  dedupe_key: string;
  category: 'account' | 'notice';
  account_id: number;
  to_address: string;
  subject: string;
  body_text: string;
  body_html: string;
  unsubscribe_url: string | null;
  attempts: number;
}

export async function addMail(trx: Knex, mail: OutgoingMail, now: Date): Promise<void> {
  await trx('mail_outbox')
    .insert({
      dedupe_key: mail.dedupeKey,
      category: mail.category,
      account_id: mail.accountId,
      to_address: mail.to,
      subject: mail.subject,
      body_text: mail.text,
      body_html: mail.html,
      unsubscribe_url: mail.unsubscribeUrl,
      created_at: now,
      next_try_at: now,
    })
    .onConflict('dedupe_key')
    .ignore();
}

/** How many mails have a key that starts like this. */
export async function countMails(db: Knex, keyStart: string): Promise<number> {
  const row: { count: number } | undefined = await db('mail_outbox')
    .where('dedupe_key', 'like', `${keyStart.replace(/[\\%_]/g, '\\$&')}%`)
    .first(db.raw('COUNT(*) AS count'));
  return Number(row?.count ?? 0);
}

/**
 * Takes up to `limit` mails that are due and puts their next try off to `leaseUntil`, so that no other worker takes
 * them meanwhile and a worker that dies with them in hand delays but does not lose them.
 */
export async function claimDueMails(
  knex: Knex,
  wanted: { now: Date; leaseUntil: Date; limit: number },
): Promise<ClaimedMail[]> {
  return knex.transaction(async (trx) => {
    const rows: MailRecord[] = await trx('mail_outbox')
      .whereNull('sent_at')
      .whereNull('given_up_at')
      .where('next_try_at', '<=', wanted.now)
      .orderBy('next_try_at')
      .limit(wanted.limit)
      .forUpdate()
      .skipLocked()
      .select(
        'id',
        'dedupe_key',
        'category',
        'account_id',
        'to_address',
        'subject',
        'body_text',
        'body_html',
        'unsubscribe_url',
        'attempts',
      );
    if (rows.length === 0) return [];
    await trx('mail_outbox')
      .whereIn(
        'id',
        rows.map((row) => row.id),
      )
      .update({ next_try_at: wanted.leaseUntil, attempts: trx.raw('attempts + 1') });
    const unwilling: { id: number }[] = await trx('accounts')
      .whereIn(
        'id',
        rows.map((row) => row.account_id),
      )
      .where({ notice_mail: false })
      .select('id');
    const unwillingIds = new Set(unwilling.map((row) => row.id));
    return rows.map((row) => ({
      id: row.id,
      dedupeKey: row.dedupe_key,
      category: row.category,
      accountId: row.account_id,
      to: row.to_address,
      subject: row.subject,
      text: row.body_text,
      html: row.body_html,
      unsubscribeUrl: row.unsubscribe_url,
      attempts: row.attempts + 1,
      unwanted: row.category === 'notice' && unwillingIds.has(row.account_id),
    }));
  });
}

// A mail that is done with keeps no text: links in it may still open an account.
const noText = { body_text: '', body_html: '' };

export async function markSent(knex: Knex, id: number, now: Date): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ sent_at: now, last_error: null, ...noText });
}

export async function markGivenUp(knex: Knex, id: number, now: Date, reason: string): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ given_up_at: now, last_error: reason.slice(0, 2000), ...noText });
}

export async function markFailed(knex: Knex, id: number, nextTryAt: Date, reason: string): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ next_try_at: nextTryAt, last_error: reason.slice(0, 2000) });
}
