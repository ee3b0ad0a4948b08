import type { Knex } from 'knex';
import { fromJson } from '../rows.js';

interface PhotoFile {
  readonly hash: string;
  readonly widths: number[];
}

/** Photos that nothing shows any more, and their files. */
export const unusedPhotoStore = {
  /**
   * Deletes the photos of an account that no row of any table points at and no edition mentions, and notes their files
   * for removal. Tables that point at photos are looked up, so that a new one is heeded by itself.
   */
  async deleteUnused(trx: Knex, ownerId: number, now: Date): Promise<void> {
    const [pointers] = (await trx.raw(`
      SELECT table_name AS tableName, column_name AS columnName FROM information_schema.key_column_usage
      WHERE table_schema = DATABASE() AND referenced_table_name = 'photos' AND referenced_column_name = 'id'
        AND table_name <> 'photo_looks'`)) as [{ tableName: string; columnName: string }[]];
    const query = trx('photos as p')
      .where('p.owner_id', ownerId)
      .whereNotExists(
        trx('editions as e')
          .whereRaw(`e.content REGEXP CONCAT('"photoId": *', p.id, '[^0-9]')`)
          .select('e.id'),
      )
      .select('p.id', 'p.hash', 'p.widths');
    for (const { tableName, columnName } of pointers)
      void query.whereNotExists(trx(tableName).where(columnName, trx.ref('p.id')).select(trx.raw('1')));
    const unused: { id: number; hash: string; widths: unknown }[] = await query;
    if (unused.length === 0) return;
    await trx('photos')
      .whereIn(
        'id',
        unused.map((photo) => photo.id),
      )
      .delete();
    await trx('photo_removals')
      .insert(
        unused.map(({ hash, widths }) => ({
          hash,
          widths: JSON.stringify(fromJson<number[]>(widths)),
          created_at: now,
        })),
      )
      .onConflict('hash')
      .ignore();
  },

  /** Files that are to go; those that a photo of somebody else shows in the meantime are crossed off. */
  async removals(trx: Knex): Promise<PhotoFile[]> {
    await trx('photo_removals').whereIn('hash', trx('photos').select('hash')).delete();
    const rows: { hash: string; widths: unknown }[] = await trx('photo_removals')
      .select('hash', 'widths')
      .limit(100);
    return rows.map(({ hash, widths }) => ({ hash, widths: fromJson<number[]>(widths) }));
  },

  async crossOff(db: Knex, hash: string): Promise<void> {
    await db('photo_removals').where({ hash }).delete();
  },
};
