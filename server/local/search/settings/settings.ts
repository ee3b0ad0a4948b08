/** A filterable attribute: a name, or patterns with what they are for. */
export type FilterableAttribute =
  | string
  | {
      readonly attributePatterns: readonly string[];
      readonly features?: {
        readonly facetSearch?: boolean;
        readonly filter?: { readonly equality?: boolean; readonly comparison?: boolean };
      };
    };

export interface TypoTolerance {
  readonly enabled: boolean;
  readonly minWordSizeForTypos: { readonly oneTypo: number; readonly twoTypos: number };
  readonly disableOnWords: readonly string[];
  readonly disableOnAttributes: readonly string[];
  readonly disableOnNumbers: boolean;
}

/** All settings of an index, each with a value. */
export interface IndexSettings {
  readonly displayedAttributes: readonly string[];
  readonly searchableAttributes: readonly string[];
  readonly filterableAttributes: readonly FilterableAttribute[];
  readonly sortableAttributes: readonly string[];
  readonly rankingRules: readonly string[];
  readonly stopWords: readonly string[];
  readonly nonSeparatorTokens: readonly string[];
  readonly separatorTokens: readonly string[];
  readonly dictionary: readonly string[];
  readonly synonyms: Readonly<Record<string, readonly string[]>>;
  readonly distinctAttribute: string | null;
  readonly proximityPrecision: 'byWord' | 'byAttribute';
  readonly typoTolerance: TypoTolerance;
  readonly faceting: {
    readonly maxValuesPerFacet: number;
    readonly sortFacetValuesBy: Readonly<Record<string, 'alpha' | 'count'>>;
  };
  readonly pagination: { readonly maxTotalHits: number };
  readonly embedders: Readonly<Record<string, never>>;
  readonly searchCutoffMs: number | null;
  readonly localizedAttributes: readonly unknown[] | null;
  readonly foreignKeys: readonly unknown[];
  readonly facetSearch: boolean;
  readonly prefixSearch: 'indexingTime' | 'disabled';
}

export const defaultSettings: IndexSettings = {
  displayedAttributes: ['*'],
  searchableAttributes: ['*'],
  filterableAttributes: [],
  sortableAttributes: [],
  rankingRules: ['words', 'typo', 'proximity', 'attributeRank', 'sort', 'wordPosition', 'exactness'],
  stopWords: [],
  nonSeparatorTokens: [],
  separatorTokens: [],
  dictionary: [],
  synonyms: {},
  distinctAttribute: null,
  proximityPrecision: 'byWord',
  typoTolerance: {
    enabled: true,
    minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 },
    disableOnWords: [],
    disableOnAttributes: [],
    disableOnNumbers: false,
  },
  faceting: { maxValuesPerFacet: 100, sortFacetValuesBy: { '*': 'alpha' } },
  pagination: { maxTotalHits: 1000 },
  embedders: {},
  searchCutoffMs: null,
  localizedAttributes: null,
  foreignKeys: [],
  facetSearch: true,
  prefixSearch: 'indexingTime',
};

/** A change as sent: missing leaves a setting, null puts its default back. */
export type SettingsChange = { readonly [Name in keyof IndexSettings]?: unknown };

/** The settings after a change that `readSettingsChange` let through. */
export function changedSettings(before: IndexSettings, change: SettingsChange): IndexSettings {
  const after: Record<string, unknown> = { ...before };
  for (const name of Object.keys(defaultSettings) as (keyof IndexSettings)[]) {
    const value = change[name];
    if (value === undefined) continue;
    if (value === null) after[name] = defaultSettings[name];
    else if (mergedSettings.has(name)) after[name] = merged(before[name], value, defaultSettings[name]);
    else if (sortedSettings.has(name)) after[name] = [...new Set(value as string[])].sort();
    else after[name] = value;
  }
  return after as unknown as IndexSettings;
}

const mergedSettings = new Set<keyof IndexSettings>(['typoTolerance', 'faceting', 'pagination']);
const sortedSettings = new Set<keyof IndexSettings>([
  'stopWords',
  'sortableAttributes',
  'separatorTokens',
  'nonSeparatorTokens',
  'dictionary',
]);

function merged(before: unknown, change: unknown, defaults: unknown): unknown {
  const result: Record<string, unknown> = { ...(before as Record<string, unknown>) };
  for (const [key, value] of Object.entries(change as Record<string, unknown>)) {
    const fallback = (defaults as Record<string, unknown>)[key];
    if (value === null) result[key] = fallback;
    else if (key === 'minWordSizeForTypos') result[key] = merged(result[key], value, fallback);
    else if (key === 'sortFacetValuesBy') result[key] = { ...(fallback as object), ...(value as object) };
    else if (value !== undefined) result[key] = value;
  }
  return result;
}

/** Whether a change of settings makes the stored words or facts wrong, so that documents must be read again. */
export function needsReindexing(before: IndexSettings, after: IndexSettings): boolean {
  const kept = (settings: IndexSettings) =>
    JSON.stringify([
      settings.searchableAttributes,
      settings.filterableAttributes,
      settings.sortableAttributes,
      settings.distinctAttribute,
      settings.rankingRules.filter((rule) => rule.includes(':')),
    ]);
  return kept(before) !== kept(after);
}
