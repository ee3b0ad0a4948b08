import { z } from 'zod';
import { ApiError } from '../http/api-error.js';

const count = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER);
const names = z.array(z.string()).nullable();

/** Every parameter of a search with its shape; its error code is `invalid_search_<name>`. */
const shapes = {
  q: z.string().nullable(),
  offset: count,
  limit: count,
  page: count.nullable(),
  hitsPerPage: count.nullable(),
  filter: z.unknown(),
  facets: names,
  sort: names,
  attributesToRetrieve: names,
  attributesToCrop: names,
  cropLength: count,
  cropMarker: z.string(),
  attributesToHighlight: names,
  highlightPreTag: z.string(),
  highlightPostTag: z.string(),
  showMatchesPosition: z.boolean(),
  showRankingScore: z.boolean(),
  showRankingScoreDetails: z.boolean(),
  showPerformanceDetails: z.boolean(),
  rankingScoreThreshold: z.number().min(0).max(1).nullable(),
  matchingStrategy: z.enum(['last', 'all', 'frequency']),
  attributesToSearchOn: names,
  distinct: z.string().nullable(),
  locales: names,
  retrieveVectors: z.literal(false),
  vector: z.null(),
  hybrid: z.null(),
  media: z.null(),
  personalize: z.null(),
} satisfies Record<string, z.ZodType>;

type Shapes = typeof shapes;
type Given = { readonly [Name in keyof Shapes]?: z.infer<Shapes[Name]> };

/** A search as asked for, every parameter with a value. */
export interface SearchRequest {
  readonly q: string;
  readonly offset: number;
  readonly limit: number;
  readonly page: number | undefined;
  readonly hitsPerPage: number | undefined;
  readonly filter: unknown;
  readonly facets: readonly string[];
  readonly sort: readonly string[];
  readonly attributesToRetrieve: readonly string[];
  readonly attributesToCrop: readonly string[];
  readonly cropLength: number;
  readonly cropMarker: string;
  readonly attributesToHighlight: readonly string[];
  readonly highlightPreTag: string;
  readonly highlightPostTag: string;
  readonly showMatchesPosition: boolean;
  readonly showRankingScore: boolean;
  readonly showRankingScoreDetails: boolean;
  readonly rankingScoreThreshold: number | undefined;
  readonly matchingStrategy: 'last' | 'all' | 'frequency';
  readonly attributesToSearchOn: readonly string[] | null;
  readonly distinct: string | undefined;
}

const snakeCase = (name: string) => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** Reads a search sent as JSON. `also` are fields the route itself understands. Throws ApiError naming the field. */
export function readSearch(body: unknown, also: readonly string[] = []): SearchRequest {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw new ApiError('bad_request', 'Invalid value type: expected an object of search parameters');
  }
  const given: Record<string, unknown> = {};
  for (const [name, value] of Object.entries(body)) {
    if (also.includes(name)) continue;
    if (!Object.hasOwn(shapes, name)) {
      const known = [...Object.keys(shapes), ...also].map((each) => `\`${each}\``).join(', ');
      throw new ApiError('bad_request', `Unknown field \`${name}\`: expected one of ${known}`);
    }
    given[name] = readField(name as keyof Shapes, value);
  }
  return withDefaults(given as Given);
}

function readField(name: keyof Shapes, value: unknown): unknown {
  const parsed = shapes[name].safeParse(value);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  const code = `invalid_search_${snakeCase(name)}`;
  throw new ApiError(
    code,
    `Invalid value at \`.${[name, ...(issue?.path ?? [])].join('.')}\`: ${issue?.message ?? ''}`,
  );
}

const lists = [
  'facets',
  'sort',
  'attributesToRetrieve',
  'attributesToCrop',
  'attributesToHighlight',
  'attributesToSearchOn',
  'locales',
];
const counts = ['offset', 'limit', 'page', 'hitsPerPage', 'cropLength', 'rankingScoreThreshold'];
const flags = [
  'showMatchesPosition',
  'showRankingScore',
  'showRankingScoreDetails',
  'showPerformanceDetails',
  'retrieveVectors',
];

/** Puts the parameters of a GET search, all texts, into the types that the JSON form has. */
export function searchFromParams(params: Readonly<Record<string, unknown>>): Record<string, unknown> {
  return Object.fromEntries(Object.entries(params).map(([name, value]) => [name, typed(name, value)]));
}

function typed(name: string, value: unknown): unknown {
  if (typeof value !== 'string') return value;
  if (lists.includes(name)) return value.split(',');
  if (counts.includes(name)) return value.trim() === '' ? value : numberOr(value);
  if (flags.includes(name)) return value === 'true' ? true : value === 'false' ? false : value;
  if (name === 'filter' && value.trimStart().startsWith('[')) return jsonOr(value);
  return value;
}

const numberOr = (text: string): unknown => (Number.isFinite(Number(text)) ? Number(text) : text);

function jsonOr(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return text;
  }
}

function withDefaults(given: Given): SearchRequest {
  return {
    q: given.q ?? '',
    offset: given.offset ?? 0,
    limit: given.limit ?? 20,
    page: given.page ?? undefined,
    hitsPerPage: given.hitsPerPage ?? undefined,
    filter: given.filter,
    facets: given.facets ?? [],
    sort: given.sort ?? [],
    attributesToRetrieve: given.attributesToRetrieve ?? ['*'],
    attributesToCrop: given.attributesToCrop ?? [],
    cropLength: given.cropLength ?? 10,
    cropMarker: given.cropMarker ?? '…',
    attributesToHighlight: given.attributesToHighlight ?? [],
    highlightPreTag: given.highlightPreTag ?? '<em>',
    highlightPostTag: given.highlightPostTag ?? '</em>',
    showMatchesPosition: given.showMatchesPosition ?? false,
    showRankingScore: given.showRankingScore ?? false,
    showRankingScoreDetails: given.showRankingScoreDetails ?? false,
    rankingScoreThreshold: given.rankingScoreThreshold ?? undefined,
    matchingStrategy: given.matchingStrategy ?? 'last',
    attributesToSearchOn: given.attributesToSearchOn ?? null,
    distinct: given.distinct ?? undefined,
  };
}
