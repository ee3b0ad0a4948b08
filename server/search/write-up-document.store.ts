import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { WriteUpDocument } from '../../shared/contract/search.js';
import type { PartKind, Standing } from '../../shared/contract/vocabulary.js';
import { fromJson, groupBy } from '../rows.js';
import { writeUpDocument } from './write-up-document.js';

interface EditionRow {
  id: number;
  slug: string;
  edition_id: number;
  content: unknown;
  published_at: Date;
}
interface SideRow {
  edition_id: number;
  id: number;
  slug: string;
  name: string;
  kind: PartKind;
  maker_id: number;
  maker_slug: string;
  maker_name: string;
}
interface RevisionRow {
  edition_id: number;
  id: number;
  part_id: number;
  label: string;
  holds: number;
}
interface SymptomRow {
  edition_id: number;
  slug: string;
  label: string;
}
interface FixRow {
  edition_id: number;
  fix_key: string;
  standing: Standing;
}
interface PhotoRow {
  id: number;
  hash: string;
  width: number;
  height: number;
  widths: unknown;
  placeholder: string;
  alt: string;
}

export type WriteUpDocumentStore = ReturnType<typeof createWriteUpDocumentStore>;

/** Reads published write-ups as documents of the index. */
export function createWriteUpDocumentStore(knex: Knex) {
  return {
    /** Documents of those write-ups that are published; the others are left out. Six queries, however many are asked for. */
    async documentsOf(writeUpIds: readonly number[]): Promise<Map<number, WriteUpDocument>> {
      const editions: (Omit<EditionRow, 'content'> & { content: EditionContent })[] = (
        await editionsOf(knex, writeUpIds)
      ).map((row) => ({
        ...row,
        content: fromJson<EditionContent>(row.content),
      }));
      if (editions.length === 0) return new Map();
      const editionIds = editions.map((edition) => edition.edition_id);
      const [sides, revisions, symptoms, fixes, photos] = await Promise.all([
        sidesOf(knex, editionIds),
        revisionsOf(knex, editionIds),
        symptomsOf(knex, editionIds),
        fixesOf(knex, editionIds),
        photosOf(
          knex,
          editions.flatMap(({ content }) => content.photos.slice(0, 1).map((use) => use.photoId)),
        ),
      ]);
      const sidesBy = groupBy(sides, (row) => row.edition_id);
      const revisionsBy = groupBy(revisions, (row) => row.edition_id);
      const symptomsBy = groupBy(symptoms, (row) => row.edition_id);
      const fixesBy = groupBy(fixes, (row) => row.edition_id);
      const photoBy = new Map(
        photos.map((photo) => [photo.id, { ...photo, widths: fromJson<number[]>(photo.widths) }]),
      );
      return new Map(
        editions.map(({ id, slug, edition_id: edition, content, published_at: publishedAt }) => [
          id,
          writeUpDocument({
            id,
            slug,
            content,
            publishedAt,
            parts: (sidesBy.get(edition) ?? []).map((row) => ({
              id: row.id,
              slug: row.slug,
              name: row.name,
              kind: row.kind,
              maker: { id: row.maker_id, slug: row.maker_slug, name: row.maker_name },
            })),
            revisions: (revisionsBy.get(edition) ?? []).map((row) => ({
              id: row.id,
              partId: row.part_id,
              label: row.label,
              holds: Boolean(row.holds),
            })),
            symptoms: symptomsBy.get(edition) ?? [],
            standings: new Map((fixesBy.get(edition) ?? []).map((row) => [row.fix_key, row.standing])),
            photo: photoBy.get(content.photos[0]?.photoId ?? 0),
          }),
        ]),
      );
    },

    /** Identities of write-ups that were ever published, ascending, from the one after `after` on. */
    async idsAfter(after: number, limit: number): Promise<number[]> {
      return knex('write_ups')
        .where('id', '>', after)
        .whereNotNull('slug')
        .orderBy('id')
        .limit(limit)
        .pluck('id');
    },
  };
}

function editionsOf(knex: Knex, writeUpIds: readonly number[]): Promise<EditionRow[]> {
  return knex('write_ups as w')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .whereIn('w.id', writeUpIds)
    .select('w.id', 'w.slug', 'e.id as edition_id', 'e.content', 'e.published_at');
}

function sidesOf(knex: Knex, editionIds: readonly number[]): Promise<SideRow[]> {
  return knex('edition_sides as s')
    .join('parts as p', 'p.id', 's.part_id')
    .join('makers as m', 'm.id', 'p.maker_id')
    .whereIn('s.edition_id', editionIds)
    .orderBy(['s.edition_id', 's.joint', 's.side'])
    .select(
      's.edition_id',
      'p.id',
      'p.slug',
      'p.name',
      'p.kind',
      'm.id as maker_id',
      'm.slug as maker_slug',
      'm.name as maker_name',
    );
}

function revisionsOf(knex: Knex, editionIds: readonly number[]): Promise<RevisionRow[]> {
  return knex('edition_revisions as er')
    .join('revisions as r', 'r.id', 'er.revision_id')
    .whereIn('er.edition_id', editionIds)
    .orderBy(['er.edition_id', 'r.part_id', 'r.position'])
    .select('er.edition_id', 'er.holds', 'r.id', 'r.part_id', 'r.label');
}

function symptomsOf(knex: Knex, editionIds: readonly number[]): Promise<SymptomRow[]> {
  return knex('edition_symptoms as es')
    .join('symptoms as s', 's.id', 'es.symptom_id')
    .whereIn('es.edition_id', editionIds)
    .orderBy(['es.edition_id', 's.position'])
    .select('es.edition_id', 's.slug', 's.label');
}

function fixesOf(knex: Knex, editionIds: readonly number[]): Promise<FixRow[]> {
  return knex('edition_fixes as ef')
    .join('fixes as f', 'f.id', 'ef.fix_id')
    .whereIn('ef.edition_id', editionIds)
    .orderBy(['ef.edition_id', 'ef.position'])
    .select('ef.edition_id', 'f.fix_key', 'f.standing');
}

function photosOf(knex: Knex, ids: readonly number[]): Promise<PhotoRow[]> {
  if (ids.length === 0) return Promise.resolve([]);
  return knex('photos')
    .whereIn('id', ids)
    .whereNull('taken_down_at')
    .select('id', 'hash', 'width', 'height', 'widths', 'placeholder', 'alt');
}
