import type { Knex } from 'knex';
import { groupBy } from '../rows.js';
import type { Attachment } from './letter.js';

/**
 * What a mail is about, which decides what stops it: nothing stops mail of the account itself; `notice` (the desk on
 * their own work), `watch` and `safety` each have their choice; a `letter` goes to somebody who need not have an account.
 */
export type MailCategory = 'account' | 'notice' | 'watch' | 'safety' | 'letter';

export interface OutgoingMail {
  /** One mail for each; adding a second one under the same key does nothing. */
  readonly dedupeKey: string;
  readonly category: MailCategory;
  /** Null for a letter. */
  readonly accountId: number | null;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly unsubscribeUrl: string | null;
  readonly attachments?: readonly Attachment[];
}

export interface ClaimedMail extends OutgoingMail {
  readonly id: number;
  /** Tries so far, with this one. */
  readonly attempts: number;
  /** Whether the recipient has turned such mail off since it was queued, or mail to them has come back. */
  readonly unwanted: boolean;
}

interface MailRecord {
  id: number;
  dedupe_key: string;
  category: MailCategory;
  account_id: number | null;
  to_address: string;
  subject: string;
  body_text: string;
  body_html: string;
  unsubscribe_url: string | null;
  attempts: number;
}

export async function addMail(trx: Knex, mail: OutgoingMail, now: Date): Promise<void> {
  const [id] = await trx('mail_outbox').insert(rowOf(mail, now)).onConflict('dedupe_key').ignore();
  // No identity: one of that key was there.
  if (!id || !mail.attachments?.length) return;
  await trx('mail_attachments').insert(
    mail.attachments.map(({ fileName, mediaType, content }) => ({
      mail_id: id,
      file_name: fileName,
      media_type: mediaType,
      content,
    })),
  );
}

const rowsAtOnce = 200;

/** Several mails without files, in as few queries as their size allows. */
export async function addMails(
  trx: Knex,
  mails: readonly Omit<OutgoingMail, 'attachments'>[],
  now: Date,
): Promise<void> {
  for (let start = 0; start < mails.length; start += rowsAtOnce)
    await trx('mail_outbox')
      .insert(mails.slice(start, start + rowsAtOnce).map((mail) => rowOf(mail, now)))
      .onConflict('dedupe_key')
      .ignore();
}

function rowOf(mail: OutgoingMail, now: Date): object {
  return {
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
  };
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
    const unwanted = await unwantedCategories(
      trx,
      rows.flatMap((row) => row.account_id ?? []),
    );
    const attachments = await attachmentsOf(
      trx,
      rows.map((row) => row.id),
    );
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
      attachments: attachments.get(row.id) ?? [],
      unwanted: row.account_id !== null && (unwanted.get(row.account_id)?.has(row.category) ?? false),
    }));
  });
}

/** What is not to be sent to each account any more. */
async function unwantedCategories(
  trx: Knex,
  accountIds: readonly number[],
): Promise<ReadonlyMap<number, ReadonlySet<MailCategory>>> {
  const accounts: {
    id: number;
    notice_mail: number;
    mail_rhythm: string;
    safety_mail: number;
    mail_refused_at: Date | null;
  }[] = await trx('accounts')
    .whereIn('id', accountIds)
    .select('id', 'notice_mail', 'mail_rhythm', 'safety_mail', 'mail_refused_at');
  return new Map(
    accounts.map((account) => {
      const refused = account.mail_refused_at !== null;
      const stopped: [MailCategory, boolean][] = [
        ['notice', refused || !account.notice_mail],
        ['watch', refused || account.mail_rhythm === 'none'],
        ['safety', refused || !account.safety_mail],
      ];
      return [account.id, new Set(stopped.flatMap(([category, is]) => (is ? [category] : [])))];
    }),
  );
}

async function attachmentsOf(trx: Knex, mailIds: readonly number[]): Promise<Map<number, Attachment[]>> {
  const rows: (Attachment & { mailId: number })[] = await trx('mail_attachments')
    .whereIn('mail_id', mailIds)
    .orderBy('id')
    .select('content', { mailId: 'mail_id', fileName: 'file_name', mediaType: 'media_type' });
  return groupBy(rows, (row) => row.mailId);
}

// A mail that is done with keeps neither text nor files: links in it may still open an account.
const noText = { body_text: '', body_html: '' };

export async function markSent(knex: Knex, id: number, now: Date): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ sent_at: now, last_error: null, ...noText });
  await knex('mail_attachments').where({ mail_id: id }).delete();
}

export async function markGivenUp(knex: Knex, id: number, now: Date, reason: string): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ given_up_at: now, last_error: reason.slice(0, 2000), ...noText });
  await knex('mail_attachments').where({ mail_id: id }).delete();
}

export async function markFailed(knex: Knex, id: number, nextTryAt: Date, reason: string): Promise<void> {
  await knex('mail_outbox')
    .where({ id })
    .update({ next_try_at: nextTryAt, last_error: reason.slice(0, 2000) });
}
