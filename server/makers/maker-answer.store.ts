import type { Knex } from 'knex';

export interface AnswerRow {
  readonly id: number;
  readonly makerId: number;
  readonly source: string;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
  readonly changedAt: Date;
  readonly takenBackAt: Date | null;
}

export interface EarlierTextRow {
  readonly answerId: number;
  readonly source: string;
  readonly from: Date;
  readonly to: Date;
}

const answers = (db: Knex): Knex.QueryBuilder =>
  db('maker_answers as n').join('accounts as a', 'a.id', 'n.account_id').select('n.id', 'n.source', {
    makerId: 'n.maker_id',
    accountId: 'n.account_id',
    displayName: 'a.display_name',
    createdAt: 'n.created_at',
    changedAt: 'n.changed_at',
    takenBackAt: 'n.taken_back_at',
  });

/** Answers of makers on write-ups, with the texts they had before. */
export const makerAnswerStore = {
  /** Those that are shown, the oldest first. */
  async shown(db: Knex, writeUpId: number): Promise<AnswerRow[]> {
    return answers(db).where('n.write_up_id', writeUpId).whereNull('n.taken_back_at').orderBy('n.id');
  },

  /** One maker's, shown or taken back. */
  async of(db: Knex, makerId: number, writeUpId: number): Promise<AnswerRow | undefined> {
    return answers(db).where({ 'n.maker_id': makerId, 'n.write_up_id': writeUpId }).first();
  },

  /** The newest first. */
  async earlierTexts(db: Knex, answerIds: readonly number[]): Promise<EarlierTextRow[]> {
    return db('maker_answer_texts')
      .whereIn('answer_id', answerIds)
      .orderBy('id', 'desc')
      .select('source', { answerId: 'answer_id', from: 'said_from', to: 'said_to' });
  },

  async add(
    trx: Knex,
    answer: { makerId: number; writeUpId: number; source: string; accountId: number; at: Date },
  ): Promise<void> {
    await trx('maker_answers').insert({
      maker_id: answer.makerId,
      write_up_id: answer.writeUpId,
      source: answer.source,
      account_id: answer.accountId,
      created_at: answer.at,
      changed_at: answer.at,
    });
  },

  /** Keeps what it said until now, then says something else; shown again if it was taken back. */
  async change(
    trx: Knex,
    before: AnswerRow,
    now: { source: string; accountId: number; at: Date },
  ): Promise<void> {
    await trx('maker_answer_texts').insert({
      answer_id: before.id,
      source: before.source,
      account_id: before.accountId,
      said_from: before.changedAt,
      said_to: before.takenBackAt ?? now.at,
    });
    await trx('maker_answers').where({ id: before.id }).update({
      source: now.source,
      account_id: now.accountId,
      changed_at: now.at,
      taken_back_at: null,
    });
  },

  async showAgain(trx: Knex, id: number): Promise<void> {
    await trx('maker_answers').where({ id }).update({ taken_back_at: null });
  },

  async takeBack(trx: Knex, id: number, at: Date): Promise<void> {
    await trx('maker_answers').where({ id }).update({ taken_back_at: at });
  },
};
