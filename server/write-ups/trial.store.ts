import type { Knex } from 'knex';
import type { Trial } from '../../shared/contract/write-ups.js';
import type { TrialOutcome } from '../../shared/contract/vocabulary.js';
import { groupBy } from '../rows.js';

export interface NewTrial {
  readonly fixId: number;
  readonly accountId: number;
  readonly outcome: TrialOutcome;
  readonly note: string;
  readonly figure: number | null;
  readonly revisionIds: readonly number[];
  readonly createdAt: Date;
}

export type TrialStore = ReturnType<typeof createTrialStore>;

export function createTrialStore(knex: Knex) {
  return {
    /** Who reported a trial of the fix, or of any fix of the write-up where none is named. */
    async triersOf(trx: Knex, writeUpId: number, fixKey: string | null): Promise<number[]> {
      const query = trx('trials as t')
        .join('fixes as f', 'f.id', 't.fix_id')
        .where('f.write_up_id', writeUpId);
      if (fixKey !== null) void query.where('f.fix_key', fixKey);
      return query.distinct().pluck('t.account_id');
    },

    /** Trials of all fixes of a write-up, the newest first; two queries, whatever their number. */
    async trialsOf(writeUpId: number, only: { trialId?: number } = {}): Promise<Trial[]> {
      const trials = knex('trials as t')
        .join('fixes as f', 'f.id', 't.fix_id')
        .join('accounts as a', 'a.id', 't.account_id')
        .where('f.write_up_id', writeUpId)
        .orderBy([
          { column: 't.created_at', order: 'desc' },
          { column: 't.id', order: 'desc' },
        ])
        .select('t.id', 't.outcome', 't.note', 't.figure', {
          fixKey: 'f.fix_key',
          personId: 'a.id',
          displayName: 'a.display_name',
          createdAt: 't.created_at',
        });
      const revisions = knex('trial_revisions as tr')
        .join('trials as t', 't.id', 'tr.trial_id')
        .join('fixes as f', 'f.id', 't.fix_id')
        .join('revisions as r', 'r.id', 'tr.revision_id')
        .join('parts as p', 'p.id', 'r.part_id')
        .where('f.write_up_id', writeUpId)
        .orderBy(['p.name', 'r.position'])
        .select('r.id', 'r.label', { trialId: 'tr.trial_id', partId: 'r.part_id', partName: 'p.name' });
      if (only.trialId !== undefined) {
        void trials.where('t.id', only.trialId);
        void revisions.where('tr.trial_id', only.trialId);
      }
      const [rows, marks]: [TrialRecord[], RevisionRecord[]] = await Promise.all([trials, revisions]);
      const revisionsOf = groupBy(marks, (mark) => mark.trialId);
      return rows.map((row) => ({
        id: row.id,
        fixKey: row.fixKey,
        person: { id: row.personId, displayName: row.displayName },
        outcome: row.outcome,
        revisions: (revisionsOf.get(row.id) ?? []).map(({ trialId: _, ...revision }) => revision),
        note: row.note,
        figure: row.figure,
        createdAt: row.createdAt.toISOString(),
      }));
    },

    /** One trial for each person and fix: a second one takes the place of the first. Returns its id. */
    async putTrial(trx: Knex, trial: NewTrial): Promise<number> {
      const { outcome, note, figure } = trial;
      await trx('trials')
        .insert({
          fix_id: trial.fixId,
          account_id: trial.accountId,
          outcome,
          note,
          figure,
          created_at: trial.createdAt,
        })
        .onConflict(['fix_id', 'account_id'])
        .merge();
      const row = await trx('trials').where({ fix_id: trial.fixId, account_id: trial.accountId }).first('id');
      const trial_id: number = row.id;
      await trx('trial_revisions').where({ trial_id }).delete();
      if (trial.revisionIds.length > 0) {
        await trx('trial_revisions').insert(
          trial.revisionIds.map((revision_id) => ({ trial_id, revision_id })),
        );
      }
      return trial_id;
    },
  };
}

interface TrialRecord {
  id: number;
  fixKey: string;
  personId: number;
  displayName: string;
  outcome: TrialOutcome;
  note: string;
  figure: number | null;
  createdAt: Date;
}

interface RevisionRecord {
  trialId: number;
  id: number;
  partId: number;
  label: string;
  partName: string;
}
