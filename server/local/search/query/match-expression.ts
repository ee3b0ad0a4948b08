import { distinct, type Phrase, type QueryPlan, type Term } from './query-plan.js';

export type MatchingStrategy = 'last' | 'all' | 'frequency';

/** A phrase in the words of FTS5. */
const phraseText = ({ stems, prefix }: Phrase): string =>
  `"${stems.join(' ').replaceAll('"', '""')}"${prefix ? ' *' : ''}`;

const anyOf = (phrases: readonly Phrase[]): string => phrases.map(phraseText).join(' OR ');

/** Narrows an expression to attributes by their column numbers; undefined narrows nothing. */
export function onColumns(expression: string, columns: readonly number[] | undefined): string {
  if (columns === undefined) return expression;
  return `{${columns.map((column) => `c${column}`).join(' ')}} : (${expression})`;
}

export interface Expressions {
  /** All that counts for the rank of a document. */
  readonly rank: string;
  /** Each of these must match. */
  readonly required: readonly string[];
  /** None of these may match. */
  readonly excluded: readonly string[];
  /** For each typed word: matched as it is, or only loosely. */
  readonly terms: readonly { readonly exact: string; readonly loose: string | undefined }[];
}

/** At more words than this, pairs of neighbours add more work than order. */
const mostWordsForPairs = 6;

/** Puts a plan into FTS5 expressions. `typoColumns` are those where typos are allowed. */
export function expressionsFor(
  plan: QueryPlan,
  strategy: MatchingStrategy,
  columns: readonly number[] | undefined,
  typoColumns: readonly number[] | undefined,
): Expressions {
  const exactly = (phrases: readonly Phrase[]) => onColumns(anyOf(phrases), columns);
  const loosely = (phrases: readonly Phrase[]) => onColumns(anyOf(phrases), typoColumns ?? columns);
  const terms = plan.terms.map(({ exact, loose }) => ({
    exact: exactly(exact),
    loose: loose.length === 0 || typoColumns?.length === 0 ? undefined : loosely(loose),
  }));
  const either = ({ exact, loose }: { exact: string; loose: string | undefined }) =>
    loose === undefined ? exact : `(${exact}) OR (${loose})`;

  const allExact = distinct([
    ...plan.phrases,
    ...plan.terms.flatMap((term) => term.exact),
    ...pairs(plan.terms),
  ]);
  const allLoose = distinct(
    plan.terms.flatMap((term) => term.loose),
    allExact,
  );
  const rank = either({
    exact: exactly(allExact),
    loose: allLoose.length === 0 || typoColumns?.length === 0 ? undefined : loosely(allLoose),
  });
  const mustMatch = requiredTerms(plan.terms, strategy)
    .map((at) => terms[at])
    .filter((term) => term !== undefined);
  return {
    rank,
    required: [...plan.phrases.map((phrase) => exactly([phrase])), ...mustMatch.map(either)],
    excluded: plan.excluded.map((phrase) => anyOf([phrase])),
    terms,
  };
}

/** Neighbours standing side by side raise a document. */
function pairs(terms: readonly Term[]): Phrase[] {
  if (terms.length < 2 || terms.length > mostWordsForPairs) return [];
  return terms.slice(1).flatMap((term, at) => {
    const [before] = terms[at]?.exact ?? [];
    const [after] = term.exact;
    return before && after ? [{ stems: [...before.stems, ...after.stems], prefix: false }] : [];
  });
}

/**
 * Which words a document must have: all of them; or the first, where words are given up from the last; or the
 * rarest, where they are given up by frequency. Words that no document has are passed over, except by `all`.
 */
function requiredTerms(terms: readonly Term[], strategy: MatchingStrategy): number[] {
  const places = terms.map((_term, at) => at);
  if (strategy === 'all') return places;
  const known = places.filter((at) => (terms[at]?.frequency ?? 0) > 0);
  if (strategy === 'frequency') {
    known.sort((left, right) => (terms[left]?.frequency ?? 0) - (terms[right]?.frequency ?? 0));
  }
  return (known.length > 0 ? known : places).slice(0, 1);
}
