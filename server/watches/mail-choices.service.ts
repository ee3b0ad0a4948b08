import type { Knex } from 'knex';
import type { MailRhythm } from '../../shared/contract/accounts.js';
import { mailChoiceStore as store } from './mail-choice.store.js';
import { namesOf, subjectKey, subjectOfKey, type SubjectRef } from './subject-names.store.js';
import { watchStore } from './watch.store.js';

export type MailChoiceService = ReturnType<typeof createMailChoiceService>;

/** What the link at the foot of a mail can do, for who holds its token: less mail, never more. */
export function createMailChoiceService({
  knex,
  accountOfToken,
}: {
  knex: Knex;
  /** Throws the problem of a token that is not good. */
  accountOfToken: (token: string) => number;
}) {
  return {
    /** The rhythm, and the watch the mail came from while there is one. */
    async read(
      token: string,
      watch: string | undefined,
    ): Promise<{
      rhythm: MailRhythm;
      benchWatch: boolean;
      watch: (SubjectRef & { name: string }) | null;
    }> {
      const accountId = accountOfToken(token);
      const ref = watch === undefined || watch === 'bench' ? null : subjectOfKey(watch);
      const [choices, watched, names] = await Promise.all([
        store.choicesOf(knex, accountId),
        ref ? watchStore.has(knex, accountId, ref) : false,
        ref ? namesOf(knex, [ref]) : new Map<string, never>(),
      ]);
      const name = ref && names.get(subjectKey(ref))?.name;
      return {
        ...choices,
        watch: ref && watched ? { ...ref, name: name ?? 'what is no longer there' } : null,
      };
    },

    async endWatch(token: string, watch: string): Promise<void> {
      const accountId = accountOfToken(token);
      if (watch === 'bench') await store.endBenchWatch(knex, accountId);
      else await watchStore.remove(knex, accountId, subjectOfKey(watch));
    },

    /** Has it weekly what came oftener; who wants none still gets none. */
    async weekly(token: string): Promise<void> {
      await store.setWeekly(knex, accountOfToken(token));
    },
  };
}
