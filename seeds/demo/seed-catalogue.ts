import type { Knex } from 'knex';
import { demoCautionLibrary } from './caution-library.js';
import { idsFrom, insertRows } from './ids.js';
import { demoMakers } from './makers.js';
import { priceBands } from './measured/prices.js';
import { processOf } from './measured/process.js';
import { demoParts } from './parts.js';
import { slugOf } from './slug.js';
import { demoSymptoms } from './symptoms.js';

/** Identities of what write-ups point at. */
export interface Catalogue {
  readonly parts: ReadonlyMap<string, number>;
  /** By `part:letter`. */
  readonly revisions: ReadonlyMap<string, number>;
  /** By `part/name`. */
  readonly features: ReadonlyMap<string, number>;
  readonly symptoms: ReadonlyMap<string, number>;
  readonly cautions: ReadonlyMap<string, number>;
}

/** Inserts makers, parts, revisions, features, symptoms and the caution library. */
export async function seedCatalogue(knex: Knex, partPhotos: ReadonlyMap<string, number>): Promise<Catalogue> {
  const makers = await identified(knex, 'makers', demoMakers);
  await insertRows(
    knex,
    'makers',
    demoMakers.map(({ slug, name, about }) => ({
      id: makers.get(slug),
      slug,
      name,
      about,
      mail_domain: `${slug}.example`,
      contact_address: `workshop@${slug}.example`,
    })),
  );

  const parts = await identified(knex, 'parts', demoParts);
  await insertRows(
    knex,
    'parts',
    demoParts.map((part) => ({
      id: parts.get(part.slug),
      slug: part.slug,
      maker_id: known(makers, part.maker),
      name: part.name,
      kind: part.kind,
      about: part.about,
      photo_id: partPhotos.get(part.slug) ?? null,
      price_band: priceBands[part.slug] ?? null,
    })),
  );

  const revisions = await seedRevisions(knex, parts);
  const features = await seedFeatures(knex, parts);

  const symptoms = await identified(knex, 'symptoms', demoSymptoms);
  await insertRows(
    knex,
    'symptoms',
    demoSymptoms.map(({ slug, label, group }, position) => ({
      id: symptoms.get(slug),
      slug,
      label,
      group_name: group,
      position,
    })),
  );

  const cautions = await identified(knex, 'caution_library', demoCautionLibrary);
  await insertRows(
    knex,
    'caution_library',
    demoCautionLibrary.map((entry, position) => ({
      id: cautions.get(entry.slug),
      slug: entry.slug,
      name: entry.name,
      signal_word: entry.signalWord,
      hazards: JSON.stringify(entry.hazards),
      hazard: entry.hazard,
      consequence: entry.consequence,
      avoidance: entry.avoidance,
      position,
    })),
  );
  // Its history begins with what is there.
  await knex.raw(`
    INSERT INTO caution_library_versions
      (library_id, version, \`change\`, name, signal_word, hazards, hazard, consequence, avoidance, changed_at, why)
    SELECT id, version, 'added', name, signal_word, hazards, hazard, consequence, avoidance, UTC_TIMESTAMP(3), ''
    FROM caution_library
  `);
  return { parts, revisions, features, symptoms, cautions };
}

async function seedRevisions(knex: Knex, parts: ReadonlyMap<string, number>): Promise<Map<string, number>> {
  const nextId = await idsFrom(knex, 'revisions');
  const ids = new Map<string, number>();
  const rows = demoParts.flatMap((part) =>
    part.revisions.map((revision, position) => {
      const id = nextId();
      ids.set(`${part.slug}:${revision.label.replace('Rev ', '')}`, id);
      return {
        id,
        part_id: parts.get(part.slug),
        label: revision.label,
        position,
        sold_from: revision.from,
        sold_to: revision.to,
        how_to_tell: revision.tell,
        what_changed: revision.changed,
      };
    }),
  );
  await insertRows(knex, 'revisions', rows);
  return ids;
}

async function seedFeatures(knex: Knex, parts: ReadonlyMap<string, number>): Promise<Map<string, number>> {
  const nextId = await idsFrom(knex, 'features');
  const ids = new Map<string, number>();
  const rows = demoParts.flatMap((part) =>
    part.features.map(({ kind, name }) => {
      const id = nextId();
      ids.set(`${part.slug}/${name}`, id);
      return {
        id,
        part_id: parts.get(part.slug),
        slug: slugOf(name),
        name,
        kind,
        process: processOf(part),
      };
    }),
  );
  await insertRows(knex, 'features', rows);
  return ids;
}

async function identified(
  knex: Knex,
  table: string,
  items: readonly { readonly slug: string }[],
): Promise<Map<string, number>> {
  const nextId = await idsFrom(knex, table);
  return new Map(items.map((item) => [item.slug, nextId()]));
}

/** The identity for a key. Throws when the demo names something that it does not contain. */
export function known(ids: ReadonlyMap<string, number>, key: string): number {
  const id = ids.get(key);
  if (id === undefined) throw new Error(`The demo names “${key}”, which it does not contain.`);
  return id;
}
