import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { DeskSubject, DeskSubjectKind } from '../../shared/contract/desk-subjects.js';
import { trialOutcomeWords, type TrialOutcome } from '../../shared/contract/vocabulary.js';
import { fromJson } from '../rows.js';
import { takenDownColumns } from '../taken-down.js';
import { readPhoto } from './photo-subject.store.js';
import { person, writtenBy, type Writer, type Written } from './written-by.js';

/** Reads the thing of one kind and identity; undefined where there is none. */
type Reader = (db: Knex, id: number) => Promise<DeskSubject | undefined>;

const readers: Record<DeskSubjectKind, Reader> = {
  async question(db, id) {
    const row: (Written & { slug: string; title: string; text: string }) | undefined = await db(
      'questions as q',
    )
      .join('accounts as a', 'a.id', 'q.account_id')
      .where('q.id', id)
      .first('q.id', 'q.slug', 'q.title', 'q.text', { ...person, ...takenDownColumns('q') });
    return (
      row && {
        ...writtenBy('question', row),
        title: `Question “${row.title}”`,
        text: row.text,
        path: `/questions/${row.slug}`,
      }
    );
  },

  async reply(db, id) {
    const row: (Written & { slug: string; title: string; text: string }) | undefined = await db(
      'question_replies as r',
    )
      .join('questions as q', 'q.id', 'r.question_id')
      .join('accounts as a', 'a.id', 'r.account_id')
      .where('r.id', id)
      .first('r.id', 'q.slug', 'q.title', 'r.text', { ...person, ...takenDownColumns('r') });
    return (
      row && {
        ...writtenBy('reply', row),
        title: `Reply to “${row.title}”`,
        text: row.text,
        path: `/questions/${row.slug}`,
      }
    );
  },

  async trial(db, id) {
    const row:
      | (Written & {
          slug: string;
          title: string;
          outcome: TrialOutcome;
          note: string;
          figure: number | null;
        })
      | undefined = await db('trials as t')
      .join('fixes as f', 'f.id', 't.fix_id')
      .join('write_ups as w', 'w.id', 'f.write_up_id')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .join('accounts as a', 'a.id', 't.account_id')
      .where('t.id', id)
      .first('t.id', 'w.slug', 'e.title', 't.outcome', 't.note', 't.figure', {
        ...person,
        ...takenDownColumns('t'),
      });
    return (
      row && {
        ...writtenBy('trial', row),
        title: `Trial on “${row.title}”`,
        text: [
          trialOutcomeWords[row.outcome],
          row.figure === null ? '' : `figure reached: ${row.figure}`,
          row.note,
        ]
          .filter(Boolean)
          .join('\n'),
        path: `/write-ups/${row.slug}`,
      }
    );
  },

  async 'fit-report'(db, id) {
    const row: (Written & { slug: string; name: string; sat: number; note: string }) | undefined = await db(
      'fit_reports as r',
    )
      .join('joints as j', 'j.id', 'r.joint_id')
      .join('accounts as a', 'a.id', 'r.account_id')
      .where('r.id', id)
      .first('r.id', 'j.slug', 'j.name', 'r.sat', 'r.note', { ...person, ...takenDownColumns('r') });
    return (
      row && {
        ...writtenBy('fit-report', row),
        title: `Fit report on “${row.name}”`,
        text: [row.sat ? 'sat as delivered' : 'did not sit as delivered', row.note]
          .filter(Boolean)
          .join('\n'),
        path: `/joints/${row.slug}`,
      }
    );
  },

  async reading(db, id) {
    const row:
      | (Written & {
          slug: string;
          part: string;
          revision: string;
          feature: string;
          dimension: string;
          entered: unknown;
          unit: string;
          instrument: string;
        })
      | undefined = await db('measurements as m')
      .join('features as f', 'f.id', 'm.feature_id')
      .join('parts as p', 'p.id', 'f.part_id')
      .join('revisions as v', 'v.id', 'm.revision_id')
      .join('accounts as a', 'a.id', 'm.account_id')
      .where('m.id', id)
      .first('m.id', 'p.slug', 'm.dimension', 'm.entered', 'm.unit', 'm.instrument', {
        part: 'p.name',
        revision: 'v.label',
        feature: 'f.name',
        takenDownAt: 'm.set_aside_at',
        takenDownReason: 'm.set_aside_reason',
        ...person,
      });
    return (
      row && {
        ...writtenBy('reading', row),
        title: `Reading: ${row.dimension} of ${row.feature} on ${row.part} ${row.revision}`,
        text: `${fromJson<number[]>(row.entered).join(', ')} ${row.unit}, ${row.instrument}`,
        path: `/parts/${row.slug}`,
      }
    );
  },

  photo: readPhoto,

  async 'write-up'(db, id) {
    const row: (Writer & { slug: string; title: string; content: unknown }) | undefined = await publishedOf(
      db,
    )
      .where('w.id', id)
      .first();
    return (
      row && {
        ...writtenBy('write-up', { ...row, takenDownAt: null, takenDownReason: null }),
        title: `Write-up “${row.title}”`,
        text: fromJson<EditionContent>(row.content).summary,
        path: `/write-ups/${row.slug}`,
      }
    );
  },

  async fix(db, id) {
    const row: (Writer & { slug: string; title: string; content: unknown; key: string }) | undefined =
      await publishedOf(db)
        .join('fixes as f', 'f.write_up_id', 'w.id')
        .where('f.id', id)
        .select({ key: 'f.fix_key' })
        .first();
    if (!row) return undefined;
    const fix = fromJson<EditionContent>(row.content).fixes.find((each) => each.key === row.key);
    return {
      ...writtenBy('fix', { ...row, id, takenDownAt: null, takenDownReason: null }),
      title: `Fix “${fix?.title ?? 'that the published edition no longer has'}” of “${row.title}”`,
      text: fix ? [fix.why, ...fix.steps.map((step) => step.text)].filter(Boolean).join('\n\n') : '',
      path: `/write-ups/${row.slug}`,
    };
  },
};

/** The thing of that kind and identity, for whoever may look at the desk; undefined where there is none. */
export function readSubject(
  db: Knex,
  { kind, id }: { kind: DeskSubjectKind; id: number },
): Promise<DeskSubject | undefined> {
  return readers[kind](db, id);
}

/** The identity of a fix of a published write-up, by its key. */
export async function fixIdOf(db: Knex, writeUpId: number, fixKey: string): Promise<number | undefined> {
  const row: { id: number } | undefined = await db('fixes')
    .where({ write_up_id: writeUpId, fix_key: fixKey })
    .first('id');
  return row?.id;
}

function publishedOf(db: Knex): Knex.QueryBuilder {
  return db('write_ups as w')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .join('accounts as a', 'a.id', 'e.author_id')
    .select('w.id', 'w.slug', 'e.title', 'e.content', person);
}
