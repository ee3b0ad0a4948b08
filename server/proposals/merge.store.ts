import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { FeatureKind } from '../../shared/contract/vocabulary.js';
import { fromJson, groupBy } from '../rows.js';
import { renameInContent, type Renamed } from './rename-in-content.js';
import type { Moves } from './repoint.store.js';

export interface NamedPart {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
}

export interface NamedRevision {
  readonly id: number;
  readonly partId: number;
  readonly label: string;
  readonly position: number;
}

export interface NamedFeature {
  readonly id: number;
  readonly partId: number;
  readonly slug: string;
  readonly name: string;
  readonly kind: FeatureKind;
}

interface JointRow {
  readonly id: number;
  readonly kind: string;
  readonly featureA: number;
  readonly featureB: number;
}

/** What a merge reads and writes; all of it runs in the caller's transaction. */
export const mergeStore = {
  /** The parts, held until the transaction ends; what is not there is missing. */
  async holdParts(trx: Knex, ids: readonly number[]): Promise<NamedPart[]> {
    return trx('parts').whereIn('id', ids).orderBy('id').forUpdate().select('id', 'slug', 'name');
  },

  /** Oldest first within each part. */
  async revisions(
    trx: Knex,
    where: { ids: readonly number[] } | { partIds: readonly number[] },
  ): Promise<NamedRevision[]> {
    const query = trx('revisions')
      .select('id', 'label', 'position', { partId: 'part_id' })
      .orderBy(['part_id', 'position']);
    return 'ids' in where ? query.whereIn('id', where.ids) : query.whereIn('part_id', where.partIds);
  },

  async features(
    trx: Knex,
    where: { ids: readonly number[] } | { partIds: readonly number[] },
  ): Promise<NamedFeature[]> {
    const query = trx('features')
      .select('id', 'slug', 'name', 'kind', { partId: 'part_id' })
      .orderBy('id')
      .forUpdate();
    return 'ids' in where ? query.whereIn('id', where.ids) : query.whereIn('part_id', where.partIds);
  },

  async partsOfFeatures(trx: Knex, featureIds: readonly number[]): Promise<number[]> {
    return trx('features').whereIn('id', featureIds).distinct('part_id').pluck('part_id');
  },

  async jointsOf(trx: Knex, featureIds: readonly number[]): Promise<JointRow[]> {
    return trx('joints')
      .whereIn('feature_a', featureIds)
      .orWhereIn('feature_b', featureIds)
      .select('id', 'kind', { featureA: 'feature_a', featureB: 'feature_b' })
      .orderBy('id')
      .forUpdate();
  },

  /** Marks of the old parts that the new part has in the same words. */
  async marksInBoth(trx: Knex, fromPart: number, intoPart: number): Promise<Moves> {
    const rows: { from: number; into: number }[] = await trx('revision_marks as f')
      .join('revision_marks as i', 'i.text', 'f.text')
      .where({ 'f.part_id': fromPart, 'i.part_id': intoPart })
      .select({ from: 'f.id', into: 'i.id' });
    return new Map(rows.map(({ from, into }) => [from, into]));
  },

  /** Of two reports of one person that come to be on the same pair of the same joint the newer one stays. */
  async settleReports(trx: Knex, moves: { joints: Moves; revisions: Moves }): Promise<void> {
    const joints = [...moves.joints].flat();
    const revisions = [...moves.revisions].flat();
    const rows: { id: number; jointId: number; a: number; b: number; accountId: number }[] = await trx(
      'fit_reports',
    )
      .whereIn('joint_id', joints)
      .orWhereIn('revision_a', revisions)
      .orWhereIn('revision_b', revisions)
      .select('id', { jointId: 'joint_id', a: 'revision_a', b: 'revision_b', accountId: 'account_id' })
      .orderBy([
        { column: 'created_at', order: 'desc' },
        { column: 'id', order: 'desc' },
      ]);
    const after = (map: Moves, id: number): number => map.get(id) ?? id;
    const alike = groupBy(rows, (row) =>
      [
        after(moves.joints, row.jointId),
        after(moves.revisions, row.a),
        after(moves.revisions, row.b),
        row.accountId,
      ].join('/'),
    );
    const older = [...alike.values()].flatMap((reports) => reports.slice(1).map(({ id }) => id));
    if (older.length > 0) await trx('fit_reports').whereIn('id', older).delete();
  },

  /** An edition that comes to mark one revision twice holds for it where either mark says so. */
  async settleMarksOfEditions(trx: Knex, revisions: Moves): Promise<void> {
    if (revisions.size === 0) return;
    const into = `CASE source.revision_id ${'WHEN ? THEN ? '.repeat(revisions.size)}END`;
    await trx.raw(
      `UPDATE edition_revisions target JOIN edition_revisions source
         ON source.edition_id = target.edition_id AND source.holds AND target.revision_id = ${into}
       SET target.holds = TRUE WHERE source.revision_id IN (?)`,
      [...[...revisions].flat(), [...revisions.keys()]],
    );
  },

  /** Published write-ups with a joint on any of the parts. */
  async writeUpsOn(trx: Knex, partIds: readonly number[]): Promise<number[]> {
    return trx('edition_sides as s')
      .join('write_ups as w', 'w.published_edition_id', 's.edition_id')
      .whereIn('s.part_id', partIds)
      .distinct('w.id')
      .orderBy('w.id')
      .pluck('w.id');
  },

  /**
   * Rewrites the text of every edition that names what is renamed, published or not. One that its author still works on
   * moves on by a version, so that a save of the old text is told of it.
   */
  async renameInEditions(trx: Knex, renamed: Renamed): Promise<void> {
    const ids = [...renamed.parts.keys(), ...renamed.revisions.keys()];
    if (ids.length === 0) return;
    // Coarse on purpose: it only spares the reading of texts that hold none of the numbers.
    const rows: { id: number; content: unknown }[] = await trx('editions')
      .whereRaw('content REGEXP ?', [`(^|[^0-9.])(${ids.join('|')})([^0-9]|$)`])
      .select('id', 'content')
      .orderBy('id')
      .forUpdate();
    const changed = rows.flatMap(({ id, content }) => {
      const before = fromJson<EditionContent>(content);
      const after = JSON.stringify(renameInContent(before, renamed));
      return after === JSON.stringify(before) ? [] : [{ id, after }];
    });
    if (changed.length === 0) return;
    await trx.raw(
      `UPDATE editions SET content = CASE id ${'WHEN ? THEN ? '.repeat(changed.length)}END,
         version = IF(state = 'published', version, version + 1) WHERE id IN (?)`,
      [...changed.flatMap(({ id, after }) => [id, after]), changed.map(({ id }) => id)],
    );
  },

  /** Puts revisions behind those of their new part, in the order given. */
  async moveRevisions(
    trx: Knex,
    ids: readonly number[],
    partId: number,
    firstPosition: number,
  ): Promise<void> {
    if (ids.length === 0) return;
    await trx.raw(
      `UPDATE revisions SET part_id = ?, position = CASE id ${'WHEN ? THEN ? '.repeat(ids.length)}END WHERE id IN (?)`,
      [partId, ...ids.flatMap((id, index) => [id, firstPosition + index]), [...ids]],
    );
  },

  async moveFeatures(
    trx: Knex,
    features: readonly { id: number; slug: string }[],
    partId: number,
  ): Promise<void> {
    if (features.length === 0) return;
    await trx.raw(
      `UPDATE features SET part_id = ?, slug = CASE id ${'WHEN ? THEN ? '.repeat(features.length)}END WHERE id IN (?)`,
      [partId, ...features.flatMap(({ id, slug }) => [id, slug]), features.map(({ id }) => id)],
    );
  },

  /** From now on the address leads to that part. */
  async redirect(trx: Knex, slug: string, partId: number): Promise<void> {
    await trx('part_redirects').insert({ slug, part_id: partId });
  },
};
