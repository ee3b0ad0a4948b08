import type { Knex } from 'knex';
import type { BodyRecord } from '../../shared/contract/dump-records.js';
import { fromJson } from '../rows.js';
import { writeUpRecords } from './write-up-record.store.js';

/** Rows read at once. */
const batch = 500;

type Row = Record<string, unknown> & { cursor: number };

/** Reads `rows` on by the column that is called `cursor`, a batch at a time. */
async function* inBatches(rowsAfter: (cursor: number) => PromiseLike<Row[]>): AsyncGenerator<Row[]> {
  let cursor = 0;
  for (;;) {
    const rows = await rowsAfter(cursor);
    if (rows.length === 0) return;
    yield rows;
    cursor = rows.at(-1)!.cursor;
  }
}

/** Everything that is published, in an order in which what is pointed at comes first. */
export async function* publishedRecords(db: Knex): AsyncGenerator<BodyRecord> {
  for (const { kind, rows, json = [], flags = [] } of sources(db)) {
    for await (const found of inBatches(rows)) {
      for (const { cursor: _, ...row } of found) {
        const value = ([name, raw]: [string, unknown]): [string, unknown] => {
          if (raw === null) return [name, null];
          if (json.includes(name)) return [name, fromJson(raw)];
          if (flags.includes(name)) return [name, Boolean(raw)];
          return [name, raw instanceof Date ? raw.toISOString() : raw];
        };
        yield { kind, ...Object.fromEntries(Object.entries(row).map(value)) } as BodyRecord;
      }
    }
    if (kind === 'fit-report') yield* writeUpRecords(db);
  }
}

interface Source {
  readonly kind: BodyRecord['kind'];
  readonly rows: (cursor: number) => PromiseLike<Row[]>;
  readonly json?: readonly string[];
  readonly flags?: readonly string[];
}

