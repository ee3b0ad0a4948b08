import type { RequestHandler } from 'express';
import expressSession from 'express-session';
import { ConnectSessionKnexStore } from 'connect-session-knex';
import type { Knex } from 'knex';
import { Passport, type Strategy } from 'passport';
import type { Request } from 'express';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { visitor, type Caller } from './caller.js';

const fourteenDays = 14 * 24 * 60 * 60 * 1000;

/** The little of an account that every request needs. */
export interface SessionAccount {
  readonly id: number;
  readonly role: AccountRole;
}

export interface SessionParts {
  readonly handlers: RequestHandler[];
  readonly store: ConnectSessionKnexStore;
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
  const store = new ConnectSessionKnexStore({ knex: options.knex, tableName: 'sessions', createTable: false, cleanupInterval: 15 * 60 * 1000 });
  const passport = new Passport();
  passport.use('local', options.strategy);
  passport.serializeUser((user, done) => done(null, (user as SessionAccount).id));
  passport.deserializeUser((id: number, done) => {
    options.findAccount(id).then((account) => done(null, account ?? false), done);
  });
  const session = expressSession({
    name: 'shimlore.sid',
    secret: options.secret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: options.secure, maxAge: fourteenDays, path: '/' },
  });
  return {
    handlers: [session, passport.session()],
    store,
    callerOf(request) {
      const account = request.user as SessionAccount | undefined;
      return account ? { role: account.role, accountId: account.id } : visitor;
    },
  };
}
