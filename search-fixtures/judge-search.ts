import { readFile } from 'node:fs/promises';
import { z } from 'zod';
import { SearchQuery, type SearchResults } from '../shared/contract/search.js';
import { ndcg, type Grades } from './ndcg.js';

const JudgedQueries = z
  .array(z.strictObject({ query: z.string().min(1), results: z.record(z.string(), z.number()) }))
  .min(1);

/** How far down a list is judged. */
const depth = 10;

export interface JudgedAnswer {
  readonly query: string;
  /** 0 … 1. */
  readonly ndcg: number;
  /** The first slug that is shown, and the best judged one that is missing from the first ten, if any. */
  readonly first: string | undefined;
  readonly missing: string | undefined;
}

export interface Judgement {
  readonly answers: JudgedAnswer[];
  readonly mean: number;
}

/** Asks every judged query, without filters and without a bench, and grades the order of what comes back. */
export async function judgeSearch(
  search: (query: SearchQuery) => Promise<SearchResults>,
): Promise<Judgement> {
  const file = new URL('./queries.json', import.meta.url);
  const judged = JudgedQueries.parse(JSON.parse(await readFile(file, 'utf8')));
  const answers: JudgedAnswer[] = [];
  for (const { query, results: grades } of judged) {
    const { items } = await search(SearchQuery.parse({ q: query, limit: depth }));
    answers.push(
      gradeAnswer(
        query,
        grades,
        items.map((item) => item.slug),
      ),
    );
  }
  return { answers, mean: answers.reduce((sum, answer) => sum + answer.ndcg, 0) / answers.length };
}

function gradeAnswer(query: string, grades: Grades, slugs: string[]): JudgedAnswer {
  const best = Object.entries(grades).sort(([, one], [, other]) => other - one);
  return {
    query,
    ndcg: ndcg(slugs, grades, depth),
    first: slugs[0],
    missing: best.find(([slug]) => !slugs.includes(slug))?.[0],
  };
}

/** One line for each query, the worst first, and the mean. */
export function judgementLines({ answers, mean }: Judgement): string[] {
  const worstFirst = [...answers].sort((one, other) => one.ndcg - other.ndcg);
  const lines = worstFirst.map(({ query, ndcg: value, first, missing }) => {
    const note = value === 1 ? '' : `  first: ${first ?? 'nothing'}${missing ? `, missing: ${missing}` : ''}`;
    return `${value.toFixed(3)}  ${query}${note}`;
  });
  return [...lines, `NDCG@${depth} over ${answers.length} queries: ${mean.toFixed(3)}`];
}
