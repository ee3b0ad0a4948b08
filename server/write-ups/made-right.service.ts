import type { Knex } from 'knex';
import { FieldNotValid, NotFound } from '../http/problems.js';
import type { FixStore } from './fix.store.js';
import { publicationStore } from './publication.store.js';
import type { PublishedStore } from './published.store.js';
import type { IndexNotice, TrialService } from './trial.service.js';

export type MadeRightService = ReturnType<typeof createMadeRightService>;

/** From which revision on the maker has corrected what a fix mends. Who may say so, the caller has asked. */
export function createMadeRightService(around: {
  fixes: FixStore;
  published: PublishedStore;
  judgeStandings: TrialService['judgeStandings'];
  searchOutbox: IndexNotice;
}) {
  const { fixes, published, judgeStandings, searchOutbox } = around;
  return {
    /**
     * Sets or, with null, takes back the revision on fixes of the published edition (null: on all), judges their standing
     * anew and has the write-up indexed. Returns the keys. FieldNotValid for a key that is none of them.
     */
    async setMadeRight(
      trx: Knex,
      writeUpId: number,
      fixKeys: readonly string[] | null,
      revisionId: number | null,
    ): Promise<string[]> {
      await publicationStore.lockWriteUp(trx, writeUpId);
      const content = await published.publishedContent(trx, writeUpId);
      if (!content) throw new NotFound('The write-up is not published any more.');
      const all = content.fixes.map((fix) => fix.key);
      const stray = (fixKeys ?? []).findIndex((key) => !all.includes(key));
      if (stray >= 0)
        throw new FieldNotValid(
          `fixKeys.${stray}`,
          'is not a fix of the published edition',
          'Read the write-up again and choose among its fixes.',
        );
      const keys = fixKeys ? [...new Set(fixKeys)] : all;
      const ids = await fixes.addMissing(trx, writeUpId, keys);
      await fixes.setMadeRight(trx, [...ids.values()], revisionId);
      await judgeStandings(trx, writeUpId, content);
      await searchOutbox.add(trx, writeUpId);
      return keys;
    },
  };
}
