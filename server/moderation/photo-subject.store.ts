import type { Knex } from 'knex';
import type { DeskSubject } from '../../shared/contract/desk-subjects.js';
import { fromJson } from '../rows.js';
import { takenDownColumns } from '../taken-down.js';
import { person, writtenBy, type Written } from './written-by.js';

/** A photo, with a page on which it stands. */
export async function readPhoto(db: Knex, id: number): Promise<DeskSubject | undefined> {
  const row:
    | (Written & {
        hash: string;
        width: number;
        height: number;
        widths: unknown;
        placeholder: string;
        alt: string;
        partSlug: string | null;
        writeUpSlug: string | null;
        questionSlug: string | null;
      })
    | undefined = await db('photos as f')
    .join('accounts as a', 'a.id', 'f.owner_id')
    .where('f.id', id)
    .first('f.id', 'f.hash', 'f.width', 'f.height', 'f.widths', 'f.placeholder', 'f.alt', {
      ...person,
      ...takenDownColumns('f'),
      partSlug: partThatShows(db),
      writeUpSlug: writeUpThatShows(db),
      questionSlug: questionThatShows(db),
    });
  if (!row) return undefined;
  const { hash, width, height, placeholder, alt } = row;
  return {
    ...writtenBy('photo', row),
    title: `Photo: ${alt}`,
    text: alt,
    path: pageOf(row),
    photo: { id, hash, width, height, widths: fromJson<number[]>(row.widths), placeholder, alt },
  };
}

/** Where a photo stands; one that stands nowhere leads to the start. */
function pageOf(row: {
  partSlug: string | null;
  writeUpSlug: string | null;
  questionSlug: string | null;
}): string {
  if (row.partSlug !== null) return `/parts/${row.partSlug}`;
  if (row.questionSlug !== null) return `/questions/${row.questionSlug}`;
  return row.writeUpSlug === null ? '/' : `/write-ups/${row.writeUpSlug}`;
}

/** A part on whose page the photo stands, with one of its revisions or readings. */
function partThatShows(db: Knex): Knex.QueryBuilder {
  return db('parts as p')
    .whereIn(
      'p.id',
      db('revision_photos as rp')
        .join('revisions as v', 'v.id', 'rp.revision_id')
        .where('rp.photo_id', db.ref('f.id'))
        .select('v.part_id')
        .unionAll(
          db('measurements as m')
            .join('revisions as v', 'v.id', 'm.revision_id')
            .where('m.photo_id', db.ref('f.id'))
            .select('v.part_id'),
        ),
    )
    .orderBy('p.id')
    .limit(1)
    .select('p.slug');
}

function writeUpThatShows(db: Knex): Knex.QueryBuilder {
  return db('edition_photos as ep')
    .join('write_ups as w', 'w.published_edition_id', 'ep.edition_id')
    .where('ep.photo_id', db.ref('f.id'))
    .orderBy('w.id')
    .limit(1)
    .select('w.slug');
}

function questionThatShows(db: Knex): Knex.QueryBuilder {
  return db('questions as q')
    .whereIn(
      'q.id',
      db('question_photos as qp')
        .where('qp.photo_id', db.ref('f.id'))
        .select('qp.question_id')
        .unionAll(
          db('question_reply_photos as rp')
            .join('question_replies as r', 'r.id', 'rp.reply_id')
            .where('rp.photo_id', db.ref('f.id'))
            .select('r.question_id'),
        ),
    )
    .orderBy('q.id')
    .limit(1)
    .select('q.slug');
}
