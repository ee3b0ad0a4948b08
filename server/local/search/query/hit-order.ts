import { ApiError } from '../http/api-error.js';
import { covers } from '../storage/attributes.js';
import type { SqlValue } from '../storage/connection.js';
import type { Sql } from '../filter/filter-sql.js';
import type { IndexState } from '../storage/index-catalogue.js';

interface SortRule {
  readonly attribute: string;
  readonly direction: 'asc' | 'desc';
}

/** Reads `attribute:asc` texts and checks that the attributes are sortable. Throws ApiError with the code given. */
export function readSort(
  sort: readonly string[],
  index: IndexState,
  code = 'invalid_search_sort',
): SortRule[] {
  const { sortableAttributes } = index.settings;
  return sort.map((text) => {
    const rule = sortRule(text);
    if (!rule)
      throw new ApiError(
        code,
        `Invalid syntax for the sort parameter: expected expression ending by \`:asc\` or \`:desc\`, found \`${text}\`.`,
      );
    if (!sortableAttributes.some((pattern) => covers(pattern, rule.attribute))) {
      const available =
        sortableAttributes.length === 0
          ? 'This index does not have configured sortable attributes.'
          : `Available sortable attributes are: ${sortableAttributes.map((each) => `\`${each}\``).join(', ')}.`;
      throw new ApiError(code, `Attribute \`${rule.attribute}\` is not sortable. ${available}`);
    }
    return rule;
  });
}

function sortRule(text: string): SortRule | undefined {
  const match = /^(?<attribute>.+):(?<direction>asc|desc)$/s.exec(text.trim());
  const { attribute, direction } = match?.groups ?? {};
  return attribute === undefined
    ? undefined
    : { attribute, direction: direction === 'desc' ? 'desc' : 'asc' };
}

/**
 * ORDER BY for the hits table under the alias h. Custom rules and `sort` placed before `words` come first; a
 * `sort` placed later orders documents that have as much of the query; the rank settles the rest.
 */
export function hitOrder(sort: readonly SortRule[], index: IndexState): Sql {
  const rules = index.settings.rankingRules;
  const words = rules.indexOf('words');
  const terms: string[] = [];
  const values: SqlValue[] = [];
  const add = (rule: SortRule) => {
    const order = orderBy(rule, index);
    terms.push(...order.terms);
    values.push(...order.values);
  };
  const isRanked = rules.some((rule) => rankRules.has(rule));
  const addRank = () => {
    if (sort.length > 0 && rules.indexOf('sort') > words && isRanked) terms.push('round(h.bucket, 2) DESC');
  };
  const late: SortRule[] = [];
  rules.forEach((rule, place) => {
    if (place === Math.max(words, 0)) addRank();
    if (rule === 'sort') sort.forEach(add);
    const custom = sortRule(rule);
    if (custom && place < words) add(custom);
    else if (custom) late.push(custom);
  });
  if (isRanked) terms.push('h.score DESC');
  late.forEach(add);
  terms.push('h.doc');
  return { text: terms.join(', '), values };
}

const rankRules = new Set([
  'words',
  'typo',
  'proximity',
  'attribute',
  'attributeRank',
  'wordPosition',
  'exactness',
]);

/** Numbers before texts, and documents without a value last in both directions. */
function orderBy({ attribute, direction }: SortRule, index: IndexState) {
  const pick = direction === 'asc' ? 'min' : 'max';
  const facts = `FROM facts_${index.id} f WHERE f.doc = h.doc AND f.field = ?`;
  const number = `(SELECT ${pick}(f.number) ${facts})`;
  const text = `(SELECT ${pick}(f.folded) ${facts} AND f.kind IN ('text', 'truth'))`;
  const terms = [`${number} ${direction} NULLS LAST`, `${text} ${direction} NULLS LAST`];
  return { terms, values: [attribute, attribute] };
}
