import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { Standing } from '../../shared/contract/vocabulary.js';
import { fromJson, groupBy } from '../rows.js';

/** What the joint's pages show of a published write-up on two parts. */
export interface PairWriteUp {
  readonly writeUpId: number;
  readonly slug: string;
  readonly title: string;
  readonly partA: number;
  readonly partB: number;
  /** Revisions it holds for. */
  readonly holdsFor: readonly number[];
  readonly content: EditionContent;
  readonly standings: ReadonlyMap<string, Standing>;
  readonly trials: { readonly held: number; readonly heldForAWhile: number; readonly didNotHelp: number };
}

export type JointWriteUpStore = ReturnType<typeof createJointWriteUpStore>;

/** Read model: published write-ups with a joint between two of the parts named. */
export function createJointWriteUpStore(knex: Knex) {
  return {
    /** With a joint between two of the parts. */
    betweenParts(partIds: readonly number[]): Promise<PairWriteUp[]> {
      return found(partIds, (query) => query.whereIn('a.part_id', partIds).whereIn('b.part_id', partIds));
    },

    /** With a joint that any of the parts is one side of; once for each such joint. */
    onParts(partIds: readonly number[]): Promise<PairWriteUp[]> {
      return found(partIds, (query) =>
        query.where((either) => either.whereIn('a.part_id', partIds).orWhereIn('b.part_id', partIds)),
      );
    },
  };

  async function found(
    partIds: readonly number[],
    choose: (query: Knex.QueryBuilder) => Knex.QueryBuilder,
  ): Promise<PairWriteUp[]> {
    if (partIds.length === 0) return [];
    const pairs: {
      writeUpId: number;
      editionId: number;
      slug: string;
      title: string;
      content: unknown;
      partA: number;
      partB: number;
    }[] = await choose(knex('edition_sides as a'))
      .join('edition_sides as b', (on) => {
        on.on('b.edition_id', 'a.edition_id').andOn('b.joint', 'a.joint').andOnVal('b.side', 'b');
      })
      .join('write_ups as w', 'w.published_edition_id', 'a.edition_id')
      .join('editions as e', 'e.id', 'a.edition_id')
      .where('a.side', 'a')
      .select('w.slug', 'e.title', 'e.content', {
        writeUpId: 'w.id',
        editionId: 'e.id',
        partA: 'a.part_id',
        partB: 'b.part_id',
      })
      .orderBy('w.id');
    if (pairs.length === 0) return [];
    const [marks, fixes] = await Promise.all([
      knex('edition_revisions')
        .whereIn(
          'edition_id',
          pairs.map((pair) => pair.editionId),
        )
        .where('holds', true)
        .select({ editionId: 'edition_id', revisionId: 'revision_id' }) as Promise<
        { editionId: number; revisionId: number }[]
      >,
      fixRows(
        knex,
        pairs.map((pair) => pair.writeUpId),
      ),
    ]);
    const marksOf = groupBy(marks, (mark) => mark.editionId);
    const fixesOf = groupBy(fixes, (fix) => fix.writeUpId);
    return pairs.map(({ editionId, content, ...pair }) => {
      const own = fixesOf.get(pair.writeUpId) ?? [];
      return {
        ...pair,
        content: fromJson<EditionContent>(content),
        holdsFor: (marksOf.get(editionId) ?? []).map((mark) => mark.revisionId),
        standings: new Map(own.map((fix) => [fix.key, fix.standing])),
        trials: {
          held: sum(own.map((fix) => fix.held)),
          heldForAWhile: sum(own.map((fix) => fix.heldForAWhile)),
          didNotHelp: sum(own.map((fix) => fix.didNotHelp)),
        },
      };
    });
  }
}

interface FixRecord {
  writeUpId: number;
  key: string;
  standing: Standing;
  held: number;
  heldForAWhile: number;
  didNotHelp: number;
}

async function fixRows(knex: Knex, writeUpIds: readonly number[]): Promise<FixRecord[]> {
  const count = (outcome: string): Knex.Raw =>
    knex.raw('COUNT(CASE WHEN t.outcome = ? THEN 1 END)', [outcome]);
  const rows: FixRecord[] = await knex('fixes as f')
    .leftJoin('trials as t', (on) => on.on('t.fix_id', 'f.id').andOnNull('t.taken_down_at'))
    .whereIn('f.write_up_id', writeUpIds)
    .groupBy('f.id', 'f.write_up_id', 'f.fix_key', 'f.standing')
    .select('f.standing', {
      writeUpId: 'f.write_up_id',
      key: 'f.fix_key',
      held: count('held'),
      heldForAWhile: count('held-for-a-while'),
      didNotHelp: count('did-not-help'),
    });
  return rows.map((row) => ({
    ...row,
    held: Number(row.held),
    heldForAWhile: Number(row.heldForAWhile),
    didNotHelp: Number(row.didNotHelp),
  }));
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
