import type { Knex } from 'knex';
import type { TakenDownKind } from '../../shared/contract/taken-down.js';

/** Where each kind is kept, and who wrote it. Readings are set aside by the measurements themselves. */
const tables = {
  question: { table: 'questions', writer: 'account_id' },
  reply: { table: 'question_replies', writer: 'account_id' },
  trial: { table: 'trials', writer: 'account_id' },
  'fit-report': { table: 'fit_reports', writer: 'account_id' },
  photo: { table: 'photos', writer: 'owner_id' },
} as const satisfies Record<Exclude<TakenDownKind, 'reading'>, { table: string; writer: string }>;
export type MarkedKind = keyof typeof tables;
export const markedKinds = Object.keys(tables) as MarkedKind[];

export interface TakingDown {
  readonly at: Date;
  readonly moderatorId: number;
  readonly reason: string;
}

const nothing = { taken_down_at: null, taken_down_by: null, taken_down_reason: null };

/** Marks rows as taken down; nothing is ever deleted. */
export const takeDownStore = {
  /** Holds the row until the transaction ends; undefined where there is none. */
  async hold(
    trx: Knex,
    kind: MarkedKind,
    id: number,
  ): Promise<{ accountId: number; takenDownAt: Date | null } | undefined> {
    const { table, writer } = tables[kind];
    return trx(table).where({ id }).forUpdate().first({ accountId: writer, takenDownAt: 'taken_down_at' });
  },

  /** `by` null: it is back on the pages. */
  async mark(trx: Knex, kind: MarkedKind, id: number, by: TakingDown | null): Promise<void> {
    await trx(tables[kind].table)
      .where({ id })
      .update(
        by ? { taken_down_at: by.at, taken_down_by: by.moderatorId, taken_down_reason: by.reason } : nothing,
      );
  },

  /** Everything of one kind by one person that is on the pages; how many there were. */
  async markAllOf(trx: Knex, kind: MarkedKind, accountId: number, by: TakingDown): Promise<number> {
    const { table, writer } = tables[kind];
    return trx(table)
      .where(writer, accountId)
      .whereNull('taken_down_at')
      .update({ taken_down_at: by.at, taken_down_by: by.moderatorId, taken_down_reason: by.reason });
  },

  /** Puts back what was taken down at that very instant; how many there were. */
  async unmarkAllOf(trx: Knex, kind: MarkedKind, accountId: number, at: Date): Promise<number> {
    const { table, writer } = tables[kind];
    return trx(table)
      .where({ [writer]: accountId, taken_down_at: at })
      .update(nothing);
  },

  async setAsideAllOf(trx: Knex, accountId: number, by: TakingDown): Promise<number[]> {
    const features: number[] = await trx('measurements')
      .where({ account_id: accountId, set_aside_at: null })
      .distinct()
      .pluck('feature_id');
    await trx('measurements').where({ account_id: accountId, set_aside_at: null }).update({
      set_aside_at: by.at,
      set_aside_by: by.moderatorId,
      set_aside_reason: by.reason,
    });
    return features;
  },

  async takeBackAllOf(trx: Knex, accountId: number, at: Date): Promise<number[]> {
    const there = () => trx('measurements').where({ account_id: accountId, set_aside_at: at });
    const features: number[] = await there().distinct().pluck('feature_id');
    await there().update({ set_aside_at: null, set_aside_by: null, set_aside_reason: null });
    return features;
  },

  /** Write-ups whose standings rest on a trial, or on any trial of an account. */
  async writeUpsOfTrials(trx: Knex, which: { id: number } | { account_id: number }): Promise<number[]> {
    const [column, value] = Object.entries(which)[0]!;
    return trx('trials as t')
      .join('fixes as f', 'f.id', 't.fix_id')
      .where(`t.${column}`, value)
      .distinct()
      .orderBy('f.write_up_id')
      .pluck('f.write_up_id');
  },

  async nameOf(trx: Knex, accountId: number): Promise<string> {
    const row: { name: string } | undefined = await trx('accounts')
      .where({ id: accountId })
      .first({ name: 'display_name' });
    return row?.name ?? '';
  },

  /** Published write-ups that show a photo, or any photo of an account. */
  async writeUpsOfPhotos(trx: Knex, which: { id: number } | { owner_id: number }): Promise<number[]> {
    const [column, value] = Object.entries(which)[0]!;
    return trx('photos as p')
      .join('edition_photos as ep', 'ep.photo_id', 'p.id')
      .join('write_ups as w', 'w.published_edition_id', 'ep.edition_id')
      .where(`p.${column}`, value)
      .distinct()
      .pluck('w.id');
  },
};
