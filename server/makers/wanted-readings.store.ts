import type { Knex } from 'knex';
import type { Feature } from '../../shared/contract/hardware.js';

/** A feature of a part and a joint that it is one side of; a feature of two joints comes twice. */
export interface JointFeatureRow extends Feature {
  readonly jointId: number;
  readonly jointSlug: string;
  readonly jointName: string;
}

export interface ReadingCount {
  readonly revisionId: number;
  readonly featureId: number;
  readonly dimension: string;
  readonly count: number;
}

export type WantedReadingsStore = typeof wantedReadingsStore;

/** Read model: which features of a part mate with others, and how often each of their dimensions was read. */
export const wantedReadingsStore = {
  async jointFeatures(db: Knex, partId: number): Promise<JointFeatureRow[]> {
    return db('features as f')
      .join('joints as j', (on) => on.on('j.feature_a', 'f.id').orOn('j.feature_b', 'f.id'))
      .where('f.part_id', partId)
      .orderBy(['f.name', 'f.id', 'j.name'])
      .select('f.id', 'f.slug', 'f.name', 'f.kind', {
        jointId: 'j.id',
        jointSlug: 'j.slug',
        jointName: 'j.name',
      });
  },

  async readingCounts(db: Knex, revisionIds: readonly number[]): Promise<ReadingCount[]> {
    return db('consensus')
      .whereIn('revision_id', revisionIds)
      .select('dimension', 'count', { revisionId: 'revision_id', featureId: 'feature_id' });
  },
};
