import type { Request, RequestHandler, Response } from 'express';
import expressSession from 'express-session';
import type { Knex } from 'knex';
import passport from 'passport';
import type { Strategy } from 'passport';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { visitor, type Caller } from './caller.js';
import { SessionStore } from './session-store.js';

const fourteenDays = 14 * 24 * 60 * 60 * 1000;
const cookieName = 'shimlore.sid';

/** The little of an account that every request needs. */
export interface SessionAccount {
  readonly id: number;
  readonly role: AccountRole;
}

export interface SessionParts {
  readonly handlers: RequestHandler[];
  callerOf(request: Request): Caller;
}

/**
 * Sessions in MariaDB behind a cookie that scripts cannot read. A session is only made by signing in, so visitors carry
 * none; `findAccount` is asked on every request of a member, so that a changed role or a removed account acts at once.
 */
export function createSessions(options: {
  knex: Knex;
  secret: string;
  secure: boolean;
  strategy: Strategy;
  findAccount(id: number): Promise<SessionAccount | undefined>;
}): SessionParts {
  const authenticator = new passport.Passport();
  authenticator.use('local', options.strategy);
  authenticator.serializeUser((user, done) => done(null, (user as SessionAccount).id));
  authenticator.deserializeUser((id: number, done) => {
    options.findAccount(id).then((account) => done(null, account ?? false), done);
  });
  const session = expressSession({
    name: cookieName,
    secret: options.secret,
    store: new SessionStore(options.knex),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: options.secure, maxAge: fourteenDays, path: '/' },
  });
  return {
    handlers: [session, authenticator.session()],
    callerOf(request) {
      const account = request.user as SessionAccount | undefined;
      return account ? { role: account.role, accountId: account.id } : visitor;
    },
  };
}

/**
 * Asks a passport strategy about this request, without starting a session. Resolves to undefined where the strategy
 * turns the request down; an error of the strategy rejects.
 */
export function authenticateWith(
  strategy: Strategy,
  request: Request,
  response: Response,
): Promise<SessionAccount | undefined> {
  return new Promise((resolve, reject) => {
    const handler = passport.authenticate(
      strategy,
      { session: false },
      (error: unknown, account?: Express.User | false | null) => {
        if (error) reject(error as Error);
        else resolve(account ? (account as SessionAccount) : undefined);
      },
    ) as RequestHandler;
    void handler(request, response, reject);
  });
}

/** Starts a session under a new id for the account. */
export function startSession(request: Request, account: SessionAccount): Promise<void> {
  return new Promise((resolve, reject) => {
    request.logIn(account, (error: unknown) => (error ? reject(error as Error) : resolve()));
  });
}

/** Ends the session of this request, in the table and in the browser. */
export async function endSession(request: Request, response: Response): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    request.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve()));
  });
  request.user = undefined;
  response.clearCookie(cookieName, { path: '/' });
}
