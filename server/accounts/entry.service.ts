import type { Knex } from 'knex';
import { endSessionsOf } from '../http/session-store.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MailQueue } from '../mail/mail-queue.js';
import type { LimitLookup } from '../members/members.js';
import { AccountBlocked, EmailNotConfirmed, TokenNotValid } from './account-problems.js';
import {
  accountByEmail,
  accountById,
  addAccountUnlessThere,
  changeAccount,
  lockedAccountByEmail,
  lockedAccountById,
  type StoredAccount,
} from './accounts.store.js';
import { hashOfToken, newMailedToken } from './mailed-token.js';
import { hashPassword, passwordMatches } from './password.js';
import {
  addToken,
  endTokens,
  newestSignUp,
  useToken,
  type PendingSignUp,
  type TokenPurpose,
} from './tokens.store.js';

const hour = 60 * 60 * 1000;
const lifeOf: Record<TokenPurpose, number> = { 'confirm-email': 24 * hour, 'reset-password': hour };

export interface EntryDependencies {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly mail: MailQueue;
  readonly limits: RateLimits;
  readonly limitOn: LimitLookup;
}

export type EntryService = ReturnType<typeof createEntryService>;

/** How people come in: sign-up, confirmation, sign-in, and a new password when the old one is lost. */
export function createEntryService({ knex, clock, mail, limits, limitOn }: EntryDependencies) {
  const mailToken = async (
    trx: Knex.Transaction,
    account: StoredAccount,
    purpose: TokenPurpose,
    signUp: PendingSignUp | null = null,
  ): Promise<void> => {
    const now = clock();
    const { token, hash } = newMailedToken();
    const expiresAt = new Date(now.getTime() + lifeOf[purpose]);
    const tokenId = await addToken(trx, { accountId: account.id, purpose, hash, expiresAt, now, signUp });
    const letter = {
      accountId: account.id,
      email: account.email,
      displayName: signUp?.displayName ?? account.displayName,
      token,
      tokenId,
    };
    if (purpose === 'reset-password') await mail.queuePasswordReset(trx, letter);
    else if (account.confirmedAt) await mail.queueAddressCheck(trx, letter);
    else await mail.queueEmailConfirmation(trx, letter);
  };

  const demandNotBlocked = async (accountId: number): Promise<void> => {
    const limit = await limitOn(accountId);
    if (limit?.kind === 'blocked') throw new AccountBlocked(limit);
  };

  return {
    /**
     * Adds an account and mails the link to confirm it. Where the address has one already, its owner is told by mail
     * and the caller learns nothing. While an account is not confirmed, each sign-up under its address stays apart: name
     * and password are those of the mail that is followed, so that nobody can slip theirs under a stranger's address.
     */
    async signUp(wish: { email: string; displayName: string; password: string; ip: string }): Promise<void> {
      await limits.take('sign-up', wish.ip);
      await limits.take('account-mail', wish.email);
      const passwordHash = await hashPassword(wish.password);
      await knex.transaction(async (trx) => {
        await addAccountUnlessThere(trx, {
          email: wish.email,
          displayName: wish.displayName,
          passwordHash,
          createdAt: clock(),
        });
        const account = await lockedAccountByEmail(trx, wish.email);
        if (!account) throw new TypeError('An account that was just added is not there.');
        if (account.confirmedAt) {
          await mail.queueAlreadyHasAccount(trx, account);
          return;
        }
        await mailToken(trx, account, 'confirm-email', { displayName: wish.displayName, passwordHash });
      });
    },

    /** Confirms the address, with the name and password of the sign-up that the mail was for; throws TokenNotValid. */
    async confirmEmail(token: string, ip: string): Promise<StoredAccount> {
      await limits.take('token', ip);
      return knex.transaction(async (trx) => {
        const now = clock();
        const used = await useToken(trx, 'confirm-email', hashOfToken(token), now);
        const before = used && (await lockedAccountById(trx, used.accountId));
        if (!before) throw new TokenNotValid();
        await demandNotBlocked(before.id);
        // Whoever has confirmed already keeps their name and password, whatever else was asked for under the address.
        const signUp = before.confirmedAt ? null : used.signUp;
        await changeAccount(trx, before.id, { ...signUp, confirmedAt: now, mailRefusedAt: null });
        await endTokens(trx, before.id, 'confirm-email', now);
        return { ...before, ...signUp, confirmedAt: now, mailRefusedAt: null };
      });
    },

    /** Mails a link by which an address that mail came back from proves that it takes mail again. */
    async confirmAddressAgain(accountId: number): Promise<void> {
      await limits.take('account-mail', `again:${accountId}`);
      await knex.transaction(async (trx) => {
        const account = await accountById(trx, accountId);
        if (account) await mailToken(trx, account, 'confirm-email');
      });
    },

    async resendConfirmation(email: string): Promise<void> {
      await limits.take('account-mail', email);
      await knex.transaction(async (trx) => {
        const account = await lockedAccountByEmail(trx, email);
        if (!account || account.confirmedAt) return;
        await mailToken(trx, account, 'confirm-email', await newestSignUp(trx, account.id));
      });
    },

    /**
     * The account of a right pair of address and password, undefined for a wrong one. Throws EmailNotConfirmed,
     * AccountBlocked, and TooManyRequests when too many wrong ones came for this address or from this network address.
     */
    async checkPassword(email: string, password: string, ip: string): Promise<StoredAccount | undefined> {
      await limits.take('sign-in-anywhere', ip);
      await limits.take('sign-in', email, ip);
      const account = await accountByEmail(knex, email);
      if (!(await passwordMatches(password, account?.passwordHash)) || !account) return undefined;
      await limits.giveBack('sign-in-anywhere', ip);
      await limits.giveBack('sign-in', email, ip);
      if (!account.confirmedAt) throw new EmailNotConfirmed();
      await demandNotBlocked(account.id);
      return account;
    },

    async requestPasswordReset(email: string): Promise<void> {
      await limits.take('account-mail', email);
      await knex.transaction(async (trx) => {
        const account = await lockedAccountByEmail(trx, email);
        if (account) await mailToken(trx, account, 'reset-password');
      });
    },

    /** Sets a new password and ends every session of the account; throws TokenNotValid. The mail proves the address as well. */
    async resetPassword(token: string, password: string, ip: string): Promise<void> {
      await limits.take('token', ip);
      const passwordHash = await hashPassword(password);
      await knex.transaction(async (trx) => {
        const now = clock();
        const used = await useToken(trx, 'reset-password', hashOfToken(token), now);
        const account = used && (await accountById(trx, used.accountId));
        if (!account) throw new TokenNotValid();
        await changeAccount(trx, account.id, {
          passwordHash,
          confirmedAt: account.confirmedAt ?? now,
          mailRefusedAt: null,
        });
        await endTokens(trx, account.id, 'reset-password', now);
        await endTokens(trx, account.id, 'confirm-email', now);
        await endSessionsOf(trx, account.id);
      });
    },
  };
}
