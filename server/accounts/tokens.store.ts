import type { Knex } from 'knex';

export type TokenPurpose = 'confirm-email' | 'reset-password';

/** Adds a token and ends the earlier ones of the same purpose, so that only the newest mail works. Returns its id. */
export async function addToken(
  trx: Knex,
  token: { accountId: number; purpose: TokenPurpose; hash: Buffer; expiresAt: Date; now: Date },
): Promise<number> {
  await endTokens(trx, token.accountId, token.purpose, token.now);
  const [id] = await trx('account_tokens').insert({
    account_id: token.accountId,
    purpose: token.purpose,
    token_hash: token.hash,
    expires_at: token.expiresAt,
    created_at: token.now,
  });
  return Number(id);
}

export async function endTokens(
  trx: Knex,
  accountId: number,
  purpose: TokenPurpose,
  now: Date,
): Promise<void> {
  await trx('account_tokens')
    .where({ account_id: accountId, purpose, used_at: null })
    .update({ used_at: now });
}

/** Uses a token up. Resolves to its account, or undefined where it is unknown, used or expired. */
export async function useToken(
  trx: Knex,
  purpose: TokenPurpose,
  hash: Buffer,
  now: Date,
): Promise<number | undefined> {
  const used = await trx('account_tokens')
    .where({ token_hash: hash, purpose, used_at: null })
    .where('expires_at', '>', now)
    .update({ used_at: now });
  if (used !== 1) return undefined;
  const row: { account_id: number } | undefined = await trx('account_tokens')
    .where({ token_hash: hash })
    .first('account_id');
  return row?.account_id;
}
