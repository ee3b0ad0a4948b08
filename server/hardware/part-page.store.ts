import type { Knex } from 'knex';
import type { Feature, PartPage } from '../../shared/contract/hardware.js';
import { fromJson, groupBy } from '../rows.js';
import type { RevisionStore } from './revision.store.js';

export type PartPageStore = ReturnType<typeof createPartPageStore>;

/** Read model of the part's page: one query for the part, then three side by side. */
export function createPartPageStore(knex: Knex, revisions: RevisionStore) {
  return {
    async partPage(slug: string): Promise<PartPage | undefined> {
      const part = await knex('parts as p')
        .join('makers as m', 'm.id', 'p.maker_id')
        .leftJoin('photos as f', (on) => on.on('f.id', 'p.photo_id').andOnNull('f.taken_down_at'))
        .where('p.slug', slug)
        .first('p.id', 'p.slug', 'p.name', 'p.kind', 'p.about', {
          makerId: 'm.id',
          makerSlug: 'm.slug',
          makerName: 'm.name',
          hash: 'f.hash',
          alt: 'f.alt',
          width: 'f.width',
          height: 'f.height',
          widths: 'f.widths',
          placeholder: 'f.placeholder',
        });
      if (!part) return undefined;
      const [ofPart, features, writeUps] = await Promise.all([
        revisions.ofPart(part.id),
        featuresOf(knex, part.id),
        writeUpsOn(knex, part.id),
      ]);
      const { hash, alt, width, height, widths, placeholder } = part;
      return {
        id: part.id,
        slug: part.slug,
        name: part.name,
        kind: part.kind,
        maker: { id: part.makerId, slug: part.makerSlug, name: part.makerName },
        about: part.about,
        photo: hash === null ? null : { hash, alt, width, height, widths: fromJson(widths), placeholder },
        revisions: ofPart,
        features,
        writeUps,
      };
    },
  };
}

async function featuresOf(knex: Knex, partId: number): Promise<Feature[]> {
  return knex('features')
    .select('id', 'slug', 'name', 'kind')
    .where('part_id', partId)
    .orderBy(['name', 'id']);
}

/** Published write-ups with a joint on the part, the newest first, and for which of its revisions they hold. */
async function writeUpsOn(knex: Knex, partId: number): Promise<PartPage['writeUps']> {
  const rows: { slug: string; title: string; label: string | null; holds: number | null }[] = await knex(
    'edition_sides as s',
  )
    .join('write_ups as w', 'w.published_edition_id', 's.edition_id')
    .join('editions as e', 'e.id', 's.edition_id')
    .leftJoin(
      knex('edition_revisions as er')
        .join('revisions as r', 'r.id', 'er.revision_id')
        .where('r.part_id', partId)
        .select('er.edition_id', 'er.holds', 'r.label', 'r.position')
        .as('mark'),
      'mark.edition_id',
      's.edition_id',
    )
    .where('s.part_id', partId)
    .distinct('w.slug', 'e.title', 'mark.label', 'mark.holds', 'e.published_at', 'mark.position', 'w.id')
    .orderBy([{ column: 'e.published_at', order: 'desc' }, { column: 'w.id' }, { column: 'mark.position' }]);
  return [...groupBy(rows, (row) => row.slug)].map(([slug, marks]) => ({
    slug,
    title: marks[0]!.title,
    holdsFor: marks.flatMap((mark) => (mark.label !== null && Boolean(mark.holds) ? [mark.label] : [])),
    notFor: marks.flatMap((mark) => (mark.label !== null && !mark.holds ? [mark.label] : [])),
  }));
}
