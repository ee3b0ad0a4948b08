import type { BenchItem, PartSummary, RevisionRef } from '../../shared/contract/hardware.js';
import type { HardwareService } from '../hardware/hardware.js';
import { AlreadyThere, FieldNotValid, NotFound } from '../http/problems.js';
import type { BenchRow, BenchStore } from './bench.store.js';

export type BenchService = ReturnType<typeof createBenchService>;

export function createBenchService(store: BenchStore, hardware: HardwareService, clock: () => Date) {
  return {
    /** The parts of an account in the order in which they were put there. */
    async readBench(accountId: number): Promise<BenchItem[]> {
      const rows = await store.itemsOf(accountId);
      const parts = await hardware.summariesByIds(rows.map((row) => row.partId));
      return rows.flatMap((row) => {
        const part = parts.get(row.partId);
        return part ? [itemOf(row, part)] : [];
      });
    },

    /** Which parts in which revisions an account has; null where it has not found out which one. */
    async benchOf(accountId: number): Promise<{ partId: number; revisionId: number | null }[]> {
      return (await store.itemsOf(accountId)).map(({ partId, revisionId }) => ({ partId, revisionId }));
    },

    /** FieldNotValid where part or revision is not there; AlreadyThere where the same revision stands on the bench. */
    async addToBench(
      accountId: number,
      wanted: { partId: number; revisionId: number | null },
    ): Promise<BenchItem> {
      const part = (await hardware.summariesByIds([wanted.partId])).get(wanted.partId);
      if (!part)
        throw new FieldNotValid('partId', 'is not a part of the catalogue', 'Choose the part from the list.');
      demandOwnRevision(part, wanted.revisionId);
      const id = await store.addItem(accountId, wanted, clock());
      if (id === 'already-there') throw sameTwice(part);
      return itemOf({ id, ...wanted }, part);
    },

    /** NotFound for an item of somebody else's bench, as for one that is not there. */
    async changeRevision(accountId: number, itemId: number, revisionId: number | null): Promise<BenchItem> {
      const row = await store.itemOf(accountId, itemId);
      const part = row && (await hardware.summariesByIds([row.partId])).get(row.partId);
      if (!part) throw notOnBench();
      demandOwnRevision(part, revisionId);
      if ((await store.setRevision(accountId, itemId, revisionId)) === 'already-there') throw sameTwice(part);
      return itemOf({ ...row, revisionId }, part);
    },

    async removeFromBench(accountId: number, itemId: number): Promise<void> {
      if (!(await store.removeItem(accountId, itemId))) throw notOnBench();
    },
  };
}

function itemOf(row: BenchRow, part: PartSummary): BenchItem {
  return { id: row.id, part, revision: revisionOf(part, row.revisionId) ?? null };
}

function revisionOf(part: PartSummary, revisionId: number | null): RevisionRef | undefined {
  return part.revisions.find((revision) => revision.id === revisionId);
}

function demandOwnRevision(part: PartSummary, revisionId: number | null): void {
  if (revisionId === null || revisionOf(part, revisionId)) return;
  throw new FieldNotValid(
    'revisionId',
    `is not a revision of ${part.name}`,
    'Choose one of its revisions, or none.',
  );
}

function sameTwice(part: PartSummary): AlreadyThere {
  return new AlreadyThere(
    `${part.name} stands on your bench in that revision.`,
    'Change the entry that is there.',
  );
}

function notOnBench(): NotFound {
  return new NotFound('There is no such part on your bench.', 'Read the bench again.');
}
