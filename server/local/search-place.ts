import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Meilisearch } from 'meilisearch';
import { defaultIndexUid } from '../search/index-settings.js';

/**
 * The engine at MEILI_HOST with MEILI_KEY, or the one that `npm start` keeps (it must be running), and the index to work
 * on. Throws one sentence where there is neither.
 */
export function searchPlace(environment: Record<string, string | undefined>): {
  engine: Meilisearch;
  indexUid: string;
} {
  const indexUid = environment['SEARCH_INDEX'] || defaultIndexUid;
  const host = environment['MEILI_HOST'];
  if (host) {
    const apiKey = environment['MEILI_KEY'];
    return { engine: new Meilisearch({ host, ...(apiKey ? { apiKey } : {}) }), indexUid };
  }
  const port = environment['SHIMLORE_SEARCH_PORT'] || '4312';
  return {
    engine: new Meilisearch({ host: `http://127.0.0.1:${port}`, apiKey: localKey(environment) }),
    indexUid,
  };
}

function localKey(environment: Record<string, string | undefined>): string {
  const file = join(environment['SHIMLORE_DATA'] || 'data', 'secrets.json');
  let key: unknown;
  try {
    key = (JSON.parse(readFileSync(file, 'utf8')) as { search?: unknown }).search;
  } catch {
    key = undefined;
  }
  if (typeof key !== 'string') {
    throw new Error(
      `There is no search engine to work with: set MEILI_HOST and MEILI_KEY, or run npm start, which makes one (${file}).`,
    );
  }
  return key;
}
