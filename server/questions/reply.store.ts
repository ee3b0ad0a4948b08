import type { Knex } from 'knex';
import type { AddReply, WriteUpRef } from '../../shared/contract/questions.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import type { Caller } from '../http/caller.js';
import { fromJson } from '../rows.js';
import { readableBy, takenDownColumns, type TakenDownRow } from '../taken-down.js';

export interface ReplyRow extends TakenDownRow {
  readonly id: number;
  readonly questionId: number;
  readonly text: string;
  readonly worksheet: WorksheetRecord | null;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
  readonly changedAt: Date | null;
  /** The write-up that was started from it, published or not. */
  readonly writeUpId: number | null;
  /** The same once it is published. */
  readonly writeUp: WriteUpRef | null;
}

export type ReplyStore = ReturnType<typeof createReplyStore>;

export function createReplyStore(knex: Knex) {
  return {
    /** Oldest first; what is taken down only for its writer and for moderators. */
    async repliesOf(questionId: number, reader: Caller): Promise<ReplyRow[]> {
      const query = replies(knex).where('r.question_id', questionId).orderBy('r.id');
      readableBy(query, 'r', reader);
      const rows: ReplyRecord[] = await query;
      return rows.map(toReply);
    },

    async byId(id: number, db: Knex): Promise<ReplyRow | undefined> {
      const row: ReplyRecord | undefined = await replies(db).where('r.id', id).first();
      return row && toReply(row);
    },

    /** Holds the reply until the transaction ends; gives it as it stands now. */
    async hold(id: number, trx: Knex): Promise<ReplyRow | undefined> {
      await trx('question_replies').where({ id }).forUpdate().first('id');
      const row: ReplyRecord | undefined = await replies(trx).where('r.id', id).first();
      return row && toReply(row);
    },

    async add(
      reply: Pick<AddReply, 'text' | 'worksheet'> & {
        questionId: number;
        accountId: number;
        createdAt: Date;
      },
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

    async change(id: number, text: string, at: Date, db: Knex): Promise<void> {
      await db('question_replies').where({ id }).update({ text, changed_at: at });
    },

    async startedWriteUp(id: number, writeUpId: number, trx: Knex): Promise<void> {
      await trx('question_replies').where({ id }).update({ write_up_id: writeUpId });
    },

    /** Everybody who replied and whose reply stands. */
    async repliersOf(questionId: number, db: Knex): Promise<number[]> {
      return db('question_replies')
        .where('question_id', questionId)
        .whereNull('taken_down_at')
        .distinct()
        .pluck('account_id');
    },
  };
}

interface ReplyRecord extends Omit<ReplyRow, 'worksheet' | 'writeUp'> {
  worksheet: unknown;
  writeUpSlug: string | null;
  writeUpTitle: string | null;
}

function replies(db: Knex): Knex.QueryBuilder {
  return db('question_replies as r')
    .join('accounts as a', 'a.id', 'r.account_id')
    .leftJoin('write_ups as w', 'w.id', 'r.write_up_id')
    .leftJoin('editions as e', 'e.id', 'w.published_edition_id')
    .select('r.id', 'r.text', 'r.worksheet', {
      questionId: 'r.question_id',
      accountId: 'a.id',
      displayName: 'a.display_name',
      createdAt: 'r.created_at',
      changedAt: 'r.changed_at',
      writeUpId: 'r.write_up_id',
      writeUpSlug: 'w.slug',
      writeUpTitle: 'e.title',
      ...takenDownColumns('r'),
    });
}

function toReply({ writeUpSlug, writeUpTitle, ...row }: ReplyRecord): ReplyRow {
  return {
    ...row,
    worksheet: row.worksheet === null ? null : fromJson(row.worksheet),
    writeUp:
      writeUpSlug === null || writeUpTitle === null ? null : { slug: writeUpSlug, title: writeUpTitle },
  };
}
