import type { Knex } from 'knex';
import type { PartRef, RevisionRef } from '../../shared/contract/hardware.js';
import type {
  ComparedPart,
  FitCell,
  FitCheckLine,
  JointPage,
  JointRef,
  JointSidePage,
  JointWriteUp,
} from '../../shared/contract/joints.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import { FieldNotValid, NotFound } from '../http/problems.js';
import type { KnownDimensions, MeasurementService } from '../measurements/measurements.js';
import { groupBy } from '../rows.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { comparedPart } from './compared-part.js';
import { chanceOf, verdictOfPair, type KnownFeature } from './fit-cell.js';
import type { JointWriteUpStore, PairWriteUp } from './joint-write-ups.store.js';
import type { JointFeature, JointRow, JointStore, ReportCount } from './joint.store.js';
import { holdsForPair, writeUpView } from './pair-write-up.js';
import { byGravity } from './verdict-order.js';

/** A joint with both its features. */
interface Joint extends JointRow {
  readonly a: JointFeature;
  readonly b: JointFeature;
}

/** Everything that is known about some joints, read at once. */
interface Knowledge {
  readonly known: KnownDimensions;
  readonly voices: ReadonlyMap<string, ReportCount>;
  readonly writeUps: readonly PairWriteUp[];
  readonly cautions: ReadonlyMap<number, Caution[]>;
}

export type JointService = ReturnType<typeof createJointService>;

