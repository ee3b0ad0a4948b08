import type { Knex } from 'knex';
import type { PartKind } from '../../../shared/contract/vocabulary.js';

export interface TestPart {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
  readonly makerSlug: string;
  /** Oldest first. */
  readonly revisions: { readonly id: number; readonly label: string }[];
}

let made = 0;

/** A part of a maker of its own, with revisions of these labels from the oldest to the newest. */
export async function insertPart(
  knex: Knex,
  wish: { name?: string; maker?: string; kind?: PartKind; revisions?: readonly string[] } = {},
): Promise<TestPart> {
  made += 1;
  const name = wish.name ?? `Part ${made}`;
  const makerSlug = `maker-${made}`;
  const slug = `part-${made}`;
  const [makerId] = await knex('makers').insert({
    slug: makerSlug,
    name: wish.maker ?? `Maker ${made}`,
    about: '',
  });
  const [id] = await knex('parts').insert({
    slug,
    maker_id: makerId,
    name,
    kind: wish.kind ?? 'motor-bracket',
    about: `About ${name}.`,
  });
  const labels = wish.revisions ?? ['Rev A', 'Rev B'];
  await knex('revisions').insert(
    labels.map((label, position) => ({
      part_id: id,
      label,
      position,
      how_to_tell: `How to tell ${label}.`,
      what_changed: '',
      sold_from: position === 0 ? '2024-03-01' : null,
    })),
  );
  const revisions = await knex('revisions').where('part_id', id).orderBy('position').select('id', 'label');
  return { id: id!, slug, name, makerSlug, revisions };
}

/** A symptom of the controlled list. Returns its slug. */
export async function insertSymptom(knex: Knex, label = 'The bracket rocks'): Promise<string> {
  made += 1;
  const slug = `symptom-${made}`;
  await knex('symptoms').insert({ slug, label, group_name: 'Seat', position: made });
  return slug;
}
