import type { Knex } from 'knex';
import type { Symptom } from '../../shared/contract/hardware.js';
import type { AddReply, AskQuestion, QuestionReading, SettledBy } from '../../shared/contract/questions.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import type { Caller } from '../http/caller.js';
import { fromJson } from '../rows.js';
import { readableBy, takenDownColumns, type TakenDownRow } from '../taken-down.js';

export interface QuestionRow extends TakenDownRow {
  readonly id: number;
  readonly slug: string;
  readonly title: string;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
  readonly replyCount: number;
  readonly settledBy: SettledBy | null;
}

export interface ReplyRow extends TakenDownRow {
  readonly id: number;
  readonly text: string;
  readonly worksheet: WorksheetRecord | null;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
}

export interface NewQuestion extends Omit<AskQuestion, 'symptoms'> {
  readonly slugBase: string;
  readonly symptomIds: readonly number[];
  readonly accountId: number;
  readonly createdAt: Date;
}

export type QuestionStore = ReturnType<typeof createQuestionStore>;

export function createQuestionStore(knex: Knex) {
  return {
    async newest(wish: {
      before: number | undefined;
      partId: number | undefined;
      open: boolean | undefined;
      rows: number;
    }): Promise<QuestionRow[]> {
      const query = questions(knex).whereNull('q.taken_down_at').orderBy('q.id', 'desc').limit(wish.rows);
      if (wish.before !== undefined) void query.where('q.id', '<', wish.before);
      if (wish.partId !== undefined)
        void query.whereIn(
          'q.id',
          knex('question_parts').where('part_id', wish.partId).select('question_id'),
        );
      if (wish.open === true) void query.whereNull('q.settled_write_up_id');
      if (wish.open === false) void query.whereNotNull('q.settled_write_up_id');
      const rows: QuestionRecord[] = await query;
      return rows.map(toQuestion);
    },

    async bySlug(slug: string, db: Knex): Promise<QuestionRow | undefined> {
      const row: QuestionRecord | undefined = await questions(db).where('q.slug', slug).first();
      return row && toQuestion(row);
    },

    /** Parts of the questions, each question's in the order in which its asker named them. */
    async partsOf(
      questionIds: readonly number[],
    ): Promise<{ questionId: number; partId: number; revisionId: number | null }[]> {
      return knex('question_parts')
        .whereIn('question_id', questionIds)
        .orderBy(['question_id', 'position'])
        .select({ questionId: 'question_id', partId: 'part_id', revisionId: 'revision_id' });
    },

    async bodyOf(
      id: number,
    ): Promise<{ text: string; readings: QuestionReading[]; worksheet: WorksheetRecord | null }> {
      const row = await knex('questions').where({ id }).first('text', 'readings', 'worksheet');
      return {
        text: row.text,
        readings: fromJson(row.readings),
        worksheet: row.worksheet === null ? null : fromJson(row.worksheet),
      };
    },

    async symptomsOf(questionId: number): Promise<Symptom[]> {
      return knex('question_symptoms as l')
        .join('symptoms as s', 's.id', 'l.symptom_id')
        .where('l.question_id', questionId)
        .orderBy('s.position')
        .select('s.id', 's.slug', 's.label', { group: 's.group_name' });
    },

    /** Oldest first; what is taken down only for its writer and for moderators. */
    async repliesOf(questionId: number, reader: Caller): Promise<ReplyRow[]> {
      const query = replies(knex).where('r.question_id', questionId).orderBy('r.id');
      readableBy(query, 'r', reader);
      const rows: ReplyRow[] = await query;
      return rows.map(toReply);
    },

    /** Stores the question under a slug that ends in its id and so is nobody else's. */
    async add(question: NewQuestion, trx: Knex): Promise<{ id: number; slug: string }> {
      const [id] = await trx('questions').insert({
        title: question.title,
        text: question.text,
        readings: JSON.stringify(question.readings),
        worksheet: question.worksheet && JSON.stringify(question.worksheet),
        account_id: question.accountId,
        created_at: question.createdAt,
      });
      const slug = `${question.slugBase}-${id}`;
      await trx('questions').where({ id }).update({ slug });
      await trx('question_parts').insert(
        question.parts.map(({ partId, revisionId }, position) => ({
          question_id: id,
          position,
          part_id: partId,
          revision_id: revisionId,
        })),
      );
      if (question.symptomIds.length > 0)
        await trx('question_symptoms').insert(
          question.symptomIds.map((symptom_id) => ({ question_id: id, symptom_id })),
        );
      return { id: id!, slug };
    },

    async addReply(
      reply: AddReply & { questionId: number; accountId: number; createdAt: Date },
      trx: Knex,
    ): Promise<ReplyRow> {
      const [id] = await trx('question_replies').insert({
        question_id: reply.questionId,
        text: reply.text,
        worksheet: reply.worksheet && JSON.stringify(reply.worksheet),
        account_id: reply.accountId,
        created_at: reply.createdAt,
      });
      return toReply(await replies(trx).where('r.id', id).first());
    },

    async publishedWriteUpId(slug: string, trx: Knex): Promise<number | undefined> {
      const row = await trx('write_ups').where({ slug }).whereNotNull('published_edition_id').first('id');
      return row?.id;
    },

    /** `by` null: nothing has settled it (any more). */
    async settle(
      id: number,
      by: { writeUpId: number; fixKey: string; fixTitle: string } | null,
      db: Knex,
    ): Promise<void> {
      await db('questions')
        .where({ id })
        .update({
          settled_write_up_id: by?.writeUpId ?? null,
          settled_fix_key: by?.fixKey ?? null,
          settled_fix_title: by?.fixTitle ?? null,
        });
    },
  };
}

interface QuestionRecord extends Omit<QuestionRow, 'settledBy'> {
  writeUpSlug: string | null;
  writeUpTitle: string | null;
  fixKey: string | null;
  fixTitle: string | null;
}

function questions(db: Knex): Knex.QueryBuilder {
  return db('questions as q')
    .join('accounts as a', 'a.id', 'q.account_id')
    .leftJoin('write_ups as w', 'w.id', 'q.settled_write_up_id')
    .leftJoin('editions as e', 'e.id', 'w.published_edition_id')
    .select('q.id', 'q.slug', 'q.title', {
      accountId: 'a.id',
      displayName: 'a.display_name',
      createdAt: 'q.created_at',
      replyCount: db('question_replies')
        .where('question_id', db.ref('q.id'))
        .whereNull('taken_down_at')
        .count(),
      writeUpSlug: 'w.slug',
      writeUpTitle: 'e.title',
      fixKey: 'q.settled_fix_key',
      fixTitle: 'q.settled_fix_title',
      ...takenDownColumns('q'),
    });
}

function toQuestion(record: QuestionRecord): QuestionRow {
  const { writeUpSlug, writeUpTitle, fixKey, fixTitle, ...row } = record;
  return {
    ...row,
    replyCount: Number(row.replyCount),
    settledBy:
      writeUpSlug === null
        ? null
        : { writeUpSlug, writeUpTitle: writeUpTitle!, fixKey: fixKey!, fixTitle: fixTitle! },
  };
}

function replies(db: Knex): Knex.QueryBuilder {
  return db('question_replies as r')
    .join('accounts as a', 'a.id', 'r.account_id')
    .select('r.id', 'r.text', 'r.worksheet', {
      accountId: 'a.id',
      displayName: 'a.display_name',
      createdAt: 'r.created_at',
      ...takenDownColumns('r'),
    });
}

function toReply(row: ReplyRow): ReplyRow {
  return { ...row, worksheet: row.worksheet === null ? null : fromJson(row.worksheet) };
}
