import type { Knex } from 'knex';
import type { RevisionRef } from '../../shared/contract/hardware.js';
import type { Standing, TrialOutcome } from '../../shared/contract/vocabulary.js';
import type { FixView } from '../../shared/contract/write-ups.js';

/** What is known of a fix beyond its text. */
export interface FixRow {
  readonly id: number;
  readonly key: string;
  readonly standing: Standing;
  readonly madeRightFrom: RevisionRef | null;
  readonly trialCounts: FixView['trialCounts'];
}

export interface EvidenceRow {
  readonly fixId: number;
  readonly accountId: number;
  readonly outcome: TrialOutcome;
  readonly figure: number | null;
}

export type FixStore = ReturnType<typeof createFixStore>;

/** Fixes, which outlive editions: cautions and trials hang on them. */
export function createFixStore(knex: Knex) {
  return {
    /** Every fix that an edition on the desk or a published one ever had, with its trials counted. */
    async fixesOf(writeUpId: number, db: Knex = knex): Promise<Map<string, FixRow>> {
      const rows: FixRecord[] = await db('fixes as f')
        .leftJoin('revisions as r', 'r.id', 'f.made_right_from')
        .leftJoin('trials as t', (on) => on.on('t.fix_id', 'f.id').andOnNull('t.taken_down_at'))
        .where('f.write_up_id', writeUpId)
        .groupBy('f.id')
        .select('f.id', 'f.standing', {
          key: 'f.fix_key',
          revisionId: 'r.id',
          partId: 'r.part_id',
          label: 'r.label',
        })
        .select(db.raw(`${count('held')}, ${count('held-for-a-while')}, ${count('did-not-help')}`));
      return new Map(rows.map((row) => [row.key, toFix(row)]));
    },

    /** Sees to it that each key has a fix; returns their ids. */
    async addMissing(trx: Knex, writeUpId: number, keys: readonly string[]): Promise<Map<string, number>> {
      if (keys.length === 0) return new Map();
      const present = () => trx('fixes').where('write_up_id', writeUpId).whereIn('fix_key', keys);
      const known = new Set<string>(await present().forUpdate().pluck('fix_key'));
      const missing = keys.filter((key) => !known.has(key));
      if (missing.length > 0) {
        await trx('fixes').insert(missing.map((key) => ({ write_up_id: writeUpId, fix_key: key })));
      }
      const rows: { id: number; fix_key: string }[] = await present().forUpdate().select('id', 'fix_key');
      return new Map(rows.map((row) => [row.fix_key, row.id]));
    },

    /** Trials that stand. */
    async evidenceFor(trx: Knex, writeUpId: number): Promise<EvidenceRow[]> {
      return trx('trials as t')
        .join('fixes as f', 'f.id', 't.fix_id')
        .where('f.write_up_id', writeUpId)
        .whereNull('t.taken_down_at')
        .select('t.outcome', 't.figure', { fixId: 't.fix_id', accountId: 't.account_id' });
    },

    async setMadeRight(trx: Knex, fixIds: readonly number[], revisionId: number | null): Promise<void> {
      await trx('fixes').whereIn('id', fixIds).update({ made_right_from: revisionId });
    },

    /** One statement for all that changed. */
    async setStandings(trx: Knex, standings: ReadonlyMap<number, Standing>): Promise<void> {
      if (standings.size === 0) return;
      const cases = [...standings].flatMap(([id, standing]) => [id, standing]);
      const whens = 'WHEN ? THEN ? '.repeat(standings.size);
      await trx('fixes')
        .whereIn('id', [...standings.keys()])
        .update({ standing: trx.raw(`CASE id ${whens}END`, cases) });
    },
  };
}

interface FixRecord {
  id: number;
  key: string;
  standing: Standing;
  revisionId: number | null;
  partId: number;
  label: string;
  held: number | null;
  'held-for-a-while': number | null;
  'did-not-help': number | null;
}

function count(outcome: TrialOutcome): string {
  return `SUM(t.outcome = '${outcome}') AS \`${outcome}\``;
}

function toFix(row: FixRecord): FixRow {
  return {
    id: row.id,
    key: row.key,
    standing: row.standing,
    madeRightFrom:
      row.revisionId === null ? null : { id: row.revisionId, partId: row.partId, label: row.label },
    trialCounts: {
      held: Number(row.held ?? 0),
      heldForAWhile: Number(row['held-for-a-while'] ?? 0),
      didNotHelp: Number(row['did-not-help'] ?? 0),
    },
  };
}
