import { z } from 'zod';
import { anyone, route } from './route.js';
import { Instant } from './primitives.js';

/** What the page of the dump tells of the newest one. */
export const DumpSummary = z.object({
  createdAt: Instant,
  bytes: z.int(),
  counts: z.array(z.object({ kind: z.string(), count: z.int() })),
  /** One line of each kind, as it stands in the file; long ones are cut. */
  samples: z.array(z.object({ kind: z.string(), line: z.string() })),
});
export type DumpSummary = z.infer<typeof DumpSummary>;

const tag = 'published knowledge';
export const dumpRoutes = {
  readDumpSummary: route({
    method: 'get',
    path: '/api/dump',
    tag,
    access: anyone,
    summary: 'What is in the newest dump of published knowledge; null while none is made',
    response: z.object({ dump: DumpSummary.nullable() }),
  }),
  serveDump: route({
    method: 'get',
    path: '/dump/shimlore.jsonl.gz',
    tag,
    access: anyone,
    summary: 'Everything published, as JSON Lines, gzip; made anew each day',
  }),
  serveDumpSchema: route({
    method: 'get',
    path: '/dump/schema.json',
    tag,
    access: anyone,
    summary: 'JSON Schema of one line of the dump',
  }),
};
