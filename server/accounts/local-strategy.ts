import type { Request } from 'express';
import { Strategy } from 'passport-local';
import type { EntryService } from './entry.service.js';

/** Sign-in with address and password as a passport strategy; a wrong pair is a failure, anything else an error. */
export function createLocalStrategy(entry: EntryService): Strategy {
  return new Strategy(
    { usernameField: 'email', passwordField: 'password', session: false, passReqToCallback: true },
    (request: Request, email, password, done) => {
      entry.checkPassword(email, password, request.ip ?? '').then(
        (account) => done(null, account ? { id: account.id, role: account.role } : false),
        (error: unknown) => done(error),
      );
    },
  );
}