export function createJointService(around: {
  knex: Knex;
  clock: () => Date;
  store: JointStore;
  pairs: JointWriteUpStore;
  measurements: Pick<MeasurementService, 'knownOf'>;
  writeUps: Pick<WriteUpService, 'cautionsOfMany'>;
  happenings: Happenings;
  deskInbox: DeskInbox;
}) {
  const { knex, clock, store, pairs, measurements, writeUps, happenings, deskInbox } = around;

  async function withFeatures(rows: readonly JointRow[]): Promise<Joint[]> {
    const features = await store.features(rows.flatMap((row) => [row.featureA, row.featureB]));
    return rows.map((row) => ({ ...row, a: features.get(row.featureA)!, b: features.get(row.featureB)! }));
  }

  async function jointBySlug(slug: string): Promise<Joint> {
    const row = await store.bySlug(slug);
    if (!row) throw new NotFound('There is no joint of that name.');
    return (await withFeatures([row]))[0]!;
  }

  async function knowledgeOf(joints: readonly Joint[]): Promise<Knowledge> {
    const parts = [...new Set(joints.flatMap((joint) => [joint.a.part.id, joint.b.part.id]))];
    const [known, voices, found] = await Promise.all([
      measurements.knownOf([...new Set(joints.flatMap((joint) => [joint.featureA, joint.featureB]))]),
      store.reportCounts(
        joints.map((joint) => ({ id: joint.id, partA: joint.a.part.id, partB: joint.b.part.id })),
      ),
      pairs.betweenParts(parts),
    ]);
    const cautions = await writeUps.cautionsOfMany([...new Set(found.map((writeUp) => writeUp.writeUpId))]);
    return {
      known,
      voices: new Map(
        voices.map((count) => [`${count.jointId}/${count.revisionA}/${count.revisionB}`, count]),
      ),
      writeUps: found,
      cautions: groupBy(cautions, (caution) => caution.writeUpId),
    };
  }

  /** Pairs of the revisions through every joint between their parts, worst first; a part may be named with several revisions. */
  async function checkFit(revisionIds: readonly number[]): Promise<FitCheckLine[]> {
    const revisions = await store.revisionsByIds(revisionIds);
    const joints = await withFeatures(
      await store.between([...new Set(revisions.map((revision) => revision.partId))]),
    );
    if (joints.length === 0) return [];
    const knowledge = await knowledgeOf(joints);
    const byPart = groupBy(revisions, (revision) => revision.partId);
    return joints
      .flatMap((joint) =>
        pairsOf(byPart.get(joint.a.part.id) ?? [], byPart.get(joint.b.part.id) ?? []).map(([a, b]) => {
          const {
            verdict,
            sentence,
            writeUps: _,
            revisionA: __,
            revisionB: ___,
            ...chance
          } = cellOf(joint, a, b, knowledge);
          return {
            joint: refOf(joint),
            revisionA: a,
            revisionB: b,
            verdict,
            sentence,
            chance,
            writeUps: writeUpsFor(joint, knowledge)
              .filter((writeUp) => holdsForPair(writeUp, a.id, b.id))
              .map((writeUp) => writeUpView(writeUp, knowledge.cautions.get(writeUp.writeUpId) ?? [])),
          };
        }),
      )
      .sort(byGravity);
  }

  return {
    async list(partSlug: string | undefined): Promise<JointRef[]> {
      return (await withFeatures(await store.all(partSlug))).map(refOf);
    },

    /** Known joints whose two features both belong to the parts named. */
    async between(partIds: readonly number[]): Promise<JointRef[]> {
      return (await withFeatures(await store.between(partIds))).map(refOf);
    },

    /** NotFound for a slug that no joint has. */
    async page(slug: string): Promise<JointPage> {
      const joint = await jointBySlug(slug);
      const [knowledge, revisions] = await Promise.all([
        knowledgeOf([joint]),
        store.revisionsOfParts([joint.a.part.id, joint.b.part.id]),
      ]);
      const [revisionsA, revisionsB] = [joint.a, joint.b].map(({ part }) =>
        revisions.filter((revision) => revision.partId === part.id),
      ) as [RevisionRef[], RevisionRef[]];
      return {
        ...refOf(joint),
        sideA: sidePage(joint.a, revisionsA, knowledge),
        sideB: sidePage(joint.b, revisionsB, knowledge),
        cells: pairsOf(revisionsA, revisionsB).map(([a, b]) => cellOf(joint, a, b, knowledge)),
        writeUps: writeUpsFor(joint, knowledge).map((writeUp): JointWriteUp =>
          writeUpView(writeUp, knowledge.cautions.get(writeUp.writeUpId) ?? []),
        ),
      };
    },

    /** Takes one voice on a pair and answers the cell as it stands then. */
    async report(
      slug: string,
      accountId: number,
      report: { revisionA: number; revisionB: number; sat: boolean; note: string },
    ): Promise<FitCell> {
      const joint = await jointBySlug(slug);
      const revisions = await store.revisionsByIds([report.revisionA, report.revisionB]);
      const sideOf = (field: 'revisionA' | 'revisionB', feature: JointFeature): RevisionRef => {
        const found = revisions.find(
          (revision) => revision.id === report[field] && revision.partId === feature.part.id,
        );
        if (!found)
          throw new FieldNotValid(
            field,
            `is not a revision of ${feature.part.name}`,
            'Choose one of the table.',
          );
        return found;
      };
      const [a, b] = [sideOf('revisionA', joint.a), sideOf('revisionB', joint.b)];
      await knex.transaction(async (trx) => {
        const id = await store.saveReport({ ...report, jointId: joint.id, accountId, at: clock() }, trx);
        const title = `Fit report on “${joint.name}”`;
        await happenings.add(trx, {
          kind: 'fit-reported',
          key: `fit-reported:${id}`,
          title: `${report.sat ? 'Fits' : 'Does not fit'}: ${a.label} with ${b.label} in “${joint.name}”`,
          text: report.note,
          path: `/joints/${joint.slug}`,
          actorId: accountId,
          about: { joints: [joint.id], revisions: [a.id, b.id] },
        });
        await deskInbox.firstPost(trx, { kind: 'fit-report', id, accountId, title });
      });
      return cellOf(joint, a, b, await knowledgeOf([joint]));
    },

    /** Every joint between the revisions named, worst first, and what those revisions are; unknown ones are left out. */
    async check(
      revisionIds: readonly number[],
    ): Promise<{ items: FitCheckLine[]; stands: { part: PartRef; revision: RevisionRef }[] }> {
      const [items, revisions] = await Promise.all([
        checkFit(revisionIds),
        store.revisionsByIds(revisionIds),
      ]);
      const parts = await store.partRefs([...new Set(revisions.map((revision) => revision.partId))]);
      return {
        items,
        stands: revisions.map((revision) => ({ revision, part: parts.get(revision.partId)! })),
      };
    },

    /** Parts in the order asked, each with its newest revision that is sold (or the one among `revisionIds`) against the revisions named. */
    async compare(slugs: readonly string[], revisionIds: readonly number[]): Promise<ComparedPart[]> {
      const parts = await store.partsBySlugs(slugs);
      if (parts.length === 0) return [];
      const partIds = parts.map((part) => part.id);
      const [refs, all, mine] = await Promise.all([
        store.partRefs(partIds),
        store.revisionsOfParts(partIds),
        store.revisionsByIds(revisionIds),
      ]);
      const others = mine.filter((revision) => !partIds.includes(revision.partId));
      const chosen = parts.map((part) => {
        const own = all.filter((revision) => revision.partId === part.id);
        return own.find((revision) => revisionIds.includes(revision.id)) ?? newestSold(own);
      });
      const lines = await checkFit(
        [...others, ...chosen.flatMap((revision) => (revision ? [revision] : []))].map(
          (revision) => revision.id,
        ),
      );
      const about = await pairs.onParts(partIds);
      return parts.map((part) =>
        comparedPart({ part, ref: refs.get(part.id)!, compared: partIds, lines, about }),
      );
    },
  };
}

