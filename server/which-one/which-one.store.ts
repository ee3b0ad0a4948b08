import type { Knex } from 'knex';
import type { PartRef } from '../../shared/contract/hardware.js';
import type { TellingDimension, TellingMark } from '../../shared/contract/which-one.js';
import { groupBy } from '../rows.js';

export type WhichOneStore = ReturnType<typeof createWhichOneStore>;

/** Read model of the questions that tell the revisions of a part apart. */
export function createWhichOneStore(knex: Knex) {
  return {
    /** Marks of the part in the order in which they were noted. */
    async marksOf(part: PartRef): Promise<TellingMark[]> {
      const rows: { id: number; text: string; revisionId: number; shows: number }[] = await knex(
        'revision_marks as m',
      )
        .join('revision_mark_answers as a', 'a.mark_id', 'm.id')
        .where('m.part_id', part.id)
        .select('m.id', 'm.text', 'a.shows', { revisionId: 'a.revision_id' })
        .orderBy(['m.id', 'a.revision_id']);
      return [...groupBy(rows, (row) => row.id)].map(([id, answers]) => ({
        id,
        text: answers[0]!.text,
        revisions: answers.map(({ revisionId, shows }) => ({ revisionId, shows: Boolean(shows) })),
      }));
    },

    /** Dimensions with a consensus on two revisions or more. */
    async dimensionsOf(part: PartRef): Promise<TellingDimension[]> {
      const rows: (TellingDimension['feature'] &
        TellingDimension['revisions'][number] & { dimension: string })[] = await knex('features as f')
        .join('consensus as c', 'c.feature_id', 'f.id')
        .where('f.part_id', part.id)
        .select('f.id', 'f.slug', 'f.name', 'f.kind', 'c.dimension', 'c.mean', {
          revisionId: 'c.revision_id',
          predictionSpread: 'c.prediction_spread',
        })
        .orderBy(['f.name', 'f.id', 'c.dimension', 'c.revision_id']);
      return [...groupBy(rows, (row) => `${row.id}/${row.dimension}`).values()]
        .filter((entries) => entries.length > 1)
        .map((entries) => {
          const { id, slug, name, kind, dimension } = entries[0]!;
          return {
            feature: { id, slug, name, kind },
            dimension,
            revisions: entries.map(({ revisionId, mean, predictionSpread }) => ({
              revisionId,
              mean,
              predictionSpread,
            })),
          };
        });
    },
  };
}
