import type { Request, Response } from 'express';
import { accountRoutes } from '../../shared/contract/accounts.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { Csrf } from '../http/csrf.js';
import {
  authenticate,
  endSession,
  startSession,
  type Authenticator,
  type SessionAccount,
} from '../http/session.js';
import { SignInRefused } from './account-problems.js';
import type { EntryService } from './entry.service.js';
import type { PeopleService } from './people.service.js';

const mailed = { mailed: true } as const;

/** What answers the account routes. */
export function bindAccountRoutes(parts: {
  entry: EntryService;
  people: PeopleService;
  authenticator: Authenticator;
  csrf: Csrf;
}): RouteBinding[] {
  const { entry, people, authenticator, csrf } = parts;

  const signInAs = async (account: SessionAccount, request: Request, response: Response) => {
    await startSession(request, account);
    csrf.renew(request, response);
    return { account: await people.readAccount(account.id) };
  };

  return [
    bind(accountRoutes.session, async ({ caller }) => ({
      account: await people.readAccount(caller.accountId),
    })),
    bind(accountRoutes.signUp, async ({ body, request }) => {
      await entry.signUp({ ...body, ip: request.ip ?? '' });
      return mailed;
    }),
    bind(accountRoutes.confirmEmail, async ({ body, request, response }) => {
      const account = await entry.confirmEmail(body.token, request.ip ?? '');
      return signInAs({ id: account.id, role: account.role }, request, response);
    }),
    bind(accountRoutes.resendConfirmation, async ({ body }) => {
      await entry.resendConfirmation(body.email);
      return mailed;
    }),
    bind(accountRoutes.signIn, async ({ body, request, response }) => {
      request.body = body;
      const account = await authenticate(authenticator, request, response);
      if (!account) throw new SignInRefused();
      return signInAs(account, request, response);
    }),
    bind(accountRoutes.signOut, async ({ request, response }) => {
      await endSession(request, response);
      csrf.renew(request, response);
    }),
    bind(accountRoutes.requestPasswordReset, async ({ body }) => {
      await entry.requestPasswordReset(body.email);
      return mailed;
    }),
    bind(accountRoutes.resetPassword, async ({ body, request }) => {
      await entry.resetPassword(body.token, body.password, request.ip ?? '');
    }),
    bind(accountRoutes.changeProfile, async ({ body, caller }) => ({
      account: await people.changeProfile(memberOf(caller).accountId, body),
    })),
    bind(accountRoutes.confirmAddressAgain, async ({ caller }) => {
      await entry.confirmAddressAgain(memberOf(caller).accountId);
      return mailed;
    }),
    bind(accountRoutes.listAccounts, ({ query }) => people.listAccounts(query)),
    bind(accountRoutes.changeRole, ({ params, body, caller }) =>
      people.changeRole(params.id, body.role, memberOf(caller).accountId),
    ),
  ];
}
