import type { Knex } from 'knex';

export type TokenPurpose = 'confirm-email' | 'reset-password';

/** What somebody asked for under an address that is not confirmed yet. */
export interface PendingSignUp {
  readonly displayName: string;
  readonly passwordHash: string;
}

/**
 * Adds a token; returns its id. The earlier ones of the same purpose end, so that only the newest mail works, but for
 * those of other sign-ups: somebody else's must not put out the one that the address's owner asked for.
 */
export async function addToken(
  trx: Knex,
  token: {
    accountId: number;
    purpose: TokenPurpose;
    hash: Buffer;
    expiresAt: Date;
    now: Date;
    signUp: PendingSignUp | null;
  },
): Promise<number> {
  if (!token.signUp) await endTokens(trx, token.accountId, token.purpose, token.now);
  const [id] = await trx('account_tokens').insert({
    account_id: token.accountId,
    purpose: token.purpose,
    token_hash: token.hash,
    expires_at: token.expiresAt,
    created_at: token.now,
    display_name: token.signUp?.displayName ?? null,
    password_hash: token.signUp?.passwordHash ?? null,
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

/** Uses a token up. Resolves to its account and sign-up, or undefined where it is unknown, used or expired. */
export async function useToken(
  trx: Knex,
  purpose: TokenPurpose,
  hash: Buffer,
  now: Date,
): Promise<{ accountId: number; signUp: PendingSignUp | null } | undefined> {
  const used = await trx('account_tokens')
    .where({ token_hash: hash, purpose, used_at: null })
    .where('expires_at', '>', now)
    .update({ used_at: now });
  if (used !== 1) return undefined;
  const row: (SignUpRow & { account_id: number }) | undefined = await trx('account_tokens')
    .where({ token_hash: hash })
    .first('account_id', 'display_name', 'password_hash');
  return row && { accountId: row.account_id, signUp: toSignUp(row) };
}

/** What was asked for last under the address of an account that is not confirmed; null where it was added otherwise. */
export async function newestSignUp(trx: Knex, accountId: number): Promise<PendingSignUp | null> {
  const row: SignUpRow | undefined = await trx('account_tokens')
    .where({ account_id: accountId, purpose: 'confirm-email' })
    .whereNotNull('display_name')
    .orderBy('id', 'desc')
    .first('display_name', 'password_hash');
  return row ? toSignUp(row) : null;
}

interface SignUpRow {
  display_name: string | null;
  password_hash: string | null;
}

function toSignUp({
  display_name: displayName,
  password_hash: passwordHash,
}: SignUpRow): PendingSignUp | null {
  return displayName === null || passwordHash === null ? null : { displayName, passwordHash };
}
