import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import type { Merge } from '../../shared/contract/proposals.js';
import { FieldNotValid } from '../http/problems.js';
import type { MeasurementService } from '../measurements/measurements.js';
import { freeSlug } from '../write-ups/slug.js';
import { mergeStore as store, type NamedFeature, type NamedPart, type NamedRevision } from './merge.store.js';
import { mergeRows, type Moves } from './repoint.store.js';

/** What merges need of search: to note, in their transaction, which documents must be made anew. */
export interface IndexNotices {
  addAll(trx: Knex, writeUpIds: readonly number[]): Promise<void>;
}

/** What merges need of watches: to let them follow, in their transaction. */
export interface FollowingWatches {
  followMerge(
    trx: Knex,
    subject: 'part' | 'revision' | 'joint',
    moves: ReadonlyMap<number, number>,
  ): Promise<void>;
}

export type MergeService = ReturnType<typeof createMergeService>;

const none: Moves = new Map();

/** What becomes what. All features of the merged ones are held from the start. */
interface Plan {
  readonly part: NamedPart;
  readonly fromName: string;
  readonly parts: Moves;
  readonly revisions: Moves;
  readonly features: Moves;
  /** Features whose readings move or whose revisions do. */
  readonly touchedFeatures: readonly number[];
}

/** Puts together what is twice in the catalogue. Each merge is one transaction: it is done whole or not at all. */
export function createMergeService(around: {
  knex: Knex;
  audit: AuditLog;
  measurements: MeasurementService;
  searchOutbox: IndexNotices;
  watches: FollowingWatches;
}) {
  const { knex, audit, measurements, searchOutbox, watches } = around;

  return {
    /** FieldNotValid for what is not there or does not go together. Returns the address of the part that stays. */
    async merge(moderatorId: number, wish: Merge): Promise<{ slug: string }> {
      if (wish.from === wish.into)
        throw new FieldNotValid('into', 'is the same as the other', 'Choose another.');
      if (wish.kind !== 'part' && wish.revisionMap.length > 0)
        throw new FieldNotValid('revisionMap', 'goes with parts only', 'Leave it out.');
      return knex.transaction(async (trx) => {
        const plan = await planOf(trx, wish);
        const writeUps = await store.writeUpsOn(trx, [...plan.parts.keys(), plan.part.id]);
        await carryOut(trx, plan);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'merged',
          subject: { kind: wish.kind, id: wish.from, name: plan.fromName },
          details: { into: wish.into, part: plan.part.slug },
        });
        await searchOutbox.addAll(trx, writeUps);
        return { slug: plan.part.slug };
      });
    },
  };

  async function carryOut(trx: Knex, plan: Plan): Promise<void> {
    const joints = await jointMoves(trx, plan.features);
    await store.settleReports(trx, { joints, revisions: plan.revisions });
    await store.settleMarksOfEditions(trx, plan.revisions);
    await mergeRows(trx, 'joints', joints);
    await watches.followMerge(trx, 'joint', joints);
    await mergeRows(trx, 'features', plan.features);
    await mergeRows(trx, 'revisions', plan.revisions);
    await watches.followMerge(trx, 'revision', plan.revisions);
    for (const [from, into] of plan.parts) await movePart(trx, from, into);
    await mergeRows(trx, 'parts', plan.parts);
    await watches.followMerge(trx, 'part', plan.parts);
    await store.renameInEditions(trx, plan);
    await measurements.remakeConsensus(plan.touchedFeatures, trx);
  }

  /** What is left on the old part once all that is on both is merged. */
  async function movePart(trx: Knex, from: number, into: number): Promise<void> {
    await mergeRows(trx, 'revision_marks', await store.marksInBoth(trx, from, into));
    const revisions = await store.revisions(trx, { partIds: [from, into] });
    const last = Math.max(-1, ...revisions.filter((row) => row.partId === into).map((row) => row.position));
    const moved = revisions.filter((row) => row.partId === from).map(({ id }) => id);
    await store.moveRevisions(trx, moved, into, last + 1);
    const features = await store.features(trx, { partIds: [from, into] });
    const taken = new Set(features.filter((row) => row.partId === into).map((row) => row.slug));
    const renamed = features
      .filter((row) => row.partId === from)
      .map(({ id, slug }) => {
        const free = freeSlug(slug, taken);
        taken.add(free);
        return { id, slug: free };
      });
    await store.moveFeatures(trx, renamed, into);
    const [old] = await store.holdParts(trx, [from]);
    await store.redirect(trx, old!.slug, into);
  }
}

function planOf(trx: Knex, wish: Merge): Promise<Plan> {
  if (wish.kind === 'part') return planParts(trx, wish);
  return wish.kind === 'revision' ? planRevisions(trx, wish) : planFeatures(trx, wish);
}

