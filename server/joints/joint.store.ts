import type { Knex } from 'knex';
import type { Feature, PartRef, RevisionRef } from '../../shared/contract/hardware.js';
import type { JointKind } from '../../shared/fit/joint-kinds.js';
import type { Process } from '../../shared/statistics/consensus.js';
import { revisionRefColumns, toRevisionRef, type RevisionRefRow } from '../revision-ref.js';

/** A feature with the part it belongs to. */
export interface JointFeature {
  readonly feature: Feature;
  readonly process: Process;
  readonly part: PartRef;
}

export interface JointRow {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
  readonly kind: JointKind;
  readonly featureA: number;
  readonly featureB: number;
}

export interface ReportCount {
  readonly jointId: number;
  readonly revisionA: number;
  readonly revisionB: number;
  readonly sat: number;
  readonly didNotSit: number;
}

export type JointStore = ReturnType<typeof createJointStore>;

export function createJointStore(knex: Knex) {
  const joints = () =>
    knex('joints as j').select('j.id', 'j.slug', 'j.name', 'j.kind', {
      featureA: 'j.feature_a',
      featureB: 'j.feature_b',
    });

  return {
    async all(partSlug: string | undefined): Promise<JointRow[]> {
      const query = joints().orderBy(['j.name', 'j.id']);
      if (partSlug !== undefined) {
        const features = knex('features as f')
          .join('parts as p', 'p.id', 'f.part_id')
          .where('p.slug', partSlug)
          .select('f.id');
        void query.where((either) =>
          either.whereIn('j.feature_a', features.clone()).orWhereIn('j.feature_b', features.clone()),
        );
      }
      return query;
    },

    async bySlug(slug: string): Promise<JointRow | undefined> {
      return joints().where('j.slug', slug).first();
    },

    /** Joints whose two features both belong to the parts named. */
    async between(partIds: readonly number[]): Promise<JointRow[]> {
      return joints()
        .join('features as a', 'a.id', 'j.feature_a')
        .join('features as b', 'b.id', 'j.feature_b')
        .whereIn('a.part_id', partIds)
        .whereIn('b.part_id', partIds)
        .orderBy('j.id');
    },

    async features(ids: readonly number[]): Promise<Map<number, JointFeature>> {
      const rows = await knex('features as f')
        .join('parts as p', 'p.id', 'f.part_id')
        .join('makers as m', 'm.id', 'p.maker_id')
        .whereIn('f.id', ids)
        .select('f.id', 'f.slug', 'f.name', 'f.kind', 'f.process', {
          partId: 'p.id',
          partSlug: 'p.slug',
          partName: 'p.name',
          partKind: 'p.kind',
          makerId: 'm.id',
          makerSlug: 'm.slug',
          makerName: 'm.name',
        });
      return new Map(
        rows.map((row) => [
          row.id,
          {
            feature: { id: row.id, slug: row.slug, name: row.name, kind: row.kind },
            process: row.process,
            part: {
              id: row.partId,
              slug: row.partSlug,
              name: row.partName,
              kind: row.partKind,
              maker: { id: row.makerId, slug: row.makerSlug, name: row.makerName },
            },
          },
        ]),
      );
    },

    async revisionsOfParts(partIds: readonly number[]): Promise<RevisionRef[]> {
      const rows: RevisionRefRow[] = await knex('revisions')
        .whereIn('part_id', partIds)
        .select(revisionRefColumns)
        .orderBy(['part_id', 'position']);
      return rows.map(toRevisionRef);
    },

    async revisionsByIds(ids: readonly number[]): Promise<RevisionRef[]> {
      const rows: RevisionRefRow[] = await knex('revisions').whereIn('id', ids).select(revisionRefColumns);
      return rows.map(toRevisionRef);
    },

    /** Parts by slug with what the comparison shows of them, in the order of the slugs. */
    async partsBySlugs(
      slugs: readonly string[],
    ): Promise<{ id: number; slug: string; about: string; price: string | null }[]> {
      const rows: { id: number; slug: string; about: string; price: string | null }[] = await knex('parts')
        .whereIn('slug', slugs)
        .select('id', 'slug', 'about', { price: 'price_band' });
      return slugs.flatMap((slug) => rows.filter((row) => row.slug === slug));
    },

    async partRefs(ids: readonly number[]): Promise<Map<number, PartRef>> {
      const rows = await knex('parts as p')
        .join('makers as m', 'm.id', 'p.maker_id')
        .whereIn('p.id', ids)
        .select('p.id', 'p.slug', 'p.name', 'p.kind', {
          makerId: 'm.id',
          makerSlug: 'm.slug',
          makerName: 'm.name',
        });
      return new Map(
        rows.map(({ makerId, makerSlug, makerName, ...part }) => [
          part.id,
          { ...part, maker: { id: makerId, slug: makerSlug, name: makerName } },
        ]),
      );
    },

    /** One report for each person and pair: a second one takes the place of the first. Returns its id. */
    async saveReport(
      report: {
        jointId: number;
        revisionA: number;
        revisionB: number;
        accountId: number;
        sat: boolean;
        note: string;
        at: Date;
      },
      trx: Knex,
    ): Promise<number> {
      await trx('fit_reports')
        .insert({
          joint_id: report.jointId,
          revision_a: report.revisionA,
          revision_b: report.revisionB,
          account_id: report.accountId,
          sat: report.sat,
          note: report.note,
          created_at: report.at,
        })
        .onConflict(['joint_id', 'revision_a', 'revision_b', 'account_id'])
        .merge();
      const row = await trx('fit_reports')
        .where({
          joint_id: report.jointId,
          revision_a: report.revisionA,
          revision_b: report.revisionB,
          account_id: report.accountId,
        })
        .first('id');
      return row.id;
    },

    /**
     * One voice per person and pair: their report, or else any trial they made on that pair with a fix for it, which tells
     * that the pair did not sit as delivered.
     */
    async reportCounts(
      joints: readonly { id: number; partA: number; partB: number }[],
    ): Promise<ReportCount[]> {
      if (joints.length === 0) return [];
      const reports: {
        jointId: number;
        revisionA: number;
        revisionB: number;
        accountId: number;
        sat: number;
      }[] = await knex('fit_reports')
        .whereIn(
          'joint_id',
          joints.map((joint) => joint.id),
        )
        .whereNull('taken_down_at')
        .select('sat', {
          jointId: 'joint_id',
          revisionA: 'revision_a',
          revisionB: 'revision_b',
          accountId: 'account_id',
        });
      const trials = await trialPairs(knex, joints);
      const voices = new Map<
        string,
        { jointId: number; revisionA: number; revisionB: number; sat: boolean }
      >();
      for (const { accountId, ...pair } of trials)
        voices.set(`${pair.jointId}/${pair.revisionA}/${pair.revisionB}/${accountId}`, {
          ...pair,
          sat: false,
        });
      for (const { accountId, sat, ...pair } of reports)
        voices.set(`${pair.jointId}/${pair.revisionA}/${pair.revisionB}/${accountId}`, {
          ...pair,
          sat: Boolean(sat),
        });
      return countVoices([...voices.values()]);
    },
  };
}

