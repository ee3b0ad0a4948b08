import type { Knex } from 'knex';
import type { Symptom } from '../../shared/contract/hardware.js';
import type {
  AskQuestion,
  ChangeQuestion,
  QuestionReading,
  SettledBy,
} from '../../shared/contract/questions.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import { fromJson } from '../rows.js';
import { takenDownColumns, type TakenDownRow } from '../taken-down.js';
import { searchedWords } from './searched-words.js';

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

export interface QuestionBody {
  readonly text: string;
  readonly readings: QuestionReading[];
  readonly worksheet: WorksheetRecord | null;
  readonly changedAt: Date | null;
}

export interface NewQuestion extends Omit<AskQuestion, 'symptoms' | 'photos'> {
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
      words: string | undefined;
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
      if (wish.words !== undefined) withWords(query, wish.words);
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

    async bodyOf(id: number, db: Knex): Promise<QuestionBody> {
      const row = await db('questions').where({ id }).first('text', 'readings', 'worksheet', 'changed_at');
      return {
        text: row.text,
        readings: fromJson(row.readings),
        worksheet: row.worksheet === null ? null : fromJson(row.worksheet),
        changedAt: row.changed_at,
      };
    },

    async symptomsOf(questionId: number, db: Knex): Promise<Symptom[]> {
      return db('question_symptoms as l')
        .join('symptoms as s', 's.id', 'l.symptom_id')
        .where('l.question_id', questionId)
        .orderBy('s.position')
        .select('s.id', 's.slug', 's.label', { group: 's.group_name' });
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

    /** What is left out stays. */
    async change(id: number, change: ChangeQuestion, at: Date, db: Knex): Promise<void> {
      const { title, text, readings } = change;
      await db('questions')
        .where({ id })
        .update({
          changed_at: at,
          ...(title === undefined ? {} : { title }),
          ...(text === undefined ? {} : { text }),
          ...(readings === undefined ? {} : { readings: JSON.stringify(readings) }),
        });
    },

    /** The questions of these identities that are on the pages, in the order of the identities. */
    async byIds(ids: readonly number[]): Promise<QuestionRow[]> {
      const rows: QuestionRecord[] = await questions(knex).whereIn('q.id', ids).whereNull('q.taken_down_at');
      const byId = new Map(rows.map((row) => [row.id, toQuestion(row)]));
      return ids.flatMap((id) => byId.get(id) ?? []);
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
    .leftJoin('editions as e', 'e.id', db.raw('COALESCE(w.published_edition_id, w.withdrawn_edition_id)'))
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

/** Every word stands in the title or the text, or begins a word there. */
function withWords(query: Knex.QueryBuilder, typed: string): void {
  const { indexed, others } = searchedWords(typed);
  if (indexed !== '') void query.whereRaw('MATCH (q.title, q.text) AGAINST (? IN BOOLEAN MODE)', [indexed]);
  for (const word of others) void query.whereRaw("INSTR(CONCAT(q.title, ' ', q.text), ?) > 0", [word]);
}
