import type { Knex } from 'knex';
import type { Caution } from '../../shared/contract/write-ups.js';
import { fromJson } from '../rows.js';

export type CautionStore = ReturnType<typeof createCautionStore>;

/** Cautions that stand; the desk writes them. */
export function createCautionStore(knex: Knex) {
  const live = (db: Knex) =>
    db('cautions as c')
      .leftJoin('fixes as f', 'f.id', 'c.fix_id')
      .whereNull('c.removed_at')
      // The column is an enum in the order of gravity, which it sorts by.
      .orderBy(['c.signal_word', 'c.id'])
      .select('c.id', 'c.hazards', 'c.hazard', 'c.consequence', 'c.avoidance', {
        writeUpId: 'c.write_up_id',
        fixKey: 'f.fix_key',
        stepKey: 'c.step_key',
        signalWord: 'c.signal_word',
      });

  return {
    /** The cautions of a write-up and its fixes, the gravest first. */
    async cautionsOf(writeUpId: number, db: Knex = knex): Promise<Caution[]> {
      return (await live(db).where('c.write_up_id', writeUpId)).map(toCaution);
    },

    async cautionsOfMany(writeUpIds: readonly number[]): Promise<(Caution & { writeUpId: number })[]> {
      if (writeUpIds.length === 0) return [];
      const rows: CautionRecord[] = await live(knex).whereIn('c.write_up_id', writeUpIds);
      return rows.map((row) => ({ ...toCaution(row), writeUpId: row.writeUpId }));
    },
  };
}

interface CautionRecord extends Omit<Caution, 'hazards'> {
  writeUpId: number;
  hazards: unknown;
}

function toCaution(row: CautionRecord): Caution {
  const { writeUpId: _, hazards, ...words } = row;
  return { ...words, hazards: fromJson(hazards) };
}