async function trialPairs(
  knex: Knex,
  joints: readonly { id: number; partA: number; partB: number }[],
): Promise<{ jointId: number; revisionA: number; revisionB: number; accountId: number }[]> {
  const parts = [...new Set(joints.flatMap((joint) => [joint.partA, joint.partB]))];
  const rows: { partA: number; partB: number; revisionA: number; revisionB: number; accountId: number }[] =
    await knex('trial_revisions as ta')
      .join('trial_revisions as tb', 'tb.trial_id', 'ta.trial_id')
      .join('revisions as ra', 'ra.id', 'ta.revision_id')
      .join('revisions as rb', 'rb.id', 'tb.revision_id')
      .join('trials as t', 't.id', 'ta.trial_id')
      .whereIn('ra.part_id', parts)
      .whereIn('rb.part_id', parts)
      .whereRaw('ra.part_id <> rb.part_id')
      .whereNull('t.taken_down_at')
      .distinct({
        partA: 'ra.part_id',
        partB: 'rb.part_id',
        revisionA: 'ra.id',
        revisionB: 'rb.id',
        accountId: 't.account_id',
      });
  return joints.flatMap((joint) =>
    rows
      .filter((row) => row.partA === joint.partA && row.partB === joint.partB)
      .map(({ revisionA, revisionB, accountId }) => ({ jointId: joint.id, revisionA, revisionB, accountId })),
  );
}

function countVoices(
  voices: readonly { jointId: number; revisionA: number; revisionB: number; sat: boolean }[],
): ReportCount[] {
  const counts = new Map<
    string,
    { jointId: number; revisionA: number; revisionB: number; sat: number; didNotSit: number }
  >();
  for (const { sat, ...pair } of voices) {
    const key = `${pair.jointId}/${pair.revisionA}/${pair.revisionB}`;
    const count = counts.get(key) ?? { ...pair, sat: 0, didNotSit: 0 };
    if (sat) count.sat += 1;
    else count.didNotSit += 1;
    counts.set(key, count);
  }
  return [...counts.values()];
}