/** One query for each kind of record; its columns are the members of the record. */
function sources(db: Knex): Source[] {
  const from = (table: string, cursor: number) =>
    db({ t: table }).where('t.id', '>', cursor).orderBy('t.id').limit(batch).select({ cursor: 't.id' });
  const credited = (table: string, cursor: number) =>
    from(table, cursor)
      .join('accounts as a', 'a.id', 't.account_id')
      .select({ by: 'a.display_name', at: 't.created_at' });
  const ofFeature = { part: 'p.slug', feature: 'f.slug', revision: 'r.label', dimension: 't.dimension' };
  const revisionList = (table: string, owner: string): Knex.Raw =>
    db.raw(
      `COALESCE((SELECT JSON_ARRAYAGG(JSON_OBJECT('part', p.slug, 'revision', r.label)) FROM ?? x
        JOIN revisions r ON r.id = x.revision_id JOIN parts p ON p.id = r.part_id WHERE ?? = t.id), '[]') AS revisions`,
      [table, `x.${owner}`],
    );
  const published = (cursor: number) =>
    db('write_ups as w').whereNotNull('w.published_edition_id').where('t.id', '>', cursor);

  return [
    { kind: 'maker', rows: (cursor) => from('makers', cursor).select('t.slug', 't.name', 't.about') },
    {
      kind: 'part',
      rows: (cursor) =>
        from('parts', cursor)
          .join('makers as m', 'm.id', 't.maker_id')
          .select('t.slug', 't.name', 't.about', {
            maker: 'm.slug',
            partKind: 't.kind',
            priceBand: 't.price_band',
          }),
    },
    {
      kind: 'revision',
      rows: (cursor) =>
        from('revisions', cursor)
          .join('parts as p', 'p.id', 't.part_id')
          .select('t.label', 't.position', 't.state', {
            part: 'p.slug',
            soldFrom: 't.sold_from',
            soldTo: 't.sold_to',
            howToTell: 't.how_to_tell',
            whatChanged: 't.what_changed',
          }),
    },
    {
      kind: 'feature',
      rows: (cursor) =>
        from('features', cursor)
          .join('parts as p', 'p.id', 't.part_id')
          .select('t.slug', 't.name', 't.process', { part: 'p.slug', featureKind: 't.kind' }),
    },
    {
      kind: 'consensus',
      flags: ['thin'],
      // Has no identity of its own: read on by feature, each with all it has.
      rows: (cursor) =>
        db('consensus as t')
          .join('features as f', 'f.id', 't.feature_id')
          .join('parts as p', 'p.id', 'f.part_id')
          .join('revisions as r', 'r.id', 't.revision_id')
          .whereIn('t.feature_id', featuresAfter(cursor))
          .orderBy(['t.feature_id', 't.revision_id', 't.dimension'])
          .select('t.count', 't.mean', 't.uncertainty', 't.thin', { ...ofFeature, cursor: 't.feature_id' }),
    },
    {
      kind: 'reading',
      json: ['entered'],
      rows: (cursor) =>
        credited('measurements', cursor)
          .join('features as f', 'f.id', 't.feature_id')
          .join('parts as p', 'p.id', 'f.part_id')
          .join('revisions as r', 'r.id', 't.revision_id')
          .whereNull('t.set_aside_at')
          .select('t.value', 't.uncertainty', 't.entered', 't.unit', 't.instrument', ofFeature),
    },
    {
      kind: 'joint',
      json: ['a', 'b'],
      rows: (cursor) =>
        from('joints', cursor).select('t.slug', 't.name', { jointKind: 't.kind' }, sideOf('a'), sideOf('b')),
    },
    {
      kind: 'fit-report',
      flags: ['sat'],
      rows: (cursor) =>
        credited('fit_reports', cursor)
          .join('joints as j', 'j.id', 't.joint_id')
          .join('revisions as ra', 'ra.id', 't.revision_a')
          .join('revisions as rb', 'rb.id', 't.revision_b')
          .whereNull('t.taken_down_at')
          .select('t.sat', 't.note', { joint: 'j.slug', revisionA: 'ra.label', revisionB: 'rb.label' }),
    },
    {
      kind: 'caution',
      json: ['hazards'],
      rows: (cursor) =>
        published(cursor)
          .join('cautions as t', 't.write_up_id', 'w.id')
          .leftJoin('fixes as f', 'f.id', 't.fix_id')
          .whereNull('t.removed_at')
          .orderBy('t.id')
          .limit(batch)
          .select('t.hazards', 't.hazard', 't.consequence', 't.avoidance', {
            cursor: 't.id',
            writeUp: 'w.slug',
            fix: 'f.fix_key',
            step: 't.step_key',
            signalWord: 't.signal_word',
            at: 't.placed_at',
          }),
    },
    {
      kind: 'trial',
      json: ['revisions'],
      rows: (cursor) =>
        credited('trials', cursor)
          .join('fixes as f', 'f.id', 't.fix_id')
          .join('write_ups as w', 'w.id', 'f.write_up_id')
          .whereNotNull('w.published_edition_id')
          .whereNull('t.taken_down_at')
          .select(
            't.outcome',
            't.note',
            't.figure',
            { writeUp: 'w.slug', fix: 'f.fix_key' },
            revisionList('trial_revisions', 'trial_id'),
          ),
    },
    {
      kind: 'question',
      json: ['readings', 'parts', 'settledBy'],
      rows: (cursor) =>
        credited('questions', cursor)
          .leftJoin('write_ups as w', 'w.id', 't.settled_write_up_id')
          .whereNull('t.taken_down_at')
          .whereNotNull('t.slug')
          .select(
            't.slug',
            't.title',
            't.text',
            't.readings',
            db.raw(`COALESCE((SELECT JSON_ARRAYAGG(JSON_OBJECT('part', p.slug, 'revision', r.label) ORDER BY x.position) FROM question_parts x
              JOIN parts p ON p.id = x.part_id LEFT JOIN revisions r ON r.id = x.revision_id WHERE x.question_id = t.id), '[]') AS parts`),
            db.raw(
              `IF(w.published_edition_id IS NULL, NULL, JSON_OBJECT('writeUp', w.slug, 'fix', t.settled_fix_key)) AS settledBy`,
            ),
          ),
    },
    {
      kind: 'reply',
      rows: (cursor) =>
        credited('question_replies', cursor)
          .join('questions as q', 'q.id', 't.question_id')
          .whereNull('t.taken_down_at')
          .whereNull('q.taken_down_at')
          .select('t.text', { question: 'q.slug' }),
    },
  ];

  /** The next features with a consensus; wrapped, since the database takes no limit in a list of its own. */
  function featuresAfter(cursor: number): Knex.QueryBuilder {
    const next = db('consensus')
      .where('feature_id', '>', cursor)
      .distinct('feature_id')
      .orderBy('feature_id')
      .limit(100);
    return db.select('feature_id').from(next.as('next'));
  }

  function sideOf(side: 'a' | 'b'): Knex.Raw {
    return db.raw(
      `(SELECT JSON_OBJECT('part', p.slug, 'feature', f.slug) FROM features f JOIN parts p ON p.id = f.part_id
        WHERE f.id = ??) AS ??`,
      [`t.feature_${side}`, side],
    );
  }
}
