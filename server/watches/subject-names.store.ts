import type { Knex } from 'knex';
import type { WatchSubject } from '../../shared/contract/watches.js';

export interface SubjectRef {
  readonly subject: WatchSubject;
  readonly id: number;
}

export interface SubjectName {
  readonly name: string;
  /** Address within the site. */
  readonly path: string;
}

interface NameRow {
  readonly id: number;
  readonly name: string;
  readonly path: string;
}

export function subjectKey({ subject, id }: SubjectRef): string {
  return `${subject}/${id}`;
}

/** The reference that a key of a watch holds. */
export function subjectOfKey(key: string): SubjectRef {
  const [subject, id] = key.split('/') as [WatchSubject, string];
  return { subject, id: Number(id) };
}

/** What everybody may read of them, by key; what is not there, not published or taken down is missing. One query a kind at most. */
export async function namesOf(
  db: Knex,
  wanted: readonly SubjectRef[],
): Promise<ReadonlyMap<string, SubjectName>> {
  const kinds = [...new Set(wanted.map(({ subject }) => subject))];
  const found = await Promise.all(
    kinds.map(async (subject) => {
      const ids = [...new Set(wanted.filter((ref) => ref.subject === subject).map(({ id }) => id))];
      const rows = (await readers[subject](db, ids)) as NameRow[];
      return rows.map(({ id, name, path }) => [subjectKey({ subject, id }), { name, path }] as const);
    }),
  );
  return new Map(found.flat());
}

const readers: Record<WatchSubject, (db: Knex, ids: readonly number[]) => PromiseLike<unknown>> = {
  part: (db, ids) =>
    db('parts')
      .whereIn('id', ids)
      .select('id', 'name', { path: db.raw("CONCAT('/parts/', slug)") }),
  revision: (db, ids) =>
    db('revisions as r')
      .join('parts as p', 'p.id', 'r.part_id')
      .whereIn('r.id', ids)
      .select('r.id', {
        name: db.raw("CONCAT(p.name, ' ', r.label)"),
        path: db.raw("CONCAT('/parts/', p.slug)"),
      }),
  joint: (db, ids) =>
    db('joints')
      .whereIn('id', ids)
      .select('id', 'name', { path: db.raw("CONCAT('/joints/', slug)") }),
  'write-up': (db, ids) =>
    db('write_ups as w')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .whereIn('w.id', ids)
      .select('w.id', { name: 'e.title', path: db.raw("CONCAT('/write-ups/', w.slug)") }),
  question: (db, ids) =>
    db('questions')
      .whereIn('id', ids)
      .whereNull('taken_down_at')
      .select('id', { name: 'title', path: db.raw("CONCAT('/questions/', slug)") }),
};
