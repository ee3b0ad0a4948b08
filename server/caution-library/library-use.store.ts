import type { Knex } from 'knex';
import type { LibraryCaution } from '../../shared/contract/moderation.js';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { fromJson } from '../rows.js';

/** A caution that was taken from an entry and stands. */
export interface UseRow {
  readonly cautionId: number;
  readonly writeUpId: number;
  readonly slug: string | null;
  readonly published: boolean;
  readonly title: string;
  readonly content: EditionContent;
  readonly fixKey: string | null;
  readonly stepKey: string | null;
  readonly words: Pick<LibraryCaution, 'signalWord' | 'hazards' | 'hazard' | 'consequence' | 'avoidance'>;
}

/** Read model: where the cautions stand that were taken from an entry, with the text they stand in. */
export async function usesOf(db: Knex, libraryId: number): Promise<UseRow[]> {
  // The text shown is the published one, or else the newest that came to the desk.
  const newest = db('editions as n').whereRaw('n.write_up_id = w.id').max('n.id');
  const rows: (Omit<UseRow, 'published' | 'content' | 'words'> &
    UseRow['words'] & { publishedEditionId: number | null; content: unknown; hazards: unknown })[] = await db(
    'cautions as c',
  )
    .join('write_ups as w', 'w.id', 'c.write_up_id')
    .join(
      'editions as e',
      'e.id',
      db.raw('COALESCE(w.published_edition_id, w.withdrawn_edition_id, (?))', [newest]),
    )
    .leftJoin('fixes as f', 'f.id', 'c.fix_id')
    .where('c.library_id', libraryId)
    .whereNull('c.removed_at')
    .orderBy(['e.title', 'c.id'])
    .select('w.slug', 'e.title', 'e.content', 'c.hazards', 'c.hazard', 'c.consequence', 'c.avoidance', {
      cautionId: 'c.id',
      writeUpId: 'w.id',
      publishedEditionId: 'w.published_edition_id',
      fixKey: 'f.fix_key',
      stepKey: 'c.step_key',
      signalWord: 'c.signal_word',
    });
  return rows.map((row) => ({
    cautionId: row.cautionId,
    writeUpId: row.writeUpId,
    slug: row.slug,
    published: row.publishedEditionId !== null,
    title: row.title,
    content: fromJson<EditionContent>(row.content),
    fixKey: row.fixKey,
    stepKey: row.stepKey,
    words: {
      signalWord: row.signalWord,
      hazards: fromJson(row.hazards),
      hazard: row.hazard,
      consequence: row.consequence,
      avoidance: row.avoidance,
    },
  }));
}
