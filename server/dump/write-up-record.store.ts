import type { Knex } from 'knex';
import type { WriteUpRecord } from '../../shared/contract/dump-records.js';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { Standing } from '../../shared/contract/vocabulary.js';
import { groupBy, fromJson } from '../rows.js';

/** Write-ups read at once: each carries its whole text. */
const batch = 50;

interface WriteUpRow {
  readonly id: number;
  readonly slug: string;
  readonly number: number;
  readonly content: unknown;
  readonly firstPublishedAt: Date;
  readonly publishedAt: Date;
}

/** Published editions as records: identities are replaced by addresses and names. Four queries for fifty. */
export async function* writeUpRecords(db: Knex): AsyncGenerator<WriteUpRecord> {
  for (let last = 0; ;) {
    const rows: WriteUpRow[] = await db('write_ups as w')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .where('w.id', '>', last)
      .orderBy('w.id')
      .limit(batch)
      .select('w.id', 'w.slug', 'e.number', 'e.content', {
        firstPublishedAt: 'w.first_published_at',
        publishedAt: 'e.published_at',
      });
    if (rows.length === 0) return;
    last = rows.at(-1)!.id;
    const contents = new Map(rows.map((row) => [row.id, fromJson<EditionContent>(row.content)]));
    const around = await surroundingsOf(db, contents);
    for (const row of rows) yield recordOf(row, contents.get(row.id)!, around);
  }
}

interface Surroundings {
  readonly authors: ReadonlyMap<number, string[]>;
  readonly parts: ReadonlyMap<number, string>;
  readonly revisions: ReadonlyMap<number, { part: string; revision: string }>;
  readonly standings: ReadonlyMap<string, Standing>;
  readonly photos: ReadonlyMap<number, { file: string; by: string }>;
}

async function surroundingsOf(
  db: Knex,
  contents: ReadonlyMap<number, EditionContent>,
): Promise<Surroundings> {
  const writeUpIds = [...contents.keys()];
  const texts = [...contents.values()];
  const sides = texts.flatMap((text) => text.joints.flatMap((joint) => [joint.a, joint.b]));
  const partIds = sides.flatMap((side) => side.partId ?? []);
  const photoIds = texts.flatMap((text) => text.photos.map((photo) => photo.photoId));
  const [authors, revisions, standings, photos]: [
    { writeUpId: number; name: string }[],
    { id: number; partId: number; part: string; revision: string }[],
    { writeUpId: number; key: string; standing: Standing }[],
    { id: number; hash: string; widths: unknown; by: string }[],
  ] = await Promise.all([
    db('editions as e')
      .join('accounts as a', 'a.id', 'e.author_id')
      .whereIn('e.write_up_id', writeUpIds)
      .where('e.state', 'published')
      .orderBy('e.number')
      .select({ writeUpId: 'e.write_up_id', name: 'a.display_name' }),
    db('parts as p')
      .leftJoin('revisions as r', 'r.part_id', 'p.id')
      .whereIn('p.id', partIds)
      .select({ id: 'r.id', partId: 'p.id', part: 'p.slug', revision: 'r.label' }),
    db('fixes')
      .whereIn('write_up_id', writeUpIds)
      .select('standing', { writeUpId: 'write_up_id', key: 'fix_key' }),
    db('photos as f')
      .join('accounts as a', 'a.id', 'f.owner_id')
      .whereIn('f.id', photoIds)
      .whereNull('f.taken_down_at')
      .select('f.id', 'f.hash', 'f.widths', { by: 'a.display_name' }),
  ]);
  return {
    authors: new Map(
      [...groupBy(authors, (row) => row.writeUpId)].map(([id, rows]) => [
        id,
        [...new Set(rows.map((row) => row.name))],
      ]),
    ),
    parts: new Map(revisions.map((row) => [row.partId, row.part])),
    revisions: new Map(revisions.map(({ id, part, revision }) => [id, { part, revision }])),
    standings: new Map(standings.map((row) => [`${row.writeUpId} ${row.key}`, row.standing])),
    photos: new Map(
      photos.map(({ id, hash, widths, by }) => [
        id,
        { file: `/photos/${hash}-${Math.max(...fromJson<number[]>(widths))}.webp`, by },
      ]),
    ),
  };
}

function recordOf(row: WriteUpRow, text: EditionContent, around: Surroundings): WriteUpRecord {
  const revisionOf = (id: number) => around.revisions.get(id) ?? [];
  const sideOf = ({ partId, feature, revisions }: EditionContent['joints'][number]['a']) => {
    const marked = (holds: boolean) =>
      revisions
        .filter((mark) => mark.holds === holds)
        .flatMap((mark) => around.revisions.get(mark.revisionId)?.revision ?? []);
    const part = partId === null ? undefined : around.parts.get(partId);
    return part === undefined ? [] : [{ part, feature, holdsFor: marked(true), notFor: marked(false) }];
  };
  return {
    kind: 'write-up',
    slug: row.slug,
    edition: row.number,
    authors: around.authors.get(row.id) ?? [],
    firstPublishedAt: row.firstPublishedAt.toISOString(),
    publishedAt: row.publishedAt.toISOString(),
    title: text.title,
    summary: text.summary,
    joints: text.joints.map((joint) => [...sideOf(joint.a), ...sideOf(joint.b)]),
    symptoms: text.symptoms,
    noticed: text.noticed,
    cause: text.cause,
    readings: text.readings.map(({ key: _, revisionId, ...reading }) => ({
      ...reading,
      of: (revisionId === null ? undefined : around.revisions.get(revisionId)) ?? null,
    })),
    fixes: text.fixes.map((fix) => ({
      key: fix.key,
      title: fix.title,
      kind: fix.kind,
      permanence: fix.permanence,
      standing: around.standings.get(`${row.id} ${fix.key}`) ?? 'told',
      why: fix.why,
      tools: fix.tools,
      materials: fix.materials,
      steps: fix.steps.map((step) => step.text),
      revisions: fix.revisionIds.flatMap(revisionOf),
      afterwards: fix.afterwards,
      afterwardsNote: fix.afterwardsNote,
      acceptance: fix.acceptance,
    })),
    photos: text.photos.flatMap(({ photoId, alt, caption }) => {
      const photo = around.photos.get(photoId);
      return photo ? [{ file: photo.file, alt, caption, by: photo.by }] : [];
    }),
    sources: text.sources,
  };
}
