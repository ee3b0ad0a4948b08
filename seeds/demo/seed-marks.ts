import type { Knex } from 'knex';
import { idsFrom, insertRows } from './ids.js';
import { demoMarks } from './marks.js';
import type { Catalogue } from './seed-catalogue.js';

/** Inserts the marks by which the demo's revisions can be told apart. */
export async function seedMarks(knex: Knex, { parts, revisions }: Catalogue): Promise<void> {
  const nextId = await idsFrom(knex, 'revision_marks');
  const marks = Object.entries(demoMarks).flatMap(([slug, list]) =>
    list.map(({ text, on }) => ({ id: nextId(), slug, text, on })),
  );
  await insertRows(
    knex,
    'revision_marks',
    marks.map(({ id, slug, text }) => {
      const part = parts.get(slug);
      if (part === undefined) throw new Error(`The marks name a part that is not in the demo: ${slug}`);
      return { id, part_id: part, text };
    }),
  );
  const answers = marks.flatMap(({ id, slug, on }) =>
    [...revisions]
      .filter(([name]) => name.startsWith(`${slug}:`))
      .map(([name, revisionId]) => ({
        mark_id: id,
        revision_id: revisionId,
        shows: on.includes(name.slice(slug.length + 1)),
      })),
  );
  await insertRows(knex, 'revision_mark_answers', answers);
}
