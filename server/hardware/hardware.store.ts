import type { Knex } from 'knex';
import type { MakerRef, PartRef, RevisionRef, Symptom } from '../../shared/contract/hardware.js';
import type { PartKind } from '../../shared/contract/vocabulary.js';
import { revisionRefColumns, toRevisionRef, type RevisionRefRow } from '../revision-ref.js';

/** A part with what only lists show beside it. */
export type PartRow = PartRef & { about: string };

export interface PartSearch {
  readonly words: readonly string[];
  readonly kind?: PartKind | undefined;
  readonly maker?: string | undefined;
  readonly after?: { name: string; id: number } | undefined;
  readonly rows: number;
}

export type HardwareStore = ReturnType<typeof createHardwareStore>;

export function createHardwareStore(knex: Knex) {
  return {
    async makers(): Promise<MakerRef[]> {
      return knex('makers').select('id', 'slug', 'name').orderBy(['name', 'id']);
    },

    async symptoms(): Promise<Symptom[]> {
      return symptomColumns(knex('symptoms')).orderBy(['position', 'id']);
    },

    async symptomsBySlugs(slugs: readonly string[]): Promise<Symptom[]> {
      return symptomColumns(knex('symptoms')).whereIn('slug', slugs).orderBy(['position', 'id']);
    },

    async parts({ words, kind, maker, after, rows }: PartSearch): Promise<PartRow[]> {
      const query = partQuery(knex).orderBy(['p.name', 'p.id']).limit(rows);
      if (kind !== undefined) void query.where('p.kind', kind);
      if (maker !== undefined) void query.where('m.slug', maker);
      for (const word of words) {
        const pattern = `%${word.replace(/[\\%_]/g, '\\$&')}%`;
        void query.where((either) =>
          either.where('p.name', 'like', pattern).orWhere('m.name', 'like', pattern),
        );
      }
      if (after) {
        void query
          .where('p.name', '>=', after.name)
          .where((either) => either.where('p.name', '>', after.name).orWhere('p.id', '>', after.id));
      }
      return (await query).map(toPart);
    },

    async partsByIds(ids: readonly number[]): Promise<PartRow[]> {
      return (await partQuery(knex).whereIn('p.id', ids)).map(toPart);
    },

    /** The part at that address, or the one into which the part that was there has been merged. */
    async partBySlug(slug: string): Promise<PartRow | undefined> {
      const here = knex('parts').where({ slug }).select('id');
      const moved = knex('part_redirects').where({ slug }).select('part_id');
      const rows = await partQuery(knex).where('p.id', knex.raw('COALESCE((?), (?))', [here, moved]));
      return rows.map(toPart)[0];
    },

    /** Oldest first within each part. */
    async revisionsOfParts(partIds: readonly number[]): Promise<RevisionRef[]> {
      const rows: RevisionRefRow[] = await knex('revisions')
        .select(revisionRefColumns)
        .whereIn('part_id', partIds)
        .orderBy(['part_id', 'position']);
      return rows.map(toRevisionRef);
    },

    async revisionsByIds(ids: readonly number[]): Promise<RevisionRef[]> {
      const rows: RevisionRefRow[] = await knex('revisions').select(revisionRefColumns).whereIn('id', ids);
      return rows.map(toRevisionRef);
    },

    /** Published write-ups with a joint on each part; parts without any are missing. */
    async writeUpCounts(partIds: readonly number[]): Promise<Map<number, number>> {
      const rows: { part_id: number; count: number | string }[] = await knex('edition_sides as s')
        .join('write_ups as w', 'w.published_edition_id', 's.edition_id')
        .select('s.part_id')
        .countDistinct({ count: 'w.id' })
        .whereIn('s.part_id', partIds)
        .groupBy('s.part_id');
      return new Map(rows.map((row) => [row.part_id, Number(row.count)]));
    },
  };
}

interface PartRecord {
  id: number;
  slug: string;
  name: string;
  kind: PartKind;
  about: string;
  maker_id: number;
  maker_slug: string;
  maker_name: string;
}

function partQuery(knex: Knex): Knex.QueryBuilder<object, PartRecord[]> {
  return knex('parts as p')
    .join('makers as m', 'm.id', 'p.maker_id')
    .select('p.id', 'p.slug', 'p.name', 'p.kind', 'p.about', {
      maker_id: 'm.id',
      maker_slug: 'm.slug',
      maker_name: 'm.name',
    }) as Knex.QueryBuilder<object, PartRecord[]>;
}

function toPart(row: PartRecord): PartRow {
  return {
    id: row.id,
    slug: row.slug,
    name: row.name,
    kind: row.kind,
    maker: { id: row.maker_id, slug: row.maker_slug, name: row.maker_name },
    about: row.about,
  };
}

function symptomColumns(query: Knex.QueryBuilder): Knex.QueryBuilder<object, Symptom[]> {
  return query.select('id', 'slug', 'label', { group: 'group_name' }) as Knex.QueryBuilder<object, Symptom[]>;
}
