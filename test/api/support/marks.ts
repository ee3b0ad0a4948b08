import type { Knex } from 'knex';
import type { TestPart } from './catalogue.js';

/** A mark of the part; the answers go with its revisions from the oldest on, null where it is not known. */
export async function insertMark(
  knex: Knex,
  part: TestPart,
  text: string,
  answers: readonly (boolean | null)[],
): Promise<number> {
  const [id] = (await knex('revision_marks').insert({ part_id: part.id, text })) as [number];
  const rows = answers.flatMap((shows, at) =>
    shows === null ? [] : [{ mark_id: id, revision_id: part.revisions[at]!.id, shows }],
  );
  await knex('revision_mark_answers').insert(rows);
  return id;
}
