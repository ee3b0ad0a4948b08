import type { Knex } from 'knex';
import type { ProposedFeature, ProposedPart, ProposedRevision } from '../../shared/contract/proposals.js';
import { isDuplicate } from '../rows.js';
import { freeSlug, slugFrom } from '../write-ups/slug.js';

/** Writes what is new in the catalogue, in the caller's transaction. Names compare as the database's collation does. */
export const catalogueEntryStore = {
  async makerNamed(db: Knex, name: string): Promise<number | undefined> {
    const row: { id: number } | undefined = await db('makers').where({ name }).first('id');
    return row?.id;
  },

  async partIsThere(db: Knex, id: number): Promise<boolean> {
    return (await db('parts').where({ id }).first('id')) !== undefined;
  },

  async partNamed(db: Knex, maker: string, name: string): Promise<boolean> {
    const query = db('parts as p').join('makers as m', 'm.id', 'p.maker_id');
    return (await query.where({ 'm.name': maker, 'p.name': name }).first('p.id')) !== undefined;
  },

  async revisionLabelled(db: Knex, partId: number, label: string): Promise<boolean> {
    return (await db('revisions').where({ part_id: partId, label }).first('id')) !== undefined;
  },

  async featureNamed(db: Knex, partId: number, name: string): Promise<boolean> {
    return (await db('features').where({ part_id: partId, name }).first('id')) !== undefined;
  },

  /** The part, held until the transaction ends, so that what is added to it comes one at a time. */
  async holdPart(trx: Knex, id: number): Promise<{ id: number; slug: string; name: string } | undefined> {
    return trx('parts').where({ id }).forUpdate().first('id', 'slug', 'name');
  },

  async addMaker(trx: Knex, name: string): Promise<number> {
    const base = slugFrom(name);
    const taken: string[] = await trx('makers').where('slug', 'like', `${base}%`).pluck('slug');
    const [id] = await trx('makers').insert({ slug: freeSlug(base, new Set(taken)), name, about: '' });
    return id!;
  },

  /** Addresses of parts that were merged away are never given again. */
  async addPart(
    trx: Knex,
    makerId: number,
    entry: ProposedPart,
  ): Promise<{ id: number; slug: string } | 'already-there'> {
    const base = slugFrom(`${entry.maker} ${entry.name}`);
    const pattern = `${base}%`;
    const [parts, moved]: [string[], string[]] = await Promise.all([
      trx('parts').where('slug', 'like', pattern).pluck('slug'),
      trx('part_redirects').where('slug', 'like', pattern).pluck('slug'),
    ]);
    const slug = freeSlug(base, new Set([...parts, ...moved]));
    const id = await unlessThere(() =>
      trx('parts').insert({
        slug,
        maker_id: makerId,
        name: entry.name,
        kind: entry.partKind,
        about: entry.about,
      }),
    );
    return id === 'already-there' ? id : { id, slug };
  },

  /** Before the first revision that was sold later, else as the newest. The part must be held. */
  async addRevision(trx: Knex, partId: number, entry: ProposedRevision): Promise<number | 'already-there'> {
    const others: { position: number; soldFrom: string | null }[] = await trx('revisions')
      .where('part_id', partId)
      .orderBy('position')
      .select('position', { soldFrom: 'sold_from' });
    const later = others.find(
      ({ soldFrom }) => soldFrom !== null && entry.soldFrom !== null && soldFrom > entry.soldFrom,
    );
    const position = later?.position ?? (others.at(-1)?.position ?? -1) + 1;
    if (later) {
      // From the end on, for no two rows of a part may have one position even for a moment.
      await trx.raw(
        'UPDATE revisions SET position = position + 1 WHERE part_id = ? AND position >= ? ORDER BY position DESC',
        [partId, position],
      );
    }
    return unlessThere(() =>
      trx('revisions').insert({
        part_id: partId,
        label: entry.label,
        position,
        sold_from: entry.soldFrom,
        sold_to: entry.soldTo,
        how_to_tell: entry.howToTell,
        what_changed: entry.whatChanged,
      }),
    );
  },

  /** In the order given; for a revision that has none yet. */
  async addRevisionPhotos(
    trx: Knex,
    revisionId: number,
    photos: readonly { photoId: number; caption: string }[],
  ): Promise<void> {
    if (photos.length === 0) return;
    await trx('revision_photos').insert(
      photos.map(({ photoId, caption }, position) => ({
        revision_id: revisionId,
        photo_id: photoId,
        position,
        caption,
      })),
    );
  },

  async addFeature(trx: Knex, partId: number, entry: ProposedFeature): Promise<void> {
    const base = slugFrom(entry.name);
    const taken: string[] = await trx('features')
      .where('part_id', partId)
      .where('slug', 'like', `${base}%`)
      .pluck('slug');
    await trx('features').insert({
      part_id: partId,
      slug: freeSlug(base, new Set(taken)),
      name: entry.name,
      kind: entry.featureKind,
      process: entry.process,
    });
  },
};

async function unlessThere(write: () => Promise<number[]>): Promise<number | 'already-there'> {
  try {
    return (await write())[0]!;
  } catch (error) {
    if (isDuplicate(error)) return 'already-there';
    throw error;
  }
}
