import type { Meilisearch, Settings } from 'meilisearch';
import type { WriteUpDocument } from '../../shared/contract/search.js';
import { stopWords, synonyms } from './synonyms.js';

export const defaultIndexUid = 'write-ups';

/** Furthest place in a list of results that can be asked for. */
export const furthestHit = 2000;

type Attribute = keyof WriteUpDocument;
/** From the weightiest down: what it is called, what the owner notices, what it is about, why, and what to do. */
const searchable: Attribute[] = [
  'title',
  'symptoms',
  'noticed',
  'summary',
  'parts',
  'fixTitles',
  'measured',
  'cause',
  'fixText',
];
const filterable: Attribute[] = [
  'symptomSlugs',
  'partSlugs',
  'revisionIds',
  'notRevisionIds',
  'partIds',
  'permanence',
  'standing',
  'kind',
];
const sortable: Attribute[] = ['publishedAt'];

export const indexSettings = {
  searchableAttributes: searchable,
  filterableAttributes: filterable,
  sortableAttributes: sortable,
  rankingRules: [
    'words',
    'typo',
    'proximity',
    'attributeRank',
    'sort',
    'wordPosition',
    'exactness',
    'publishedAt:desc',
  ],
  stopWords: [...stopWords],
  synonyms: { ...synonyms },
  // A figure with one digit changed is another dimension, not a misspelling.
  typoTolerance: { minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 }, disableOnNumbers: true },
  faceting: { maxValuesPerFacet: 500, sortFacetValuesBy: { '*': 'count' } },
  pagination: { maxTotalHits: furthestHit },
} satisfies Settings;

/** Settings whose order means something; the engine gives the others back in an order of its own. */
const ordered = new Set(['searchableAttributes', 'rankingRules']);

/**
 * Makes the index if it is not there and gives it these settings unless it has them. Resolves when the engine is done;
 * throws what the SDK throws, or where a task fails.
 */
export async function ensureSearchIndex(client: Meilisearch, uid: string = defaultIndexUid): Promise<void> {
  const made = await client.createIndex(uid, { primaryKey: 'id' }).waitTask();
  if (made.status !== 'succeeded' && made.error?.code !== 'index_already_exists') {
    throw new Error(`Index ${uid} could not be made: ${made.error?.message ?? made.status}`);
  }
  const index = client.index(uid);
  const present = (await index.getSettings()) as Record<string, unknown>;
  const wanted = Object.entries(indexSettings).filter(
    ([name, value]) => !covers(present[name], value, ordered.has(name)),
  );
  if (wanted.length === 0) return;
  const changed = await index.updateSettings(Object.fromEntries(wanted)).waitTask({ timeout: 60_000 });
  if (changed.status !== 'succeeded')
    throw new Error(`Index ${uid} did not take its settings: ${changed.error?.message ?? changed.status}`);
}

/** Whether a setting as it is says all that is wanted of it; it may say more. */
function covers(present: unknown, wanted: unknown, inOrder: boolean): boolean {
  if (Array.isArray(wanted)) {
    if (!Array.isArray(present) || present.length !== wanted.length) return false;
    return inOrder
      ? wanted.every((value, at) => present[at] === value)
      : wanted.every((value) => present.includes(value));
  }
  if (typeof wanted === 'object' && wanted !== null) {
    if (typeof present !== 'object' || present === null) return false;
    return Object.entries(wanted).every(([name, value]) =>
      covers((present as Record<string, unknown>)[name], value, false),
    );
  }
  return present === wanted;
}
