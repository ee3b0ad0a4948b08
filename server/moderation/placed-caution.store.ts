import type { Knex } from 'knex';
import type { LibraryCaution } from '../../shared/contract/moderation.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import { fromJson } from '../rows.js';

/** What a caution says. */
export type CautionWords = Omit<Caution, 'id' | 'fixKey' | 'stepKey'>;

export type PlacedCautionStore = ReturnType<typeof createPlacedCautionStore>;

/** Writes cautions, and keeps the library they are taken from. What stands on a write-up is read by the write-ups themselves. */
export function createPlacedCautionStore(knex: Knex) {
  return {
    /** What is offered: the entries that are not retired. */
    async library(): Promise<LibraryCaution[]> {
      const rows: (Omit<LibraryCaution, 'hazards'> & { hazards: unknown })[] = await knex('caution_library')
        .select('id', 'name', 'hazards', 'hazard', 'consequence', 'avoidance', { signalWord: 'signal_word' })
        .whereNull('retired_at')
        .orderBy(['position', 'id']);
      return rows.map((row) => ({ ...row, hazards: fromJson(row.hazards) }));
    },

    async isInLibrary(id: number): Promise<boolean> {
      return (await knex('caution_library').where('id', id).first('id')) !== undefined;
    },

    async place(
      trx: Knex,
      caution: {
        writeUpId: number;
        fixId: number | null;
        stepKey: string | null;
        libraryId: number | null;
        words: CautionWords;
        placedBy: number;
        at: Date;
      },
    ): Promise<number> {
      const [id] = await trx('cautions').insert({
        write_up_id: caution.writeUpId,
        fix_id: caution.fixId,
        step_key: caution.stepKey,
        library_id: caution.libraryId,
        ...columnsOf(caution.words),
        placed_by: caution.placedBy,
        placed_at: caution.at,
      });
      return id!;
    },

    /** The write-up that a caution stands on; undefined where it is not there or was taken off. */
    async writeUpOf(cautionId: number): Promise<number | undefined> {
      const row = await knex('cautions').where('id', cautionId).whereNull('removed_at').first('write_up_id');
      return row?.write_up_id;
    },

    async reword(trx: Knex, id: number, words: CautionWords): Promise<void> {
      await trx('cautions').where('id', id).update(columnsOf(words));
    },

    async move(trx: Knex, id: number, to: { fixId: number | null; stepKey: string | null }): Promise<void> {
      await trx('cautions').where('id', id).update({ fix_id: to.fixId, step_key: to.stepKey });
    },

    async takeOff(trx: Knex, id: number, at: Date): Promise<void> {
      await trx('cautions').where('id', id).update({ removed_at: at });
    },
  };
}

function columnsOf(words: CautionWords): object {
  const { signalWord, hazards, hazard, consequence, avoidance } = words;
  return { signal_word: signalWord, hazards: JSON.stringify(hazards), hazard, consequence, avoidance };
}
