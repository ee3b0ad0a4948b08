import { ConnectSessionKnexStore } from 'connect-session-knex';
import type { SessionData } from 'express-session';
import type { Knex } from 'knex';

/**
 * Sessions in the table `sessions`. The store beneath reports a failure through its callback and, besides, as a
 * rejected promise that nobody awaits; here it is told once, through the callback, so that a database that is away
 * for a moment fails the request and not the process.
 */
export class SessionStore extends ConnectSessionKnexStore {
  constructor(knex: Knex) {
    // Expired rows are swept by a worker that can be stopped, not by the store's own timer.
    super({ knex, tableName: 'sessions', createTable: false, cleanupInterval: 0 });
    this.ready.catch(() => undefined);
  }

  override async get(
    sid: string,
    callback: (error: unknown, session?: SessionData | null) => void,
  ): Promise<SessionData | null> {
    let session: SessionData | null;
    try {
      session = await super.get(sid, () => undefined);
    } catch (error) {
      callback(error);
      return null;
    }
    callback(null, session);
    return session;
  }

  override async set(sid: string, session: SessionData, callback?: (error?: unknown) => void): Promise<void> {
    await super.set(sid, session).then(
      () => callback?.(),
      (error: unknown) => callback?.(error),
    );
  }

  override async touch(
    sid: string,
    session: SessionData,
    callback?: (error?: unknown) => void,
  ): Promise<void> {
    await super.touch(sid, session).then(
      () => callback?.(),
      (error: unknown) => callback?.(error),
    );
  }

  override async destroy(sid: string, callback?: (error?: unknown) => void): Promise<number> {
    return super.destroy(sid).then(
      (count) => {
        callback?.();
        return count;
      },
      (error: unknown) => {
        callback?.(error);
        return 0;
      },
    );
  }
}

/** Deletes sessions that ended before `now`. */
export async function sweepSessions(knex: Knex, now: Date): Promise<void> {
  await knex('sessions').where('expired', '<', now).del();
}

/** Ends every session of an account. */
export async function endSessionsOf(trx: Knex, accountId: number): Promise<void> {
  await trx('sessions').where({ account_id: accountId }).del();
}
