import { z } from 'zod';
import {
  deskItemKinds,
  type DeskItem,
  type DeskItemKind,
  type DeskQuery,
  type DeskQueue,
} from '../../shared/contract/desk-queue.js';
import { readCursor, toPage } from '../http/pages.js';
import { groupBy } from '../rows.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { openHazards } from './caution-missing.js';
import type { DeskQueueStore, QueueRow } from './desk-queue.store.js';

const Place = z.object({
  at: z.iso.datetime(),
  rank: z
    .number()
    .int()
    .min(0)
    .max(deskItemKinds.length - 1),
  id: z.number().int(),
});

const pages: Record<DeskItemKind, string> = {
  edition: '/desk/editions/',
  proposal: '/desk/hardware/',
  'maker-request': '/desk/makers/',
  flag: '/desk/flags/',
  'first-post': '/desk/first-posts/',
  photo: '/desk/photos/',
};

export type DeskQueueService = ReturnType<typeof createDeskQueueService>;

/** All that waits at the desk as one queue. */
export function createDeskQueueService(parts: {
  clock: () => Date;
  store: DeskQueueStore;
  writeUps: Pick<WriteUpService, 'cautionsOfMany'>;
}) {
  const { clock, store, writeUps } = parts;

  /** Hazards without a caution, of the editions among the rows. */
  async function openHazardsOf(rows: readonly QueueRow[]): Promise<Map<number, number>> {
    const editions = rows.filter((row) => deskItemKinds[row.rank] === 'edition').map((row) => row.id);
    const contents = await store.contentsOf(editions);
    const writeUpIds = [...new Set([...contents.values()].map(({ writeUpId }) => writeUpId))];
    const cautions = groupBy(await writeUps.cautionsOfMany(writeUpIds), (caution) => caution.writeUpId);
    return new Map(
      [...contents].map(([id, { writeUpId, content }]) => [
        id,
        openHazards(content, cautions.get(writeUpId) ?? []).length,
      ]),
    );
  }

  return {
    /** One page, the longest wait first; the counts are of all that waits. */
    async readDesk(moderatorId: number, query: z.output<typeof DeskQuery>): Promise<DeskQueue> {
      const place = readCursor(Place, query.cursor);
      const [rows, counts] = await Promise.all([
        store.waiting({
          kind: query.kind,
          claim: query.claim,
          words: query.words,
          moderatorId,
          now: clock(),
          after: place && { ...place, at: new Date(place.at) },
          rows: query.limit + 1,
        }),
        store.counts(),
      ]);
      const page = toPage(rows, query.limit, ({ at, rank, id }) => ({ at: at.toISOString(), rank, id }));
      const hazards = await openHazardsOf(page.items);
      return {
        items: page.items.map((row) => toItem(row, moderatorId, hazards)),
        next: page.next,
        counts,
      };
    },
  };
}

function toItem(row: QueueRow, moderatorId: number, hazards: ReadonlyMap<number, number>): DeskItem {
  const kind = deskItemKinds[row.rank]!;
  return {
    kind,
    id: row.id,
    title: row.title,
    person: { id: row.personId, displayName: row.displayName },
    since: row.at.toISOString(),
    openHazards: kind === 'edition' ? (hazards.get(row.id) ?? 0) : null,
    claim:
      row.holderId === null
        ? null
        : {
            person: { id: row.holderId, displayName: row.holderName! },
            until: row.until!.toISOString(),
          },
    mine: row.holderId === moderatorId,
    path: `${pages[kind]}${row.id}`,
  };
}
