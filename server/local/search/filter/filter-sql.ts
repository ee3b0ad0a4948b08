import type { SqlValue } from '../storage/connection.js';
import { filterablePatterns, filterFeatures, isFilterable } from '../storage/attributes.js';
import { folded } from '../storage/document-store.js';
import type { IndexState } from '../storage/index-catalogue.js';
import { FilterSyntaxError } from './filter-tokens.js';
import { parseFilter, type Condition, type Filter } from './filter-parser.js';

/** A piece of SQL that is true or false, with its values in order. */
export interface Sql {
  readonly text: string;
  readonly values: readonly SqlValue[];
}

/**
 * Reads the filter of a request: a text, or an array whose elements all must hold, where any one of the texts
 * in an inner array suffices. Answers undefined where nothing is filtered. Throws FilterSyntaxError.
 */
export function readFilter(filter: unknown): Filter | undefined {
  if (filter === undefined || filter === null) return undefined;
  if (typeof filter === 'string') return parseFilter(filter);
  if (!Array.isArray(filter)) throw new FilterSyntaxError('The filter must be a text, or an array of texts.');
  const all = filter.map(readElement).filter((each) => each !== undefined);
  return all.length === 0 ? undefined : { all };
}

function readElement(element: unknown): Filter | undefined {
  if (typeof element === 'string') return parseFilter(element);
  if (Array.isArray(element) && element.every((each) => typeof each === 'string')) {
    const any = element.map(parseFilter).filter((each) => each !== undefined);
    return any.length === 0 ? undefined : { any };
  }
  throw new FilterSyntaxError('An array filter holds texts, or arrays of texts, two levels deep at most.');
}

/** The filter as SQL over `doc`, a column expression of document numbers. Throws where an attribute is not filterable. */
export function filterSql(filter: Filter, index: IndexState, doc: string): Sql {
  if ('all' in filter)
    return joined(
      filter.all.map((each) => filterSql(each, index, doc)),
      'AND',
    );
  if ('any' in filter)
    return joined(
      filter.any.map((each) => filterSql(each, index, doc)),
      'OR',
    );
  if ('not' in filter) {
    const { text, values } = filterSql(filter.not, index, doc);
    return { text: `NOT ${text}`, values };
  }
  return conditionSql(filter, index, doc);
}

/** Joins in halves, so that a filter of thousands of conditions stays a shallow tree for the database. */
function joined(pieces: readonly Sql[], word: 'AND' | 'OR'): Sql {
  const [first] = pieces;
  if (pieces.length === 1 && first) return first;
  const middle = Math.ceil(pieces.length / 2);
  const left = joined(pieces.slice(0, middle), word);
  const right = joined(pieces.slice(middle), word);
  return { text: `(${left.text} ${word} ${right.text})`, values: [...left.values, ...right.values] };
}

function conditionSql(condition: Condition, index: IndexState, doc: string): Sql {
  const { field } = condition;
  const { settings } = index;
  if (!isFilterable(settings, field)) throw new FilterSyntaxError(notFilterable(field, index));
  const features = filterFeatures(settings, field);
  const compares =
    condition.test === 'between' || (condition.test === 'compare' && /[<>]/.test(condition.sign));
  if (
    (compares && !features.comparison) ||
    (condition.test === 'compare' && !compares && !features.equality)
  ) {
    throw new FilterSyntaxError(`The settings do not allow this operator on \`${field}\`.`);
  }
  const holds = (text: string, ...values: SqlValue[]): Sql => ({
    text: `${doc} IN (SELECT doc FROM facts_${index.id} WHERE field = ? AND ${text})`,
    values: [field, ...values],
  });
  switch (condition.test) {
    case 'exists':
      return holds('1');
    case 'null':
      return holds("kind = 'null'");
    case 'empty':
      return holds("kind IN ('empty', 'emptyText')");
    case 'startsWith': {
      const start = folded(condition.value);
      return holds('substr(folded, 1, ?) = ?', Array.from(start).length, start);
    }
    case 'in': {
      const numbers = condition.values.map(numberIn).filter((number) => number !== undefined);
      return holds(
        '(folded IN (SELECT value FROM json_each(?)) OR number IN (SELECT value FROM json_each(?)))',
        JSON.stringify(condition.values.map(folded)),
        JSON.stringify(numbers),
      );
    }
    case 'between':
      return range(holds, [
        ['>=', condition.from],
        ['<=', condition.to],
      ]);
    case 'compare':
      return comparison(condition.sign, condition.value, holds);
  }
}

type Holds = (text: string, ...values: SqlValue[]) => Sql;

function comparison(sign: string, value: string, holds: Holds): Sql {
  if (sign !== '=' && sign !== '!=') return range(holds, [[sign, value]]);
  const number = numberIn(value);
  const equal =
    number === undefined
      ? holds('folded = ?', folded(value))
      : holds('(folded = ? OR number = ?)', folded(value), number);
  return sign === '=' ? equal : { text: `NOT ${equal.text}`, values: equal.values };
}

/** Numbers compare with numbers; where a bound is no number, texts compare by their letters (dates as ISO texts). */
function range(holds: Holds, bounds: readonly (readonly [sign: string, value: string])[]): Sql {
  const numbers = bounds.map(([, value]) => numberIn(value));
  if (numbers.every((number) => number !== undefined)) {
    return holds(bounds.map(([sign]) => `number ${sign} ?`).join(' AND '), ...numbers);
  }
  const test = bounds.map(([sign]) => `folded ${sign} ?`).join(' AND ');
  return holds(`kind = 'text' AND ${test}`, ...bounds.map(([, value]) => folded(value)));
}

function numberIn(text: string): number | undefined {
  if (!/^\s*[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?\s*$/i.test(text)) return undefined;
  const number = Number(text);
  return Number.isFinite(number) ? number : undefined;
}

function notFilterable(field: string, index: IndexState): string {
  const patterns = filterablePatterns(index.settings);
  const available =
    patterns.length === 0
      ? 'This index does not have configured filterable attributes.'
      : `Available filterable attribute patterns are: ${patterns.map((each) => `\`${each}\``).join(', ')}.`;
  return `Attribute \`${field}\` is not filterable. ${available}`;
}