/** What a shop has: an announced revision only where there is no other. */
function newestSold(revisions: readonly RevisionRef[]): RevisionRef | undefined {
  return revisions.findLast((revision) => !revision.announced) ?? revisions.at(-1);
}

function pairsOf(a: readonly RevisionRef[], b: readonly RevisionRef[]): [RevisionRef, RevisionRef][] {
  return a.flatMap((one) => b.map((other): [RevisionRef, RevisionRef] => [one, other]));
}

function refOf(joint: Joint): JointRef {
  return {
    id: joint.id,
    slug: joint.slug,
    name: joint.name,
    kind: joint.kind,
    a: joint.a.part,
    b: joint.b.part,
  };
}

function knownFeature(side: JointFeature, revision: RevisionRef, { known }: Knowledge): KnownFeature {
  const at = `${side.feature.id}/${revision.id}`;
  return {
    process: side.process,
    attributes: known.attributes.get(at) ?? {},
    dimensions: known.dimensions.get(at) ?? {},
  };
}

function sidePage(
  side: JointFeature,
  revisions: readonly RevisionRef[],
  knowledge: Knowledge,
): JointSidePage {
  return {
    part: side.part,
    feature: side.feature,
    process: side.process,
    revisions: revisions.map((revision) => {
      const { attributes, dimensions } = knownFeature(side, revision, knowledge);
      return { revision, attributes: { ...attributes }, dimensions: { ...dimensions } };
    }),
  };
}

function cellOf(joint: Joint, a: RevisionRef, b: RevisionRef, knowledge: Knowledge): FitCell {
  const verdict = verdictOfPair(
    joint.kind,
    knownFeature(joint.a, a, knowledge),
    knownFeature(joint.b, b, knowledge),
  );
  const voices = knowledge.voices.get(`${joint.id}/${a.id}/${b.id}`) ?? { sat: 0, didNotSit: 0 };
  return {
    revisionA: a.id,
    revisionB: b.id,
    verdict: verdict.verdict,
    sentence: verdict.sentence,
    ...chanceOf(verdict.chance, voices),
    writeUps: writeUpsFor(joint, knowledge)
      .filter((writeUp) => holdsForPair(writeUp, a.id, b.id))
      .map((writeUp) => writeUp.slug),
  };
}

function writeUpsFor(joint: Joint, { writeUps }: Knowledge): PairWriteUp[] {
  const [a, b] = [joint.a.part.id, joint.b.part.id];
  const found = writeUps.filter(
    (writeUp) => (writeUp.partA === a && writeUp.partB === b) || (writeUp.partA === b && writeUp.partB === a),
  );
  return [...new Map(found.map((writeUp) => [writeUp.writeUpId, writeUp])).values()];
}
