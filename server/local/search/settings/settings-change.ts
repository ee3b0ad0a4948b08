import { z } from 'zod';
import { ApiError } from '../http/api-error.js';
import { defaultSettings, type IndexSettings, type SettingsChange } from './settings.js';

const names = z.array(z.string());
const whole = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER);
const wordSize = z.number().int().min(0).max(255).nullable().optional();
const ruleName =
  /^(words|typo|proximity|attribute|attributeRank|wordPosition|sort|exactness|[^\s:]+:(asc|desc))$/;

const granular = z.strictObject({
  attributePatterns: names,
  features: z
    .strictObject({
      facetSearch: z.boolean().optional(),
      filter: z
        .strictObject({ equality: z.boolean().optional(), comparison: z.boolean().optional() })
        .optional(),
    })
    .optional(),
});

const shapes: Record<keyof IndexSettings, z.ZodType> = {
  displayedAttributes: names,
  searchableAttributes: names.max(1000),
  filterableAttributes: z.array(z.union([z.string(), granular])),
  sortableAttributes: names,
  rankingRules: z.array(
    z.string().regex(ruleName, 'must be a ranking rule such as words, sort or `attribute:desc`'),
  ),
  stopWords: names,
  nonSeparatorTokens: names,
  separatorTokens: names,
  dictionary: names,
  synonyms: z.record(z.string(), names),
  distinctAttribute: z.string(),
  proximityPrecision: z.enum(['byWord', 'byAttribute']),
  typoTolerance: z.strictObject({
    enabled: z.boolean().nullable().optional(),
    minWordSizeForTypos: z.strictObject({ oneTypo: wordSize, twoTypos: wordSize }).nullable().optional(),
    disableOnWords: names.nullable().optional(),
    disableOnAttributes: names.nullable().optional(),
    disableOnNumbers: z.boolean().nullable().optional(),
  }),
  faceting: z.strictObject({
    maxValuesPerFacet: whole.nullable().optional(),
    sortFacetValuesBy: z
      .record(z.string(), z.enum(['alpha', 'count']))
      .nullable()
      .optional(),
  }),
  pagination: z.strictObject({ maxTotalHits: whole.nullable().optional() }),
  embedders: z.strictObject({}, 'is not supported by the local search server: it has no embedders'),
  searchCutoffMs: whole,
  localizedAttributes: z.array(z.strictObject({ attributePatterns: names, locales: names })),
  foreignKeys: z.array(z.strictObject({ foreignIndexUid: z.string(), fieldName: z.string() })),
  facetSearch: z.boolean(),
  prefixSearch: z.enum(['indexingTime', 'disabled']),
};

const snakeCase = (name: string) => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** Checks a change of one setting; null is always fine. Throws `invalid_settings_<name>`. */
export function readSetting(name: keyof IndexSettings, value: unknown): unknown {
  if (value === null) return null;
  const parsed = shapes[name].safeParse(value);
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    const place = ['', name, ...(issue?.path ?? [])].join('.');
    throw new ApiError(
      `invalid_settings_${snakeCase(name)}`,
      `Invalid value at \`${place}\`: ${issue?.message ?? 'not understood'}`,
    );
  }
  if (name === 'typoTolerance')
    checkWordSizes(parsed.data as { minWordSizeForTypos?: { oneTypo?: number; twoTypos?: number } });
  return parsed.data;
}

/** Checks a change of several settings. Unknown names are refused. */
export function readSettingsChange(body: unknown): SettingsChange {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw new ApiError('bad_request', 'Invalid value type: expected an object of settings');
  }
  const change: Record<string, unknown> = {};
  for (const [name, value] of Object.entries(body)) {
    if (!Object.hasOwn(defaultSettings, name)) {
      const known = Object.keys(defaultSettings)
        .map((each) => `\`${each}\``)
        .join(', ');
      throw new ApiError('bad_request', `Unknown field \`${name}\`: expected one of ${known}`);
    }
    change[name] = readSetting(name as keyof IndexSettings, value);
  }
  return change;
}

function checkWordSizes(tolerance: {
  minWordSizeForTypos?: { oneTypo?: number; twoTypos?: number } | null;
}): void {
  const { oneTypo = 5, twoTypos = 9 } = tolerance.minWordSizeForTypos ?? {};
  if (oneTypo > twoTypos) {
    throw new ApiError(
      'invalid_settings_typo_tolerance',
      `\`minWordSizeForTypos\`: \`oneTypo\` (${oneTypo}) must not be above \`twoTypos\` (${twoTypos}).`,
    );
  }
}
