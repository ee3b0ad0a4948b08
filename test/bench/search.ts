/**
 * Compares the local search server's engine (SQLite FTS5 with its typo layer) with MiniSearch on generated
 * write-ups. Prints milliseconds of processor time and ratios; asserts nothing, since machines differ.
 *
 *   npm run bench:search            10,000 documents
 *   npm run bench:search -- 50000   as many as you like
 */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import MiniSearch from 'minisearch';
import { answerSearch } from '../../server/local/search/query/answer-search.js';
import { readSearch } from '../../server/local/search/query/search-request.js';
import { IndexCatalogue } from '../../server/local/search/storage/index-catalogue.js';
import { Connection } from '../../server/local/search/storage/connection.js';
import { TaskRunner } from '../../server/local/search/tasks/task-runner.js';
import { TaskStore } from '../../server/local/search/tasks/task-store.js';
import type { TaskWork } from '../../server/local/search/tasks/task.js';

interface WriteUp extends Record<string, unknown> {
  id: number;
  title: string;
  text: string;
  kind: string;
  maker: string;
  part: string;
  permanence: string;
  year: number;
}

const size = Number(process.argv[2] ?? 10_000);
const wordsKnown = 30_000;
const wordsPerText = 200;
const queriesPerKind = 60;
const facets = ['kind', 'maker', 'part', 'permanence', 'year'];

/** Numbers from 0 up to 1, the same ones every time (mulberry32). */
function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

const random = randomNumbers(7);
const below = (limit: number) => Math.floor(random() * limit);
const syllables = [
  'ba',
  'co',
  'di',
  'fu',
  'ge',
  'lo',
  'mi',
  'na',
  'po',
  'ra',
  'se',
  'ti',
  'vu',
  'ker',
  'lan',
  'mor',
  'sten',
];
const vocabulary = Array.from({ length: wordsKnown }, () =>
  Array.from({ length: 2 + below(3) }, () => syllables[below(syllables.length)]).join(''),
);
/** A few words are common and most are rare, as in real texts. */
const word = () => vocabulary[Math.floor(wordsKnown ** random()) - 1] ?? 'shim';
const rarerWord = () => vocabulary[50 + below(3000)] ?? 'shim';
const words = (count: number) => Array.from({ length: count }, word).join(' ');

const documents = Array.from({ length: size }, (_, id): WriteUp => ({
  id,
  title: words(8),
  text: words(wordsPerText),
  kind: ['shim', 'trim', 'reposition', 'remake', 'swap', 'adjust'][below(6)] ?? 'shim',
  maker: `maker ${below(40)}`,
  part: `part ${below(400)}`,
  permanence: ['reversible', 'leaves a mark', 'permanent'][below(3)] ?? 'permanent',
  year: 2015 + below(12),
}));

function misspelt(text: string): string {
  const at = 1 + below(Math.max(1, text.length - 2));
  return text.slice(0, at) + text.slice(at + 1);
}

const queries: Record<string, string[]> = {
  'two words': Array.from({ length: queriesPerKind }, () => `${rarerWord()} ${rarerWord()} `),
  'four words, one misspelt': Array.from(
    { length: queriesPerKind },
    () => `${rarerWord()} ${misspelt(rarerWord())} ${rarerWord()} ${rarerWord()} `,
  ),
  'beginning of a word': Array.from({ length: queriesPerKind }, () => rarerWord().slice(0, 4)),
};

const percentile = (times: readonly number[], part: number) =>
  [...times].sort((left, right) => left - right)[
    Math.min(times.length - 1, Math.floor(times.length * part))
  ] ?? 0;

/** Processor time in ms: unlike time by the clock it says the same on a busy machine. */
function processorTime(since?: NodeJS.CpuUsage): number {
  const { user, system } = process.cpuUsage(since);
  return (user + system) / 1000;
}

function timed(work: () => unknown): number {
  const start = process.cpuUsage();
  work();
  return processorTime(start);
}

