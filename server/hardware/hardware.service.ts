import { z } from 'zod';
import type {
  MakerRef,
  PartPage,
  PartRef,
  PartSummary,
  Revision,
  RevisionRef,
  Symptom,
} from '../../shared/contract/hardware.js';
import type { PartKind } from '../../shared/contract/vocabulary.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotFound } from '../http/problems.js';
import { groupBy } from '../rows.js';
import type { HardwareStore } from './hardware.store.js';
import type { PartPageStore } from './part-page.store.js';
import type { RevisionStore } from './revision.store.js';

const PlaceInParts = z.object({ name: z.string().max(120), id: z.number().int() });

export interface PartQuery {
  readonly q?: string | undefined;
  readonly kind?: PartKind | undefined;
  readonly maker?: string | undefined;
  readonly cursor?: string | undefined;
  readonly limit: number;
}

export type HardwareService = ReturnType<typeof createHardwareService>;

export function createHardwareService(around: {
  store: HardwareStore;
  pages: PartPageStore;
  revisions: RevisionStore;
}) {
  const { store, pages, revisions } = around;

  return {
    listMakers(): Promise<MakerRef[]> {
      return store.makers();
    },

    listSymptoms(): Promise<Symptom[]> {
      return store.symptoms();
    },

    /** Parts by name; every word of `q` stands in the name of the part or of its maker. */
    async listParts(query: PartQuery): Promise<{ items: PartSummary[]; next: string | null }> {
      const after = readCursor(PlaceInParts, query.cursor);
      const words = (query.q ?? '').split(/\s+/).filter((word) => word !== '');
      const parts = await store.parts({
        words,
        kind: query.kind,
        maker: query.maker,
        after,
        rows: query.limit + 1,
      });
      const page = toPage(parts, query.limit, (part) => ({ name: part.name, id: part.id }));
      return { items: await summariesOf(page.items), next: page.next };
    },

    /**
     * The address of a part that was merged into another leads to that one, which tells its own. NotFound for a slug that
     * no part has or had.
     */
    async readPart(slug: string): Promise<PartPage> {
      const page = await pages.partPage((await partBySlug(slug)).slug);
      if (!page) throw noSuchPart();
      return page;
    },

    /** As `readPart`, without what only the page shows. */
    partBySlug,

    /** All that is known of the part's revisions, from the oldest to the newest. */
    revisionsOfPart(partId: number): Promise<Revision[]> {
      return revisions.ofPart(partId);
    },

    /** Parts that are not there are missing from the map; so with all look-ups below. */
    partsByIds(ids: readonly number[]): Promise<Map<number, PartRef>> {
      return byId(ids, async (known) => (await store.partsByIds(known)).map(({ about: _, ...part }) => part));
    },

    /** Revisions of each part from the oldest to the newest; a part without any has an empty list. */
    async revisionsByPartIds(ids: readonly number[]): Promise<Map<number, RevisionRef[]>> {
      const lists = new Map<number, RevisionRef[]>(ids.map((id) => [id, []]));
      for (const revision of ids.length === 0 ? [] : await store.revisionsOfParts([...new Set(ids)])) {
        lists.get(revision.partId)?.push(revision);
      }
      return lists;
    },

    revisionsByIds(ids: readonly number[]): Promise<Map<number, RevisionRef>> {
      return byId(ids, store.revisionsByIds);
    },

    async symptomsBySlugs(slugs: readonly string[]): Promise<Map<string, Symptom>> {
      const found = slugs.length === 0 ? [] : await store.symptomsBySlugs([...new Set(slugs)]);
      return new Map(found.map((symptom) => [symptom.slug, symptom]));
    },

    summariesByIds(ids: readonly number[]): Promise<Map<number, PartSummary>> {
      return byId(ids, async (known) => summariesOf(await store.partsByIds(known)));
    },
  };

  async function partBySlug(slug: string): Promise<PartRef> {
    const part = await store.partBySlug(slug);
    if (!part) throw noSuchPart();
    const { about: _, ...ref } = part;
    return ref;
  }

  async function summariesOf(parts: readonly (PartRef & { about: string })[]): Promise<PartSummary[]> {
    if (parts.length === 0) return [];
    const ids = parts.map((part) => part.id);
    const [revisions, counts] = await Promise.all([store.revisionsOfParts(ids), store.writeUpCounts(ids)]);
    const revisionsOf = groupBy(revisions, (revision) => revision.partId);
    return parts.map((part) => ({
      ...part,
      revisions: revisionsOf.get(part.id) ?? [],
      writeUps: counts.get(part.id) ?? 0,
    }));
  }
}

function noSuchPart(): NotFound {
  return new NotFound('There is no part of that name in the catalogue.');
}

async function byId<T extends { id: number }>(
  ids: readonly number[],
  find: (ids: readonly number[]) => Promise<T[]>,
): Promise<Map<number, T>> {
  const found = ids.length === 0 ? [] : await find([...new Set(ids)]);
  return new Map(found.map((row) => [row.id, row]));
}
