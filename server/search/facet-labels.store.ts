import type { Knex } from 'knex';
import type { RevisionRef } from '../../shared/contract/hardware.js';

/** Names behind the slugs and identities that the index counts by. */
export interface FacetLabels {
  readonly parts: ReadonlyMap<string, string>;
  readonly symptoms: ReadonlyMap<string, string>;
  /** Revisions of the chosen parts: parts by name, revisions from the oldest on. */
  readonly revisions: readonly { id: number; label: string }[];
}

export type FacetLabelsStore = ReturnType<typeof createFacetLabelsStore>;

export function createFacetLabelsStore(knex: Knex) {
  return {
    async labelsOf(wanted: {
      parts: string[];
      symptoms: string[];
      revisionsOfParts: string[];
    }): Promise<FacetLabels> {
      const [parts, symptoms, revisions] = await Promise.all([
        named(knex('parts').whereIn('slug', wanted.parts).select('slug', 'name'), wanted.parts),
        named(
          knex('symptoms').whereIn('slug', wanted.symptoms).select('slug', 'label as name'),
          wanted.symptoms,
        ),
        wanted.revisionsOfParts.length === 0
          ? []
          : knex('revisions as r')
              .join('parts as p', 'p.id', 'r.part_id')
              .whereIn('p.slug', wanted.revisionsOfParts)
              .orderBy(['p.name', 'p.id', 'r.position'])
              .select<{ id: number; name: string; label: string }[]>('r.id', 'p.name', 'r.label'),
      ]);
      return {
        parts,
        symptoms,
        revisions: revisions.map(({ id, name, label }) => ({ id, label: `${name} ${label}` })),
      };
    },

    /** Revisions by identity; unknown ones are left out. */
    async revisionsByIds(ids: readonly number[]): Promise<RevisionRef[]> {
      if (ids.length === 0) return [];
      return knex('revisions').whereIn('id', ids).select('id', 'part_id as partId', 'label');
    },
  };
}

async function named(query: Knex.QueryBuilder, wanted: readonly string[]): Promise<Map<string, string>> {
  if (wanted.length === 0) return new Map();
  const rows: { slug: string; name: string }[] = await query;
  return new Map(rows.map((row) => [row.slug, row.name]));
}
