import type { Knex } from 'knex';
import type { TakenDown } from '../shared/contract/taken-down.js';
import { isModerator, type Caller } from './http/caller.js';

/** Columns of a row that the desk may have taken down; `table` is its alias. */
export function takenDownColumns(table: string): Record<string, string> {
  return { takenDownAt: `${table}.taken_down_at`, takenDownReason: `${table}.taken_down_reason` };
}

export interface TakenDownRow {
  readonly takenDownAt: Date | null;
  readonly takenDownReason: string | null;
}

/** Null while it is on the pages. */
export function takenDownOf({ takenDownAt, takenDownReason }: TakenDownRow): TakenDown | null {
  return takenDownAt && { at: takenDownAt.toISOString(), reason: takenDownReason ?? '' };
}

/** Leaves out what is taken down, but for its writer and for moderators; `table` is the alias of the rows. */
export function readableBy(query: Knex.QueryBuilder, table: string, reader: Caller): void {
  if (isModerator(reader)) return;
  void query.where((either) => {
    void either.whereNull(`${table}.taken_down_at`);
    if (reader.accountId !== null) void either.orWhere(`${table}.account_id`, reader.accountId);
  });
}

/** Whether the reader may see it although it is taken down. */
export function mayReadTakenDown(writerId: number, reader: Caller): boolean {
  return isModerator(reader) || reader.accountId === writerId;
}
