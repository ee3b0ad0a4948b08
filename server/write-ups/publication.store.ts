import type { Knex } from 'knex';
import { isDuplicate } from '../rows.js';
import { baseOfNext, notWithdrawn } from './withdrawal.store.js';
import type { EditionLinks } from './edition-links.js';

export interface LockedWriteUp {
  readonly id: number;
  readonly slug: string | null;
  /** The published edition; of a withdrawn write-up the one that was. */
  readonly publishedEditionId: number | null;
}

/** Writes what becomes of a write-up when one of its editions is published. All of it runs in the caller's transaction. */
export const publicationStore = {
  /** Holds the write-up until the transaction ends; every command that touches cautions, trials or publication starts here. */
  async lockWriteUp(trx: Knex, id: number): Promise<LockedWriteUp | undefined> {
    return trx('write_ups')
      .where('id', id)
      .forUpdate()
      .first('id', 'slug', { publishedEditionId: baseOfNext(trx, 'write_ups') });
  },

  /** Slugs in use that begin like `base`. */
  async slugsLike(trx: Knex, base: string): Promise<Set<string>> {
    return new Set(await trx('write_ups').where('slug', 'like', `${base}%`).pluck('slug'));
  },

  /** False where another write-up took that slug in the meantime. */
  async giveSlug(trx: Knex, writeUpId: number, slug: string): Promise<boolean> {
    try {
      await trx('write_ups').where('id', writeUpId).update({ slug });
      return true;
    } catch (error) {
      if (isDuplicate(error)) return false;
      throw error;
    }
  },

  /**
   * Published editions are numbered without gaps: an edition that is overtaken by another, or follows one thrown away,
   * gets the next number; whichever unpublished edition has it moves to the end.
   */
  async giveNumber(trx: Knex, writeUpId: number, editionId: number): Promise<number> {
    const editions: { id: number; number: number; state: string }[] = await trx('editions')
      .where('write_up_id', writeUpId)
      .select('id', 'number', 'state')
      .forUpdate();
    const next =
      1 + Math.max(0, ...editions.filter((row) => row.state === 'published').map((row) => row.number));
    const holder = editions.find((row) => row.number === next);
    if (holder?.id === editionId) return next;
    if (holder) {
      const last = Math.max(...editions.map((row) => row.number));
      await trx('editions')
        .where('id', holder.id)
        .update({ number: last + 1 });
    }
    await trx('editions').where('id', editionId).update({ number: next });
    return next;
  },

  async markPublished(trx: Knex, writeUpId: number, editionId: number, at: Date): Promise<void> {
    await trx('editions')
      .where('id', editionId)
      .update({ state: 'published', published_at: at, updated_at: at, version: trx.raw('version + 1') });
    await trx('write_ups')
      .where('id', writeUpId)
      .update({
        published_edition_id: editionId,
        first_published_at: trx.raw('COALESCE(first_published_at, ?)', [at]),
        // The mended text is out: what was withdrawn no longer is.
        ...notWithdrawn,
      });
  },

  async writeLinks(
    trx: Knex,
    editionId: number,
    links: EditionLinks,
    fixIds: ReadonlyMap<string, number>,
  ): Promise<void> {
    const edition_id = editionId;
    const sides = links.sides.map(({ joint, side, partId }) => ({
      edition_id,
      joint,
      side,
      part_id: partId,
    }));
    const revisions = links.revisions.map(({ revisionId, holds }) => ({
      edition_id,
      revision_id: revisionId,
      holds,
    }));
    const photos = links.photoIds.map((photo_id) => ({ edition_id, photo_id }));
    const fixes = links.fixes.map(({ key, position }) => ({ edition_id, fix_id: fixIds.get(key), position }));
    const fixRevisions = links.fixes.flatMap(({ key, revisionIds }) =>
      revisionIds.map((revision_id) => ({ edition_id, fix_id: fixIds.get(key), revision_id })),
    );
    await insertAll(trx, 'edition_sides', sides);
    await insertAll(trx, 'edition_revisions', revisions);
    await insertAll(trx, 'edition_photos', photos);
    await insertAll(trx, 'edition_fixes', fixes);
    await insertAll(trx, 'edition_fix_revisions', fixRevisions);
    if (links.symptomSlugs.length > 0) {
      const symptoms = trx('symptoms')
        .whereIn('slug', links.symptomSlugs)
        .select(trx.raw('?', [editionId]), 'id');
      await trx(trx.raw('?? (??, ??)', ['edition_symptoms', 'edition_id', 'symptom_id'])).insert(symptoms);
    }
  },
};

async function insertAll(trx: Knex, table: string, rows: readonly object[]): Promise<void> {
  if (rows.length > 0) await trx(table).insert(rows);
}
