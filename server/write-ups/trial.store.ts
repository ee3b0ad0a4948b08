import type { Knex } from 'knex';
import type { TrialOutcome } from '../../shared/contract/vocabulary.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import type { Trial } from '../../shared/contract/write-ups.js';
import type { Caller } from '../http/caller.js';
import { fromJson, groupBy } from '../rows.js';
import { readableBy, takenDownColumns, takenDownOf, type TakenDownRow } from '../taken-down.js';

export interface NewTrial {
  readonly fixId: number;
  readonly accountId: number;
  readonly outcome: TrialOutcome;
  readonly note: string;
  readonly figure: number | null;
  readonly worksheet: WorksheetRecord | null;
  readonly revisionIds: readonly number[];
  readonly createdAt: Date;
}

export type TrialStore = ReturnType<typeof createTrialStore>;

export function createTrialStore(knex: Knex) {
  return {
    /** Who reported a trial that stands of the fix, or of any fix of the write-up where none is named. */
    async triersOf(trx: Knex, writeUpId: number, fixKey: string | null): Promise<number[]> {
      const query = trx('trials as t')
        .join('fixes as f', 'f.id', 't.fix_id')
        .where('f.write_up_id', writeUpId)
        .whereNull('t.taken_down_at');
      if (fixKey !== null) void query.where('f.fix_key', fixKey);
      return query.distinct().pluck('t.account_id');
    },

    /**
     * Trials of all fixes of a write-up, the newest first; two queries, whatever their number. What is taken down only for
     * its writer and for moderators.
     */
    async trialsOf(writeUpId: number, reader: Caller, only: { trialId?: number } = {}): Promise<Trial[]> {
      const trials = knex('trials as t')
        .join('fixes as f', 'f.id', 't.fix_id')
        .join('accounts as a', 'a.id', 't.account_id')
        .where('f.write_up_id', writeUpId)
        .orderBy([
          { column: 't.created_at', order: 'desc' },
          { column: 't.id', order: 'desc' },
        ])
        .select('t.id', 't.outcome', 't.note', 't.figure', 't.worksheet', {
          fixKey: 'f.fix_key',
          personId: 'a.id',
          displayName: 'a.display_name',
          createdAt: 't.created_at',
          ...takenDownColumns('t'),
        });
      readableBy(trials, 't', reader);
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
        worksheet: row.worksheet === null ? null : fromJson<WorksheetRecord>(row.worksheet),
        createdAt: row.createdAt.toISOString(),
        takenDown: takenDownOf(row),
      }));
    },

    /** One trial for each person and fix: a second one takes the place of the first. Returns its id. */
    async putTrial(trx: Knex, trial: NewTrial): Promise<number> {
      const { outcome, note, figure, worksheet } = trial;
      await trx('trials')
        .insert({
          fix_id: trial.fixId,
          account_id: trial.accountId,
          outcome,
          note,
          figure,
          worksheet: worksheet && JSON.stringify(worksheet),
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

interface TrialRecord extends TakenDownRow {
  id: number;
  fixKey: string;
  personId: number;
  displayName: string;
  outcome: TrialOutcome;
  note: string;
  figure: number | null;
  worksheet: unknown;
  createdAt: Date;
}

interface RevisionRecord {
  trialId: number;
  id: number;
  partId: number;
  label: string;
  partName: string;
}
