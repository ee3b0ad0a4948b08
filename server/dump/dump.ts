import type { Response } from 'express';
import type { Knex } from 'knex';
import type { Logger } from 'pino';
import { z } from 'zod';
import { DumpRecord } from '../../shared/contract/dump-records.js';
import { dumpRoutes as routes } from '../../shared/contract/dump.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { NotFound } from '../http/problems.js';
import { repeatedly, type Worker } from '../worker.js';
import { dumpPath, makeDump, readSummary, type DumpPlace } from './dump-file.js';

const minute = 60 * 1000;
const day = 24 * 60 * minute;
/** How long shared caches may keep it, in seconds; after that they ask whether it has changed. */
const keptFor = 3600;

/** Everything published, for anybody to take away under the licence. */
export function createDump(around: { knex: Knex; clock: () => Date; logger: Logger } & DumpPlace): {
  bindings: RouteBinding[];
  worker: Worker;
} {
  const { knex, clock, logger, folder } = around;
  const schema = JSON.stringify(z.toJSONSchema(DumpRecord), null, 2);
  return {
    bindings: [
      bind(routes.readDumpSummary, async () => ({ dump: (await readSummary(folder)) ?? null })),
      bind(routes.serveDump, async ({ response }) => {
        if (!(await readSummary(folder)))
          throw new NotFound('No dump has been made yet.', 'Come back in an hour; one is made each day.');
        forEverybody(response);
        response.attachment('shimlore.jsonl.gz').type('application/gzip');
        // Tag, day of change, ranges and conditional requests come with it.
        await new Promise<void>((done, fail) =>
          response.sendFile(dumpPath(folder), { cacheControl: false }, (error?: Error & { code?: string }) =>
            !error || error.code === 'ECONNABORTED' || response.headersSent ? done() : fail(error),
          ),
        );
      }),
      bind(routes.serveDumpSchema, async ({ response }) => {
        forEverybody(response);
        response.type('application/schema+json').send(schema);
      }),
    ],
    worker: repeatedly({
      round: async () => {
        const newest = await readSummary(folder);
        if (!newest || clock().getTime() - Date.parse(newest.createdAt) >= day) {
          const made = await makeDump(knex, around, clock());
          logger.info({ bytes: made.bytes }, 'dump of published knowledge made');
        }
        return { more: false };
      },
      pauseMs: 10 * minute,
      onError: (error) => logger.warn({ err: error }, 'the dump could not be made; trying again later'),
    }),
  };
}

/** Open data: kept by shared caches and read by pages of other sites. */
function forEverybody(response: Response): void {
  response.set({
    'Cache-Control': `public, max-age=${keptFor}`,
    'Access-Control-Allow-Origin': '*',
    'Cross-Origin-Resource-Policy': 'cross-origin',
  });
}
