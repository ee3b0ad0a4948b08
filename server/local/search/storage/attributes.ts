import type { FilterableAttribute, IndexSettings } from '../settings/settings.js';

/** Whether an attribute name or pattern (`*`, `a.*`, `*_id`) covers a path; a name covers what is nested in it. */
export function covers(pattern: string, path: string): boolean {
  if (pattern === '*' || pattern === path) return true;
  if (!pattern.includes('*')) return path.startsWith(`${pattern}.`);
  const expression = pattern.split('*').map(escaped).join('.*');
  return new RegExp(`^${expression}$`, 's').test(path);
}

const escaped = (text: string) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

const patternsOf = (attribute: FilterableAttribute): readonly string[] =>
  typeof attribute === 'string' ? [attribute] : attribute.attributePatterns;

/** Names of all filterable patterns, as they stand in the settings. */
export const filterablePatterns = (settings: IndexSettings): string[] =>
  settings.filterableAttributes.flatMap(patternsOf);

export function isFilterable(settings: IndexSettings, path: string): boolean {
  return filterablePatterns(settings).some((pattern) => covers(pattern, path));
}

/** What a filterable attribute may be used for: the first pattern that covers it decides. */
export function filterFeatures(settings: IndexSettings, path: string) {
  const attribute = settings.filterableAttributes.find((each) =>
    patternsOf(each).some((pattern) => covers(pattern, path)),
  );
  if (attribute === undefined || typeof attribute === 'string') {
    return { facetSearch: true, equality: true, comparison: true };
  }
  const { facetSearch = false, filter = {} } = attribute.features ?? {};
  return { facetSearch, equality: filter.equality ?? true, comparison: filter.comparison ?? false };
}

/** Attributes that custom ranking rules (`views:desc`) order by. */
export const rankedAttributes = (settings: IndexSettings): string[] =>
  settings.rankingRules
    .filter((rule) => rule.includes(':'))
    .map((rule) => rule.slice(0, rule.lastIndexOf(':')));

/** Whether values at the path are kept for filters, facets, sorting or making distinct. */
export function keepsFacts(settings: IndexSettings, path: string): boolean {
  return (
    isFilterable(settings, path) ||
    settings.sortableAttributes.some((pattern) => covers(pattern, path)) ||
    settings.distinctAttribute === path ||
    rankedAttributes(settings).includes(path)
  );
}

/** Attributes searched, most important first; with `*` those met so far. */
export function searchedAttributes(settings: IndexSettings, met: readonly string[]): readonly string[] {
  return settings.searchableAttributes.includes('*') ? met : settings.searchableAttributes;
}
