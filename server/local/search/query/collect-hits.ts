import type { Sql } from '../filter/filter-sql.js';
import { covers } from '../storage/attributes.js';
import type { Connection, SqlValue } from '../storage/connection.js';
import { columnsOf, type IndexState } from '../storage/index-catalogue.js';
import { expressionsFor, type Expressions, type MatchingStrategy } from './match-expression.js';
import type { QueryPlan } from './query-plan.js';

export interface HitRequest {
  readonly plan: QueryPlan;
  /** Over the column that `hitColumn` names for the plan. */
  readonly filter: Sql | undefined;
  readonly strategy: MatchingStrategy;
  readonly searchOn: readonly string[] | null;
}

/**
 * The column of document numbers that a filter is written for. The plus keeps SQLite from running the word search
 * once for every document that passes the filter.
 */
export const hitColumn = (plan: QueryPlan): string => (plan.isPlaceholder ? 'num' : '+rowid');

/** What a word counts that matched only with typos, joined or split. */
const looseCredit = 0.7;

/**
 * Fills the reader's `hits` table: document number; `bucket`, the part of the typed words that the document has
 * (0 to 1); `score`, its BM25 rank times that part, higher is better.
 */
export function collectHits(reader: Connection, index: IndexState, request: HitRequest): void {
  reader.run('DELETE FROM hits');
  const { plan, filter } = request;
  const columns = columnsOf(index);
  if (plan.isPlaceholder) {
    const tests = filter ? [filter] : [];
    const excluded = expressionsFor(plan, request.strategy, undefined, undefined).excluded;
    const { text, values } = conjunction([...tests, ...excluded.map((each) => without(index, each, 'num'))]);
    reader.run(`INSERT INTO hits SELECT num, 1, 0 FROM documents_${index.id} WHERE ${text}`, values);
    return;
  }
  const searched = request.searchOn && columnNumbers(columns, request.searchOn);
  if (searched?.length === 0 || columns.length === 0) return;
  const typos = typoColumns(columns, index, searched ?? undefined);
  const expressions = expressionsFor(plan, request.strategy, searched ?? undefined, typos);
  insertRanked(reader, index, expressions, filter, columns.length);
}

function insertRanked(
  reader: Connection,
  index: IndexState,
  expressions: Expressions,
  filter: Sql | undefined,
  columns: number,
): void {
  const table = `words_${index.id}`;
  const tests = conjunction([
    ...expressions.required.map((each) => within(index, each, '+rowid')),
    ...expressions.excluded.map((each) => without(index, each, '+rowid')),
    ...(filter ? [filter] : []),
  ]);
  const coverage = coverageSql(index, expressions);
  reader.run(
    `INSERT INTO hits SELECT doc, part, rank * (0.2 + 0.8 * part * part) FROM (
       SELECT rowid AS doc, -bm25(${table}, ${columnWeights(columns).join(', ')}) AS rank, ${coverage.text} AS part
       FROM ${table} WHERE ${table} MATCH ? AND ${tests.text})`,
    [...coverage.values, expressions.rank, ...tests.values],
  );
}

/** Part of the typed words that a document has. */
function coverageSql(index: IndexState, { terms }: Expressions): Sql {
  if (terms.length === 0 || (terms.length === 1 && terms[0]?.loose === undefined))
    return { text: '1.0', values: [] };
  const values: SqlValue[] = [];
  const credits = terms.map(({ exact, loose }) => {
    values.push(exact);
    const isExact = `rowid IN (SELECT rowid FROM words_${index.id} WHERE words_${index.id} MATCH ?)`;
    if (loose === undefined) return `CASE WHEN ${isExact} THEN 1.0 ELSE 0.0 END`;
    values.push(loose);
    return `CASE WHEN ${isExact} THEN 1.0 WHEN ${isExact} THEN ${looseCredit} ELSE 0.0 END`;
  });
  return { text: `(${credits.join(' + ')}) / ${terms.length}.0`, values };
}

const within = ({ id }: IndexState, expression: string, doc: string): Sql => ({
  text: `${doc} IN (SELECT rowid FROM words_${id} WHERE words_${id} MATCH ?)`,
  values: [expression],
});

const without = (index: IndexState, expression: string, doc: string): Sql => {
  const { text, values } = within(index, expression, doc);
  return { text: `NOT ${text}`, values };
};

function conjunction(tests: readonly Sql[]): Sql {
  if (tests.length === 0) return { text: '1', values: [] };
  return {
    text: tests.map(({ text }) => `(${text})`).join(' AND '),
    values: tests.flatMap(({ values }) => values),
  };
}

/** Weight of each searched attribute in BM25: the first counts most, the last one. */
function columnWeights(columns: number): string[] {
  return Array.from({ length: columns }, (_, column) =>
    (1 + (4 * (columns - 1 - column)) / Math.max(columns - 1, 1)).toFixed(3),
  );
}

export function columnNumbers(columns: readonly string[], attributes: readonly string[]): number[] {
  return columns.flatMap((column, number) =>
    attributes.some((attribute) => covers(attribute, column) || covers(column, attribute)) ? [number] : [],
  );
}

function typoColumns(
  columns: readonly string[],
  index: IndexState,
  searched: readonly number[] | undefined,
): number[] | undefined {
  const { disableOnAttributes } = index.settings.typoTolerance;
  if (disableOnAttributes.length === 0) return undefined;
  const strict = new Set(columnNumbers(columns, disableOnAttributes));
  return (searched ?? columns.map((_column, number) => number)).filter((number) => !strict.has(number));
}
