import type { Knex } from 'knex';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import type { Account, MailRhythm } from '../../shared/contract/accounts.js';

/** An account as the table holds it. */
export interface StoredAccount {
  readonly id: number;
  readonly email: string;
  readonly displayName: string;
  readonly role: AccountRole;
  readonly passwordHash: string;
  readonly confirmedAt: Date | null;
  readonly noticeMail: boolean;
  readonly mailRhythm: MailRhythm;
  readonly safetyMail: boolean;
  readonly benchWatch: boolean | null;
  readonly mailRefusedAt: Date | null;
  readonly units: Account['units'];
  readonly createdAt: Date;
  /** When it goes, as its owner asked; null: it stays. */
  readonly deletionAt: Date | null;
}

interface AccountRecord {
  id: number;
  email: string;
  display_name: string;
  role: AccountRole;
  password_hash: string;
  confirmed_at: Date | null;
  notice_mail: number;
  mail_rhythm: MailRhythm;
  safety_mail: number;
  bench_watch: number | null;
  mail_refused_at: Date | null;
  units: Account['units'];
  created_at: Date;
  deletion_at: Date | null;
}

const columns = [
  'id',
  'email',
  'display_name',
  'role',
  'password_hash',
  'confirmed_at',
  'notice_mail',
  'mail_rhythm',
  'safety_mail',
  'bench_watch',
  'mail_refused_at',
  'units',
  'created_at',
  'deletion_at',
];

/**
 * Adds an account that is not confirmed yet, unless the address is taken, whatever its letter case. Either way the
 * row is held exclusively: an ignored duplicate would hold it shared, and two sign-ups at once would block each other.
 */
export async function addAccountUnlessThere(
  trx: Knex.Transaction,
  account: { email: string; displayName: string; passwordHash: string; createdAt: Date },
): Promise<void> {
  await trx('accounts')
    .insert({
      email: account.email,
      display_name: account.displayName,
      password_hash: account.passwordHash,
      created_at: account.createdAt,
    })
    .onConflict('email')
    .merge({ email: trx.ref('email') });
}

export async function accountByEmail(db: Knex, email: string): Promise<StoredAccount | undefined> {
  return toStored(await db('accounts').where({ email }).first<AccountRecord | undefined>(columns));
}

export async function accountById(db: Knex, id: number): Promise<StoredAccount | undefined> {
  return toStored(await db('accounts').where({ id }).first<AccountRecord | undefined>(columns));
}

/** The same, held against changes until the transaction ends. */
export async function lockedAccountById(
  trx: Knex.Transaction,
  id: number,
): Promise<StoredAccount | undefined> {
  return toStored(await trx('accounts').where({ id }).forUpdate().first<AccountRecord | undefined>(columns));
}

export async function lockedAccountByEmail(
  trx: Knex.Transaction,
  email: string,
): Promise<StoredAccount | undefined> {
  return toStored(
    await trx('accounts').where({ email }).forUpdate().first<AccountRecord | undefined>(columns),
  );
}

export interface AccountChange {
  readonly displayName?: string | undefined;
  readonly passwordHash?: string | undefined;
  readonly noticeMail?: boolean | undefined;
  readonly mailRhythm?: MailRhythm | undefined;
  readonly safetyMail?: boolean | undefined;
  readonly benchWatch?: boolean | undefined;
  readonly mailRefusedAt?: null | undefined;
  readonly units?: Account['units'] | undefined;
  readonly role?: AccountRole | undefined;
  readonly confirmedAt?: Date | undefined;
}

/** Changes what is given and leaves what is undefined. */
export async function changeAccount(trx: Knex, id: number, change: AccountChange): Promise<void> {
  const fields = {
    display_name: change.displayName,
    password_hash: change.passwordHash,
    notice_mail: change.noticeMail,
    mail_rhythm: change.mailRhythm,
    safety_mail: change.safetyMail,
    bench_watch: change.benchWatch,
    mail_refused_at: change.mailRefusedAt,
    units: change.units,
    role: change.role,
    confirmed_at: change.confirmedAt,
  };
  const given = Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined));
  if (Object.keys(given).length > 0) await trx('accounts').where({ id }).update(given);
}

/** Accounts from the newest on, those before `beforeId` only; `words` is looked for in address and name. */
export async function accountsNewestFirst(
  db: Knex,
  wanted: { words: string | undefined; beforeId: number | undefined; limit: number },
): Promise<StoredAccount[]> {
  const query = db('accounts').select<AccountRecord[]>(columns).orderBy('id', 'desc').limit(wanted.limit);
  if (wanted.beforeId !== undefined) void query.where('id', '<', wanted.beforeId);
  if (wanted.words) {
    const pattern = `%${wanted.words.replace(/[\\%_]/g, '\\$&')}%`;
    void query.where((either) =>
      either.where('email', 'like', pattern).orWhere('display_name', 'like', pattern),
    );
  }
  return (await query).map((record) => toStored(record));
}

function toStored(record: AccountRecord): StoredAccount;
function toStored(record: AccountRecord | undefined): StoredAccount | undefined;
function toStored(record: AccountRecord | undefined): StoredAccount | undefined {
  return (
    record && {
      id: record.id,
      email: record.email,
      displayName: record.display_name,
      role: record.role,
      passwordHash: record.password_hash,
      confirmedAt: record.confirmed_at,
      noticeMail: Boolean(record.notice_mail),
      mailRhythm: record.mail_rhythm,
      safetyMail: Boolean(record.safety_mail),
      benchWatch: record.bench_watch === null ? null : Boolean(record.bench_watch),
      mailRefusedAt: record.mail_refused_at,
      units: record.units,
      createdAt: record.created_at,
      deletionAt: record.deletion_at,
    }
  );
}
