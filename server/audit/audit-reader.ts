import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import type { Knex } from 'knex';
import { z } from 'zod';
import { auditRoutes as routes, type AuditFilter, type AuditLine } from '../../shared/contract/audit.js';
import { Id } from '../../shared/contract/primitives.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { readCursor, toPage } from '../http/pages.js';
import { csvHead, csvLine, jsonLine } from './audit-export.js';
import { createAuditReaderStore, type AuditReaderStore } from './audit-reader.store.js';

const ListKey = z.tuple([Id]);
const batch = 500;

const forms = {
  csv: { type: 'text/csv; charset=utf-8; header=present', head: csvHead, line: csvLine },
  jsonl: { type: 'application/jsonl; charset=utf-8', head: '', line: jsonLine },
} as const;

/** The audit log for those who answer for the site: search, export, and what it has on one thing. */
export function createAuditReader({ knex, clock }: { knex: Knex; clock: () => Date }): {
  bindings: RouteBinding[];
} {
  const store = createAuditReaderStore(knex);
  return {
    bindings: [
      bind(routes.listAudit, async ({ query: { cursor, limit, ...filter } }) => {
        const [beforeId] = readCursor(ListKey, cursor) ?? [];
        return toPage(await store.newestFirst(filter, beforeId, limit + 1), limit, (line) => [line.id]);
      }),
      bind(routes.listAuditNames, () => store.names()),
      bind(routes.exportAudit, async ({ query: { form, ...filter }, response }) => {
        await send(response, forms[form], filter, `audit-${clock().toISOString().slice(0, 10)}.${form}`);
        return '';
      }),
      bind(routes.readSubjectAudit, async ({ params }) => ({
        items: await store.onSubject(params.kind, params.id),
      })),
    ],
  };

  async function send(
    response: Response,
    form: (typeof forms)[keyof typeof forms],
    filter: AuditFilter,
    name: string,
  ): Promise<void> {
    const pieces = piecesOf(store, form, filter);
    // The first batch is read before the headers go: a database that is away is still told as a problem.
    const first = await pieces.next();
    response.setHeader('Content-Type', form.type);
    response.setHeader('Content-Disposition', `attachment; filename="${name}"`);
    const whole = async function* () {
      if (!first.done) yield first.value;
      yield* pieces;
    };
    await pipeline(Readable.from(whole()), response).catch((error: NodeJS.ErrnoException) => {
      // Whoever asked for the file has gone: nothing went wrong here.
      if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
    });
  }
}

/** The log batch by batch; the next one is read when the last has gone out. */
async function* piecesOf(
  store: AuditReaderStore,
  form: { readonly head: string; readonly line: (line: AuditLine) => string },
  filter: AuditFilter,
): AsyncGenerator<string> {
  let after = 0;
  let head = form.head;
  for (;;) {
    const lines = await store.oldestFirst(filter, after, batch);
    const text = head + lines.map(form.line).join('');
    head = '';
    if (text !== '') yield text;
    const last = lines.at(-1);
    if (!last || lines.length < batch) return;
    after = last.id;
  }
}
