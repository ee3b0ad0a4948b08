import type { Request, RequestHandler, Response } from 'express';
import expressSession from 'express-session';
import type { Knex } from 'knex';
import passport, { type Strategy } from 'passport';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { visitor, type Caller, type PostingLimit } from './caller.js';
import { SessionStore } from './session-store.js';

const fourteenDays = 14 * 24 * 60 * 60 * 1000;
const cookieName = 'shimlore.sid';

export type Authenticator = InstanceType<typeof passport.Passport>;

/** The little of an account that every request needs. */
export interface SessionAccount {
  readonly id: number;
  readonly role: AccountRole;
  /** Reads, but does not post. */
  readonly limit?: PostingLimit | null;
}

export interface SessionParts {
  readonly handlers: RequestHandler[];
  callerOf(request: Request): Caller;
}

/**
 * Passport with the strategy people sign in by. `findAccount` is asked on every request of a member, so that a changed
 * role, a limit or a removed account acts at once.
 */
export function createAuthenticator(options: {
  strategy: Strategy;
  findAccount(id: number): Promise<SessionAccount | undefined>;
}): Authenticator {
  const authenticator = new passport.Passport();
  authenticator.use('local', options.strategy);
  authenticator.serializeUser((user, done) => done(null, (user as SessionAccount).id));
  authenticator.deserializeUser((id: number, done) => {
    options.findAccount(id).then((account) => done(null, account ?? false), done);
  });
  return authenticator;
}

/**
 * Sessions in MariaDB behind a cookie that scripts cannot read. A session is only made by signing in, so visitors carry
 * none.
 */
export function createSessions(options: {
  knex: Knex;
  secret: string;
  secure: boolean;
  authenticator: Authenticator;
}): SessionParts {
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
    handlers: [session, options.authenticator.session()],
    callerOf(request) {
      const account = request.user as SessionAccount | undefined;
      if (!account) return visitor;
      return { role: account.role, accountId: account.id, limit: account.limit ?? null };
    },
  };
}

/**
 * Asks the strategy about this request, without starting a session. Resolves to undefined where it turns the request
 * down; an error of the strategy rejects.
 */
export function authenticate(
  authenticator: Authenticator,
  request: Request,
  response: Response,
): Promise<SessionAccount | undefined> {
  return new Promise((resolve, reject) => {
    const handler = authenticator.authenticate(
      'local',
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
