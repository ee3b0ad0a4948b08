import type { Knex } from 'knex';
import { z } from 'zod';
import { Id, Instant } from '../../shared/contract/primitives.js';
import { mostWatches, WatchSubject, type WatchEntry } from '../../shared/contract/watches.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotFound, NotValid } from '../http/problems.js';
import { namesOf, subjectKey, type SubjectRef } from './subject-names.store.js';
import { watchStore as store } from './watch.store.js';

const PlaceInWatches = z.object({ subject: WatchSubject, id: Id, createdAt: Instant });

export type WatchService = ReturnType<typeof createWatchService>;

/** What somebody wants to be told of. */
export function createWatchService({ knex, clock }: { knex: Knex; clock: () => Date }) {
  return {
    /** NotFound for what is not there or not for everybody to see; NotValid for one watch too many. */
    async watch(accountId: number, ref: SubjectRef): Promise<void> {
      if (!(await namesOf(knex, [ref])).has(subjectKey(ref)))
        throw new NotFound(
          'There is nothing of that kind to watch.',
          'Open its page and watch it from there.',
        );
      const outcome = await knex.transaction((trx) =>
        store.add(trx, { ...ref, accountId, createdAt: clock() }),
      );
      if (outcome === 'too-many')
        throw new NotValid([
          {
            path: 'id',
            message: `would be one more than the ${mostWatches} that can be watched`,
            remedy: 'End a watch that is no longer needed first.',
          },
        ]);
    },

    endWatch: (accountId: number, ref: SubjectRef): Promise<void> => store.remove(knex, accountId, ref),

    /** One page, the newest first. NotValid for a cursor of another list. */
    async list(
      accountId: number,
      query: { cursor?: string | undefined; limit: number },
    ): Promise<{ items: WatchEntry[]; next: string | null }> {
      const after = readCursor(PlaceInWatches, query.cursor);
      const rows = await store.newest(knex, accountId, { after, rows: query.limit + 1 });
      const page = toPage(rows, query.limit, (row) => row);
      const names = await namesOf(knex, page.items);
      return {
        items: page.items.map(({ subject, id, createdAt }) => ({
          subject,
          id,
          name: names.get(subjectKey({ subject, id }))?.name ?? null,
          path: names.get(subjectKey({ subject, id }))?.path ?? null,
          createdAt: createdAt.toISOString(),
        })),
        next: page.next,
      };
    },

    async keys(accountId: number): Promise<string[]> {
      return (await store.all(knex, accountId)).map(subjectKey);
    },

    /** Lets watches and notices follow what the catalogue has put together, within its transaction. */
    followMerge: (
      trx: Knex,
      subject: 'part' | 'revision' | 'joint',
      moves: ReadonlyMap<number, number>,
    ): Promise<void> => store.follow(trx, subject, moves),
  };
}
