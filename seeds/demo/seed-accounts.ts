import type { Knex } from 'knex';
import { demoAccounts, demoMembers } from './accounts.js';
import { idsFrom, insertRows } from './ids.js';

const day = 86_400_000;

/** Inserts the demo's accounts, confirmed, and gives their ids by key. Each distinct password is hashed once. */
export async function seedAccounts(
  knex: Knex,
  now: Date,
  hashPassword: (plain: string) => Promise<string>,
): Promise<Map<string, number>> {
  const accounts = [...demoAccounts, ...demoMembers];
  const known = await knex('accounts')
    .whereIn(
      'email',
      accounts.map((account) => account.email),
    )
    .first('email');
  if (known) throw new Error(`The demo is already there (${known.email}). Start with an empty database.`);
  const passwords = [...new Set(accounts.map((account) => account.password))];
  const hashes = new Map(
    await Promise.all(passwords.map(async (password) => [password, await hashPassword(password)] as const)),
  );
  const nextId = await idsFrom(knex, 'accounts');
  const ids = new Map<string, number>();
  const rows = accounts.map((account, index) => {
    const id = nextId();
    ids.set(account.key, id);
    const created = new Date(now.getTime() - (1150 - index * 3) * day);
    return {
      id,
      email: account.email,
      display_name: account.displayName,
      role: account.role,
      password_hash: hashes.get(account.password),
      confirmed_at: new Date(created.getTime() + 600_000),
      notice_mail: index % 7 !== 6,
      units: index % 9 === 8 ? 'in' : 'mm',
      created_at: created,
    };
  });
  await insertRows(knex, 'accounts', rows);
  return ids;
}