function report(name: string, ours: readonly number[], theirs: readonly number[]): void {
  const show = (part: number) => {
    const [left, right] = [percentile(ours, part), percentile(theirs, part)];
    return `${left.toFixed(1)} against ${right.toFixed(1)} ms (${(right / Math.max(left, 0.01)).toFixed(1)} times)`;
  };
  console.log(`${name.padEnd(28)} p50 ${show(0.5)}   p95 ${show(0.95)}`);
}

async function waitFor(tasks: TaskStore, uid: number): Promise<number> {
  const start = process.cpuUsage();
  while (tasks.find(uid)?.finishedAt === null) await new Promise((resolve) => setTimeout(resolve, 1));
  const error = tasks.find(uid)?.error;
  if (error) throw new Error(error.message);
  return processorTime(start);
}

const folder = mkdtempSync(join(tmpdir(), 'bench-search-'));
const control = new Connection(join(folder, 'control.db'));
const catalogue = new IndexCatalogue(folder);
const tasks = new TaskStore(control);
const runner = new TaskRunner(tasks, control, catalogue, () => new Date());
const run = (work: TaskWork) => {
  const type = work.kind === 'putDocuments' ? 'documentAdditionOrUpdate' : 'settingsUpdate';
  return waitFor(tasks, runner.add({ indexUid: 'write-ups', type, work, details: {} }).uid);
};
const put = (some: readonly WriteUp[]) =>
  run({ kind: 'putDocuments', merge: false, skipCreation: false, primaryKey: 'id', documents: some });

try {
  const change = { searchableAttributes: ['title', 'text'], filterableAttributes: facets };
  await run({ kind: 'changeSettings', change, mayCreate: true });
  let built = 0;
  for (let at = 0; at < size; at += 1000) built += await put(documents.slice(at, at + 1000));

  const mini = new MiniSearch<WriteUp>({ fields: ['title', 'text'], storeFields: facets });
  const miniBuilt = timed(() => mini.addAll(documents));
  report('building', [built], [miniBuilt]);

  const index = catalogue.find('write-ups');
  if (!index) throw new Error('The index was not made');
  const ask = (body: Record<string, unknown>) => answerSearch(catalogue, index, readSearch(body), undefined);
  ask({ q: 'warm up' });

  for (const [name, texts] of Object.entries(queries)) {
    const isPrefix = name.startsWith('beginning');
    const options = {
      prefix: isPrefix,
      fuzzy: name.includes('misspelt') ? 0.2 : false,
      combineWith: 'OR' as const,
    };
    report(
      name,
      texts.map((q) => timed(() => ask({ q }))),
      texts.map((q) => timed(() => mini.search(q, options).slice(0, 20))),
    );
  }

  const miniFacets = (q: string, maker: string) => {
    const hits = mini.search(q, { filter: (hit) => hit['maker'] === maker });
    const counts = facets.map((facet) => {
      const values = new Map<unknown, number>();
      for (const hit of hits) values.set(hit[facet], (values.get(hit[facet]) ?? 0) + 1);
      return values;
    });
    return counts.length;
  };
  const common = Array.from({ length: queriesPerKind }, () => [word(), `maker ${below(40)}`] as const);
  report(
    'filter and five facets',
    common.map(([q, maker]) => timed(() => ask({ q: `${q} `, filter: `maker = "${maker}"`, facets }))),
    common.map(([q, maker]) => timed(() => miniFacets(q, maker))),
  );
  const all = Array.from({ length: 10 }, () => timed(() => ask({ facets })));
  console.log(`${'five facets over everything'.padEnd(28)} p50 ${percentile(all, 0.5).toFixed(1)} ms`);

  const updates: number[] = [];
  const miniUpdates: number[] = [];
  for (const document of documents.slice(0, 50)) {
    updates.push(await put([{ ...document, title: words(8) }]));
    miniUpdates.push(timed(() => mini.replace({ ...document, title: words(8) })));
  }
  report('one update, searchable', updates, miniUpdates);
} finally {
  await runner.stop();
  catalogue.close();
  control.close();
  rmSync(folder, { recursive: true, force: true });
}
