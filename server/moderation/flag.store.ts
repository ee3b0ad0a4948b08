import type { Knex } from 'knex';
import type { DeskSubjectKind } from '../../shared/contract/desk-subjects.js';
import type { FlagGround, FlagOutcome } from '../../shared/contract/flags.js';
import { takenDownKinds } from '../../shared/contract/taken-down.js';
import { isDuplicate } from '../rows.js';

export interface FlaggedRow {
  readonly id: number;
  readonly kind: DeskSubjectKind;
  readonly subjectId: number;
  readonly title: string;
  readonly state: 'waiting' | FlagOutcome;
  readonly reason: string | null;
  readonly createdAt: Date;
}

export interface FlagRow {
  readonly accountId: number;
  readonly displayName: string;
  readonly ground: FlagGround;
  readonly line: string;
  readonly createdAt: Date;
}

export interface Settlement {
  readonly outcome: FlagOutcome;
  readonly reason: string;
  readonly by: number;
  readonly at: Date;
}

/** Somebody who told the desk of a thing, and what it was called. */
export interface Teller {
  readonly flaggedId: number;
  readonly accountId: number;
  readonly title: string;
}

const longestTitle = 300;

export const flagStore = {
  /** The row that waits for a thing, made if it is not there. */
  async waitingFor(
    trx: Knex,
    thing: { kind: DeskSubjectKind; id: number; title: string; writerId: number; at: Date },
  ): Promise<number> {
    const [result] = (await trx.raw(
      `INSERT INTO flagged (subject_kind, subject_id, title, writer_id, waiting_name, created_at)
        VALUES (?, ?, ?, ?, ?, ?) ON DUPLICATE KEY UPDATE id = LAST_INSERT_ID(id)`,
      [
        thing.kind,
        thing.id,
        thing.title.slice(0, longestTitle),
        thing.writerId,
        `${thing.kind}:${thing.id}`,
        thing.at,
      ],
    )) as [{ insertId: number }];
    return result.insertId;
  },

  /** False where the account has told of it already. */
  async add(
    trx: Knex,
    flag: { flaggedId: number; accountId: number; ground: FlagGround; line: string; at: Date },
  ): Promise<boolean> {
    try {
      await trx('flags').insert({
        flagged_id: flag.flaggedId,
        account_id: flag.accountId,
        ground: flag.ground,
        line: flag.line,
        created_at: flag.at,
      });
      return true;
    } catch (error) {
      if (isDuplicate(error)) return false;
      throw error;
    }
  },

  async byId(db: Knex, id: number): Promise<FlaggedRow | undefined> {
    return flagged(db).where({ id }).first();
  },

  async hold(trx: Knex, id: number): Promise<FlaggedRow | undefined> {
    return flagged(trx).where({ id }).forUpdate().first();
  },

  async flagsOf(db: Knex, flaggedId: number): Promise<FlagRow[]> {
    return db('flags as f')
      .join('accounts as a', 'a.id', 'f.account_id')
      .where('f.flagged_id', flaggedId)
      .orderBy('f.id')
      .select('f.ground', 'f.line', {
        accountId: 'a.id',
        displayName: 'a.display_name',
        createdAt: 'f.created_at',
      });
  },

  async settle(trx: Knex, id: number, settlement: Settlement): Promise<Teller[]> {
    return settleThose(trx, [id], settlement);
  },

  /** What waits on a thing; those who told of it. */
  async settleOn(
    trx: Knex,
    { kind, id }: { kind: DeskSubjectKind; id: number },
    settlement: Settlement,
  ): Promise<Teller[]> {
    const ids: number[] = await trx('flagged')
      .where({ waiting_name: `${kind}:${id}` })
      .pluck('id');
    return settleThose(trx, ids, settlement);
  },

  /** What waits on anything of an account that can be taken down. */
  async settleAllOf(trx: Knex, accountId: number, settlement: Settlement): Promise<Teller[]> {
    const ids: number[] = await trx('flagged')
      .where({ writer_id: accountId, state: 'waiting' })
      .whereIn('subject_kind', takenDownKinds)
      .pluck('id');
    return settleThose(trx, ids, settlement);
  },
};

async function settleThose(
  trx: Knex,
  ids: readonly number[],
  { outcome, reason, by, at }: Settlement,
): Promise<Teller[]> {
  if (ids.length === 0) return [];
  await trx('flagged')
    .whereIn('id', ids)
    .update({ state: outcome, waiting_name: null, reason, decided_by: by, decided_at: at });
  return trx('flags as f')
    .join('flagged as d', 'd.id', 'f.flagged_id')
    .whereIn('d.id', ids)
    .orderBy('f.id')
    .select('d.title', { flaggedId: 'd.id', accountId: 'f.account_id' });
}

function flagged(db: Knex): Knex.QueryBuilder {
  return db('flagged').select('id', 'title', 'state', 'reason', {
    kind: 'subject_kind',
    subjectId: 'subject_id',
    createdAt: 'created_at',
  });
}
