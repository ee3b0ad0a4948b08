import type { Knex } from 'knex';
import type { z } from 'zod';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { QuestionPage, Settle } from '../../shared/contract/questions.js';
import type { TrialReport } from '../../shared/contract/write-ups.js';
import type { MemberCaller } from '../http/caller.js';
import { FieldNotValid, NotAllowed, NotValid } from '../http/problems.js';
import type { Happenings } from '../watches/happenings.js';
import type { QuestionViews } from './question-view.js';
import type { QuestionRow, QuestionStore } from './question.store.js';
import type { ReplyStore } from './reply.store.js';

/** What settling needs of write-ups: the text that is published now, and to report a trial in the same transaction. */
export interface PublishedFixes {
  publishedContent(db: Knex, writeUpId: number): Promise<EditionContent | undefined>;
  reportTrialWithin(trx: Knex, accountId: number, slug: string, report: TrialReport): Promise<unknown>;
}

export type SettlingService = ReturnType<typeof createSettlingService>;

/** Askers say what settled their questions. */
export function createSettlingService(around: {
  knex: Knex;
  writeUps: PublishedFixes;
  store: QuestionStore;
  replies: ReplyStore;
  views: QuestionViews;
  happenings: Happenings;
}) {
  const { knex, writeUps, store, replies, views, happenings } = around;

  /** The question, if the account asked it. */
  async function own(slug: string, caller: MemberCaller, db: Knex): Promise<QuestionRow> {
    const row = await views.existing(slug, db, caller);
    if (row.accountId !== caller.accountId)
      throw new NotAllowed('Only who asked can say what settled a question.', 'Reply to it instead.');
    return row;
  }

  return {
    /**
     * Names the fix that helped and, where the asker tells of one, reports their trial of it: both or neither. NotAllowed
     * for others than the asker; FieldNotValid for a fix that is not published; NotValid for a trial that does not belong.
     */
    async settle(
      slug: string,
      caller: MemberCaller,
      { writeUpSlug, fixKey, trial }: z.output<typeof Settle>,
    ): Promise<QuestionPage> {
      await knex.transaction(async (trx) => {
        const question = await own(slug, caller, trx);
        const writeUpId = await store.publishedWriteUpId(writeUpSlug, trx);
        if (writeUpId === undefined)
          throw new FieldNotValid(
            'writeUpSlug',
            'is not a published write-up',
            'Search for it by its title.',
          );
        const content = await writeUps.publishedContent(trx, writeUpId);
        const fix = content?.fixes.find(({ key }) => key === fixKey);
        if (!fix)
          throw new FieldNotValid(
            'fixKey',
            'is not a fix of its published edition',
            'Choose one of its fixes.',
          );
        await store.settle(question.id, { writeUpId, fixKey, fixTitle: fix.title }, trx);
        if (trial)
          await writeUps
            .reportTrialWithin(trx, caller.accountId, writeUpSlug, { ...trial, fixKey })
            .catch((error: unknown) => {
              throw error instanceof NotValid ? within('trial', error) : error;
            });
        const repliers = await replies.repliersOf(question.id, trx);
        await happenings.add(trx, {
          kind: 'question-settled',
          key: `question-settled:${question.id}:${writeUpId}:${fixKey}`,
          title: `Settled: ${question.title}`,
          text: `By “${fix.title}”.`,
          path: `/questions/${slug}`,
          actorId: caller.accountId,
          about: { questions: [question.id], writeUps: [writeUpId] },
          people: repliers.map((accountId) => ({ accountId, atOnce: false })),
        });
      });
      return views.read(slug, caller);
    },

    async reopen(slug: string, caller: MemberCaller): Promise<QuestionPage> {
      const question = await own(slug, caller, knex);
      await store.settle(question.id, null, knex);
      return views.read(slug, caller);
    },
  };
}

/** The same problem with its fields named as they stand within a member of the body. */
function within(member: string, error: NotValid): NotValid {
  return new NotValid(
    (error.extras.fields ?? []).map((field) => ({ ...field, path: `${member}.${field.path}` })),
  );
}