async function planParts(trx: Knex, { from, into, revisionMap }: Merge): Promise<Plan> {
  const parts = await store.holdParts(trx, [from, into]);
  const old = demand(parts, from, 'from', 'part');
  const part = demand(parts, into, 'into', 'part');
  const revisions = await store.revisions(trx, { partIds: [from, into] });
  const moves = revisionMoves(revisions, { from, into, revisionMap });
  const features = await store.features(trx, { partIds: [from, into] });
  return {
    part,
    fromName: old.name,
    parts: new Map([[from, into]]),
    revisions: moves,
    features: featuresInBoth(features, from, into),
    touchedFeatures: features.map(({ id }) => id),
  };
}

/** Revisions named by the map; one that moves over as its own must not have the label of one that is there. */
function revisionMoves(
  revisions: readonly NamedRevision[],
  { from, into, revisionMap }: Pick<Merge, 'from' | 'into' | 'revisionMap'>,
): Moves {
  const partOf = new Map(revisions.map(({ id, partId }) => [id, partId]));
  const moves = new Map<number, number>();
  revisionMap.forEach((pair, index) => {
    if (partOf.get(pair.from) !== from || moves.has(pair.from))
      throw new FieldNotValid(
        `revisionMap.${index}.from`,
        'is not a revision of the part that goes, or stands there twice',
        'Name each of its revisions once at most.',
      );
    if (partOf.get(pair.into) !== into)
      throw new FieldNotValid(
        `revisionMap.${index}.into`,
        'is not a revision of the part that stays',
        'Choose one of its revisions.',
      );
    moves.set(pair.from, pair.into);
  });
  const plain = (label: string): string => label.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
  const labels = new Set(revisions.filter(({ partId }) => partId === into).map(({ label }) => plain(label)));
  const clash = revisions.find(
    ({ id, partId, label }) => partId === from && !moves.has(id) && labels.has(plain(label)),
  );
  if (clash)
    throw new FieldNotValid(
      'revisionMap',
      `leaves out ${clash.label}, which both parts have`,
      'Say which revision it is.',
    );
  return moves;
}

function featuresInBoth(features: readonly NamedFeature[], from: number, into: number): Moves {
  const there = features.filter(({ partId }) => partId === into);
  return new Map(
    features
      .filter(({ partId }) => partId === from)
      .flatMap((old) => {
        const same = there.find(({ slug, kind }) => slug === old.slug && kind === old.kind);
        return same ? [[old.id, same.id] as const] : [];
      }),
  );
}

async function planRevisions(trx: Knex, { from, into }: Merge): Promise<Plan> {
  const revisions = await store.revisions(trx, { ids: [from, into] });
  const old = demand(revisions, from, 'from', 'revision');
  const kept = demand(revisions, into, 'into', 'revision');
  if (old.partId !== kept.partId)
    throw new FieldNotValid('into', 'is a revision of another part', 'Choose one of the same part.');
  const [part] = await store.holdParts(trx, [kept.partId]);
  const features = await store.features(trx, { partIds: [kept.partId] });
  return {
    part: part!,
    fromName: `${part!.name} ${old.label}`.slice(0, 120),
    parts: none,
    revisions: new Map([[from, into]]),
    features: none,
    touchedFeatures: features.map(({ id }) => id),
  };
}

async function planFeatures(trx: Knex, { from, into }: Merge): Promise<Plan> {
  // Parts are held before features, always: two merges at once never wait for each other.
  const parts = await store.holdParts(trx, await store.partsOfFeatures(trx, [from, into]));
  const features = await store.features(trx, { ids: [from, into] });
  const old = demand(features, from, 'from', 'feature');
  const kept = demand(features, into, 'into', 'feature');
  if (old.partId !== kept.partId)
    throw new FieldNotValid('into', 'is a feature of another part', 'Choose one of the same part.');
  if (old.kind !== kept.kind)
    throw new FieldNotValid('into', 'is a feature of another kind', 'Choose one of the same kind.');
  return {
    part: parts[0]!,
    fromName: old.name,
    parts: none,
    revisions: none,
    features: new Map([[from, into]]),
    touchedFeatures: [from, into],
  };
}

/** Joints that come to be between the same features as another of their kind: that one, the older, takes them in. */
async function jointMoves(trx: Knex, features: Moves): Promise<Moves> {
  const moves = new Map<number, number>();
  if (features.size === 0) return moves;
  const kept = new Map<string, number>();
  for (const joint of await store.jointsOf(trx, [...features].flat())) {
    const a = features.get(joint.featureA) ?? joint.featureA;
    const b = features.get(joint.featureB) ?? joint.featureB;
    if (a === b)
      throw new FieldNotValid(
        'from',
        'is joined with the other',
        'What mates with each other cannot be the same.',
      );
    const key = `${a}/${b}/${joint.kind}`;
    const older = kept.get(key);
    if (older === undefined) kept.set(key, joint.id);
    else moves.set(joint.id, older);
  }
  return moves;
}

function demand<Row extends { id: number }>(
  rows: readonly Row[],
  id: number,
  field: 'from' | 'into',
  what: Merge['kind'],
): Row {
  const found = rows.find((row) => row.id === id);
  if (!found) throw new FieldNotValid(field, `is not a ${what} of the catalogue`, 'Choose it from the list.');
  return found;
}
