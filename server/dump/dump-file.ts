import { randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createGzip } from 'node:zlib';
import type { Knex } from 'knex';
import type { DumpHeader } from '../../shared/contract/dump-records.js';
import { DumpSummary } from '../../shared/contract/dump.js';
import { licence } from '../../shared/contract/licence.js';
import { publishedRecords } from './published.store.js';

const longestSample = 600;

export interface DumpPlace {
  readonly folder: string;
  /** Address of the site, as it is named in the first line. */
  readonly publicAddress: string;
}

export const dumpPath = (folder: string): string => path.join(folder, 'shimlore.jsonl.gz');
const summaryPath = (folder: string): string => path.join(folder, 'shimlore.json');

/** What is known of the newest dump; undefined while there is none. */
export async function readSummary(folder: string): Promise<DumpSummary | undefined> {
  try {
    return DumpSummary.parse(JSON.parse(await readFile(summaryPath(folder), 'utf8')));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return undefined;
    throw error;
  }
}

/**
 * Writes everything published as JSON Lines, one state of the database from the first line to the last. The file takes
 * the place of the one before in one step, so that nobody ever fetches half of one. Memory: one batch of rows.
 */
export async function makeDump(knex: Knex, place: DumpPlace, now: Date): Promise<DumpSummary> {
  await mkdir(place.folder, { recursive: true });
  const beside = path.join(place.folder, `making-${randomUUID()}`);
  try {
    // The counts stand in the first line, and are known after the last one: the lines wait in a file of their own.
    const { counts, samples } = await knex.transaction((trx) => writeBody(trx, `${beside}.jsonl`), {
      isolationLevel: 'repeatable read',
    });
    const header = headerOf(place, now, Object.fromEntries(counts));
    await pipeline(
      (async function* () {
        yield `${JSON.stringify(header)}\n`;
        yield* createReadStream(`${beside}.jsonl`);
      })(),
      createGzip({ level: 9 }),
      createWriteStream(`${beside}.gz`, { flush: true }),
    );
    const summary: DumpSummary = {
      createdAt: now.toISOString(),
      bytes: (await stat(`${beside}.gz`)).size,
      counts: [...counts].map(([kind, count]) => ({ kind, count })),
      samples: [...samples].map(([kind, line]) => ({ kind, line })),
    };
    await writeFile(`${beside}.json`, JSON.stringify(summary));
    await rename(`${beside}.gz`, dumpPath(place.folder));
    await rename(`${beside}.json`, summaryPath(place.folder));
    return summary;
  } finally {
    await Promise.all(['jsonl', 'gz', 'json'].map((end) => rm(`${beside}.${end}`, { force: true })));
  }
}

async function writeBody(
  db: Knex,
  file: string,
): Promise<{ counts: Map<string, number>; samples: Map<string, string> }> {
  const counts = new Map<string, number>();
  const samples = new Map<string, string>();
  const lines = async function* (): AsyncGenerator<string> {
    for await (const record of publishedRecords(db)) {
      const line = JSON.stringify(record);
      counts.set(record.kind, (counts.get(record.kind) ?? 0) + 1);
      if (!samples.has(record.kind))
        samples.set(record.kind, line.length <= longestSample ? line : `${line.slice(0, longestSample)}…`);
      yield `${line}\n`;
    }
  };
  await pipeline(Readable.from(lines()), createWriteStream(file));
  return { counts, samples };
}

function headerOf(place: DumpPlace, now: Date, counts: Record<string, number>): DumpHeader {
  return {
    kind: 'shimlore',
    version: 1,
    licence: licence.spdx,
    attribution: `Name the people in "by" and "authors", and Shimlore (${place.publicAddress}); say what you changed; share what you make of it under the same licence.`,
    address: place.publicAddress,
    schema: new URL('/dump/schema.json', place.publicAddress).href,
    createdAt: now.toISOString(),
    counts,
  };
}
