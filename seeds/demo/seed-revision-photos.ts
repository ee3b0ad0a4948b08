import type { Knex } from 'knex';
import { insertRows } from './ids.js';
import { demoRevisionDrawings } from './revision-drawings.js';
import { known, type Catalogue } from './seed-catalogue.js';

/** Shows each drawing at its revision; `photos` are stored ones by `part:letter`. */
export async function seedRevisionPhotos(
  knex: Knex,
  { catalogue, photos }: { catalogue: Catalogue; photos: ReadonlyMap<string, number> },
): Promise<void> {
  const rows = demoRevisionDrawings.map(({ part, letter, caption }) => ({
    revision_id: known(catalogue.revisions, `${part}:${letter}`),
    photo_id: known(photos, `${part}:${letter}`),
    position: 0,
    caption,
  }));
  await insertRows(knex, 'revision_photos', rows);
}
